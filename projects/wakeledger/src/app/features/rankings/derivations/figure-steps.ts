import { ENERGY_METHODS as METHODS_OF_ENERGY } from '#shared/core/derivation/energy-methods';
import { nameOf, type Method } from '#shared/core/derivation/method';
import { REDUCTION_METHODS as METHODS } from '#shared/core/derivation/reduction-methods';
import type { RankingView, ViewCoefficient, ViewRow } from '#shared/core/ranking/ranking-view';
import type { DerivationStep } from '../../../ui/derivation-sheet/derivation';
import type { QuantityFormat } from '../../../ui/quantity/quantity-format';

/** C_D = C_D·A/A on the common area: the step after which a figure depends on somebody's choice. */
export function commonAreaStep(row: ViewRow, view: RankingView, format: QuantityFormat): DerivationStep {
  const whose = view.commonAreaOf ?? $localize`typed or fixed`;
  return {
    ...coefficientStep(METHODS.commonArea, row, row.onCommonArea, format),
    assumed: [
      $localize`common reference area: ${whose}:WHOSE:. The choice is arbitrary and changes no rank.`,
    ],
  };
}

/** C_D = C_D·A/A on the variant's own frontal area, whose uncertainty enters here. */
export function ownAreaStep(row: ViewRow, format: QuantityFormat): DerivationStep {
  return {
    ...coefficientStep(METHODS.ownArea, row, row.onOwnArea, format),
    assumed: [$localize`the frontal area that counts now, with its uncertainty`],
  };
}

function coefficientStep(
  method: Method,
  row: ViewRow,
  { value, areaM2, expandedUncertainty }: ViewCoefficient,
  format: QuantityFormat,
): DerivationStep {
  return {
    title: method.title,
    result: format.text(value, 'coefficient', { expandedU: expandedUncertainty }),
    formulaMathml: method.formulaMathml,
    formulaText: method.formulaText,
    values: `${format.text(row.figure.dragAreaM2, 'drag-area', { digits: 4 })} / ${format.text(areaM2, 'area')}`,
    source: method.source,
    method: nameOf(method),
    assumed: [],
    cautions: [],
  };
}

/** The energy in the person's unit, and what a count costs. */
export function energyInUnits(
  row: ViewRow,
  view: RankingView,
  format: QuantityFormat,
): readonly DerivationStep[] {
  const { energy } = row;
  if (!energy || !view.cycle) return [];
  return [
    {
      title: $localize`Energy at the wheel over the distance`,
      result: format.text(energy.wheelEnergyWhPerKm, 'energy-per-distance', {
        expandedU: energy.expandedUncertaintyWhPerKm,
      }),
      formulaMathml: '<mfrac><mi>E</mi><mi>d</mi></mfrac>',
      formulaText: 'E/d',
      values: $localize`${view.cycle.name}:CYCLE:, ${format.text(view.cycle.distanceM / 1000, 'distance')}:DISTANCE:; one count costs ${format.text(energy.whPerKmPerCount, 'energy-per-distance', { digits: 2 })}:COUNT:`,
      source: METHODS_OF_ENERGY.cycleEnergy.source,
      method: nameOf(METHODS_OF_ENERGY.cycleEnergy),
      assumed: row.baseStandsIn
        ? [$localize`the chosen configuration does not exist on this variant; its base stands in`]
        : [],
      cautions: [
        $localize`an estimate; certified values come only from the approval authority’s own procedure`,
      ],
    },
  ];
}

/** From the zero-yaw drag area to the energy at the wheel, without the inputs at hand: road load, then cycle. */
export function energySteps(
  row: ViewRow,
  view: RankingView,
  format: QuantityFormat,
): readonly DerivationStep[] {
  const { energy } = row;
  if (!energy || !view.cycle) return [];
  const number = (value: number, digits: number): string => format.value(value, 'number', { digits });
  const method = METHODS_OF_ENERGY.builtUpRoadLoad;
  return [
    {
      title: $localize`Road load`,
      result: `${number(energy.f2NPerKmh2, 5)} N/(km/h)²`,
      formulaMathml: method.formulaMathml,
      formulaText: method.formulaText,
      values: `ρ = ${format.text(view.air.densityKgM3, 'density')}, m = ${format.text(row.massKg ?? 0, 'mass')}: f0 = ${number(energy.f0N, 2)} N, f1 = ${number(energy.f1NPerKmh, 4)} N/(km/h)`,
      source: method.source,
      method: nameOf(method),
      assumed: [$localize`mass and rolling resistance of ${row.configuration ?? ''}:CONFIGURATION:`],
      cautions: [],
    },
    ...energyInUnits(row, view, format),
  ];
}
