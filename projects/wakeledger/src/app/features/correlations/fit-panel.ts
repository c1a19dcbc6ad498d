import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { CorrelationPair } from '#shared/contracts/correlations';
import type { ColourValues } from '../../../theme/token-values';
import { Chart } from '../../ui/chart/chart';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { correlationOptions, correlationTable, influenceTable, residualOptions } from './correlation-chart';
import { refusalWords } from './correlation-words';
import { fitFigures, lineSentence } from './fit-figures';
import { fittedPairs, noticeableDistance } from './fitted-pairs';

/** The line through a set of pairs: figures, chart, residuals and what each pair does to it; or why there is none. */
@Component({
  selector: 'wl-fit-panel',
  imports: [Chart],
  template: `
    @if (refusal(); as words) {
      <p class="wl-notice wl-trouble" role="status"><strong i18n>No correlation</strong> {{ words }}</p>
    }
    @if (view(); as view) {
      <p class="line">{{ view.sentence }}</p>
      <dl>
        @for (figure of view.figures; track figure.label) {
          <dt>{{ figure.label }}</dt>
          <dd>{{ figure.words }}</dd>
        }
      </dl>
      @if (view.pulling.length) {
        <p class="wl-notice">
          <strong i18n>Look twice at</strong> {{ view.pulling.join(', ') }}.
          <ng-container i18n
            >Without one of these the line would lie noticeably elsewhere (Cook’s distance above 4/n). That is
            no reason to leave it out: find out what was different.</ng-container
          >
        </p>
      }
      <div class="charts">
        <wl-chart [caption]="captions().pairs" [options]="pairOptions()" [table]="view.pairTable" />
        <wl-chart [caption]="captions().residuals" [options]="residuals()" [table]="view.influenceTable" />
      </div>
    }
  `,
  styles: `
    .line {
      font-family: var(--wl-title);
    }
    dl {
      display: grid;
      grid-template-columns: max-content minmax(0, 1fr);
      gap: 2px 20px;
      margin: 8px 0 16px;
    }
    dd {
      margin: 0;
    }
    .charts {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(min(100%, 420px), 1fr));
      gap: 24px;
    }
    @media (max-width: 600px) {
      dl {
        grid-template-columns: minmax(0, 1fr);
      }
      dt {
        margin-top: 6px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FitPanel {
  readonly pairs = input.required<readonly CorrelationPair[]>();
  /** Names of the facility and of its reference. */
  readonly from = input.required<string>();
  readonly to = input.required<string>();

  private readonly format = inject(QuantityFormat);
  private readonly fitted = computed(() => fittedPairs(this.pairs()));
  private readonly line = computed(() => {
    const fitted = this.fitted();
    return fitted.kind === 'fitted' ? fitted : undefined;
  });
  protected readonly refusal = computed(() => {
    const fitted = this.fitted();
    return fitted.kind === 'refused' ? refusalWords(fitted.code) : undefined;
  });
  private readonly names = computed(() => ({
    x: $localize`Drag area in ${this.from()}:FACILITY:, in m²`,
    y: $localize`Drag area in ${this.to()}:FACILITY:, in m²`,
  }));
  protected readonly captions = computed(() => ({
    pairs: $localize`Pairs and line, ${this.from()}:FROM: to ${this.to()}:TO:`,
    residuals: $localize`What the line leaves over, pair by pair, ${this.from()}:FROM: to ${this.to()}:TO:`,
  }));
  protected readonly view = computed(() => {
    const line = this.line();
    if (line === undefined) return undefined;
    return {
      sentence: lineSentence(line.fit, { from: this.from(), to: this.to() }, this.format),
      figures: fitFigures(line.fit, this.format),
      pulling: line.used
        .filter(({ influence }) => this.standsOut(influence.cooksDistance, line.used.length))
        .map(({ pair }) => pair.geometry),
      pairTable: correlationTable(line, this.names(), this.format),
      influenceTable: influenceTable(line, this.format),
    };
  });
  protected readonly pairOptions = computed(() => {
    const [line, names] = [this.line(), this.names()];
    return (inks: ColourValues) =>
      line === undefined ? {} : correlationOptions(line, names, this.format, inks);
  });
  protected readonly residuals = computed(() => {
    const [line, names] = [this.line(), this.names()];
    return (inks: ColourValues) =>
      line === undefined
        ? {}
        : residualOptions(line, names, this.format, inks, (distance) =>
            this.standsOut(distance, line.used.length),
          );
  });

  private standsOut(cooksDistance: number | null, pairs: number): boolean {
    return cooksDistance !== null && cooksDistance > noticeableDistance(pairs);
  }
}
