import type { AdjustmentFields } from '#shared/contracts/adjustments';
import type { PolicyValues } from '#shared/contracts/policies';
import type { TestPlanInputs } from '#shared/contracts/test-plans';
import type { FacilityFields } from '#shared/contracts/facilities';
import type { ProgrammeFields } from '#shared/contracts/programmes';
import type { ResultFields } from '#shared/contracts/results';
import type { VariantFields } from '#shared/contracts/variants';
import type { ScenarioCheck, ScenarioFormerVersion } from './check-bodies';

/**
 * The demo scenario as plain data: everything in it is invented. Entities point to each other by keys of this scenario;
 * the loader turns them into ids.
 */
export interface Scenario {
  readonly facilities: Readonly<Record<string, FacilityFields>>;
  readonly programme: ScenarioProgramme;
  readonly variants: Readonly<Record<string, VariantFields>>;
  /** In the order of entry. */
  readonly results: readonly ScenarioResult[];
  readonly withdrawals: readonly ScenarioWithdrawal[];
  readonly adoptions: readonly ScenarioAdoption[];
  readonly formerVersions: readonly ScenarioFormerVersion[];
  /** By date. */
  readonly checks: readonly ScenarioCheck[];
  /** Newest last. */
  readonly policies: readonly ScenarioPolicies[];
  /** In the order in which they were added. */
  readonly adjustments: Readonly<Record<string, ScenarioAdjustment>>;
  readonly correlations: Readonly<Record<string, ScenarioCorrelation>>;
  readonly judgements: readonly ScenarioJudgement[];
  /** Names of results that were looked through. */
  readonly checked: readonly string[];
  readonly plans: Readonly<Record<string, ScenarioPlan>>;
}

export interface ScenarioPolicies {
  readonly date: string;
  /** What differs from the values that everybody begins with. */
  readonly changes: Partial<PolicyValues>;
  readonly comment: string;
}

export type ScenarioAdjustment = AdjustmentFields;

export interface ScenarioCorrelation {
  readonly name: string;
  readonly facility: string;
  readonly referenceFacility: string;
  /** Each adopted when it was made; the newest counts. */
  readonly versions: readonly {
    readonly date: string;
    readonly effectiveDate: string;
    /** Names of results: of the facility, of the reference facility. */
    readonly pairs: readonly (readonly [result: string, referenceResult: string])[];
    readonly comment: string;
  }[];
}

/** What is held of a result; without a Reynolds method the usual one. */
export interface ScenarioJudgement {
  readonly result: string;
  readonly date: string;
  readonly reynolds?: { readonly sweepOf: string };
  readonly includedReason?: string;
  readonly setAsideReason?: string;
  readonly comment?: string;
}

export interface ScenarioPlan {
  readonly name: string;
  readonly variant: string;
  readonly facility: string;
  readonly date: string;
  /** Whether results to come are held against it. */
  readonly expected: boolean;
  readonly inputs: TestPlanInputs;
}

export interface ScenarioProgramme extends Omit<ProgrammeFields, 'commonArea' | 'referenceFacilityId'> {
  readonly commonAreaOf: string;
  readonly referenceFacility: string;
}

export interface ScenarioResult extends Omit<ResultFields, 'variantId' | 'facilityId'> {
  readonly variant: string;
  readonly facility: string;
}

export interface ScenarioWithdrawal {
  /** Name of the result. */
  readonly result: string;
  readonly date: string;
  readonly reason: string;
}

export interface ScenarioAdoption {
  /** Names; all of one variant. */
  readonly results: readonly [string, ...string[]];
  readonly rule?: 'newest' | 'weighted-mean';
  readonly date: string;
  readonly comment: string;
}

type Common = Omit<ScenarioResult, 'variant' | 'name' | 'testDate' | 'points'>;
type Own = Partial<Common> & Pick<ScenarioResult, 'variant' | 'name' | 'testDate' | 'points'>;

/** Results of one campaign: what they have in common, and each one’s own. */
export function campaign(common: Common, own: readonly Own[]): readonly ScenarioResult[] {
  return own.map((result) => ({ ...common, ...result }));
}

/** A reading at zero yaw, the mean of n with the standard deviation of one. */
export function straight(value: number, s?: number, n?: number): ScenarioResult['points'] {
  return [{ yawDeg: 0, value, ...(s === undefined ? {} : { s, n }) }];
}

/** A yaw sweep, as pairs of angle and value. */
export function sweep(
  ...pairs: readonly (readonly [yawDeg: number, value: number])[]
): ScenarioResult['points'] {
  return pairs.map(([yawDeg, value]) => ({ yawDeg, value }));
}

/** A Reynolds sweep at zero yaw, as pairs of speed [km/h] and value. */
export function speeds(
  ...pairs: readonly (readonly [speedKmh: number, value: number])[]
): ScenarioResult['points'] {
  return pairs.map(([speedKmh, value]) => ({ yawDeg: 0, value, speedKmh }));
}
