import type { CorrelationPair } from '#shared/contracts/correlations';
import { Issues, type Issue } from '../../rules/issue';

/** Where a result was measured, and of what. */
export interface PairedResult {
  readonly id: string;
  readonly variantId: string;
  readonly facilityId: string;
}

export interface PairSurroundings {
  readonly facilityId: string;
  readonly referenceFacilityId: string;
  readonly results: ReadonlyMap<string, PairedResult>;
}

function resultIssue(
  resultId: string | undefined,
  facilityId: string,
  results: PairSurroundings['results'],
  where: string,
): readonly Issue[] {
  if (resultId === undefined) return [];
  const result = results.get(resultId);
  return new Issues()
    .when(result === undefined, where, 'There is no such result. Choose a result, or type the pair by hand.')
    .when(
      result !== undefined && result.facilityId !== facilityId,
      where,
      'This result comes from another facility than the one it is paired for.',
    ).list;
}

function pairIssues(pair: CorrelationPair, around: PairSurroundings, where: string): readonly Issue[] {
  const { resultId, referenceResultId, leftOutReason } = pair;
  const one = resultId === undefined ? undefined : around.results.get(resultId);
  const other = referenceResultId === undefined ? undefined : around.results.get(referenceResultId);
  const used = leftOutReason === undefined;
  const zeroU =
    'An uncertainty of zero is never known, and the pair would outweigh all others. State the standard uncertainty, above 0, or leave the pair out with a reason.';
  return new Issues()
    .add(resultIssue(resultId, around.facilityId, around.results, `${where}.resultId`))
    .add(
      resultIssue(
        referenceResultId,
        around.referenceFacilityId,
        around.results,
        `${where}.referenceResultId`,
      ),
    )
    .when(
      one !== undefined && other !== undefined && one.variantId !== other.variantId,
      `${where}.referenceResultId`,
      'The two results are of different variants. A pair is one geometry, measured twice.',
    )
    .when(used && pair.uM2 === 0, `${where}.uM2`, zeroU, 'uncertainty-zero')
    .when(used && pair.referenceUM2 === 0, `${where}.referenceUM2`, zeroU, 'uncertainty-zero').list;
}

/** What is wrong with the pairs of a version, before a line is laid through them. */
export function versionIssues(pairs: readonly CorrelationPair[], around: PairSurroundings): readonly Issue[] {
  return new Issues()
    .when(
      around.facilityId === around.referenceFacilityId,
      'referenceFacilityId',
      'A facility needs no correlation to itself. Choose another reference facility.',
    )
    .add(pairs.flatMap((pair, place) => pairIssues(pair, around, `pairs.${place}`)))
    .add(spreadIssues(pairs.filter(({ leftOutReason }) => leftOutReason === undefined))).list;
}

/** A line of one point, or of one drag area, could carry that figure and no other. */
function spreadIssues(used: readonly CorrelationPair[]): readonly Issue[] {
  const [first] = used;
  return new Issues()
    .when(
      used.length < 2,
      'pairs',
      'At least two pairs are needed: with fewer, nothing shows whether another geometry would agree. Add pairs, or take some in that were left out.',
      'correlation-too-few-pairs',
    )
    .when(
      used.length >= 2 && used.every(({ dragAreaM2 }) => dragAreaM2 === first?.dragAreaM2),
      'pairs',
      'Every pair has the same drag area, so the correlation would hold for that one figure only. Add a pair with another drag area.',
      'correlation-no-spread',
    ).list;
}
