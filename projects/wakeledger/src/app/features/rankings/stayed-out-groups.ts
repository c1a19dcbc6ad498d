import type { RankingView, ViewExclusion, ViewExclusionRule } from '#shared/core/ranking/ranking-view';
import type { NumberLocale } from '../../core/numbers/number-locale';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { exclusionName, exclusionReasons, remedyWords, ruleTitle, ruleWords } from './exclusion-words';
import { listWords } from './ranking-words';

/** Up to so many results are read one by one; more are read by rule. */
const MOST_LISTED = 6;

/** One line of what stayed out: a result with all its reasons, or a rule with all its results. */
export interface StayedOutEntry {
  readonly id: string;
  readonly words: string;
  /** How many results the rule keeps out; null where the entry is a single result. */
  readonly count: number | null;
  readonly adopted: boolean;
  readonly remedies: readonly string[];
  readonly results: readonly StayedOutResult[];
}

export interface StayedOutResult {
  readonly id: string;
  readonly words: string;
  readonly adopted: boolean;
}

interface Marks {
  readonly format: QuantityFormat;
  readonly locale: NumberLocale;
}

function single(exclusion: ViewExclusion, { format, locale }: Marks): StayedOutEntry {
  return {
    id: exclusion.resultId,
    words: `${exclusionName(exclusion)}: ${exclusionReasons(exclusion, format, locale)}`,
    count: null,
    adopted: exclusion.adopted,
    remedies: [...new Set(exclusion.rules.map(({ remedy }) => remedyWords(remedy)))],
    results: [],
  };
}

/** A result under a rule: what this rule found in it, and what else keeps it out. */
function underRule(exclusion: ViewExclusion, rule: ViewExclusionRule, { format, locale }: Marks): string {
  const found = rule.value !== null || rule.items.length > 0 || rule.detail !== null;
  const own = found ? `: ${ruleWords(rule, format, locale)}` : '';
  const others = exclusion.rules.filter((other) => other !== rule);
  const words = listWords(others.map((other) => ruleWords(other, format, locale)));
  return `${exclusionName(exclusion)}${own}${words === '' ? '' : $localize`; also ${words}:REASONS:`}`;
}

function grouped(stayedOut: readonly ViewExclusion[], marks: Marks): readonly StayedOutEntry[] {
  const pairs = stayedOut.flatMap((exclusion) => exclusion.rules.map((rule) => ({ exclusion, rule })));
  const groups = new Map<string, { readonly exclusion: ViewExclusion; readonly rule: ViewExclusionRule }[]>();
  for (const pair of pairs) {
    const title = ruleTitle(pair.rule, marks.format, marks.locale);
    const group = groups.get(title);
    if (group) group.push(pair);
    else groups.set(title, [pair]);
  }
  return [...groups]
    .sort(([, a], [, b]) => b.length - a.length)
    .map(([title, group]) => ({
      id: title,
      words: title,
      count: group.length,
      adopted: group.some(({ exclusion }) => exclusion.adopted),
      remedies: [...new Set(group.map(({ rule }) => remedyWords(rule.remedy)))],
      results: group.map(({ exclusion, rule }) => ({
        id: exclusion.resultId,
        words: underRule(exclusion, rule, marks),
        adopted: exclusion.adopted,
      })),
    }));
}

/**
 * What stayed out, as few lines as can be read: one a result up to six of them, else one a rule. A result that two rules
 * keep out stands under both.
 */
export function stayedOutEntries(
  stayedOut: RankingView['stayedOut'],
  format: QuantityFormat,
  locale: NumberLocale,
): readonly StayedOutEntry[] {
  const marks = { format, locale };
  return stayedOut.length > MOST_LISTED
    ? grouped(stayedOut, marks)
    : stayedOut.map((each) => single(each, marks));
}
