import { refuse } from '../refusal';
import { byCodeUnits } from '../text-order';
import { amount, budgetOf, type KeyedFigure } from '../uncertainty/budget';

/** The measured joint effect of several deltas: it replaces their sum while all are posted and none is contained. */
export interface InteractionInput {
  readonly id: string;
  readonly deltaIds: readonly string[];
  readonly jointDeltaDragAreaM2: number;
  /** Standard uncertainty [m²]. */
  readonly uM2: number;
  readonly degreesOfFreedom?: number | null | undefined;
  /** Absent: zero-yaw. */
  readonly basis?: 'zero-yaw' | 'wind-averaged' | null | undefined;
  readonly yawRatio?: { readonly value: number; readonly u: number } | null | undefined;
  readonly carryOver?: { readonly factor: number; readonly u: number } | null | undefined;
}

/** @throws {Refused} malformed-input: an interaction of no delta; duplicate-id: one that names a delta twice */
export function checkInteractions(interactions: readonly InteractionInput[]): void {
  for (const { id, deltaIds } of interactions) {
    if (deltaIds.length === 0) {
      refuse(
        'malformed-input',
        `interaction:${id}.deltaIds`,
        'An interaction needs the deltas that it joins.',
      );
    }
    if (new Set(deltaIds).size < deltaIds.length) {
      refuse('duplicate-id', `interaction:${id}.deltaIds`, `The interaction “${id}” names a delta twice.`);
    }
  }
}

/**
 * The interactions that hold, largest first, then by id: all their deltas are posted and none is contained. One that shares a delta with a
 * larger active one is left out (method section 11).
 *
 * @throws {Refused} interactions-overlap: two of equal size share a delta
 */
export function activeInteractions(
  interactions: readonly InteractionInput[],
  posted: ReadonlySet<string>,
  contained: ReadonlySet<string>,
): readonly InteractionInput[] {
  const qualifying = interactions
    .filter(({ deltaIds }) => deltaIds.every((id) => posted.has(id) && !contained.has(id)))
    .sort((a, b) => b.deltaIds.length - a.deltaIds.length || byCodeUnits(a.id, b.id));
  const active: InteractionInput[] = [];
  for (const interaction of qualifying) {
    const overlapping = active.filter(({ deltaIds }) =>
      deltaIds.some((id) => interaction.deltaIds.includes(id)),
    );
    const equal = overlapping.find(({ deltaIds }) => deltaIds.length === interaction.deltaIds.length);
    if (equal !== undefined) {
      refuse(
        'interactions-overlap',
        `interaction:${interaction.id}`,
        `The interactions “${equal.id}” and “${interaction.id}” join equally many deltas and share one: which holds cannot be said.`,
      );
    }
    if (overlapping.length === 0) active.push(interaction);
  }
  return active;
}

/**
 * An interaction's joint effect on a variant, zero yaw: ΔCdA times the carry-over factor, with its own u under `stated:<interaction>` and
 * ΔCdA·u(factor) under `carry-over:<interaction>:<variant>`.
 *
 * @throws {Refused} basis-mixed: a wind-averaged effect in a zero-yaw account
 */
export function zeroYawInteractionFigure(interaction: InteractionInput, variantId: string): KeyedFigure {
  const { id, jointDeltaDragAreaM2, uM2, degreesOfFreedom, basis, carryOver } = interaction;
  if (basis === 'wind-averaged') {
    refuse(
      'basis-mixed',
      `interaction:${id}.basis`,
      `The interaction “${id}” is wind-averaged, the figures are at zero yaw.`,
    );
  }
  const factor = carryOver?.factor ?? 1;
  return {
    dragAreaM2: jointDeltaDragAreaM2 * factor,
    budget: budgetOf([
      amount(`stated:${id}`, uM2 * factor, degreesOfFreedom),
      amount(`carry-over:${id}:${variantId}`, jointDeltaDragAreaM2 * (carryOver?.u ?? 0)),
    ]),
  };
}
