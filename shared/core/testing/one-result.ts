import { evaluateReduce } from '../reduction/reduce';
import type { ProgrammeInput, RankingInput, ResultInput } from '../ranking/ranking-input';
import type { ReducedResult } from '../ranking/ranking-output';
import { aRanking, aResult } from './ranking-builders';

/** The programme of {@link aRanking} with the default policies: the friction line is on. */
export const aProgramme = (changes: Partial<ProgrammeInput> = {}): ProgrammeInput => ({
  ...aRanking().programme,
  policies: null,
  ...changes,
});

const withResult = (result: Partial<ResultInput>, input: Partial<RankingInput>): RankingInput =>
  aRanking({ programme: aProgramme(), ...input, results: [aResult('r', 'a', result)] });

/** The one result `r` of variant `a` at the reference, with its amounts by key [m²]. @throws {Error} where it is refused */
export function reduced(
  result: Partial<ResultInput>,
  input: Partial<RankingInput> = {},
): ReducedResult & { readonly amounts: ReadonlyMap<string, number> } {
  const { reducedResults, excludedResults } = evaluateReduce(withResult(result, input));
  const [only] = reducedResults;
  if (only === undefined) throw new Error(`It was refused: ${JSON.stringify(excludedResults)}`);
  const amounts = new Map(only.zeroYaw.contributions.map(({ key, amountM2 }) => [key, amountM2]));
  return { ...only, amounts };
}

/** The rules by which the one result stays out; none where it is usable. */
export function rulesOf(result: Partial<ResultInput>, input: Partial<RankingInput> = {}): readonly string[] {
  return evaluateReduce(withResult(result, input)).excludedResults[0]?.rules ?? [];
}

/** The steps that are listed, by name. */
export const stepNames = ({ steps }: ReducedResult): readonly string[] => steps.map(({ step }) => step);
