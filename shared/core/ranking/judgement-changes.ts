import type { CheckLimits } from '../checks/limits';
import type { ContextReason, RankingContext } from './ranking-context';
import type { BlockageMethodInput, EvidenceRule, FacilityInput, RankingInput } from './ranking-input';
import { withSweeps } from './sweeps';

/** What of a facility's corrections can be tried; a part that is left out stays as it is. */
export interface FacilityChange {
  readonly blockage?: BlockageMethodInput | undefined;
  readonly biasURelative?: number | undefined;
  readonly sessionURelative?: number | undefined;
}

/** One change of judgement, as it is tried and proposed. Raw values are in none: those are never changed. */
export type ChangeOfJudgement =
  | { readonly kind: 'set-aside'; readonly resultId: string; readonly reason: string }
  | { readonly kind: 'bring-back'; readonly resultId: string }
  | { readonly kind: 'include-not-comparable'; readonly resultId: string; readonly reason: string }
  | {
      readonly kind: 'evidence';
      readonly variantId: string;
      /** None: the newest usable result counts again. */
      readonly resultIds: readonly string[];
      readonly rule: EvidenceRule;
    }
  | ({ readonly kind: 'facility'; readonly facilityId: string } & FacilityChange)
  | {
      readonly kind: 'policies';
      readonly values: { readonly [Limit in keyof CheckLimits]?: CheckLimits[Limit] | undefined };
    }
  | { readonly kind: 'friction-line'; readonly frictionLine: 'on' | 'off' };

/** What a ranking is made from. */
export interface JudgedSources {
  readonly inputs: RankingInput;
  readonly context: RankingContext;
}

/** Who tries it, and when (a moment with its offset): stands beside the reasons that are tried. */
export interface Trying {
  readonly at: string;
  readonly by: string;
}

export interface ChangedSources extends JudgedSources {
  /** Changes whose result, variant or facility is not in the programme (any more): they did nothing. */
  readonly withoutSubject: readonly ChangeOfJudgement[];
}

type Step = (sources: JudgedSources) => JudgedSources;

const inContext =
  (change: (context: RankingContext) => Partial<RankingContext>): Step =>
  ({ inputs, context }) => ({ inputs, context: { ...context, ...change(context) } });

const without = (reasons: readonly ContextReason[], resultId: string): readonly ContextReason[] =>
  reasons.filter((held) => held.resultId !== resultId);

/** As setting aside does when it is stored: the result leaves the adoption that holds it, and none is left empty. */
function setAside(resultId: string, reason: string, trying: Trying): Step {
  return inContext((context) => ({
    setAside: [...without(context.setAside, resultId), { resultId, reason, ...trying }],
    adoptions: context.adoptions.flatMap((adoption) => {
      const resultIds = adoption.resultIds.filter((id) => id !== resultId);
      return resultIds.length === 0 ? [] : [{ ...adoption, resultIds }];
    }),
  }));
}

function included(resultId: string, reason: string, trying: Trying): Step {
  return ({ inputs, context }) => ({
    inputs: {
      ...inputs,
      results: inputs.results.map((result) =>
        result.id === resultId ? { ...result, includedWithReason: reason } : result,
      ),
    },
    context: {
      ...context,
      included: [...without(context.included, resultId), { resultId, reason, ...trying }],
    },
  });
}

function restingOn(
  { variantId, resultIds, rule }: Extract<ChangeOfJudgement, { kind: 'evidence' }>,
  trying: Trying,
): Step {
  return inContext(({ adoptions }) => {
    const others = adoptions.filter((adoption) => adoption.variantId !== variantId);
    if (resultIds.length === 0) return { adoptions: others };
    return { adoptions: [...others, { id: `tried:${variantId}`, variantId, resultIds, rule, ...trying }] };
  });
}

/** A facility with other corrections. */
export function changedFacility<Facility extends FacilityChange | FacilityInput>(
  facility: Facility,
  { blockage, biasURelative, sessionURelative }: FacilityChange,
): Facility {
  return {
    ...facility,
    ...(blockage === undefined ? {} : { blockage }),
    ...(biasURelative === undefined ? {} : { biasURelative }),
    ...(sessionURelative === undefined ? {} : { sessionURelative }),
  };
}

/** The figures name the version that storing the change would make. */
function facilityChanged({ facilityId, ...change }: { facilityId: string } & FacilityChange): Step {
  return ({ inputs, context }) => ({
    inputs: {
      ...inputs,
      facilities: inputs.facilities.map((facility) =>
        facility.id === facilityId ? changedFacility(facility, change) : facility,
      ),
    },
    context: {
      ...context,
      facilityVersions: context.facilityVersions.map((version) =>
        version.facilityId === facilityId ? { ...version, number: version.number + 1 } : version,
      ),
    },
  });
}

