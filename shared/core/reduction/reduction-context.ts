import { airOf } from '../air/air';
import { DEFAULT_POLICIES, KMH_PER_MS } from '../constants';
import { fitCorrelation } from '../correlation/correlation';
import type {
  AdjustmentInput,
  CorrelationInput,
  PoliciesInput,
  RankingInput,
  SweepInput,
} from '../ranking/ranking-input';
import { refuse } from '../refusal';
import { positive } from '../requirement';
import { reynoldsNumber } from '../similarity/flow';
import { fitSweep, judgeSweep } from '../similarity/reynolds-sweep';
import { once } from './once';
import { windOf } from './yaw/yaw-ratio';
import type { Policies, PreparedCorrelation, PreparedSweep, ReductionContext } from './reduction';

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

/** Under what the friction share's amounts stand where the policies have no id of their own. */
const DEFAULT_POLICY_ID = 'policy';

/** The policies with their defaults filled in. */
export function policiesOf(given: PoliciesInput | null | undefined): Policies {
  return {
    policyId: given?.policyId ?? DEFAULT_POLICY_ID,
    machCaution: given?.machCaution ?? DEFAULT_POLICIES.machCaution,
    machExcluded: given?.machExcluded ?? DEFAULT_POLICIES.machExcluded,
    blockageCaution: given?.blockageCaution ?? DEFAULT_POLICIES.blockageCaution,
    blockageExcluded: given?.blockageExcluded ?? DEFAULT_POLICIES.blockageExcluded,
    openJetLimit: given?.openJetLimit ?? DEFAULT_POLICIES.openJetLimit,
    minimumReynolds: given?.minimumReynolds ?? DEFAULT_POLICIES.minimumReynolds,
    frictionLine: given?.frictionLine ?? DEFAULT_POLICIES.frictionLine,
    frictionShare: given?.frictionShare ?? DEFAULT_POLICIES.frictionShare,
    frictionShareU: given?.frictionShareU ?? DEFAULT_POLICIES.frictionShareU,
    reynoldsToleranceM2: given?.reynoldsToleranceM2 ?? DEFAULT_POLICIES.reynoldsToleranceM2,
  };
}

function checkPolicies(policies: Policies): void {
  for (const [name, limit] of Object.entries(policies)) {
    if (typeof limit === 'number' && !Number.isFinite(limit))
      refuse('not-a-number', `programme.policies.${name}`, `${name} is not a number.`);
  }
}

function preparedSweep(
  { id, name, points }: SweepInput,
  referenceReynolds: number,
  { reynoldsToleranceM2, minimumReynolds }: Policies,
): PreparedSweep {
  const fit = once(() => fitSweep(points, `sweep:${id}`));
  const verdict = once(() => judgeSweep(fit(), referenceReynolds, reynoldsToleranceM2, minimumReynolds));
  return { id, name: name ?? null, fit, verdict };
}

/** An adjustment is either categorical or per unit, whole. @throws {Refused} missing-input */
function checkAdjustment(adjustment: AdjustmentInput, where: string): void {
  const { fromValue, toValue, deltaDragAreaM2, uM2, perUnitDragAreaM2, uPerUnitM2 } = adjustment;
  const needed = perUnitDragAreaM2 == null ? { fromValue, toValue, deltaDragAreaM2, uM2 } : { uPerUnitM2 };
  for (const [name, value] of Object.entries(needed)) {
    if (value == null) {
      refuse('missing-input', `${where}.${name}`, `${name} of the adjustment “${adjustment.id}” is missing.`);
    }
  }
}

function adjustmentsByItem(
  list: readonly AdjustmentInput[] | null | undefined,
): ReadonlyMap<string, readonly AdjustmentInput[]> {
  byId(list, 'adjustments');
  (list ?? []).forEach((adjustment, i) => checkAdjustment(adjustment, `adjustments.${i}`));
  const found = new Map<string, AdjustmentInput[]>();
  for (const adjustment of list ?? []) {
    const before = found.get(adjustment.item);
    if (before === undefined) found.set(adjustment.item, [adjustment]);
    else before.push(adjustment);
  }
  return found;
}

function prepared(input: CorrelationInput): PreparedCorrelation {
  const replaces = new Set(input.replaces ?? []);
  return {
    input,
    replaces: {
      blockage: replaces.has('blockage'),
      reynolds: replaces.has('reynolds'),
      groundSimulation: replaces.has('ground-simulation'),
    },
    fit: once(() => fitCorrelation(input.pairs, `correlation:${input.id}`)),
  };
}

/** The first correlation of each facility to the programme's reference facility. */
function correlationsByFacility({
  correlations,
  programme,
}: RankingInput): ReadonlyMap<string, PreparedCorrelation> {
  byId(correlations, 'correlations');
  const first = new Map<string, PreparedCorrelation>();
  for (const correlation of correlations ?? []) {
    const { facilityId, referenceFacilityId } = correlation;
    const fits = referenceFacilityId === programme.referenceFacilityId && facilityId !== referenceFacilityId;
    if (fits && !first.has(facilityId)) first.set(facilityId, prepared(correlation));
  }
  return first;
}

/**
 * What does not depend on one result: reference air and Reynolds number, policies, entities by id; sweeps and correlations are
 * fitted when a result asks for them.
 *
 * @throws {Refused} duplicate-id, not-positive, missing-input (of an adjustment), and the codes of air
 */
export function reductionContextOf(input: RankingInput): ReductionContext {
  const { programme } = input;
  byId(input.results, 'results');
  positive(programme.referenceSpeedKmh, 'programme.referenceSpeedKmh');
  positive(programme.characteristicLengthM, 'programme.characteristicLengthM');
  const policies = policiesOf(programme.policies);
  checkPolicies(policies);
  const referenceAir = airOf(programme.referenceAir, 'programme.referenceAir');
  const referenceReynolds = reynoldsNumber(
    programme.referenceSpeedKmh / KMH_PER_MS,
    programme.characteristicLengthM,
    1,
    referenceAir.kinematicViscosityM2S,
  );
  const sweeps = [...byId(input.sweeps, 'sweeps').values()];
  return {
    programme,
    policies,
    referenceAir,
    referenceReynolds,
    referenceCondition: programme.referenceCondition ?? {},
    wind: windOf(programme),
    facilities: byId(input.facilities, 'facilities'),
    models: byId(input.models, 'models'),
    variants: byId(input.variants, 'variants'),
    sweeps: new Map(sweeps.map((sweep) => [sweep.id, preparedSweep(sweep, referenceReynolds, policies)])),
    adjustments: adjustmentsByItem(input.adjustments),
    correlations: correlationsByFacility(input),
  };
}
