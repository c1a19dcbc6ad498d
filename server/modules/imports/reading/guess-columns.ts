import { IMPORT_FIELD_NAMES, importFieldRule, type ImportField } from '#shared/contracts/import-fields';
import { HEADER_WORDS } from './header-words';
import { isSomeUnit, unitOf } from './unit-words';

export interface ColumnKind {
  readonly header: string;
  readonly holdsNumbers: boolean;
  readonly holdsDates: boolean;
}

export interface ColumnGuess {
  readonly index: number;
  readonly field: ImportField;
  readonly unit?: string;
}

/** A heading taken apart: `A_ref / m²` is the name `a ref` and the unit `m²`. */
export interface Heading {
  readonly words: string;
  readonly unit: string | undefined;
}

const UNIT_FORMS = [
  /^(.*?)\s*\[([^\]]*)\]\s*$/,
  /^(.+?)\s*\(([^)]*(?:\([^)]*\)[^)]*)?)\)\s*$/,
  /^(.+?)\s+\/\s*(\S+)\s*$/,
  /^(.+?)\s+in\s+(\S+)\s*$/,
];

export function headingParts(header: string): Heading {
  for (const form of UNIT_FORMS) {
    const parts = form.exec(header);
    if (parts === null) continue;
    const [, name = '', unit = ''] = parts;
    if (isSomeUnit(unit)) return { words: wordsOf(name), unit };
    // A number in parentheses only tells repeated headings apart.
    if (/^\d+$/.test(unit)) return headingParts(name);
  }
  const spoken = wordsOf(header);
  const last = /^(.+?)[\s_]+(\S+)$/.exec(header.trim().replace(/_/g, ' '));
  if (last !== null && isSomeUnit(last[2] ?? '') && (last[2] ?? '').length > 1 && !isKnown(spoken))
    return { words: wordsOf(last[1] ?? ''), unit: last[2] };
  return { words: spoken, unit: undefined };
}

function wordsOf(text: string): string {
  return text
    .trim()
    .replace(/([a-z])([A-Z][a-z])/g, '$1 $2')
    .toLowerCase()
    .replace(/ä/g, 'ae')
    .replace(/ö/g, 'oe')
    .replace(/ü/g, 'ue')
    .replace(/ß/g, 'ss')
    .replace(/β/g, 'beta')
    .replace(/ψ/g, 'psi')
    .replace(/σ/g, 'sigma')
    .replace(/ν/g, 'nu')
    .replace(/φ|ϕ/g, 'phi')
    .replace(/∞/g, 'inf')
    .replace(/[×*·]/g, ' x ')
    .normalize('NFKD')
    .replace(/[^a-z0-9]+/g, ' ')
    .trim();
}

const isKnown = (words: string): boolean =>
  IMPORT_FIELD_NAMES.some((field) => HEADER_WORDS[field].includes(words));

interface Candidate extends ColumnGuess {
  readonly score: number;
}

/**
 * What each column probably holds: by the words of its heading, weighed with its unit and with whether its cells are
 * numbers or dates. Each field and each column is given once, the surest pair first; what is unsure is left open.
 */
export function guessColumns(columns: readonly ColumnKind[]): readonly ColumnGuess[] {
  const candidates = columns
    .flatMap((column, index) => candidatesOf(column, index))
    .sort((one, other) => other.score - one.score || one.index - other.index);
  const fields = new Set<ImportField>();
  const taken = new Set<number>();
  const guesses: ColumnGuess[] = [];
  for (const { index, field, unit } of candidates) {
    if (fields.has(field) || taken.has(index)) continue;
    fields.add(field);
    taken.add(index);
    guesses.push(unit === undefined ? { index, field } : { index, field, unit });
  }
  return guesses.sort((one, other) => one.index - other.index);
}

function candidatesOf(column: ColumnKind, index: number): readonly Candidate[] {
  const heading = headingParts(column.header);
  return IMPORT_FIELD_NAMES.flatMap((field) => {
    const score = scoreOf(field, heading, column);
    if (score <= 0) return [];
    const unit = guessedUnit(field, heading.unit);
    return [unit === undefined ? { index, field, score } : { index, field, unit, score }];
  });
}

/** The unit that the heading names; else the field's first, its usual one. */
function guessedUnit(field: ImportField, text: string | undefined): string | undefined {
  const named = text === undefined ? undefined : unitOf(field, text);
  return named ?? importFieldRule(field).units?.[0]?.unit;
}

function scoreOf(field: ImportField, heading: Heading, column: ColumnKind): number {
  const rule = importFieldRule(field);
  const words = HEADER_WORDS[field];
  const place = words.indexOf(heading.words);
  let score = place >= 0 ? 100 - place / 10 : containedScore(words, heading.words);
  if (score === 0) return 0;
  const asValue = rule.units?.[0]?.unit === 'as the value';
  if (heading.unit !== undefined && !asValue) {
    if (unitOf(field, heading.unit) !== undefined) score += 20;
    else if (!/^[-–—−1]$/.test(heading.unit.trim())) return 0;
  }
  const numeric = rule.kind === 'number' || rule.kind === 'integer';
  if (numeric && !column.holdsNumbers) score -= 60;
  if (rule.kind === 'date' && !column.holdsDates) score -= 40;
  return score >= 40 ? score : 0;
}

/** A heading that holds a known name of two words or a long one among others, for example `drag coefficient mean`. */
function containedScore(names: readonly string[], words: string): number {
  const padded = ` ${words} `;
  const longest = names
    .filter((name) => name.length >= 4 && padded.includes(` ${name} `))
    .reduce((length, name) => Math.max(length, name.length), 0);
  return longest === 0 ? 0 : 50 + (30 * longest) / words.length;
}
