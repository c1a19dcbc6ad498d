import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { Router, RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { firstValueFrom } from 'rxjs';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { Undo } from '../../core/editing/undo';
import { Preferences } from '../../core/preferences/preferences';
import { Session } from '../../core/session/session';
import { FacilitiesApi } from '../../data/facilities/facilities-api';
import { FacilityPageActions } from '../../data/facilities/facilities.actions';
import { facilitiesFeature } from '../../data/facilities/facilities.feature';
import { TestSessionsApi } from '../../data/facilities/test-sessions-api';
import { Busy } from '../../ui/busy/busy';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { FACILITY_KIND_WORDS } from '../../ui/words/evidence-words';
import { ControlChartPanel } from './control-chart-panel';
import { blockageWords } from './facility-comparison';
import { FacilityCorrelations } from './facility-correlations';
import { uncertaintyLines, usualConditionWords } from './facility-words';
import { MeasurementEntry } from './measurement-entry';
import { MeasurementTable, type Striking } from './measurement-table';
import { SessionTable } from './session-table';
import { VersionHistory } from './version-history';

/** How sure is what this facility says? What it is, its corrections, its check body, its sessions and its versions. */
@Component({
  selector: 'wl-facility-page',
  imports: [
    Busy,
    ControlChartPanel,
    DatePipe,
    EmptyState,
    FacilityCorrelations,
    MeasurementEntry,
    MeasurementTable,
    ProblemBanner,
    RouterLink,
    SessionTable,
    VersionHistory,
  ],
  templateUrl: './facility-page.html',
  styleUrl: './facility-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FacilityPage {
  readonly facilityId = input.required<string>();
  /** From the address: which sessions set the limits of the control chart. */
  readonly limits = input<string>();

  private readonly store = inject(Store);
  private readonly router = inject(Router);
  private readonly undo = inject(Undo);
  private readonly member = inject(Session);
  private readonly facilitiesApi = inject(FacilitiesApi);
  private readonly sessionsApi = inject(TestSessionsApi);
  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);

  protected readonly mayEdit = computed(() => this.member.may('facilities.edit'));
  protected readonly mayReadResults = computed(() => this.member.may('results.read'));
  private readonly loading = this.store.selectSignal(facilitiesFeature.selectLoading);
  protected readonly known = this.store.selectSignal(facilitiesFeature.selectById);
  protected readonly facility = computed(() => this.known().get(this.facilityId()));
  protected readonly missing = computed(
    () => this.loading().kind === 'ready' && this.facility() === undefined,
  );

  private readonly versions = rxResource({
    params: () => this.facilityId(),
    stream: ({ params }) => this.facilitiesApi.versions(params),
  });
  private readonly evidence = rxResource({
    params: () => this.facilityId(),
    stream: ({ params }) => this.facilitiesApi.evidence(params),
  });
  private readonly sessionList = rxResource({
    params: () => this.facilityId(),
    stream: ({ params }) => this.sessionsApi.list(params),
  });
  private readonly measured = rxResource({
    params: () => this.facilityId(),
    stream: ({ params }) => this.sessionsApi.measurements(params),
  });
  private readonly resources = [this.versions, this.evidence, this.sessionList, this.measured] as const;

  protected readonly history = computed(() => (this.versions.hasValue() ? this.versions.value() : undefined));
  protected readonly programmes = computed(() =>
    this.evidence.hasValue() ? this.evidence.value() : undefined,
  );
  protected readonly sessions = computed(() =>
    this.sessionList.hasValue() ? this.sessionList.value() : undefined,
  );
  protected readonly measurements = computed(() =>
    this.measured.hasValue() ? this.measured.value() : undefined,
  );
  protected readonly current = computed(() => this.history()?.[0]);
  protected readonly striking = signal<ApiProblem | undefined>(undefined);
  protected readonly problem = computed(() => {
    const loading = this.loading();
    if (loading.kind === 'failed') return loading.problem;
    const failed = this.resources.find((resource) => resource.error() !== undefined);
    return this.missing() || failed === undefined ? undefined : asApiProblem(failed.error());
  });

  protected readonly shown = computed(() => {
    const facility = this.facility();
    if (!facility) return undefined;
    const { areaM2 } = facility;
    return {
      kind: FACILITY_KIND_WORDS[facility.kind],
      simulated: facility.kind === 'simulation',
      area: areaM2 === undefined ? undefined : this.format.text(areaM2, 'area', { digits: 2 }),
      nozzle: facility.kind === 'open-jet',
      blockage: blockageWords(facility.blockage),
      uncertainties: uncertaintyLines(facility, this.format),
      condition: usualConditionWords(facility, this.preferences.numberLocale()),
    };
  });

  constructor() {
    effect(() => {
      this.facilityId();
      untracked(() => this.store.dispatch(FacilityPageActions.opened()));
    });
  }

  protected retry(): void {
    this.store.dispatch(FacilityPageActions.opened());
    for (const resource of this.resources) resource.reload();
  }

  protected onSession(): void {
    this.sessionList.reload();
  }

  protected onMeasurement(): void {
    this.undo.say($localize`The measurement is entered.`);
    this.measured.reload();
    this.sessionList.reload();
  }

  protected async strike({ measurement, reason }: Striking): Promise<void> {
    this.striking.set(undefined);
    try {
      await firstValueFrom(this.sessionsApi.strike(this.facilityId(), measurement.id, reason));
    } catch (error) {
      this.striking.set(asApiProblem(error));
    }
    this.measured.reload();
    this.sessionList.reload();
  }

  protected chooseLimits(limits: string): void {
    void this.router.navigate([], {
      queryParams: { limits },
      queryParamsHandling: 'merge',
      replaceUrl: true,
    });
  }
}
