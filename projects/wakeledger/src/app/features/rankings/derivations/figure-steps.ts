import { ENERGY_METHODS as METHODS_OF_ENERGY } from '#shared/core/derivation/energy-methods';
import { inValues, plain } from '#shared/core/derivation/in-values';
import { nameOf, type Method } from '#shared/core/derivation/method';
import { REDUCTION_METHODS as METHODS } from '#shared/core/derivation/reduction-methods';
import type { RankingView, ViewCoefficient, ViewRow } from '#shared/core/ranking/ranking-view';
import type { DerivationStep } from '../../../ui/derivation-sheet/derivation';
import { plainFigure, wordedValues } from '../../../ui/derivation-sheet/worded';
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
    result: {
      shown: format.text(value, 'coefficient', { expandedU: expandedUncertainty }),
      plain: plainFigure(value, expandedUncertainty, ''),
    },
    formulaMathml: method.formulaMathml,
    formulaText: method.formulaText,
    values: wordedValues(inValues`${row.figure.dragAreaM2} m² / ${areaM2} m²`, format),
    source: method.source,
    method: nameOf(method),
    assumed: [],
    cautions: [],
  };
}

function cycleWords(cycle: string, distance: string, perCount: string): string {
  return $localize`${cycle}:CYCLE:, ${distance}:DISTANCE:; one count costs ${perCount}:COUNT:`;
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
      result: {
        shown: format.text(energy.wheelEnergyWhPerKm, 'energy-per-distance', {
          expandedU: energy.expandedUncertaintyWhPerKm,
        }),
        plain: plainFigure(energy.wheelEnergyWhPerKm, energy.expandedUncertaintyWhPerKm, 'Wh/km'),
      },
      formulaMathml: '<mfrac><mi>E</mi><mi>d</mi></mfrac>',
      formulaText: 'E/d',
      values: {
        shown: cycleWords(
          view.cycle.name,
          format.text(view.cycle.distanceM / 1000, 'distance'),
          format.text(energy.whPerKmPerCount, 'energy-per-distance', { digits: 2 }),
        ),
        plain: cycleWords(
          view.cycle.name,
          `${plain(view.cycle.distanceM / 1000)} km`,
          `${plain(energy.whPerKmPerCount)} Wh/km`,
        ),
      },
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
  const { f0N, f1NPerKmh, f2NPerKmh2 } = energy;
  const method = METHODS_OF_ENERGY.builtUpRoadLoad;
  return [
    {
      title: $localize`Road load`,
      result: wordedValues(inValues`${f2NPerKmh2} N/(km/h)²`, format),
      formulaMathml: method.formulaMathml,
      formulaText: method.formulaText,
      values: wordedValues(
        inValues`ρ = ${view.air.densityKgM3} kg/m³, m = ${row.massKg} kg: f_0 = ${f0N} N, f_1 = ${f1NPerKmh} N/(km/h)`,
        format,
      ),
      source: method.source,
      method: nameOf(method),
      assumed: [$localize`mass and rolling resistance of ${row.configuration ?? ''}:CONFIGURATION:`],
      cautions: [],
    },
    ...energyInUnits(row, view, format),
  ];
}
