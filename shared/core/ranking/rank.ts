import { DEFAULT_CONFIDENCE } from '../constants';
import { prepareCycle } from '../cycles/cycle';
import { traceOf, type BuiltInCycles } from '../cycles/cycle-input';
import { excludedResults, reduceResults } from '../reduction/reduce';
import { refuse } from '../refusal';
import { inseparableGroups, probabilityLowerThanLaterOnes } from './comparables';
import { byDragArea, dragComparables, orderByOwnAreaCoefficient, rankedVariants } from './drag-ranking';
import { rankByEnergy } from './energy-ranking';
import { pickEvidence } from './evidence';
import { lowestSamplingInputOf, sampleLowest } from './lowest-sampling';
import type { ProgrammeInput, RankingInput } from './ranking-input';
import type { RankOutput } from './ranking-output';
import { positive } from '../requirement';

/** @throws {Refused} confidence-out-of-range unless 0.5 ≤ c < 1 */
export function confidenceOf(programme: ProgrammeInput): number {
  const confidence = programme.confidence ?? DEFAULT_CONFIDENCE;
  if (!(confidence >= 0.5 && confidence < 1)) {
    refuse('confidence-out-of-range', 'programme.confidence', `${confidence} is not from 0.5 to below 1.`);
  }
  return confidence;
}

/**
 * The operation `rank`: everything at once. A screen calls the parts by themselves and keeps what has not changed:
 * `reduceResults` → `pickEvidence` → `byDragArea`, `rankedVariants`, `inseparableGroups` → `rankByEnergy`, `sampleLowest`.
 *
 * @throws {Refused} the codes that refuse the whole: duplicate-id, confidence-out-of-range, not-positive, those
 *   of the programme's air and of the cycle, uncertainty-zero (weighted mean), missing-input (mass or rolling resistance)
 */
export function evaluateRank(input: RankingInput, builtIn: BuiltInCycles): RankOutput {
  const { programme, variants, request } = input;
  const confidence = confidenceOf(programme);
  positive(programme.commonAreaM2, 'programme.commonAreaM2');
  const basis = request?.basis ?? 'zero-yaw';
  const reduced = reduceResults(input);
  const { chosen, variantsWithoutEvidence } = pickEvidence(variants, reduced, basis);
  const ordered = byDragArea(chosen);
  const ranking = rankedVariants(ordered, programme.commonAreaM2);
  const orderByDragArea = ranking.map((row) => row.variantId);
  const ownAreaOrder = orderByOwnAreaCoefficient(ranking);
  const set = dragComparables(ordered);
  const { referenceAir, referenceReynolds } = reduced.context;
  const cycle = request?.cycle == null ? null : prepareCycle(traceOf(request.cycle, builtIn));
  return {
    referenceReynolds,
    referenceAirDensityKgM3: referenceAir.densityKgM3,
    reducedResults: reduced.reductions.map(({ output }) => output),
    excludedResults: excludedResults(reduced, basis),
    variantsWithoutEvidence,
    ranking,
    orderByDragArea,
    orderByOwnAreaCoefficient: ownAreaOrder,
    ownAreaOrderDisagrees: ownAreaOrder.some((id, i) => id !== orderByDragArea[i]),
    probabilityLowerThanLaterOnes: probabilityLowerThanLaterOnes(set),
    inseparableGroups: inseparableGroups(set, confidence),
    probabilityLowest: sampleLowest(lowestSamplingInputOf(set, request?.seed ?? 1)),
    ...(cycle !== null &&
      rankByEnergy(
        ordered,
        { cycle, airDensityKgM3: referenceAir.densityKgM3, rotatingFactor: programme.rotatingFactor },
        confidence,
      )),
  };
}
