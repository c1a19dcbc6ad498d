import type { RankingContext } from './ranking-context';
import type { FacilityInput, RankingInput, ResultInput, VariantInput } from './ranking-input';
import type { Contribution } from '../uncertainty/figure';
import type { ViewContribution, ViewEvidence } from './ranking-view';

/** Everything that has a name, by its id. */
export interface RankingNames {
  readonly variants: ReadonlyMap<string, VariantInput>;
  readonly facilities: ReadonlyMap<string, FacilityInput>;
  readonly results: ReadonlyMap<string, ResultInput>;
  readonly models: ReadonlyMap<string, string>;
  readonly sessions: ReadonlyMap<string, string>;
  /** Adjustments and correlations; a correlation's name says which version it is, and since when it is used. */
  readonly judgements: ReadonlyMap<string, string>;
  /** Which version of each facility's corrections and uncertainties counts. */
  readonly facilityVersions: ReadonlyMap<string, number>;
  /** Results that some variant rests on by adoption. */
  readonly adopted: ReadonlySet<string>;
}

const byId = <T extends { readonly id: string }>(items: readonly T[]): ReadonlyMap<string, T> =>
  new Map(items.map((item) => [item.id, item]));

export function namesIn(inputs: RankingInput, context: RankingContext): RankingNames {
  return {
    variants: byId(inputs.variants),
    facilities: byId(inputs.facilities),
    results: byId(inputs.results),
    models: new Map((inputs.models ?? []).map(({ id, name }) => [id, name ?? id])),
    sessions: new Map(context.sessions.map(({ id, name }) => [id, name])),
    judgements: new Map(
      [...(inputs.adjustments ?? []), ...(inputs.correlations ?? [])].map(({ id, name }) => [id, name ?? id]),
    ),
    facilityVersions: new Map(context.facilityVersions.map(({ facilityId, number }) => [facilityId, number])),
    adopted: new Set(context.adoptions.flatMap(({ resultIds }) => resultIds)),
  };
}

export const variantName = (names: RankingNames, id: string): string => names.variants.get(id)?.name ?? id;

export const facilityName = (names: RankingNames, id: string): string => names.facilities.get(id)?.name ?? id;

/** With the version that its amounts come from, once there is more than one. */
function versionedFacility(names: RankingNames, id: string): string {
  const version = names.facilityVersions.get(id) ?? 1;
  return version === 1 ? facilityName(names, id) : `${facilityName(names, id)}, version ${version}`;
}

/** What a person calls the thing that a key of a budget belongs to. */
function nameOfKey(names: RankingNames, kind: string, id: string): string {
  switch (kind) {
    case 'facility-bias':
    case 'simulation-bias':
    case 'blockage-method':
      return versionedFacility(names, id);
    case 'frontal-area':
    case 'reynolds-shape':
    case 'combination':
      return variantName(names, id);
    case 'as-built-scale':
      return names.models.get(id) ?? id;
    case 'adjustment':
    case 'correlation-level':
    case 'correlation-slope':
      return names.judgements.get(id) ?? id;
    case 'correlation-scatter': {
      const at = id.lastIndexOf(':');
      const correlation = id.slice(0, at);
      return `${names.judgements.get(correlation) ?? correlation}, ${variantName(names, id.slice(at + 1))}`;
    }
    case 'session':
      return names.sessions.get(id) ?? names.results.get(id)?.name ?? id;
    case 'installation':
      // An installation is known by facility and name; what a person typed stands after the colon.
      return names.results.get(id)?.name ?? id.slice(id.indexOf(':') + 1);
    default:
      return names.results.get(id)?.name ?? id;
  }
}

export function viewContribution(names: RankingNames, contribution: Contribution): ViewContribution {
  const colon = contribution.key.indexOf(':');
  const kind = colon < 0 ? contribution.key : contribution.key.slice(0, colon);
  const id = colon < 0 ? '' : contribution.key.slice(colon + 1);
  return { ...contribution, kind, of: nameOfKey(names, kind, id) };
}

export function viewEvidence(names: RankingNames, resultId: string): ViewEvidence {
  const result = names.results.get(resultId);
  const facility = result && names.facilities.get(result.facilityId);
  return {
    resultId,
    name: result?.name ?? resultId,
    testDate: result?.testDate ?? '',
    facilityName: facility?.name ?? result?.facilityId ?? '',
    facilityKind: facility?.kind ?? 'closed',
    scale: result?.scale ?? 1,
    adopted: names.adopted.has(resultId),
    includedReason: result?.includedWithReason ?? null,
  };
}
