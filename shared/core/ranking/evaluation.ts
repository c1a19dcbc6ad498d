import type { Combination } from '../combination/combination';
import { COMBINATION_METHODS } from '../derivation/combination-methods';
import { methodChain } from '../derivation/derivation';
import { nameOf } from '../derivation/method';
import { traceOfReduction } from '../derivation/trace-of-figure';
import { excludedResults, reduceResults, type ReducedSet } from '../reduction/reduce';
import type { Reduction } from '../reduction/reduction';
import { byCodeUnits } from '../text-order';
import { figureOf } from '../uncertainty/budget';
import { rankedVariants } from './drag-ranking';
import { pickEvidence, type VariantEvidence } from './evidence';
import type { EvaluatedResult, EvaluationOutput } from './evaluation-output';
import type { Basis, RankingInput } from './ranking-input';

/** What an evaluation comes to, and the methods that it used, `id@version` in the order of use. */
export interface EvidenceEvaluation {
  readonly output: EvaluationOutput;
  readonly methods: readonly string[];
}

function evaluatedResult({ output }: Reduction): EvaluatedResult {
  const { resultId, reynolds, mach, blockageRatio, steps, zeroYaw, cautions } = output;
  const { windAveragedDragAreaM2, windAveragedStandardUncertaintyM2 } = output;
  return {
    resultId,
    reynolds,
    mach,
    blockageRatio,
    steps,
    zeroYaw,
    windAveragedDragAreaM2,
    windAveragedStandardUncertaintyM2,
    cautions,
  };
}

function evidenceOn(basis: Basis, input: RankingInput, reduced: ReducedSet): VariantEvidence | undefined {
  return pickEvidence(input.variants, reduced, basis).chosen[0];
}

/** The methods of every result that was used, each once; the longer chain where there is a wind average. */
function methodsOf(reduced: ReducedSet, evidence: VariantEvidence | undefined): readonly string[] {
  const used = reduced.reductions.filter(({ output }) => evidence?.resultIds.includes(output.resultId));
  const chains = used.flatMap((reduction) => {
    const basis = reduction.windAverage.figure === null ? 'zero-yaw' : 'wind-averaged';
    return methodChain(traceOfReduction(reduction, reduced.context, basis, new Map()));
  });
  return [...new Set([...chains, ...combinationMethods(evidence?.combination ?? null)])];
}

/** What a weighted mean adds to the methods of its results; one result has nothing to agree with. */
function combinationMethods(combination: Combination | null): readonly string[] {
  if (combination === null) return [];
  const { weightedMean, birgeRatio, randomEffects } = COMBINATION_METHODS;
  const methods =
    combination.birgeRatio === null ? [weightedMean] : [weightedMean, birgeRatio, randomEffects];
  return methods.map(nameOf);
}

/**
 * The evidence of the one variant of an input: each of its results at the reference, and its figure on both bases, by the
 * functions that the ranking uses.
 *
 * @throws {Refused} what refuses the whole ranking, as the operation `rank`
 */
export function evaluateEvidence(input: RankingInput): EvidenceEvaluation {
  const reduced = reduceResults(input);
  const zeroYaw = evidenceOn('zero-yaw', input, reduced);
  const windAveraged = evidenceOn('wind-averaged', input, reduced);
  const usedResultIds = zeroYaw?.resultIds ?? [];
  return {
    output: {
      zeroYaw: zeroYaw === undefined ? null : figureOf(zeroYaw.figure),
      windAveraged: windAveraged === undefined ? null : figureOf(windAveraged.figure),
      usedResultIds,
      combination: (zeroYaw && rankedVariants([zeroYaw], 1)[0]?.combination) ?? null,
      results: reduced.reductions.map(evaluatedResult).sort((a, b) => byCodeUnits(a.resultId, b.resultId)),
      excluded: excludedResults(reduced, 'zero-yaw').map(({ resultId, rules }) => ({ resultId, rules })),
    },
    methods: methodsOf(reduced, zeroYaw),
  };
}
