import type { JudgementChange } from '#shared/contracts/proposals';
import type { RankingQuery } from '#shared/contracts/rankings';
import {
  applyChanges,
  type ChangedSources,
  type JudgedSources,
} from '#shared/core/ranking/judgement-changes';
import { choicesOfQuery } from '#shared/core/ranking/ranking-choices';
import { compareRankings, type RankingComparison } from '#shared/core/ranking/ranking-comparison';
import { buildRankingView } from '#shared/core/ranking/ranking-view-build';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { Refused } from '#shared/core/refusal';
import type { MemberContext } from '../../http/context';
import { fail, ProblemError } from '../../http/problem-error';
import { readRankingContext, readRankingInputs } from '../rankings';

/** A ranking as it is and as changes would make it. */
export interface Outcome {
  readonly sources: JudgedSources;
  readonly changed: ChangedSources;
  readonly before: RankingView;
  readonly after: RankingView;
}

/**
 * The programme's ranking without and with the changes, under the same choices.
 *
 * @throws {Refused} what refuses the whole ranking
 * @throws {ProblemError} unusable-input where nothing can be ranked yet, or a choice is none
 */
export async function outcomeOf(
  work: MemberContext,
  programmeId: string,
  changes: readonly JudgementChange[],
  query: RankingQuery,
): Promise<Outcome> {
  const { choices, unreadable } = choicesOfQuery(query);
  const [first] = unreadable;
  if (first !== undefined) fail('unusable-input', { where: `query.${first}`, detail: 'This is no choice.' });
  const sources = {
    inputs: await readRankingInputs(work, programmeId, query.area, 'all'),
    context: await readRankingContext(work, programmeId, query),
  };
  const trying = { at: work.now.toISOString(), by: work.member.displayName };
  const changed = applyChanges(sources, changes, trying);
  return {
    sources,
    changed,
    before: buildRankingView(sources.inputs, sources.context, choices),
    after: buildRankingView(changed.inputs, changed.context, choices),
  };
}

/** What the changes would come to now; undefined where nothing can be ranked now, with or without them. */
export async function comparisonNow(
  work: MemberContext,
  programmeId: string,
  changes: readonly JudgementChange[],
  query: RankingQuery,
): Promise<RankingComparison | undefined> {
  try {
    const { before, after } = await outcomeOf(work, programmeId, changes, query);
    return compareRankings(before, after);
  } catch (error) {
    if (error instanceof Refused || error instanceof ProblemError) return undefined;
    throw error;
  }
}
