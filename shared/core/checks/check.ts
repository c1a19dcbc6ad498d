import type { ConditionValue } from '../ranking/ranking-input';
import type { Refusal } from '../refusal';

/** Every check, in the order in which they are shown; one that does not apply to a result is not listed for it. */
export const CHECK_NAMES = [
  'refused',
  'condition',
  'mach',
  'blockage',
  'reynolds',
  'transition',
  'drag-coefficient',
  'frontal-area',
  'quoted-area',
  'repeatability',
  'yaw-coverage',
  'yaw-pairs',
  'hall-temperature',
  'hall-pressure',
  'air-formula',
  'front-lift',
  'rear-lift',
] as const;
export type CheckName = (typeof CHECK_NAMES)[number];

export const CHECK_VERDICTS = ['passes', 'caution', 'excluded'] as const;
export type CheckVerdict = (typeof CHECK_VERDICTS)[number];

/** What value and limit are in; `fraction` is 0 to 1, `number` has no dimension. */
export const CHECK_UNITS = ['number', 'fraction', 'm²', '°', '°C', 'Pa'] as const;
export type CheckUnit = (typeof CHECK_UNITS)[number];

/** What else is to be said: why a check passes where it might not, or what was probably meant. */
export const CHECK_FINDINGS = [
  'adjusted',
  'included-with-reason',
  'friction-line',
  'no-reynolds-correction',
  'own-sweep',
  'other-sweep',
  'trips',
  'flat-sweep',
  'zero-yaw-only',
  'no-wind-average',
  'stated-uncertainty',
  'facility-repeatability',
  'kelvin',
  'fahrenheit',
  'hectopascal',
  'kilopascal',
  'bar',
  'percent',
] as const;
export type CheckFinding = (typeof CHECK_FINDINGS)[number];

/** The limits of the organisation's policies that a check can rest on. */
export const CHECK_POLICIES = [
  'machCaution',
  'blockageCaution',
  'openJetLimit',
  'reynoldsToleranceM2',
  'minimumReynolds',
  'yawCoverageDeg',
  'repeatabilityCaution',
  'airTemperatureC',
  'airPressurePa',
  'frontLiftLimit',
  'rearLiftLimit',
  'plausible',
] as const;
export type CheckPolicy = (typeof CHECK_POLICIES)[number];

/** Passes from … to …; beyond `excludedAbove` the result stays out of the ranking. Null: no such bound. */
export interface CheckLimit {
  readonly from: number | null;
  readonly to: number | null;
  readonly excludedAbove: number | null;
}

/** An item of the test condition that is not the programme's reference. */
export interface DifferingItem {
  readonly item: string;
  readonly reference: ConditionValue;
  /** Null: the result does not state it. */
  readonly stated: ConditionValue | null;
}

/** One check of one result. */
export interface Check {
  readonly check: CheckName;
  readonly verdict: CheckVerdict;
  /** What was found; null where that is no number. */
  readonly value: number | null;
  readonly unit: CheckUnit;
  readonly limit: CheckLimit | null;
  /** The policy that sets the limit; null where no policy does. */
  readonly policy: CheckPolicy | null;
  readonly finding: CheckFinding | null;
  /** Of the condition only. */
  readonly items: readonly DifferingItem[];
  /** Of a refusal only. */
  readonly refusal: Refusal | null;
}

type Told = Pick<Check, 'check' | 'verdict'> & Partial<Check>;

/** A check with what it does not speak of left empty. */
export function check(told: Told): Check {
  return {
    value: null,
    unit: 'number',
    limit: null,
    policy: null,
    finding: null,
    items: [],
    refusal: null,
    ...told,
  };
}

const NO_BOUND: CheckLimit = { from: null, to: null, excludedAbove: null };

/** A limit from the bounds that there are. */
export function limit(bounds: Partial<CheckLimit>): CheckLimit {
  return { ...NO_BOUND, ...bounds };
}

/** Caution outside from … to …; the bounds themselves pass. */
export function within(value: number, { from, to }: Pick<CheckLimit, 'from' | 'to'>): CheckVerdict {
  return (from !== null && value < from) || (to !== null && value > to) ? 'caution' : 'passes';
}

/** The gravest verdict of several; `passes` where there is none. */
export function gravest(checks: readonly Pick<Check, 'verdict'>[]): CheckVerdict {
  if (checks.some(({ verdict }) => verdict === 'excluded')) return 'excluded';
  return checks.some(({ verdict }) => verdict === 'caution') ? 'caution' : 'passes';
}
