import { probabilityLower } from '../uncertainty/budget';
import type {
  RankingView,
  ViewEvidence,
  ViewExclusion,
  ViewFigure,
  ViewGroup,
  ViewRow,
} from './ranking-view';
import { keyedFigureOfRow } from './ranking-view-lowest';

/** What of a ranking is compared; any two that show the same programme. */
export type ComparedRanking = Pick<RankingView, 'rows' | 'groups' | 'stayedOut'>;

/** Where one variant stands in one ranking. */
export interface Standing {
  readonly rank: number;
  readonly figure: ViewFigure;
  /** On the common area. */
  readonly coefficient: number;
  readonly evidence: readonly ViewEvidence[];
}

/** One variant before and after; null where it is not ranked. */
export interface RankingMove {
  readonly variantId: string;
  readonly name: string;
  readonly before: Standing | null;
  readonly after: Standing | null;
  /** Places gained (above 0: further up, to a lower drag); 0 where it is missing on one side. */
  readonly places: number;
  /** After minus before [m²]; null where it is missing on one side. */
  readonly shiftM2: number | null;
  /** Place, figure or uncertainty are not the same to the last digit. */
  readonly moved: boolean;
}

/** P(lower has less drag than higher) of two neighbours in the new order, before and after. */
export interface ProbabilityChange {
  readonly lowerId: string;
  readonly lowerName: string;
  readonly higherId: string;
  readonly higherName: string;
  /** Null where one of the two was not ranked. */
  readonly before: number | null;
  readonly after: number;
}

/** A result that a variant rests on now and did not before, or the other way round. */
export interface EvidenceChange {
  readonly variantId: string;
  readonly variantName: string;
  readonly evidence: ViewEvidence;
}

export interface RankingComparison {
  /** Every variant of either ranking, in the new order; those no longer ranked last. */
  readonly moves: readonly RankingMove[];
  readonly probabilities: readonly ProbabilityChange[];
  readonly bracketsGained: readonly ViewGroup[];
  readonly bracketsLost: readonly ViewGroup[];
  readonly entering: readonly EvidenceChange[];
  readonly leaving: readonly EvidenceChange[];
  readonly exclusionsGained: readonly ViewExclusion[];
  readonly exclusionsLost: readonly ViewExclusion[];
  /** False: the two rankings say the same. */
  readonly changed: boolean;
}

function standingOf(row: ViewRow | undefined): Standing | null {
  if (row === undefined) return null;
  const { rank, figure, onCommonArea, evidence } = row;
  return { rank, figure, coefficient: onCommonArea.value, evidence };
}

function sameFigure(a: ViewFigure, b: ViewFigure): boolean {
  return a.dragAreaM2 === b.dragAreaM2 && a.expandedUncertaintyM2 === b.expandedUncertaintyM2;
}

function moveOf(named: ViewRow, from: ViewRow | undefined, to: ViewRow | undefined): RankingMove {
  const before = standingOf(from);
  const after = standingOf(to);
  const both = before !== null && after !== null;
  return {
    variantId: named.variantId,
    name: named.name,
    before,
    after,
    places: both ? before.rank - after.rank : 0,
    shiftM2: both ? after.figure.dragAreaM2 - before.figure.dragAreaM2 : null,
    moved: !both || before.rank !== after.rank || !sameFigure(before.figure, after.figure),
  };
}

type RowsById = ReadonlyMap<string, ViewRow>;

const byVariant = (rows: readonly ViewRow[]): RowsById => new Map(rows.map((row) => [row.variantId, row]));

function movesOf(before: RowsById, after: ComparedRanking, rowsAfter: RowsById): readonly RankingMove[] {
  const gone = [...before.values()].filter(({ variantId }) => !rowsAfter.has(variantId));
  return [
    ...after.rows.map((row) => moveOf(row, before.get(row.variantId), row)),
    ...gone.map((row) => moveOf(row, row, undefined)),
  ];
}

function probabilityOf(lower: ViewRow | undefined, higher: ViewRow | undefined): number | null {
  return lower === undefined || higher === undefined
    ? null
    : probabilityLower(keyedFigureOfRow(lower), keyedFigureOfRow(higher));
}

/** By drag area, whatever order is shown: an order by energy moves with it. */
function probabilitiesOf(before: RowsById, after: ComparedRanking): readonly ProbabilityChange[] {
  const order = after.rows.toSorted((a, b) => a.rankByDragArea - b.rankByDragArea);
  return order.slice(1).flatMap((higher, index): readonly ProbabilityChange[] => {
    const lower = order[index];
    const now = probabilityOf(lower, higher);
    if (lower === undefined || now === null) return [];
    const then = probabilityOf(before.get(lower.variantId), before.get(higher.variantId));
    if (then === now) return [];
    return [
      {
        lowerId: lower.variantId,
        lowerName: lower.name,
        higherId: higher.variantId,
        higherName: higher.name,
        before: then,
        after: now,
      },
    ];
  });
}

/** A bracket is the set that it holds: the same members in another order are the same bracket. */
const membersOf = ({ variantIds }: ViewGroup): string => [...variantIds].sort().join(' ');

function groupsMissingIn(groups: readonly ViewGroup[], others: readonly ViewGroup[]): readonly ViewGroup[] {
  const known = new Set(others.map(membersOf));
  return groups.filter((group) => !known.has(membersOf(group)));
}

function evidenceMissingIn(rows: readonly ViewRow[], others: RowsById): readonly EvidenceChange[] {
  return rows.flatMap(({ variantId, name, evidence }) => {
    const known = new Set(others.get(variantId)?.evidence.map(({ resultId }) => resultId));
    return evidence
      .filter(({ resultId }) => !known.has(resultId))
      .map((each) => ({ variantId, variantName: name, evidence: each }));
  });
}

const reasonsOf = ({ resultId, rules }: ViewExclusion): string =>
  [resultId, ...rules.map(({ rule }) => rule)].join(' ');

function exclusionsMissingIn(
  exclusions: readonly ViewExclusion[],
  others: readonly ViewExclusion[],
): readonly ViewExclusion[] {
  const known = new Set(others.map(reasonsOf));
  return exclusions.filter((exclusion) => !known.has(reasonsOf(exclusion)));
}

/** What a change does to a ranking: the answer to "what happens if I adopt this?" and to a judgement that is tried. */
export function compareRankings(before: ComparedRanking, after: ComparedRanking): RankingComparison {
  const rowsBefore = byVariant(before.rows);
  const rowsAfter = byVariant(after.rows);
  const comparison = {
    moves: movesOf(rowsBefore, after, rowsAfter),
    probabilities: probabilitiesOf(rowsBefore, after),
    bracketsGained: groupsMissingIn(after.groups, before.groups),
    bracketsLost: groupsMissingIn(before.groups, after.groups),
    entering: evidenceMissingIn(after.rows, rowsBefore),
    leaving: evidenceMissingIn(before.rows, rowsAfter),
    exclusionsGained: exclusionsMissingIn(after.stayedOut, before.stayedOut),
    exclusionsLost: exclusionsMissingIn(before.stayedOut, after.stayedOut),
  };
  const { moves, ...lists } = comparison;
  return {
    ...comparison,
    changed: moves.some(({ moved }) => moved) || Object.values(lists).some((list) => list.length > 0),
  };
}
