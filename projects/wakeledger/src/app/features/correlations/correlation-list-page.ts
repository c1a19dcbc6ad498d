import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import type { CorrelationSummary } from '#shared/contracts/correlations';
import { asApiProblem } from '../../core/api/api-problem';
import { Session } from '../../core/session/session';
import { CorrelationsApi } from '../../data/correlations/correlations-api';
import { FacilitiesApi } from '../../data/facilities/facilities-api';
import { Busy } from '../../ui/busy/busy';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';

/** How is one facility brought to another? */
@Component({
  selector: 'wl-correlation-list-page',
  imports: [Busy, EmptyState, ProblemBanner, RouterLink],
  templateUrl: './correlation-list-page.html',
  styleUrl: './correlations.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CorrelationListPage {
  private readonly api = inject(CorrelationsApi);
  private readonly facilitiesApi = inject(FacilitiesApi);
  private readonly session = inject(Session);

  protected readonly mayEdit = computed(() => this.session.may('correlations.edit'));
  protected readonly mayRead = computed(() => this.session.may('results.read'));
  protected readonly correlations = rxResource({ stream: () => this.api.list() });
  private readonly facilities = rxResource({ stream: () => this.facilitiesApi.list() });
  protected readonly ready = computed(() => this.correlations.hasValue());
  protected readonly problem = computed(() => {
    const error = this.correlations.error();
    return error === undefined ? undefined : asApiProblem(error);
  });
  private readonly names = computed(
    () =>
      new Map((this.facilities.hasValue() ? this.facilities.value() : []).map(({ id, name }) => [id, name])),
  );
  protected readonly rows = computed(() =>
    (this.correlations.hasValue() ? this.correlations.value() : []).map((correlation) =>
      this.row(correlation),
    ),
  );

  private row({ id, name, facilityId, referenceFacilityId, latestNumber, inUse }: CorrelationSummary) {
    return {
      id,
      name,
      from: this.names().get(facilityId) ?? '…',
      to: this.names().get(referenceFacilityId) ?? '…',
      latest: latestNumber,
      inUse,
      newer: inUse !== undefined && inUse.versionNumber < latestNumber,
    };
  }
}
