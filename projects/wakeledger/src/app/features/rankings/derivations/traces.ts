import type { Derivation as Trace } from '#shared/core/derivation/derivation';
import type { KeyNames } from '#shared/core/derivation/key-labels';
import { traceOfCombination } from '#shared/core/derivation/trace-of-combination';
import { traceOfEnergy } from '#shared/core/derivation/trace-of-energy';
import { traceOfReduction } from '#shared/core/derivation/trace-of-figure';
import type { RankingView, ViewRow } from '#shared/core/ranking/ranking-view';
import type { DerivationSources } from '../../../data/rankings/rankings.selectors';
import type { FigureKind } from '../figure-kind';

/** Whatever a key of a budget can belong to, by its id. */
function keyNames({ inputs, context }: DerivationSources): KeyNames {
  const named = [
    ...inputs.facilities,
    ...(inputs.models ?? []),
    ...inputs.variants,
    ...inputs.results,
    ...context.sessions,
    ...(inputs.adjustments ?? []),
    ...(inputs.correlations ?? []),
  ];
  return new Map(named.flatMap(({ id, name }) => (name == null ? [] : [[id, name] as const])));
}

/** The trace from the raw value to the drag area that a row stands on. */
export function dragTrace(
  kind: FigureKind,
  row: ViewRow,
  view: RankingView,
  sources: DerivationSources,
): Trace | null {
  const { reductions, context } = sources.reduced;
  const used = row.evidence.flatMap(
    ({ resultId }) => reductions.find(({ output }) => output.resultId === resultId) ?? [],
  );
  const newest = used.at(-1);
  if (!newest) return null;
  // Energy stands on the zero-yaw drag area, as the regulations do.
  const basis = kind === 'energy' ? 'zero-yaw' : view.basis;
  return row.rule === 'weighted-mean'
    ? traceOfCombination(row.variantId, used, context, basis, keyNames(sources))
    : traceOfReduction(newest, context, basis, keyNames(sources));
}

/** From the zero-yaw drag area on to the energy at the wheel. */
export function energyTrace(row: ViewRow, sources: DerivationSources): Trace | null {
  const { configured, drag, cycle, reduced, inputs } = sources;
  const variant = configured.find(({ input }) => input.id === row.variantId)?.input;
  const zeroYaw = drag.zeroYaw.get(row.variantId);
  if (!variant || !zeroYaw || !cycle) return null;
  const { densityKgM3: airDensityKgM3 } = reduced.context.referenceAir;
  const { rotatingFactor } = inputs.programme;
  return traceOfEnergy({ variant, zeroYaw }, { cycle, airDensityKgM3, rotatingFactor }, keyNames(sources));
}