/** The limits that the method reads; the others change no figure. */
const OF_THE_METHOD = [
  'machCaution',
  'machExcluded',
  'blockageCaution',
  'blockageExcluded',
  'openJetLimit',
  'minimumReynolds',
  'reynoldsToleranceM2',
  'frictionShare',
  'frictionShareU',
] as const satisfies readonly (keyof CheckLimits)[];

function policiesChanged(values: Partial<Record<(typeof OF_THE_METHOD)[number], number | undefined>>): Step {
  return ({ inputs, context }) => {
    const number = (context.policyNumber ?? 0) + 1;
    const changed = Object.fromEntries(
      OF_THE_METHOD.flatMap((limit) => (values[limit] === undefined ? [] : [[limit, values[limit]]])),
    );
    const policies = { ...inputs.programme.policies, ...changed, policyId: `v${number}` };
    return {
      inputs: { ...inputs, programme: { ...inputs.programme, policies } },
      context: { ...context, policyNumber: number },
    };
  };
}

function frictionLineSet(frictionLine: 'on' | 'off'): Step {
  return ({ inputs, context }) => ({
    inputs: {
      ...inputs,
      programme: { ...inputs.programme, policies: { ...inputs.programme.policies, frictionLine } },
    },
    context,
  });
}

function stepOf(change: ChangeOfJudgement, trying: Trying): Step {
  switch (change.kind) {
    case 'set-aside':
      return setAside(change.resultId, change.reason, trying);
    case 'bring-back':
      return inContext((context) => ({ setAside: without(context.setAside, change.resultId) }));
    case 'include-not-comparable':
      return included(change.resultId, change.reason, trying);
    case 'evidence':
      return restingOn(change, trying);
    case 'facility':
      return facilityChanged(change);
    case 'policies':
      return policiesChanged(change.values);
    case 'friction-line':
      return frictionLineSet(change.frictionLine);
  }
}

function hasSubject(change: ChangeOfJudgement, { inputs }: JudgedSources): boolean {
  const results = (ids: readonly string[]) =>
    ids.every((id) => inputs.results.some((result) => result.id === id));
  if ('resultId' in change) return results([change.resultId]);
  if ('facilityId' in change) return inputs.facilities.some(({ id }) => id === change.facilityId);
  if (!('variantId' in change)) return true;
  return inputs.variants.some(({ id }) => id === change.variantId) && results(change.resultIds);
}

/** What a change is about: two with the same subject cannot both hold. */
export function subjectOf(change: ChangeOfJudgement): string {
  switch (change.kind) {
    case 'set-aside':
    case 'bring-back':
      return `counting ${change.resultId}`;
    case 'include-not-comparable':
      return `included ${change.resultId}`;
    case 'evidence':
      return `evidence ${change.variantId}`;
    case 'facility':
      return `facility ${change.facilityId}`;
    case 'policies':
    case 'friction-line':
      return change.kind;
  }
}

/**
 * A list of changes with one more. It takes the place of the one about the same subject; changes of one facility or of
 * the limits are put together.
 */
export function withChange<Change extends ChangeOfJudgement>(
  changes: readonly Change[],
  change: Change,
): readonly Change[] {
  const subject = subjectOf(change);
  const before = changes.find((each) => subjectOf(each) === subject);
  if (before === undefined) return [...changes, change];
  const together = putTogether(before, change);
  return changes.map((each) => (each === before ? together : each));
}

function putTogether<Change extends ChangeOfJudgement>(before: Change, change: Change): Change {
  if (before.kind === 'facility' && change.kind === 'facility') return { ...before, ...change };
  if (before.kind === 'policies' && change.kind === 'policies') {
    return { ...change, values: { ...before.values, ...change.values } };
  }
  return change;
}

/**
 * A ranking's sources as they would be with the changes, for `buildRankingView`; nothing that is given is changed. What
 * is held of results comes before what variants rest on, so that the order of the list makes no difference, as it makes
 * none when a proposal is accepted.
 *
 * @throws {Refused} what refuses the whole ranking, as the operation `rank`
 */
export function applyChanges(
  sources: JudgedSources,
  changes: readonly ChangeOfJudgement[],
  trying: Trying,
): ChangedSources {
  const able = changes.filter((change) => hasSubject(change, sources));
  const inTurn = [
    ...able.filter(({ kind }) => kind !== 'evidence'),
    ...able.filter(({ kind }) => kind === 'evidence'),
  ];
  const { inputs, context } = inTurn.reduce<JudgedSources>(
    (changed, change) => stepOf(change, trying)(changed),
    sources,
  );
  return {
    // A sweep is brought to the full-scale drag area by its facility's corrections: they may be others now.
    inputs: inTurn.length === 0 ? inputs : withSweeps(inputs, inputs.results),
    context,
    withoutSubject: changes.filter((change) => !able.includes(change)),
  };
}
