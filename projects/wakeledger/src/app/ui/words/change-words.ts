import type { JudgementChange } from '#shared/contracts/proposals';
import type { PolicyValues } from '#shared/contracts/policies';
import type { BlockageMethodInput } from '#shared/core/ranking/ranking-input';
import type { QuantityFormat } from '../quantity/quantity-format';
import { BLOCKAGE_METHOD_WORDS, type BlockageMethodName } from './evidence-words';

/** Limits that the method reads and that can be tried, as they are typed: the held value times `factor`. */
export const TRIED_LIMITS = [
  { limit: 'machCaution', words: $localize`Mach number, caution above`, unit: '', factor: 1 },
  { limit: 'machExcluded', words: $localize`Mach number, excluded above`, unit: '', factor: 1 },
  { limit: 'blockageCaution', words: $localize`Blockage, caution above`, unit: '%', factor: 100 },
  { limit: 'blockageExcluded', words: $localize`Blockage, excluded above`, unit: '%', factor: 100 },
  {
    limit: 'openJetLimit',
    words: $localize`Blockage in an open jet, excluded above`,
    unit: '%',
    factor: 100,
  },
  { limit: 'minimumReynolds', words: $localize`Reynolds number, caution below`, unit: '× 10⁶', factor: 1e-6 },
  { limit: 'reynoldsToleranceM2', words: $localize`Tolerance of a flat sweep`, unit: 'm²', factor: 1 },
  { limit: 'frictionShare', words: $localize`Friction share of the drag`, unit: '%', factor: 100 },
  {
    limit: 'frictionShareU',
    words: $localize`Standard uncertainty of the friction share`,
    unit: '%',
    factor: 100,
  },
] as const;
export type TriedLimit = (typeof TRIED_LIMITS)[number]['limit'];

/** Corrections of a facility, as far as they can be tried. */
export interface TriedCorrections {
  readonly blockage?: BlockageMethodInput | null | undefined;
  readonly biasURelative?: number | null | undefined;
  readonly sessionURelative?: number | null | undefined;
}

/** Names of what changes are about, and what held before. */
export interface ChangeSubjects {
  readonly result: (id: string) => string;
  readonly variant: (id: string) => string;
  readonly facility: (id: string) => string;
  readonly corrections: (facilityId: string) => TriedCorrections | undefined;
  readonly limit: (limit: TriedLimit) => number | null | undefined;
}

const isKnown = (method: string): method is BlockageMethodName => method in BLOCKAGE_METHOD_WORDS;

function blockageWords(blockage: BlockageMethodInput | null | undefined, format: QuantityFormat): string {
  if (!blockage) return $localize`nothing stated`;
  const { method, theta, factor } = blockage;
  const words = isKnown(method) ? BLOCKAGE_METHOD_WORDS[method] : method;
  if (theta != null) return `${words}, θ ${format.significant(theta, 4)}`;
  return factor == null ? words : `${words}, ${format.significant(factor, 5)}`;
}

const percent = (value: number | null | undefined, format: QuantityFormat): string =>
  value == null ? $localize`nothing stated` : `${format.significant(value * 100, 3)} %`;

function correctionWords(change: TriedCorrections, before: TriedCorrections, format: QuantityFormat): string {
  const parts = [
    ...(change.blockage
      ? [
          $localize`blockage ${blockageWords(before.blockage, format)}:BEFORE: → ${blockageWords(change.blockage, format)}:AFTER:`,
        ]
      : []),
    ...(change.biasURelative == null
      ? []
      : [
          $localize`facility bias ${percent(before.biasURelative, format)}:BEFORE: → ${percent(change.biasURelative, format)}:AFTER:`,
        ]),
    ...(change.sessionURelative == null
      ? []
      : [
          $localize`session ${percent(before.sessionURelative, format)}:BEFORE: → ${percent(change.sessionURelative, format)}:AFTER:`,
        ]),
  ];
  return parts.join('; ');
}

function limitWords(values: Partial<PolicyValues>, subjects: ChangeSubjects, format: QuantityFormat): string {
  return TRIED_LIMITS.flatMap(({ limit, words, unit, factor }) => {
    const value = values[limit];
    if (value === undefined) return [];
    const before = subjects.limit(limit);
    const figure = (held: number) => format.significant(held * factor, 4);
    return [`${words} ${before == null ? '–' : figure(before)} → ${figure(value)}${unit && ` ${unit}`}`];
  }).join('; ');
}

/** A change of judgement in one sentence. */
export function changeWords(
  change: JudgementChange,
  subjects: ChangeSubjects,
  format: QuantityFormat,
): string {
  switch (change.kind) {
    case 'set-aside':
      return $localize`${subjects.result(change.resultId)}:RESULT: is set aside: ${change.reason}:REASON:`;
    case 'bring-back':
      return $localize`${subjects.result(change.resultId)}:RESULT: is brought back and counts again`;
    case 'include-not-comparable':
      return $localize`${subjects.result(change.resultId)}:RESULT: counts although it is not comparable: ${change.reason}:REASON:`;
    case 'evidence':
      return evidenceWords(change, subjects);
    case 'facility':
      return `${subjects.facility(change.facilityId)}: ${correctionWords(change, subjects.corrections(change.facilityId) ?? {}, format)}`;
    case 'policies':
      return $localize`Limits: ${limitWords(change.values, subjects, format)}:LIMITS:`;
    case 'friction-line':
      return change.frictionLine === 'on'
        ? $localize`Results without a sweep are moved by the friction line`
        : $localize`Results without a sweep are left where they are: no friction line`;
  }
}

function evidenceWords(
  { variantId, resultIds, rule }: Extract<JudgementChange, { kind: 'evidence' }>,
  subjects: ChangeSubjects,
): string {
  const variant = subjects.variant(variantId);
  const names = resultIds.map(subjects.result).join(', ');
  if (resultIds.length === 0) return $localize`${variant}:VARIANT: rests on its newest usable result`;
  if (resultIds.length === 1) return $localize`${variant}:VARIANT: rests on ${names}:RESULT:`;
  return rule === 'weighted-mean'
    ? $localize`${variant}:VARIANT: rests on the weighted mean of ${names}:RESULTS:`
    : $localize`${variant}:VARIANT: rests on the newest of ${names}:RESULTS:`;
}
