import type { PreparedCycle } from '../cycles/cycle';
import { whPerKm } from '../road-load/cycle-energy';
import { figureOf } from '../uncertainty/budget';
import { excludedResults, type ReducedSet } from '../reduction/reduce';
import { chosenCycle } from './chosen-cycle';
import { probabilityLowerOf, type Comparables } from './comparables';
import { confidenceOf } from './rank';
import type { RankingChoices, RankingOrder } from './ranking-choices';
import type { ContextCycle, RankingContext } from './ranking-context';
import type { RankingInput } from './ranking-input';
import type { IgnoredChoice, RankingView, ViewGroup, ViewOffers, ViewRow } from './ranking-view';
import { exclusionLimits, viewExclusion, withSetAside } from './ranking-view-exclusions';
import {
  chosenAir,
  chosenArea,
  configurationNames,
  configuredVariants,
  type ConfiguredVariant,
} from './ranking-view-input';
import { namesIn, variantName, type RankingNames } from './ranking-view-names';
import { noticeOf } from './ranking-view-orders';
import { viewRow, type RowSources } from './ranking-view-rows';
import {
  cycleStage,
  dragStage,
  energyStage,
  evidenceStage,
  groupStage,
  reduceStage,
  type DragStage,
  type EnergyStage,
  type EvidenceStage,
} from './ranking-view-stages';

/** Everything that the stages have worked out; a screen remembers each, the server makes them once. */
export interface ViewParts {
  readonly inputs: RankingInput;
  readonly context: RankingContext;
  readonly choices: RankingChoices;
  readonly names: RankingNames;
  readonly configured: readonly ConfiguredVariant[];
  readonly reduced: ReducedSet;
  readonly evidence: EvidenceStage;
  readonly drag: DragStage;
  readonly cycle: { readonly offer: ContextCycle; readonly prepared: PreparedCycle } | null;
  readonly energy: EnergyStage | null;
  /** In the order that is shown. */
  readonly groups: readonly (readonly string[])[];
}

/** The programme's own area and, where it is a variant's, whose. */
export function programmeArea(
  inputs: RankingInput,
  context: RankingContext,
): { readonly areaM2: number; readonly variantName: string | null } {
  const policy = context.programme.commonArea;
  const variant =
    policy.kind === 'variant' ? inputs.variants.find(({ id }) => id === policy.variantId) : undefined;
  return { areaM2: inputs.programme.commonAreaM2, variantName: variant?.name ?? null };
}

/** Whether the energies decide the order: they were asked for, and there are some. */
export function ordersByEnergy(order: RankingOrder, energy: EnergyStage | null): energy is EnergyStage {
  return order === 'energy' && energy !== null && energy.order.length > 0;
}

const places = (order: readonly string[]): ReadonlyMap<string, number> =>
  new Map(order.map((id, index) => [id, index + 1]));

function rowSources(parts: ViewParts, commonAreaM2: number): RowSources {
  const { names, choices, context, configured, reduced, drag, energy, evidence } = parts;
  const zeroYaw =
    choices.basis === 'zero-yaw'
      ? new Map(drag.ranking.map((row) => [row.variantId, row]))
      : new Map([...drag.zeroYaw].map(([id, figure]) => [id, figureOf(figure)]));
  return {
    names,
    basis: choices.basis,
    commonAreaM2,
    context: new Map(context.variants.map((variant) => [variant.id, variant])),
    configured: new Map(configured.map((variant) => [variant.input.id, variant])),
    reduced: new Map(reduced.reductions.map(({ output }) => [output.resultId, output])),
    energy: new Map(energy?.energies.map((row) => [row.variantId, row])),
    zeroYaw,
    newer: evidence.newer,
    placeByDragArea: places(drag.order),
    placeByOwnArea: places(drag.orderByOwnArea),
    placeByEnergy: places(energy?.order ?? []),
  };
}

function viewRows(parts: ViewParts, commonAreaM2: number): readonly ViewRow[] {
  const { choices, drag, energy } = parts;
  const sources = rowSources(parts, commonAreaM2);
  const byEnergy = ordersByEnergy(choices.order, energy);
  const ranked = new Map(drag.ranking.map((row) => [row.variantId, row]));
  // Those without energy follow in the order by drag area: they are named, not dropped.
  const order = byEnergy
    ? [...energy.order, ...drag.order.filter((id) => energy.without.includes(id))]
    : drag.order;
  const probabilities = byEnergy ? energy.probabilities : drag.probabilities;
  return order.flatMap((id, index) => {
    const row = ranked.get(id);
    return row ? [viewRow(sources, row, index + 1, probabilities[index] ?? null)] : [];
  });
}

