import type { CheckLimits, LimitRange } from './limits';

export type LimitRule =
  'above-zero' | 'fraction' | 'caution-above-excluded' | 'from-not-below-to' | 'twice' | 'not-a-number';

/** What is wrong with one limit; the path is dotted, as in `plausible.2.dragCoefficient.to`. */
export interface LimitIssue {
  readonly where: string;
  readonly rule: LimitRule;
}

const FRACTIONS = [
  'blockageCaution',
  'blockageExcluded',
  'openJetLimit',
  'frictionShare',
  'frictionShareU',
  'repeatabilityCaution',
] as const;
const ABOVE_ZERO = [
  'machCaution',
  'machExcluded',
  'minimumReynolds',
  'reynoldsToleranceM2',
  'yawCoverageDeg',
] as const;
const LIFT = ['frontLiftLimit', 'rearLiftLimit'] as const;

function rangeIssues({ from, to }: LimitRange, where: string): LimitIssue[] {
  if (Number.isNaN(from) || Number.isNaN(to)) {
    return [{ where: `${where}.${Number.isNaN(from) ? 'from' : 'to'}`, rule: 'not-a-number' }];
  }
  return from < to ? [] : [{ where: `${where}.to`, rule: 'from-not-below-to' }];
}

function pairIssue(caution: number, excluded: number, where: string): LimitIssue[] {
  return caution > excluded ? [{ where, rule: 'caution-above-excluded' }] : [];
}

/** Everything that is wrong with a set of limits, field by field; empty where they can be used. */
export function limitIssues(limits: CheckLimits): readonly LimitIssue[] {
  const shapes = limits.plausible.map(({ bodyShape }) => bodyShape);
  return [
    ...FRACTIONS.flatMap((where): LimitIssue[] =>
      limits[where] >= 0 && limits[where] <= 1 ? [] : [{ where, rule: 'fraction' }],
    ),
    ...ABOVE_ZERO.flatMap((where): LimitIssue[] =>
      limits[where] > 0 ? [] : [{ where, rule: 'above-zero' }],
    ),
    ...LIFT.flatMap((where): LimitIssue[] =>
      Number.isNaN(limits[where]) ? [{ where, rule: 'not-a-number' }] : [],
    ),
    ...pairIssue(limits.machCaution, limits.machExcluded, 'machCaution'),
    ...pairIssue(limits.blockageCaution, limits.blockageExcluded, 'blockageCaution'),
    ...rangeIssues(limits.airTemperatureC, 'airTemperatureC'),
    ...rangeIssues(limits.airPressurePa, 'airPressurePa'),
    ...limits.plausible.flatMap((body, i) => [
      ...rangeIssues(body.dragCoefficient, `plausible.${i}.dragCoefficient`),
      ...rangeIssues(body.frontalAreaM2, `plausible.${i}.frontalAreaM2`),
    ]),
    ...shapes.flatMap((shape, i): LimitIssue[] =>
      shapes.indexOf(shape) < i ? [{ where: `plausible.${i}.bodyShape`, rule: 'twice' }] : [],
    ),
  ];
}
