import { refuse } from '../refusal';
import { checkInteractions, type InteractionInput } from '../statement/interactions';
import { figureOf, keyedFigureOf, type KeyedFigure } from '../uncertainty/budget';
import type { Figure, FigureInput } from '../uncertainty/figure';
import { combine, type Combination } from './combination';
import { toCommonGeometry } from './common-geometry';

/** Input of the operation `combine`. */
export interface CombineInput {
  readonly variantId: string;
  readonly results: readonly (FigureInput & {
    /** Ids of postings that the result's geometry contains. */
    readonly containsPostings?: readonly string[] | null | undefined;
  })[];
  readonly postings?: readonly (FigureInput & { readonly id: string })[] | null | undefined;
  readonly interactions?: readonly InteractionInput[] | null | undefined;
}

export interface CombineOutput extends Omit<Combination, 'figure'> {
  readonly combined: Figure;
  /** Only where postings were given. */
  readonly commonGeometryContains?: readonly string[];
}

/** @throws {Refused} duplicate-id */
function distinct(ids: readonly string[], where: string): void {
  const twice = ids.find((id, i) => ids.indexOf(id) !== i);
  if (twice !== undefined) refuse('duplicate-id', where, `“${twice}” is there twice in ${where}.`);
}

/**
 * The operation `combine`: the weighted mean of a variant's results, all brought to one geometry first (method section 10).
 *
 * @throws {Refused} nothing-to-combine, unknown-posting, uncertainty-zero, duplicate-id, interactions-overlap, basis-mixed,
 *   malformed-input (an interaction of no delta)
 */
export function evaluateCombine({ variantId, results, postings, interactions }: CombineInput): CombineOutput {
  distinct(
    (postings ?? []).map(({ id }) => id),
    'postings',
  );
  distinct(
    (interactions ?? []).map(({ id }) => id),
    'interactions',
  );
  results.forEach(({ containsPostings }, i) => {
    distinct(containsPostings ?? [], `results.${i}.containsPostings`);
  });
  checkInteractions(interactions ?? []);
  const effects = new Map<string, KeyedFigure>((postings ?? []).map((one) => [one.id, keyedFigureOf(one)]));
  const geometry = toCommonGeometry(
    results.map((one) => ({ figure: keyedFigureOf(one), containsPostings: one.containsPostings ?? [] })),
    effects,
    interactions ?? [],
    variantId,
  );
  const { figure, ...combination } = combine(geometry.figures, variantId);
  return {
    combined: figureOf(figure),
    ...combination,
    ...(postings != null && { commonGeometryContains: geometry.contains }),
  };
}