function groupOf(parts: ViewParts, set: Comparables, ids: readonly string[]): ViewGroup {
  const first = set.ids.indexOf(ids[0] ?? '');
  const last = set.ids.indexOf(ids.at(-1) ?? '');
  const value = (index: number): number => {
    const number = set.values[index] ?? 0;
    return parts.energy !== null && set === parts.energy.set
      ? whPerKm(number, parts.cycle?.prepared.distanceM ?? 1)
      : number;
  };
  return {
    variantIds: ids,
    names: ids.map((id) => variantName(parts.names, id)),
    fromRank: first + 1,
    toRank: last + 1,
    difference: value(last) - value(first),
    probability: probabilityLowerOf(set, first, last),
  };
}

function viewNotices(parts: ViewParts, rows: readonly ViewRow[]): RankingView['notices'] {
  const { drag, energy } = parts;
  const byId = new Map(rows.map((row) => [row.variantId, row]));
  const inDragOrder = drag.order.flatMap((id) => byId.get(id) ?? []);
  const ownArea = noticeOf(
    'own-area',
    inDragOrder.map(({ variantId, name, onOwnArea }) => ({
      variantId,
      name,
      value: onOwnArea.value,
      cause: onOwnArea.areaM2,
    })),
    drag.orderByOwnArea,
  );
  const zeroYawOrder = inDragOrder.toSorted(
    (a, b) =>
      (drag.zeroYaw.get(a.variantId)?.dragAreaM2 ?? 0) - (drag.zeroYaw.get(b.variantId)?.dragAreaM2 ?? 0),
  );
  const byEnergy = noticeOf(
    'energy',
    zeroYawOrder.map(({ variantId, name, energy: own, massKg }) => ({
      variantId,
      name,
      value: own?.wheelEnergyWhPerKm ?? 0,
      cause: massKg,
    })),
    energy?.order ?? [],
  );
  return [ownArea, byEnergy].filter((notice) => notice !== null);
}

function viewOffers(parts: ViewParts): ViewOffers {
  const { inputs, context } = parts;
  const own = programmeArea(inputs, context);
  return {
    areas: inputs.variants.map(({ id, name, frontalAreaM2 }) => ({
      variantId: id,
      name: name ?? id,
      areaM2: frontalAreaM2,
    })),
    cycles: context.cycles.map(({ key, name }) => ({ key, name })),
    configurations: configurationNames(context.variants),
    programmeAir: inputs.programme.referenceAir,
    programmeAreaM2: own.areaM2,
    programmeAreaOf: own.variantName,
    programmeConfidence: confidenceOf(inputs.programme),
  };
}

function ignoredChoices(parts: ViewParts): readonly IgnoredChoice[] {
  const { inputs, context, choices, cycle, energy } = parts;
  const ignored: IgnoredChoice[] = [];
  const own = programmeArea(inputs, context);
  if (chosenArea(choices.area, own, inputs.variants) === null) ignored.push('area');
  if (chosenAir(choices.air, inputs.programme.referenceAir) === null) ignored.push('air');
  if (cycle?.offer.key !== choices.cycle) ignored.push('cycle');
  const { configuration } = choices;
  if (configuration !== null && !configurationNames(context.variants).includes(configuration)) {
    ignored.push('configuration');
  }
  if (choices.order === 'energy' && !ordersByEnergy(choices.order, energy)) ignored.push('order');
  return ignored;
}

function stayedOut({ names, inputs, reduced, choices, context }: ViewParts): RankingView['stayedOut'] {
  const sources = {
    names,
    referenceCondition: inputs.programme.referenceCondition,
    limits: exclusionLimits(inputs.programme.policies),
    reduced: new Map(reduced.reductions.map(({ output }) => [output.resultId, output])),
    notComparable: new Map(
      reduced.reductions.map(({ output, condition }) => [output.resultId, new Set(condition.notComparable)]),
    ),
    refusals: new Map(reduced.refused.map(({ resultId, detail }) => [resultId, detail])),
    setAside: new Map(context.setAside.map(({ resultId, reason }) => [resultId, reason])),
  };
  return withSetAside(excludedResults(reduced, choices.basis), inputs.results, context.setAside).map(
    (excluded) => viewExclusion(sources, excluded),
  );
}

