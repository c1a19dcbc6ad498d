import { formatDate } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  LOCALE_ID,
  computed,
  inject,
  input,
  output,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { Facility } from '#shared/contracts/facilities';
import type { CheckMeasurement, TestSession } from '#shared/contracts/test-sessions';
import {
  FEWEST_SESSIONS,
  controlChart,
  withinReach,
  type ChartPoint,
} from '#shared/core/uncertainty/control-chart';
import { Chart, type ChartOptions } from '../../ui/chart/chart';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { chartSessions, countingMeasurements, limitsChoice } from './check-sessions';
import { controlChartOptions, controlChartTable, type SessionLabel } from './control-chart-options';
import { verdictOf } from './control-chart-words';
import { uncertaintyWords } from './facility-words';
import { scatterToAddress } from './scatter-address';

/** Fewer degrees of freedom than this say next to nothing: such a scatter is not offered to be taken over. */
const LEAST_FREEDOM = 1;

/** Has the facility moved? The check body's session means with their limits, what they say, and the scatter they give. */
@Component({
  selector: 'wl-control-chart-panel',
  imports: [Chart, RouterLink],
  templateUrl: './control-chart-panel.html',
  styleUrl: './control-chart-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ControlChartPanel {
  readonly facility = input.required<Facility>();
  readonly sessions = input.required<readonly TestSession[]>();
  readonly measurements = input.required<readonly CheckMeasurement[]>();
  readonly mayEdit = input(false);
  /** Which sessions set the limits, as it stands in the address. */
  readonly limits = input<string>();
  readonly limitsChosen = output<string>();

  private readonly format = inject(QuantityFormat);
  private readonly locale = inject(LOCALE_ID);

  private readonly counting = computed(() =>
    countingMeasurements(this.measurements(), this.facility().checkBody?.name ?? ''),
  );
  /** Measurements of a body that was replaced. */
  protected readonly ofOthers = computed(
    () => this.measurements().filter(({ struck }) => struck === undefined).length - this.counting().length,
  );
  private readonly charted = computed(() => chartSessions(this.sessions(), this.counting()));
  private readonly choice = computed(() => limitsChoice(this.charted(), this.limits()));
  protected readonly chart = computed(() => controlChart(this.charted(), this.choice().ids));
  private readonly names = computed(() => new Map(this.sessions().map(({ id, name }) => [id, name])));
  private readonly labelOf = (point: ChartPoint): SessionLabel => ({
    name: this.names().get(point.sessionId) ?? '',
    date: formatDate(point.date, 'd MMM y', this.locale),
  });

  protected readonly verdict = computed(() =>
    verdictOf(this.chart(), (sessionId) => this.names().get(sessionId) ?? ''),
  );
  protected readonly caption = computed(
    () => $localize`Check body of ${this.facility().name}:FACILITY:, session by session`,
  );
  protected readonly options = computed<ChartOptions>(() => {
    const chart = this.chart();
    return (inks) => controlChartOptions(chart, this.labelOf, this.format, inks);
  });
  protected readonly table = computed(() => controlChartTable(this.chart(), this.labelOf, this.format));

  protected readonly figures = computed(() => {
    const { scatter, settingSessions } = this.chart();
    if (scatter === undefined) return undefined;
    const share = (m2: number): string =>
      this.format.text((m2 / scatter.centreM2) * 100, 'percent', { digits: 2 });
    const area = (m2: number): string => this.format.text(m2, 'drag-area', { digits: 5 });
    return {
      sessions: settingSessions,
      centre: this.format.text(scatter.centreM2, 'drag-area', { digits: 4 }),
      within:
        scatter.withinM2 === null
          ? undefined
          : {
              m2: area(scatter.withinM2),
              share: share(scatter.withinM2),
              nu: scatter.withinDegreesOfFreedom,
            },
      between: {
        m2: area(scatter.betweenM2),
        share: share(scatter.betweenM2),
        none: scatter.betweenM2 === 0,
        nu: this.format.value(scatter.betweenDegreesOfFreedom, 'number', { digits: 1 }),
      },
      blind: !withinReach(settingSessions) && this.chart().points.every(({ setsLimits }) => setsLimits),
    };
  });

  protected readonly stated = computed(() => {
    const {
      sessionURelative: relative,
      sessionUM2: m2,
      sessionDegreesOfFreedom: degreesOfFreedom,
    } = this.facility();
    return uncertaintyWords({ relative, m2, degreesOfFreedom }, this.format);
  });

  /** What the form is handed; undefined where the sessions say too little for it. */
  protected readonly toTakeOver = computed(() => {
    const { scatter, settingSessions } = this.chart();
    if (scatter === undefined || scatter.betweenDegreesOfFreedom < LEAST_FREEDOM) return undefined;
    return scatterToAddress({
      uRelative: Number((scatter.betweenM2 / scatter.centreM2).toPrecision(3)),
      degreesOfFreedom: Number(scatter.betweenDegreesOfFreedom.toPrecision(3)),
      comment: $localize`Session scatter from ${settingSessions}:COUNT: sessions of the check body ${this.facility().checkBody?.name ?? ''}:BODY:`,
    });
  });

  protected readonly choices = computed(() => {
    const charted = this.charted();
    const upTo = charted.slice(FEWEST_SESSIONS - 1, -1).map(({ id }) => ({
      value: id,
      words: $localize`those up to ${this.names().get(id) ?? ''}:SESSION:`,
    }));
    return [{ value: 'all', words: $localize`all sessions` }, ...upTo].map((choice) => ({
      ...choice,
      chosen: choice.value === this.choice().value,
    }));
  });
}
