import { AIR_STATES, type AirInput } from '../air/air-input';
import type { Basis } from './ranking-input';

export const ORDERS = ['drag-area', 'energy'] as const;
export type RankingOrder = (typeof ORDERS)[number];
export const EVIDENCE_BASES = ['adopted', 'newest'] as const;
export type EvidenceBasis = (typeof EVIDENCE_BASES)[number];
export const BASES = ['zero-yaw', 'wind-averaged'] as const satisfies readonly Basis[];

/** Which one area the coefficients are shown on. */
export type AreaChoice =
  | { readonly kind: 'programme' }
  | { readonly kind: 'variant'; readonly variantId: string }
  | { readonly kind: 'typed'; readonly areaM2: number };

/** `programme`, or an air of one's own. */
export type AirChoice = { readonly kind: 'programme' } | { readonly kind: 'stated'; readonly air: AirInput };

/** What a person has chosen to see. All of it stands in the address; what is left out there has its default. */
export interface RankingChoices {
  readonly order: RankingOrder;
  readonly area: AreaChoice;
  /** Key of a cycle: a built-in name, or the id of an own one. */
  readonly cycle: string;
  readonly air: AirChoice;
  readonly evidence: EvidenceBasis;
  readonly basis: Basis;
  /** Name of a configuration; null: each variant's base. */
  readonly configuration: string | null;
  /** Null: the programme's. */
  readonly confidence: number | null;
}

export const DEFAULT_CHOICES: RankingChoices = {
  order: 'drag-area',
  area: { kind: 'programme' },
  cycle: 'wltc-class-3b',
  air: { kind: 'programme' },
  evidence: 'adopted',
  basis: 'zero-yaw',
  configuration: null,
  confidence: null,
};

export const CHOICE_NAMES = [
  'order',
  'area',
  'cycle',
  'air',
  'evidence',
  'basis',
  'configuration',
  'confidence',
] as const;
export type ChoiceName = (typeof CHOICE_NAMES)[number];
/** Choices as they stand in an address. */
export type ChoiceQuery = { readonly [Name in ChoiceName]?: string | undefined };

const BASE = 'base';
const PROGRAMME = 'programme';
const VARIANT_PREFIX = 'variant:';
const CUSTOM_PREFIX = 'custom:';
/** Largest common area that is taken for one [m²]: ten times a large van's. */
const LARGEST_AREA_M2 = 100;
const PLAIN_NUMBER = /^-?\d{1,9}(\.\d{1,9})?$/;

const plainNumber = (text: string): number | null => (PLAIN_NUMBER.test(text) ? Number(text) : null);

const oneOf = <T extends string>(words: readonly T[], text: string): T | null =>
  words.find((word) => word === text) ?? null;

function areaOf(text: string): AreaChoice | null {
  if (text === PROGRAMME) return { kind: 'programme' };
  if (text.startsWith(VARIANT_PREFIX)) {
    const variantId = text.slice(VARIANT_PREFIX.length);
    return variantId === '' ? null : { kind: 'variant', variantId };
  }
  const areaM2 = plainNumber(text);
  return areaM2 !== null && areaM2 > 0 && areaM2 <= LARGEST_AREA_M2 ? { kind: 'typed', areaM2 } : null;
}

function airOf(text: string): AirChoice | null {
  if (text === PROGRAMME) return { kind: 'programme' };
  if (text.startsWith(CUSTOM_PREFIX)) {
    const parts = text.slice(CUSTOM_PREFIX.length).split(':');
    const [temperatureC, pressurePa, relativeHumidity] = parts.map(plainNumber);
    if (parts.length !== 3 || temperatureC == null || pressurePa == null || relativeHumidity == null)
      return null;
    return { kind: 'stated', air: { state: 'custom', temperatureC, pressurePa, relativeHumidity } };
  }
  const state = oneOf(AIR_STATES, text);
  return state === null || state === 'custom' ? null : { kind: 'stated', air: { state } };
}

function confidenceOf(text: string): number | null {
  const confidence = plainNumber(text);
  return confidence !== null && confidence >= 0.5 && confidence < 1 ? confidence : null;
}

const READERS: { readonly [Name in ChoiceName]: (text: string) => Partial<RankingChoices> | null } = {
  order: (text) => wrap('order', oneOf(ORDERS, text)),
  area: (text) => wrap('area', areaOf(text)),
  cycle: (text) => wrap('cycle', text === '' ? null : text),
  air: (text) => wrap('air', airOf(text)),
  evidence: (text) => wrap('evidence', oneOf(EVIDENCE_BASES, text)),
  basis: (text) => wrap('basis', oneOf(BASES, text)),
  configuration: (text) => (text === BASE ? { configuration: null } : { configuration: text }),
  confidence: (text) => wrap('confidence', confidenceOf(text)),
};

function wrap<Name extends ChoiceName>(
  name: Name,
  value: RankingChoices[Name] | null,
): Partial<RankingChoices> | null {
  return value === null ? null : { [name]: value };
}

/** Choices read from an address. What cannot be read keeps its default and is named in `unreadable`. */
export function choicesOfQuery(query: ChoiceQuery): {
  readonly choices: RankingChoices;
  readonly unreadable: readonly ChoiceName[];
} {
  const unreadable: ChoiceName[] = [];
  let choices = DEFAULT_CHOICES;
  for (const name of CHOICE_NAMES) {
    const text = query[name];
    if (text === undefined) continue;
    const read = READERS[name](text);
    if (read === null) unreadable.push(name);
    else choices = { ...choices, ...read };
  }
  return { choices, unreadable };
}

function areaText(area: AreaChoice): string {
  if (area.kind === 'programme') return PROGRAMME;
  return area.kind === 'variant' ? `${VARIANT_PREFIX}${area.variantId}` : String(area.areaM2);
}

function airText(choice: AirChoice): string {
  if (choice.kind === 'programme') return PROGRAMME;
  const { state, temperatureC, pressurePa, relativeHumidity } = choice.air;
  return state == null || state === 'custom'
    ? `${CUSTOM_PREFIX}${temperatureC}:${pressurePa}:${relativeHumidity}`
    : state;
}

/** The address of choices: one text for each that is not at its default, undefined for the others. */
export function queryOfChoices(choices: RankingChoices): {
  readonly [Name in ChoiceName]: string | undefined;
} {
  const all = textsOf(choices);
  const defaults = textsOf(DEFAULT_CHOICES);
  const left = (name: ChoiceName): string | undefined =>
    all[name] === defaults[name] ? undefined : all[name];
  return {
    order: left('order'),
    area: left('area'),
    cycle: left('cycle'),
    air: left('air'),
    evidence: left('evidence'),
    basis: left('basis'),
    configuration: left('configuration'),
    confidence: left('confidence'),
  };
}

function textsOf(choices: RankingChoices): { readonly [Name in ChoiceName]: string | undefined } {
  return {
    order: choices.order,
    area: areaText(choices.area),
    cycle: choices.cycle,
    air: airText(choices.air),
    evidence: choices.evidence,
    basis: choices.basis,
    configuration: choices.configuration ?? BASE,
    confidence: choices.confidence === null ? undefined : String(choices.confidence),
  };
}
