import { DEFAULT_POLICIES } from '../constants';
import { differingItems } from '../similarity/condition';
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

function remedyOf(rule: string): Remedy {
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
  /** The method's own words, by result, of those that it refused. */
  readonly refusals: ReadonlyMap<string, string>;
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
  if (rule === 'mach') return { ...plain, value: reduced?.mach ?? null, limit: sources.limits.machExcluded };
  if (rule === 'blockage') {
    return { ...plain, value: reduced?.blockageRatio ?? null, limit: blockageLimit(sources, result) };
  }
  return rule === 'not-comparable'
    ? { ...plain, items: differences(sources.referenceCondition, result?.condition) }
    : plain;
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
    adopted: names.adopted.get(excluded.variantId) === excluded.resultId,
    rules: excluded.rules.map((rule) => viewRule(sources, rule, result)),
  };
}
