import { formatDate } from '@angular/common';
import { ChangeDetectionStrategy, Component, LOCALE_ID, computed, inject, input } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import type { Facility } from '#shared/contracts/facilities';
import { asApiProblem } from '../../core/api/api-problem';
import { Session } from '../../core/session/session';
import { CorrelationsApi } from '../../data/correlations/correlations-api';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';

/** Is it brought to another facility, or others to it? Each correlation with the version in use. */
@Component({
  selector: 'wl-facility-correlations',
  imports: [ProblemBanner, RouterLink],
  template: `
    <wl-problem-banner [problem]="problem()" />
    @for (row of rows(); track row.id) {
      <p>
        @if (mayRead()) {
          <a [routerLink]="['/correlations', row.id]">{{ row.name }}</a>
        } @else {
          {{ row.name }}
        }
        <span class="small">{{ row.words }}</span>
      </p>
    } @empty {
      @if (listed.hasValue()) {
        <p i18n>
          None. Where one geometry was measured here and elsewhere,
          <a routerLink="/correlations">a correlation</a>
          brings the one to the other.
        </p>
      }
    }
  `,
  styles: `
    p {
      margin: 0 0 6px;
    }
    .small {
      display: block;
      font-size: var(--wl-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FacilityCorrelations {
  readonly facilityId = input.required<string>();
  readonly facilities = input.required<ReadonlyMap<string, Facility>>();

  private readonly api = inject(CorrelationsApi);
  private readonly member = inject(Session);
  private readonly locale = inject(LOCALE_ID);

  protected readonly mayRead = computed(() => this.member.may('results.read'));
  protected readonly listed = rxResource({ stream: () => this.api.list() });
  protected readonly problem = computed(() => {
    const error = this.listed.error();
    return error === undefined ? undefined : asApiProblem(error);
  });
  protected readonly rows = computed(() => {
    if (!this.listed.hasValue()) return [];
    const own = this.facilityId();
    const nameOf = (id: string): string => this.facilities().get(id)?.name ?? '…';
    return this.listed
      .value()
      .filter(({ facilityId, referenceFacilityId }) => facilityId === own || referenceFacilityId === own)
      .map(({ id, name, facilityId, referenceFacilityId, inUse }) => {
        const brought =
          facilityId === own
            ? $localize`brings it to ${nameOf(referenceFacilityId)}:FACILITY:`
            : $localize`brings ${nameOf(facilityId)}:FACILITY: to it`;
        const use =
          inUse === undefined
            ? $localize`not in use`
            : $localize`version ${inUse.versionNumber}:NUMBER: in use since ${formatDate(inUse.since, 'd MMM y', this.locale)}:DAY:`;
        return { id, name, words: `${brought}; ${use}` };
      });
  });
}
