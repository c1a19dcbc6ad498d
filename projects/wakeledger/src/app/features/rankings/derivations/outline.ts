import { plain } from '#shared/core/derivation/in-values';
import type { RankingView, ViewContribution, ViewRow, ViewStep } from '#shared/core/ranking/ranking-view';
import type { BudgetShare, Derivation, DerivationStep } from '../../../ui/derivation-sheet/derivation';
import { freedomWords } from '../../../ui/derivation-sheet/from-trace';
import { plainFigure, wordedUncertainty } from '../../../ui/derivation-sheet/worded';
import type { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { evidenceWords } from '../evidence-line';
import type { FigureKind } from '../figure-kind';
import { cautionWords, contributionWords, stepWords } from '../method-words';
import { commonAreaStep, energySteps, ownAreaStep } from './figure-steps';

function budgetShares(
  contributions: readonly ViewContribution[],
  format: QuantityFormat,
): readonly BudgetShare[] {
  return contributions.map((each) => ({
    label: contributionWords(each),
    share: each.shareOfVariance,
    u: wordedUncertainty(each.amountM2, 'm²', format),
    freedom: freedomWords(each.degreesOfFreedom, format),
  }));
}

/** The budget of the drag area that every figure of a row stands on. */
export function sharesOfRow(row: ViewRow, format: QuantityFormat): Pick<Derivation, 'budget' | 'budgetNote'> {
  return {
    budget: budgetShares(row.contributions, format),
    budgetNote: $localize`Shares of the variance of the drag area.`,
  };
}

function outlineStep(
  { step, dragAreaM2 }: ViewStep,
  row: ViewRow,
  format: QuantityFormat,
  last: boolean,
): DerivationStep {
  return {
    title: stepWords(step),
    result: {
      shown: format.text(dragAreaM2, 'drag-area', { digits: 4 }),
      plain: `${plain(dragAreaM2)} m²`,
    },
    formulaMathml: '<mrow><msub><mi>C</mi><mi>D</mi></msub><mi>A</mi></mrow>',
    formulaText: 'C_D·A',
    values: { shown: '', plain: '' },
    source: $localize`the raw readings are kept with the result, for those who may see them`,
    method: `${step}@1`,
    assumed: [],
    cautions: last ? row.cautions.map(cautionWords) : [],
  };
}

/** The one step of a weighted mean that may be shown: how many results it rests on and how well they agree. */
function combinationStep(row: ViewRow, format: QuantityFormat): DerivationStep {
  const { dragAreaM2 } = row.figure;
  const birge = row.combination?.birgeRatio ?? null;
  return {
    title: $localize`Weighted mean of ${row.evidence.length}:COUNT: results`,
    result: {
      shown: format.text(dragAreaM2, 'drag-area', { digits: 4 }),
      plain: `${plain(dragAreaM2)} m²`,
    },
    formulaMathml:
      '<mrow><mo>∑</mo><mi>w</mi><mi>x</mi><mo>/</mo><mo>∑</mo><mi>w</mi><mo>,</mo><mi>w</mi><mo>=</mo><mn>1</mn><mo>/</mo><msup><mi>u</mi><mn>2</mn></msup></mrow>',
    formulaText: '∑wx/∑w, w = 1/u²',
    values: { shown: '', plain: '' },
    source: $localize`the raw readings are kept with the results, for those who may see them`,
    method: 'weighted-mean@1',
    assumed: [],
    cautions: [
      ...row.cautions.map(cautionWords),
      ...(birge !== null && birge > 1
        ? [
            $localize`the results differ by more than their uncertainties explain (Birge ratio ${format.value(birge, 'number', { digits: 2 })}:RATIO:): the uncertainty is widened`,
          ]
        : []),
    ],
  };
}

/** The end of a figure's derivation, from the drag area on: the same for everybody. */
export function closingSteps(
  kind: FigureKind,
  row: ViewRow,
  view: RankingView,
  format: QuantityFormat,
): readonly DerivationStep[] {
  if (kind === 'common-area') return [commonAreaStep(row, view, format)];
  if (kind === 'own-area') return [ownAreaStep(row, format)];
  return kind === 'energy' ? energySteps(row, view, format) : [];
}

/** The figure at the head of the sheet, and what it is. */
export function headOf(
  kind: FigureKind,
  row: ViewRow,
  view: RankingView,
  format: QuantityFormat,
): Pick<Derivation, 'figure' | 'summary'> {
  const value = (number: number, of: 'drag-area' | 'coefficient' | 'energy-per-distance'): string =>
    format.value(number, of);
  const basis = view.basis === 'zero-yaw' ? $localize`zero yaw` : $localize`wind-averaged`;
  const freedom = row.figure.effectiveDegreesOfFreedom;
  const k = format.value(row.figure.coverageFactor, 'number', { digits: 2 });
  const coverage =
    freedom === null
      ? $localize`U = ${k}:K: u`
      : $localize`U = ${k}:K: u, ${Math.floor(freedom)}:NU: degrees of freedom`;
  const from = $localize`${row.name}:VARIANT:, opened by ${evidenceWords(row)}:EVIDENCE:`;
  switch (kind) {
    case 'drag-area':
      return {
        figure: {
          value: value(row.figure.dragAreaM2, 'drag-area'),
          expandedU: value(row.figure.expandedUncertaintyM2, 'drag-area'),
          unit: 'm²',
          plain: plainFigure(row.figure.dragAreaM2, row.figure.expandedUncertaintyM2, 'm²'),
        },
        summary: $localize`${from}:FROM:. Carried figure, ${basis}:BASIS:. ${coverage}:COVERAGE:.`,
      };
    case 'common-area':
      return {
        figure: {
          value: value(row.onCommonArea.value, 'coefficient'),
          expandedU: value(row.onCommonArea.expandedUncertainty, 'coefficient'),
          unit: '',
          plain: plainFigure(row.onCommonArea.value, row.onCommonArea.expandedUncertainty, ''),
        },
        summary: $localize`${from}:FROM:. Drag coefficient on the common area of ${format.text(view.commonAreaM2, 'area')}:AREA:, ${basis}:BASIS:. ${coverage}:COVERAGE:.`,
      };
    case 'own-area':
      return {
        figure: {
          value: value(row.onOwnArea.value, 'coefficient'),
          expandedU: value(row.onOwnArea.expandedUncertainty, 'coefficient'),
          unit: '',
          plain: plainFigure(row.onOwnArea.value, row.onOwnArea.expandedUncertainty, ''),
        },
        summary: $localize`${from}:FROM:. Drag coefficient on its own frontal area of ${format.text(row.onOwnArea.areaM2, 'area')}:AREA:, ${basis}:BASIS:. ${coverage}:COVERAGE:.`,
      };
    case 'energy':
      return {
        figure: {
          value: value(row.energy?.wheelEnergyWhPerKm ?? 0, 'energy-per-distance'),
          expandedU: value(row.energy?.expandedUncertaintyWhPerKm ?? 0, 'energy-per-distance'),
          unit: format.display('energy-per-distance').unit,
          plain: plainFigure(
            row.energy?.wheelEnergyWhPerKm ?? 0,
            row.energy?.expandedUncertaintyWhPerKm ?? 0,
            'Wh/km',
          ),
        },
        summary: $localize`${from}:FROM:. Energy at the wheel on ${view.cycle?.name ?? ''}:CYCLE:, from the zero-yaw drag area; an estimate.`,
      };
  }
}

/** The derivation as it may be shown without the raw evidence: steps by name and result, and the budget. */
export function outlineDerivation(
  kind: FigureKind,
  row: ViewRow,
  view: RankingView,
  format: QuantityFormat,
): Derivation {
  const steps =
    row.combination === null
      ? row.steps.map((step, index) => outlineStep(step, row, format, index === row.steps.length - 1))
      : [combinationStep(row, format)];
  return {
    ...headOf(kind, row, view, format),
    steps: [...steps, ...closingSteps(kind, row, view, format)],
    ...sharesOfRow(row, format),
  };
}
