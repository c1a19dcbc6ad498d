import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, inject, untracked } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import type { ProgrammeSummary } from '#shared/contracts/programmes';
import { Session } from '../../core/session/session';
import { daysUntil, daysUntilWords } from '../../core/shell/days-until';
import { ProgrammesPageActions } from '../../data/programmes/programmes.actions';
import { programmesFeature } from '../../data/programmes/programmes.feature';
import { Busy } from '../../ui/busy/busy';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';

interface Row extends ProgrammeSummary {
  readonly left?: string;
  /** The milestone has passed or comes within a month. */
  readonly pressing: boolean;
}

const PRESSING_DAYS = 31;

/** Which programmes need me today? Soonest milestone first, with what is missing. */
@Component({
  selector: 'wl-programme-list-page',
  imports: [Busy, DatePipe, EmptyState, ProblemBanner, RouterLink],
  templateUrl: './programme-list-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgrammeListPage {
  private readonly store = inject(Store);
  private readonly session = inject(Session);
  private readonly page = this.store.selectSignal(programmesFeature.selectListPage);

  protected readonly mayEdit = computed(() => this.session.may('programmes.edit'));
  protected readonly mayRead = computed(() => this.session.may('programmes.read'));
  protected readonly organisation = computed(() => this.session.membership()?.organisationName ?? '');
  protected readonly loading = computed(() => this.page().loading);
  protected readonly problem = computed(() => {
    const loading = this.loading();
    return loading.kind === 'failed' ? loading.problem : undefined;
  });
  protected readonly rows = computed(() => this.page().active.map((each) => asRow(each, new Date())));
  protected readonly retired = computed(() => this.page().retired);

  constructor() {
    // Again when the organisation is switched while the page is open: the store has then forgotten everything.
    effect(() => {
      if (this.session.membership() === undefined || !this.mayRead()) return;
      untracked(() => this.store.dispatch(ProgrammesPageActions.opened()));
    });
  }

  protected retry(): void {
    this.store.dispatch(ProgrammesPageActions.askedAgain());
  }
}

function asRow(summary: ProgrammeSummary, now: Date): Row {
  if (!summary.nextMilestone) return { ...summary, pressing: false };
  const days = daysUntil(summary.nextMilestone.date, now);
  return { ...summary, left: daysUntilWords(days), pressing: days <= PRESSING_DAYS };
}
