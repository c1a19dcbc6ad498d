import { DEFAULT_POLICIES } from '../constants';
import { differingItems } from '../similarity/condition';
import { byCodeUnits } from '../text-order';
import type { ContextReason } from './ranking-context';
import type { ConditionInput, PoliciesInput, ResultInput } from './ranking-input';
import type { ExcludedResult, ReducedResult } from './ranking-output';
import type { Remedy, ViewExclusion, ViewExclusionRule } from './ranking-view';
import { facilityName, variantName, type RankingNames } from './ranking-view-names';

/** Limits of method sections 4 and 5, the programme's own where it states them. */
export interface ExclusionLimits {
  readonly machExcluded: number;
  readonly blockageExcluded: number;
  readonly openJetLimit: number;
}

export function exclusionLimits(policies: PoliciesInput | null | undefined): ExclusionLimits {
  const { machExcluded, blockageExcluded, openJetLimit } = DEFAULT_POLICIES;
  return {
    machExcluded: policies?.machExcluded ?? machExcluded,
    blockageExcluded: policies?.blockageExcluded ?? blockageExcluded,
    openJetLimit: policies?.openJetLimit ?? openJetLimit,
  };
}

/** Each item in which a stated condition differs from the reference, with both values. */
export function differences(
  reference: ConditionInput | null | undefined,
  stated: ConditionInput | null | undefined,
): ViewExclusionRule['items'] {
  return differingItems(reference, stated).flatMap((item) => {
    const value = reference?.[item];
    return value == null ? [] : [{ item, reference: value, stated: stated?.[item] ?? null }];
  });
}

/** The rule of a result that a person keeps out; it stands before the method's own. */
const SET_ASIDE = 'set-aside';

/** What stays out by the method's rules and by judgement, by result id. */
export function withSetAside(
  excluded: readonly ExcludedResult[],
  results: readonly ResultInput[],
  setAside: readonly ContextReason[],
): readonly ExcludedResult[] {
  if (setAside.length === 0) return excluded;
  const known = new Map(results.map((result) => [result.id, result]));
  const all = new Map(excluded.map((each) => [each.resultId, each]));
  for (const { resultId } of setAside) {
    const result = known.get(resultId);
    if (result === undefined) continue;
    const rules = [SET_ASIDE, ...(all.get(resultId)?.rules ?? [])];
    all.set(resultId, { resultId, variantId: result.variantId, rules });
  }
  return [...all.values()].sort((a, b) => byCodeUnits(a.resultId, b.resultId));
}

function remedyOf(rule: string): Remedy {
  if (rule === SET_ASIDE) return 'bring-back';
  if (rule === 'not-comparable') return 'include-with-reason';
  if (rule === 'mach' || rule === 'blockage') return 'change-policy';
  return rule.startsWith('no-wind-average') ? 'measure-yaw' : 'enter-anew';
}

/** What the words of an exclusion are made from. */
export interface ExclusionSources {
  readonly names: RankingNames;
  readonly referenceCondition: ConditionInput | null | undefined;
  readonly limits: ExclusionLimits;
  readonly reduced: ReadonlyMap<string, ReducedResult>;
  /** Items that no adjustment and no correlation answers for, by result. */
  readonly notComparable: ReadonlyMap<string, ReadonlySet<string>>;
  /** The method's own words, by result, of those that it refused. */
  readonly refusals: ReadonlyMap<string, string>;
  /** Reasons of those that are set aside. */
  readonly setAside: ReadonlyMap<string, string>;
}

function blockageLimit(sources: ExclusionSources, result: ResultInput | undefined): number {
  const kind = result && sources.names.facilities.get(result.facilityId)?.kind;
  return kind === 'open-jet' ? sources.limits.openJetLimit : sources.limits.blockageExcluded;
}

function viewRule(
  sources: ExclusionSources,
  rule: string,
  result: ResultInput | undefined,
): ViewExclusionRule {
  const reduced = result && sources.reduced.get(result.id);
  const plain = {
    rule,
    remedy: remedyOf(rule),
    value: null,
    limit: null,
    items: [],
    detail: result && rule.startsWith('refused:') ? (sources.refusals.get(result.id) ?? null) : null,
  };
  if (rule === SET_ASIDE) return { ...plain, detail: sources.setAside.get(result?.id ?? '') ?? null };
  if (rule === 'mach') return { ...plain, value: reduced?.mach ?? null, limit: sources.limits.machExcluded };
  if (rule === 'blockage') {
    return { ...plain, value: reduced?.blockageRatio ?? null, limit: blockageLimit(sources, result) };
  }
  if (rule !== 'not-comparable') return plain;
  const open = sources.notComparable.get(result?.id ?? '');
  const items = differences(sources.referenceCondition, result?.condition);
  return { ...plain, items: items.filter(({ item }) => open === undefined || open.has(item)) };
}

/** What stayed out, with the rule and who may do what about it. */
export function viewExclusion(sources: ExclusionSources, excluded: ExcludedResult): ViewExclusion {
  const { names } = sources;
  const result = names.results.get(excluded.resultId);
  return {
    resultId: excluded.resultId,
    name: result?.name ?? excluded.resultId,
    variantId: excluded.variantId,
    variantName: variantName(names, excluded.variantId),
    facilityName: result ? facilityName(names, result.facilityId) : '',
    testDate: result?.testDate ?? '',
    adopted: names.adopted.has(excluded.resultId),
    rules: excluded.rules.map((rule) => viewRule(sources, rule, result)),
  };
}
