import type { RankingView, ViewRow } from '#shared/core/ranking/ranking-view';
import type { DerivationStep } from '../../../ui/derivation-sheet/derivation';
import type { QuantityFormat } from '../../../ui/quantity/quantity-format';

const CDA = '<mrow><msub><mi>C</mi><mi>D</mi></msub><mo>&#8290;</mo><mi>A</mi></mrow>';
const sub = (base: string, index: string): string => `<msub><mi>${base}</mi><mi>${index}</mi></msub>`;

const NO_NOTES = { assumed: [], cautions: [] } as const;

/** C_D = C_D·A/A on the common area: the step after which a figure depends on somebody's choice. */
export function commonAreaStep(row: ViewRow, view: RankingView, format: QuantityFormat): DerivationStep {
  const whose = view.commonAreaOf ?? $localize`typed or fixed`;
  return {
    title: $localize`Coefficient on the common area`,
    result: format.text(row.onCommonArea.value, 'coefficient'),
    formulaMathml: `${sub('C', 'D')}<mo>=</mo><mfrac>${CDA}${sub('A', 'common')}</mfrac>`,
    formulaText: 'C_D = C_D·A / A_common',
    values: `${format.text(row.figure.dragAreaM2, 'drag-area', { digits: 4 })} / ${format.text(view.commonAreaM2, 'area')}`,
    source: $localize`common reference area: ${whose}:WHOSE:. The choice is arbitrary and changes no rank.`,
    method: 'coefficient-on-area@1',
    ...NO_NOTES,
  };
}

/** C_D = C_D·A/A on the variant's own frontal area, whose uncertainty enters here. */
export function ownAreaStep(row: ViewRow, format: QuantityFormat): DerivationStep {
  return {
    title: $localize`Coefficient on its own frontal area`,
    result: format.text(row.onOwnArea.value, 'coefficient', {
      expandedU: row.onOwnArea.expandedUncertainty,
    }),
    formulaMathml: `${sub('C', 'D')}<mo>=</mo><mfrac>${CDA}${sub('A', 'own')}</mfrac>`,
    formulaText: 'C_D = C_D·A / A_own',
    values: `${format.text(row.figure.dragAreaM2, 'drag-area', { digits: 4 })} / ${format.text(row.onOwnArea.areaM2, 'area')}`,
    source: $localize`frontal area of ${row.name}:VARIANT:, with its uncertainty`,
    method: 'coefficient-on-area@1',
    ...NO_NOTES,
  };
}

/** From the zero-yaw drag area to the energy at the wheel: road load, then cycle. */
export function energySteps(
  row: ViewRow,
  view: RankingView,
  format: QuantityFormat,
): readonly DerivationStep[] {
  const { energy } = row;
  if (!energy || !view.cycle) return [];
  const number = (value: number, digits: number): string => format.value(value, 'number', { digits });
  const mass = format.text(row.massKg ?? 0, 'mass');
  const load = `f0 = ${number(energy.f0N, 2)} N, f1 = ${number(energy.f1NPerKmh, 4)} N/(km/h), f2 = ${number(energy.f2NPerKmh2, 5)} N/(km/h)²`;
  return [
    {
      title: $localize`Road load`,
      result: `${number(energy.f2NPerKmh2, 5)} N/(km/h)²`,
      formulaMathml: `<msub><mi>f</mi><mn>2</mn></msub><mo>=</mo><mfrac><mrow><mi>ρ</mi>${CDA}</mrow><mrow><mn>2</mn><mo>·</mo><msup><mn>3.6</mn><mn>2</mn></msup></mrow></mfrac>`,
      formulaText: 'f2 = ½·ρ·C_D·A/3.6², or f2₀ + (ρ·C_D·A − ρ₀·C_D·A₀)/(2·3.6²) with a measured road load',
      values: `ρ = ${format.text(view.air.densityKgM3, 'density')}; ${load}`,
      source: $localize`method section 13; zero-yaw drag area, as the regulations do; mass and rolling resistance of ${row.configuration ?? ''}:CONFIGURATION:`,
      method: 'road-load@1',
      assumed: row.baseStandsIn
        ? [$localize`the chosen configuration does not exist on this variant; its base stands in`]
        : [],
      cautions: [],
    },
    {
      title: $localize`Energy at the wheel`,
      result: format.text(energy.wheelEnergyWhPerKm, 'energy-per-distance', {
        expandedU: energy.expandedUncertaintyWhPerKm,
      }),
      formulaMathml:
        '<mi>E</mi><mo>=</mo><munder><mo>∑</mo><mrow><mi>F</mi><mo>&gt;</mo><mn>0</mn></mrow></munder>' +
        '<mrow><mo>(</mo><msub><mi>f</mi><mn>0</mn></msub><mo>+</mo><msub><mi>f</mi><mn>1</mn></msub><mi>v</mi><mo>+</mo><msub><mi>f</mi><mn>2</mn></msub><msup><mi>v</mi><mn>2</mn></msup><mo>+</mo><mn>1.03</mn><mi>m</mi><mi>a</mi><mo>)</mo></mrow><mi>d</mi>',
      formulaText: 'E = Σ (f0 + f1·v + f2·v² + 1.03·m·a)·d over F > 0',
      values: $localize`${view.cycle.name}:CYCLE:, ${format.text(view.cycle.distanceM / 1000, 'distance')}:DISTANCE:; m = ${mass}:MASS:; one count costs ${format.text(energy.whPerKmPerCount, 'energy-per-distance', { digits: 2 })}:COUNT:`,
      source: 'UN GTR No. 15, Annex 7',
      method: 'cycle-energy@1',
      ...NO_NOTES,
      cautions: [
        $localize`an estimate; certified values come only from the approval authority’s own procedure`,
      ],
    },
  ];
}