/** The view from its parts: what remains to be done once every stage has answered. */
export function assembleView(parts: ViewParts): RankingView {
  const { inputs, context, choices, names, reduced, drag, energy, cycle, groups } = parts;
  const own = programmeArea(inputs, context);
  const area = chosenArea(choices.area, own, inputs.variants) ?? { areaM2: own.areaM2, of: own.variantName };
  const { programme, referenceAir, referenceReynolds } = reduced.context;
  const byEnergy = ordersByEnergy(choices.order, energy);
  const rows = viewRows(parts, area.areaM2);
  const named = (variantId: string) => ({ variantId, name: variantName(names, variantId) });
  return {
    programmeName: inputs.programme.name ?? context.programme.name,
    order: byEnergy ? 'energy' : 'drag-area',
    basis: choices.basis,
    evidence: choices.evidence,
    commonAreaM2: area.areaM2,
    commonAreaOf: area.of,
    confidence: choices.confidence ?? confidenceOf(inputs.programme),
    cycle: cycle && {
      key: cycle.offer.key,
      name: cycle.offer.name,
      distanceM: cycle.prepared.distanceM,
    },
    air: { state: programme.referenceAir.state ?? 'custom', densityKgM3: referenceAir.densityKgM3 },
    configuration: choices.configuration,
    referenceReynolds,
    characteristicLengthName: context.programme.characteristicLengthName,
    ignored: ignoredChoices(parts),
    resultCount: inputs.results.length,
    rows,
    groups: groups.map((ids) => groupOf(parts, byEnergy ? energy.set : drag.set, ids)),
    notices: viewNotices(parts, rows),
    stayedOut: stayedOut(parts),
    withoutEvidence: parts.evidence.variantsWithoutEvidence.map(({ variantId }) => named(variantId)),
    withoutEnergy: (energy?.without ?? []).map(named),
    offers: viewOffers(parts),
  };
}

/**
 * All results at the reference that the choices ask for: most of the work of a ranking, and the same whatever is adopted or
 * set aside.
 *
 * @throws {Refused} what refuses the whole ranking, as the operation `rank`
 */
export function reducedForChoices(inputs: RankingInput, choices: Pick<RankingChoices, 'air'>): ReducedSet {
  const air = chosenAir(choices.air, inputs.programme.referenceAir) ?? inputs.programme.referenceAir;
  return reduceStage(inputs, air);
}

/**
 * The ranking for the choices, from all results of a programme and what the screen needs beside them. Only the chosen
 * cycle must bring its rows. `reduced` is kept by who builds several rankings of the same inputs.
 *
 * @throws {Refused} what refuses the whole ranking, as the operation `rank`
 */
export function buildRankingView(
  inputs: RankingInput,
  context: RankingContext,
  choices: RankingChoices,
  reduced: ReducedSet = reducedForChoices(inputs, choices),
): RankingView {
  const configured = configuredVariants(inputs.variants, context.variants, choices.configuration);
  const { evidence: evidenceBasis, basis } = choices;
  const evidence = evidenceStage(inputs.variants, reduced, context, evidenceBasis, basis);
  const drag = dragStage(evidence);
  const offer = chosenCycle(context.cycles, choices.cycle);
  const prepared = cycleStage(offer);
  const cycle = offer && prepared ? { offer, prepared } : null;
  const { densityKgM3 } = reduced.context.referenceAir;
  const energy =
    prepared && energyStage(drag, configured, prepared, densityKgM3, inputs.programme.rotatingFactor);
  const confidence = choices.confidence ?? confidenceOf(inputs.programme);
  const groups = groupStage(ordersByEnergy(choices.order, energy) ? energy.set : drag.set, confidence);
  const names = namesIn(inputs, context);
  return assembleView({
    inputs,
    context,
    choices,
    names,
    configured,
    reduced,
    evidence,
    drag,
    cycle,
    energy,
    groups,
  });
}
