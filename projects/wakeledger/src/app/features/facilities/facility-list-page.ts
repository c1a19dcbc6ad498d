import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  computed,
  effect,
  inject,
  runInInjectionContext,
  untracked,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import type { Facility } from '#shared/contracts/facilities';
import { Undo } from '../../core/editing/undo';
import { problemWords } from '../../core/errors/problem-words';
import { Preferences } from '../../core/preferences/preferences';
import { Session } from '../../core/session/session';
import { FacilityFormPageActions, FacilityListPageActions } from '../../data/facilities/facilities.actions';
import { facilitiesFeature } from '../../data/facilities/facilities.feature';
import { Busy } from '../../ui/busy/busy';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { BLOCKAGE_METHOD_WORDS, FACILITY_KIND_WORDS } from '../../ui/words/evidence-words';
import { confirmFacilityRetirement } from './confirm-facility-retirement';
import { uncertaintyLines, usualConditionWords } from './facility-words';

/** Where does evidence come from, and how sure is it? */
@Component({
  selector: 'wl-facility-list-page',
  imports: [Busy, EmptyState, ProblemBanner, RouterLink],
  templateUrl: './facility-list-page.html',
  styleUrl: './facility-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FacilityListPage {
  private readonly store = inject(Store);
  private readonly session = inject(Session);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);

  protected readonly mayEdit = computed(() => this.session.may('facilities.edit'));
  protected readonly loading = this.store.selectSignal(facilitiesFeature.selectLoading);
  private readonly saving = this.store.selectSignal(facilitiesFeature.selectSaving);
  private readonly active = this.store.selectSignal(facilitiesFeature.selectActive);
  private readonly retired = this.store.selectSignal(facilitiesFeature.selectRetired);
  protected readonly problem = computed(() => {
    const loading = this.loading();
    return loading.kind === 'failed' ? loading.problem : undefined;
  });
  protected readonly rows = computed(() => this.active().map((facility) => this.row(facility)));
  protected readonly retiredRows = computed(() => this.retired().map((facility) => this.row(facility)));

  constructor() {
    this.store.dispatch(FacilityListPageActions.opened());
    effect(() => {
      const saving = this.saving();
      untracked(() => {
        if (saving.kind === 'saved') this.offerUndo(saving.entity);
        if (saving.kind === 'refused') this.undo.say(problemWords(saving.problem).title);
        if (saving.kind === 'conflict') {
          this.undo.say(
            $localize`${saving.theirs.name}:NAME: was changed meanwhile. Look again, then decide.`,
          );
        }
        if (saving.kind !== 'idle' && saving.kind !== 'saving') {
          this.store.dispatch(FacilityFormPageActions.outcomeSeen());
        }
      });
    });
  }

  protected retry(): void {
    this.store.dispatch(FacilityListPageActions.askedAgain());
  }

  protected async retire(facility: Facility): Promise<void> {
    const confirmed = await runInInjectionContext(this.injector, () => confirmFacilityRetirement(facility));
    if (confirmed)
      this.store.dispatch(FacilityListPageActions.retirementConfirmed({ facility, retired: true }));
  }

  protected bringBack(facility: Facility): void {
    this.store.dispatch(FacilityListPageActions.retirementConfirmed({ facility, retired: false }));
  }

  private offerUndo(facility: Facility): void {
    const wasRetired = facility.retiredAt !== undefined;
    this.undo.offer(
      wasRetired ? $localize`${facility.name}:NAME: is retired.` : $localize`${facility.name}:NAME: is back.`,
      () =>
        this.store.dispatch(FacilityListPageActions.retirementConfirmed({ facility, retired: !wasRetired })),
    );
  }

  private row(facility: Facility) {
    const { blockage, areaM2 } = facility;
    return {
      facility,
      kind: FACILITY_KIND_WORDS[facility.kind],
      simulated: facility.kind === 'simulation',
      area: areaM2 === undefined ? undefined : this.format.text(areaM2, 'area', { digits: 2 }),
      blockage: blockage && BLOCKAGE_METHOD_WORDS[blockage.method],
      uncertainties: uncertaintyLines(facility, this.format),
      condition: usualConditionWords(facility, this.preferences.numberLocale()),
      retire: $localize`Retire ${facility.name}:NAME:`,
      bringBack: $localize`Bring ${facility.name}:NAME: back`,
    };
  }
}
