import type { Basis, RankingInput } from '../ranking/ranking-input';
import type { ExcludedResult, ReduceOutput } from '../ranking/ranking-output';
import { Refused, type Refusal } from '../refusal';
import { byCodeUnits } from '../text-order';
import { reduceResult } from './reduce-result';
import type { Reduction, ReductionContext } from './reduction';
import { reductionContextOf } from './reduction-context';

/** A result that could not be reduced, and why. */
export interface RefusedResult extends Refusal {
  readonly resultId: string;
  readonly variantId: string;
}

/** All results brought to the reference: depends on everything but the request and the common area. */
export interface ReducedSet {
  readonly context: ReductionContext;
  /** In input order. */
  readonly reductions: readonly Reduction[];
  readonly refused: readonly RefusedResult[];
}

/**
 * Reduces every result; what refuses one result leaves the others.
 *
 * @throws {Refused} duplicate-id, missing-input (of an adjustment), and the codes of the programme's air
 */
export function reduceResults(input: RankingInput): ReducedSet {
  const context = reductionContextOf(input);
  const reductions: Reduction[] = [];
  const refused: RefusedResult[] = [];
  for (const result of input.results) {
    try {
      reductions.push(reduceResult(result, context));
    } catch (error) {
      if (!(error instanceof Refused)) throw error;
      const { code, where, detail } = error;
      refused.push({ resultId: result.id, variantId: result.variantId, code, where, detail });
    }
  }
  return { context, reductions, refused };
}

/** The rules that keep a reduced result out on a basis: none means that it is usable. */
export function exclusionRules({ output }: Reduction, basis: Basis): string[] {
  const noAverage = basis === 'wind-averaged' && output.windAveragedRefusal !== null;
  return [...output.excludedBy, ...(noAverage ? [`no-wind-average:${output.windAveragedRefusal}`] : [])];
}

/** Every result that stays out, with its rules, by result id. */
export function excludedResults({ reductions, refused }: ReducedSet, basis: Basis): ExcludedResult[] {
  const excluded = reductions.map((reduction) => ({
    resultId: reduction.output.resultId,
    variantId: reduction.output.variantId,
    rules: exclusionRules(reduction, basis),
  }));
  const all = [
    ...excluded.filter(({ rules }) => rules.length > 0),
    ...refused.map(({ resultId, variantId, code }) => ({ resultId, variantId, rules: [`refused:${code}`] })),
  ];
  return all.sort((a, b) => byCodeUnits(a.resultId, b.resultId));
}

/** The operation `reduce`. Of the request only the basis counts. @throws {Refused} as {@link reduceResults} */
export function evaluateReduce(input: RankingInput): ReduceOutput {
  const reduced = reduceResults(input);
  return {
    reducedResults: reduced.reductions.map(({ output }) => output),
    excludedResults: excludedResults(reduced, input.request?.basis ?? 'zero-yaw'),
  };
}
