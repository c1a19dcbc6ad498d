import type { CandidatePair, CorrelationPair } from '#shared/contracts/correlations';

/** A pair on offer: whether it is taken in, and the reason where it is not. */
export interface PairDraft {
  readonly key: string;
  readonly pair: CorrelationPair;
  readonly origin: 'results' | 'hand' | 'version';
  /** What a person should know before taking it in. */
  readonly about: {
    readonly resultNames: string;
    readonly programme: string;
    readonly excludedBy: readonly string[];
    readonly cautions: readonly string[];
    /** The drag area that the version before held, where today's reduction gives another. */
    readonly formerDragAreaM2?: number;
  };
  readonly included: boolean;
  readonly reason: string;
  /** It was on offer as taken in, so leaving it out needs a reason. */
  readonly expected: boolean;
}

/** What the person decided about a pair. */
export interface PairDecision {
  readonly included: boolean;
  readonly reason: string;
}

const keyOf = ({ resultId, referenceResultId, geometry, dragAreaM2 }: CorrelationPair): string =>
  resultId === undefined ? `hand ${geometry} ${dragAreaM2}` : `${resultId} ${referenceResultId ?? ''}`;

const SAME_FIGURE_M2 = 5e-6;

function figuresOf(candidate: CandidatePair): CorrelationPair {
  const { geometry, resultId, referenceResultId, dragAreaM2, uM2, referenceDragAreaM2, referenceUM2 } =
    candidate;
  return { geometry, resultId, referenceResultId, dragAreaM2, uM2, referenceDragAreaM2, referenceUM2 };
}

function candidateDraft(candidate: CandidatePair, former: CorrelationPair | undefined): PairDraft {
  const pair = figuresOf(candidate);
  const moved = former !== undefined && Math.abs(former.dragAreaM2 - pair.dragAreaM2) > SAME_FIGURE_M2;
  const expected = former === undefined ? candidate.newest : former.leftOutReason === undefined;
  return {
    key: keyOf(pair),
    pair,
    origin: 'results',
    about: {
      resultNames: `${candidate.resultName} (${candidate.testDate}), ${candidate.referenceResultName} (${candidate.referenceTestDate})`,
      programme: candidate.programmeName,
      excludedBy: candidate.excludedBy,
      cautions: candidate.cautions,
      ...(moved ? { formerDragAreaM2: former.dragAreaM2 } : {}),
    },
    included: expected,
    reason: former?.leftOutReason ?? '',
    expected,
  };
}

const NOTHING_TOLD = { resultNames: '', programme: '', excludedBy: [], cautions: [] } as const;

function keptDraft(saved: CorrelationPair): PairDraft {
  const { leftOutReason, ...pair } = saved;
  return {
    key: keyOf(pair),
    pair,
    origin: pair.resultId === undefined ? 'hand' : 'version',
    about: NOTHING_TOLD,
    included: leftOutReason === undefined,
    reason: leftOutReason ?? '',
    expected: leftOutReason === undefined,
  };
}

/** A pair typed by hand. */
export function handDraft(pair: CorrelationPair): PairDraft {
  return {
    key: keyOf(pair),
    pair,
    origin: 'hand',
    about: NOTHING_TOLD,
    included: true,
    reason: '',
    expected: false,
  };
}

/**
 * Everything on offer: pairs of results as they are reduced today, with what the version before decided about them, then what
 * that version held beyond them, then what was typed by hand now; with the person's own decisions laid over.
 */
export function pairDrafts(
  candidates: readonly CandidatePair[],
  former: readonly CorrelationPair[],
  byHand: readonly CorrelationPair[],
  decisions: ReadonlyMap<string, PairDecision>,
): readonly PairDraft[] {
  const formerByKey = new Map(former.map((pair) => [keyOf(pair), pair]));
  const fromResults = candidates.map((candidate) =>
    candidateDraft(candidate, formerByKey.get(keyOf(figuresOf(candidate)))),
  );
  const offered = new Set(fromResults.map(({ key }) => key));
  const kept = former.filter((pair) => !offered.has(keyOf(pair))).map(keptDraft);
  return [...fromResults, ...kept, ...byHand.map(handDraft)].map((draft) => ({
    ...draft,
    ...decisions.get(draft.key),
  }));
}

const MINIMUM_REASON = 3;

/** Whether a pair that was on offer as taken in is left out without a reason. */
export function lacksReason({ included, reason, expected }: PairDraft): boolean {
  return !included && expected && reason.trim().length < MINIMUM_REASON;
}

/** The pairs as they are saved: taken in, or left out with a reason. What was never in and has no reason is not part of it. */
export function pairsOfDrafts(drafts: readonly PairDraft[]): CorrelationPair[] {
  return drafts.flatMap(({ pair, included, reason }) => {
    if (included) return [pair];
    const words = reason.trim();
    return words.length < MINIMUM_REASON ? [] : [{ ...pair, leftOutReason: words }];
  });
}

/** Results that stand in more than one pair taken in: such pairs do not vary apart from one another. */
export function sharedResults(drafts: readonly PairDraft[]): readonly string[] {
  const seen = new Map<string, number>();
  for (const { included, pair } of drafts) {
    if (!included) continue;
    for (const id of [pair.resultId, pair.referenceResultId]) {
      if (id !== undefined) seen.set(id, (seen.get(id) ?? 0) + 1);
    }
  }
  const shared = [...seen].filter(([, times]) => times > 1).map(([id]) => id);
  const names = drafts
    .filter(
      ({ included, pair }) =>
        included && shared.some((id) => id === pair.resultId || id === pair.referenceResultId),
    )
    .map(({ pair }) => pair.geometry);
  return [...new Set(names)];
}
