import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Chart, type ChartOptions, type ChartTable } from '../../../ui/chart/chart';
import { reynoldsWords } from '../../../ui/checks/check-figures';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { sweepChartOptions } from './sweep-chart-options';
import { offTheFit, sweepFacts, sweepVerdicts } from './sweep-words';
import type { SweepView } from './sweep-view';

/** A Reynolds sweep: chart with its table, the fit in figures, and what it says in sentences. */
@Component({
  selector: 'wl-sweep-panel',
  imports: [Chart],
  template: `
    <wl-chart [caption]="caption()" [options]="options()" [table]="table()" />
    <ul class="verdicts">
      @for (verdict of verdicts(); track verdict.words) {
        <li [class]="verdict.ink">
          <span aria-hidden="true">{{ verdict.shape }} </span>{{ verdict.words }}
        </li>
      }
    </ul>
    <dl class="facts">
      @for (fact of facts(); track fact.label) {
        <div>
          <dt>{{ fact.label }}</dt>
          <dd>{{ fact.words }}</dd>
        </div>
      }
    </dl>
  `,
  styleUrl: './sweep-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SweepPanel {
  readonly view = input.required<SweepView>();
  readonly name = input.required<string>();

  private readonly format = inject(QuantityFormat);
  protected readonly caption = computed(
    () => $localize`Drag area over Reynolds number, ${this.name()}:NAME:`,
  );
  protected readonly verdicts = computed(() => sweepVerdicts(this.view(), this.format));
  protected readonly facts = computed(() => sweepFacts(this.view(), this.format));

  protected readonly options = computed<ChartOptions>(() => {
    const view = this.view();
    const words = {
      reynoldsAxis: $localize`Reynolds number on the characteristic length (logarithmic)`,
      dragAreaAxis: $localize`Drag area in m²`,
      points: $localize`points`,
      fit: $localize`fit`,
      reference: $localize`reference`,
      lowest: $localize`lowest acceptable`,
      minimum: $localize`minimum`,
      tolerance: $localize`within tolerance`,
      reynolds: (value: number) => reynoldsWords(value, this.format),
    };
    return (inks) => sweepChartOptions(view, words, inks);
  });

  protected readonly table = computed<ChartTable>(() => {
    const { points, outcome } = this.view();
    return {
      columns: [$localize`Reynolds number`, $localize`Drag area in m²`, $localize`Off the fit, m²`],
      rows: points
        .toSorted((one, other) => one.reynolds - other.reynolds)
        .map((point) => [
          reynoldsWords(point.reynolds, this.format),
          this.format.value(point.dragAreaM2, 'drag-area', { digits: 4 }),
          this.format.value(offTheFit(this.view(), point), 'drag-area', { digits: 4, signed: true }),
        ])
        .concat([
          [
            $localize`at the reference ${reynoldsWords(this.view().referenceReynolds, this.format)}:REYNOLDS:`,
            this.format.text(outcome.predictionAtReferenceM2, 'drag-area', {
              digits: 4,
              expandedU: outcome.predictionExpandedUncertaintyM2,
              withUnit: false,
            }),
            '',
          ],
        ]),
    };
  });
}
