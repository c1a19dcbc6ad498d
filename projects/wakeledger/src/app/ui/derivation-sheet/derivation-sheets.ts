import type { CsvCell } from '../../core/export/csv';
import type { SheetToWrite } from '../../core/export/workbook';
import type { Derivation, Worded } from './derivation';

/** The derivation as sheets of a workbook: the figure, its steps, and where its uncertainty comes from. */
export function derivationSheets(derivation: Derivation): readonly SheetToWrite[] {
  const { figure, summary, steps, budget, budgetNote } = derivation;
  const sheets: SheetToWrite[] = [
    { name: $localize`Figure`, rows: [FIGURE_HEAD, [summary, ...figureCells(figure.plain)]] },
    {
      name: $localize`Steps`,
      rows: [
        STEP_HEAD,
        ...steps.map((step, index): readonly CsvCell[] => [
          index + 1,
          step.title,
          ...numberAndUnit(step.result),
          step.formulaText,
          step.values.plain,
          step.source,
          step.method,
          step.changed,
          step.assumed.join('; '),
          step.cautions.join('; '),
        ]),
      ],
    },
  ];
  if (budget.length > 0)
    sheets.push({
      name: $localize`Uncertainty`,
      rows: [
        BUDGET_HEAD,
        ...budget.map(({ label, share, u, freedom }): readonly CsvCell[] => [
          label,
          share,
          ...(u ? numberAndUnit(u) : []),
          ...(u && freedom ? [freedom] : []),
        ]),
        ...(budgetNote ? [[budgetNote]] : []),
      ],
    });
  return sheets;
}

const FIGURE_HEAD = [$localize`Figure`, $localize`Value`, $localize`Expanded uncertainty U`, $localize`Unit`];
const STEP_HEAD = [
  $localize`Step`,
  $localize`What it gives`,
  $localize`Result`,
  $localize`Unit`,
  $localize`Formula`,
  $localize`With its values`,
  $localize`Source`,
  $localize`Method and version`,
  $localize`Changed`,
  $localize`Assumed`,
  $localize`Cautions`,
];
const BUDGET_HEAD = [
  $localize`Contribution`,
  $localize`Share of the variance, 0 to 1`,
  $localize`Standard uncertainty`,
  $localize`Unit`,
  $localize`Degrees of freedom`,
];

const NUMBER = String.raw`-?\d+(?:\.\d+)?(?:e[+-]?\d+)?`;
const ONE = new RegExp(`^(${NUMBER})(?: (.*))?$`);
const WITH_U = new RegExp(`^(${NUMBER}) ± (${NUMBER})(?: (.*))?$`);

/** `899.3 Pa` as a number and its unit; what is no number stays text. */
function numberAndUnit({ plain }: Worded): readonly CsvCell[] {
  const parts = ONE.exec(plain);
  return parts === null ? [plain, undefined] : [Number(parts[1]), parts[2]];
}

/** `0.594 ± 0.008 m²` as three cells. */
function figureCells(plain: string): readonly CsvCell[] {
  const parts = WITH_U.exec(plain);
  if (parts !== null) return [Number(parts[1]), Number(parts[2]), parts[3]];
  const [value, unit] = numberAndUnit({ shown: plain, plain });
  return [value, undefined, unit];
}
