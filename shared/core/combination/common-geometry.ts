import { refuse } from '../refusal';
import {
  activeInteractions,
  zeroYawInteractionFigure,
  type InteractionInput,
} from '../statement/interactions';
import { byCodeUnits } from '../text-order';
import { budgetOf, type KeyedFigure } from '../uncertainty/budget';

/** A figure and the postings that its geometry contains. */
export interface FigureOfGeometry {
  readonly figure: KeyedFigure;
  readonly containsPostings: readonly string[];
}

export interface CommonGeometry {
  /** Every figure with what the others' geometries contain and its own does not. */
  readonly figures: readonly KeyedFigure[];
  /** The union of the contents, sorted (code units): what the combined figure contains. */
  readonly contains: readonly string[];
}

function plus(figure: KeyedFigure, additions: readonly KeyedFigure[]): KeyedFigure {
  return {
    dragAreaM2: additions.reduce((sum, { dragAreaM2 }) => sum + dragAreaM2, figure.dragAreaM2),
    budget: budgetOf([figure, ...additions].flatMap(({ budget }) => budget)),
  };
}

/**
 * Brings figures to one geometry: each is given the postings that another contains and it does not. For a figure the union of contents is what
 * is posted and its own is what is contained, so interactions hold as on a statement (method section 10).
 *
 * @throws {Refused} unknown-posting, interactions-overlap, basis-mixed
 */
export function toCommonGeometry(
  results: readonly FigureOfGeometry[],
  postings: ReadonlyMap<string, KeyedFigure>,
  interactions: readonly InteractionInput[],
  variantId: string,
): CommonGeometry {
  const contains = [...new Set(results.flatMap(({ containsPostings }) => containsPostings))].sort(
    byCodeUnits,
  );
  const effectOf = (id: string): KeyedFigure =>
    postings.get(id) ?? refuse('unknown-posting', `posting:${id}`, `There is no posting “${id}”.`);
  contains.forEach(effectOf);
  const joint = new Map(interactions.map((one) => [one.id, zeroYawInteractionFigure(one, variantId)]));
  const posted = new Set(contains);
  const figures = results.map(({ figure, containsPostings }) => {
    const contained = new Set(containsPostings);
    const active = activeInteractions(interactions, posted, contained);
    const joined = new Set(active.flatMap(({ deltaIds }) => deltaIds));
    const alone = contains.filter((id) => !contained.has(id) && !joined.has(id));
    return plus(figure, [...alone.map(effectOf), ...active.flatMap(({ id }) => joint.get(id) ?? [])]);
  });
  return { figures, contains };
}
