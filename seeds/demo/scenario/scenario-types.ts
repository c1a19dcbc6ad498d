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
  readonly result: string;
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
