import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import type { Correlation, CorrelationAdoption } from '#shared/contracts/correlations';
import { asApiProblem } from '../../core/api/api-problem';
import { Undo } from '../../core/editing/undo';
import { Session } from '../../core/session/session';
import { CorrelationsApi } from '../../data/correlations/correlations-api';
import { FacilitiesApi } from '../../data/facilities/facilities-api';
import { Busy } from '../../ui/busy/busy';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { replacedWords } from './correlation-words';
import { FitPanel } from './fit-panel';
import { UseForm } from './use-form';

/** What does this correlation say, and since when is it used? Every version stays as it was made. */
@Component({
  selector: 'wl-correlation-page',
  imports: [Busy, DatePipe, FitPanel, ProblemBanner, RouterLink, UseForm],
  templateUrl: './correlation-page.html',
  styleUrl: './correlations.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CorrelationPage {
  readonly correlationId = input.required<string>();

  private readonly api = inject(CorrelationsApi);
  private readonly facilitiesApi = inject(FacilitiesApi);
  private readonly session = inject(Session);
  private readonly undo = inject(Undo);

  protected readonly mayEdit = computed(() => this.session.may('correlations.edit'));
  protected readonly mayAdopt = computed(() => this.session.may('correlations.adopt'));
  protected readonly resource = rxResource({
    params: () => this.correlationId(),
    stream: ({ params }) => this.api.read(params),
  });
  private readonly facilities = rxResource({ stream: () => this.facilitiesApi.list() });
  /** What an adoption or ending answered, newer than what was read. */
  private readonly answered = signal<Correlation | undefined>(undefined);
  protected readonly correlation = computed(() => {
    const answered = this.answered();
    if (answered?.id === this.correlationId()) return answered;
    return this.resource.hasValue() ? this.resource.value() : undefined;
  });
  protected readonly problem = computed(() => {
    const error = this.resource.error();
    return error === undefined ? undefined : asApiProblem(error);
  });
  protected readonly names = computed(() => {
    const known = this.facilities.hasValue() ? this.facilities.value() : [];
    const name = (id: string | undefined): string => known.find((each) => each.id === id)?.name ?? '…';
    const correlation = this.correlation();
    return { from: name(correlation?.facilityId), to: name(correlation?.referenceFacilityId) };
  });
  /** The version that is looked at: the one chosen, else the one in use, else the newest. */
  private readonly chosen = signal<number | undefined>(undefined);
  protected readonly shown = computed(() => {
    const correlation = this.correlation();
    const number = this.chosen() ?? correlation?.inUse?.versionNumber ?? correlation?.latestNumber;
    return correlation?.versions.find((version) => version.number === number);
  });
  protected readonly replaced = computed(() => replacedWords(this.shown()?.replaces ?? []));
  protected readonly leftOut = computed(
    () => this.shown()?.pairs.filter(({ leftOutReason }) => leftOutReason !== undefined) ?? [],
  );
  /** Whether there is a use, now or planned, that could be ended. */
  protected readonly endable = computed(() => {
    const [last] = this.correlation()?.adoptions ?? [];
    return last?.versionNumber !== undefined;
  });

  protected show(number: number): void {
    this.chosen.set(number);
  }

  protected useWords({ versionNumber }: CorrelationAdoption): string {
    return versionNumber === undefined
      ? $localize`its use ends`
      : $localize`version ${versionNumber}:NUMBER: is used`;
  }

  protected onUse(correlation: Correlation): void {
    this.answered.set(correlation);
    const { inUse, name } = correlation;
    this.undo.say(
      inUse === undefined
        ? $localize`${name}:NAME: is not in use today.`
        : $localize`Version ${inUse.versionNumber}:NUMBER: of ${name}:NAME: is in use since ${inUse.since}:DATE:.`,
    );
  }
}
