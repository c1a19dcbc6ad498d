import { airOf } from '../air/air';
import { DEFAULT_POLICIES, KMH_PER_MS } from '../constants';
import type { RankingInput } from '../ranking/ranking-input';
import { refuse } from '../refusal';
import { positive } from '../requirement';
import { reynoldsNumber } from '../similarity/flow';
import type { Policies, ReductionContext } from './reduction';

/**
 * A list by id.
 *
 * @throws {Refused} duplicate-id
 */
function byId<Entity extends { readonly id: string }>(
  list: readonly Entity[] | null | undefined,
  where: string,
): ReadonlyMap<string, Entity> {
  const found = new Map<string, Entity>();
  for (const entity of list ?? []) {
    if (found.has(entity.id)) refuse('duplicate-id', where, `“${entity.id}” is there twice in ${where}.`);
    found.set(entity.id, entity);
  }
  return found;
}

function policiesOf(given: RankingInput['programme']['policies']): Policies {
  return {
    machCaution: given?.machCaution ?? DEFAULT_POLICIES.machCaution,
    machExcluded: given?.machExcluded ?? DEFAULT_POLICIES.machExcluded,
    blockageCaution: given?.blockageCaution ?? DEFAULT_POLICIES.blockageCaution,
    blockageExcluded: given?.blockageExcluded ?? DEFAULT_POLICIES.blockageExcluded,
    openJetLimit: given?.openJetLimit ?? DEFAULT_POLICIES.openJetLimit,
    minimumReynolds: given?.minimumReynolds ?? DEFAULT_POLICIES.minimumReynolds,
  };
}

function checkPolicies(policies: Policies): void {
  for (const [name, limit] of Object.entries(policies)) {
    if (!Number.isFinite(limit))
      refuse('not-a-number', `programme.policies.${name}`, `${name} is not a number.`);
  }
}

/**
 * What does not depend on one result: reference air and Reynolds number, policies, entities by id.
 *
 * @throws {Refused} duplicate-id, not-positive, and the codes of air
 */
export function reductionContextOf(input: RankingInput): ReductionContext {
  const { programme } = input;
  byId(input.results, 'results');
  byId(input.sweeps, 'sweeps');
  byId(input.adjustments, 'adjustments');
  byId(input.correlations, 'correlations');
  positive(programme.referenceSpeedKmh, 'programme.referenceSpeedKmh');
  positive(programme.characteristicLengthM, 'programme.characteristicLengthM');
  const policies = policiesOf(programme.policies);
  checkPolicies(policies);
  const referenceAir = airOf(programme.referenceAir, 'programme.referenceAir');
  return {
    programme,
    policies,
    referenceAir,
    referenceReynolds: reynoldsNumber(
      programme.referenceSpeedKmh / KMH_PER_MS,
      programme.characteristicLengthM,
      1,
      referenceAir.kinematicViscosityM2S,
    ),
    referenceCondition: programme.referenceCondition ?? {},
    facilities: byId(input.facilities, 'facilities'),
    models: byId(input.models, 'models'),
    variants: byId(input.variants, 'variants'),
  };
}
