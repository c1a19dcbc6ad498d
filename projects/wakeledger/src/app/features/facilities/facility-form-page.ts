import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  ElementRef,
  Injector,
  afterNextRender,
  computed,
  effect,
  inject,
  input,
  runInInjectionContext,
  signal,
  untracked,
} from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { type AbstractControl, NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import {
  BLOCKAGE_METHODS,
  FACILITY_KINDS,
  type Facility,
  type FacilityChange,
} from '#shared/contracts/facilities';
import { changedCorrections } from '#shared/core/reduction/facility-corrections';
import type { ApiProblem, ProblemIssue } from '../../core/api/api-problem';
import { newCommandKey } from '../../core/api/command-key';
import { resolveConflict } from '../../core/editing/conflict-dialog';
import { conflictRows } from '../../core/editing/conflict-rows';
import { formPulse } from '../../core/editing/form-pulse';
import { focusFirstFault, revealErrors } from '../../core/editing/reveal-errors';
import { Undo } from '../../core/editing/undo';
import { type HoldsChanges, warnBeforeUnload } from '../../core/editing/unsaved-changes';
import { Preferences } from '../../core/preferences/preferences';
import { Session } from '../../core/session/session';
import { FacilitiesApi } from '../../data/facilities/facilities-api';
import { FacilityFormPageActions } from '../../data/facilities/facilities.actions';
import { facilitiesFeature } from '../../data/facilities/facilities.feature';
import { Busy } from '../../ui/busy/busy';
import { ConditionFields } from '../../ui/condition/condition-fields';
import { controlError, showIssues } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { NumberField } from '../../ui/field/number-field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { BLOCKAGE_METHOD_WORDS, FACILITY_KIND_WORDS } from '../../ui/words/evidence-words';
import { confirmFacilityRetirement } from './confirm-facility-retirement';
import { facilityComparison } from './facility-comparison';
import {
  facilityChangeOf,
  facilityFieldsOf,
  facilityForm,
  isTunnel,
  setFacility,
  takeOver,
} from './facility-form';
import { BLOCKAGE_METHOD_HINTS } from './facility-words';
import { scatterFromAddress } from './scatter-address';
import { tooLargeModels } from './tested-models';
import { UNCERTAINTY_LINES } from './uncertainty-lines';

/** One facility: kind, blockage, usual condition and how sure its figures are. */
@Component({
  selector: 'wl-facility-form-page',
  imports: [
    Busy,
    ConditionFields,
    Field,
    NumberField,
    ProblemBanner,
    ReactiveFormsModule,
    RouterLink,
    WlInput,
  ],
  templateUrl: './facility-form-page.html',
  styleUrl: './facility-form-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FacilityFormPage implements HoldsChanges {
  /** Absent: a new facility. */
  readonly facilityId = input<string>();
  /** From the address: a session scatter to be taken over from the check body, see `scatter-address.ts`. */
  readonly scatter = input<string>();

  private readonly store = inject(Store);
  private readonly router = inject(Router);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);
  private readonly builder = inject(NonNullableFormBuilder);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  private readonly session = inject(Session);
  private readonly api = inject(FacilitiesApi);

  protected readonly form = facilityForm(this.builder);
  private readonly pulse = formPulse(signal(this.form));
  protected readonly loading = this.store.selectSignal(facilitiesFeature.selectLoading);
  private readonly saving = this.store.selectSignal(facilitiesFeature.selectSaving);
  private readonly known = this.store.selectSignal(facilitiesFeature.selectById);
  protected readonly busy = computed(() => this.saving().kind === 'saving');
  /** As it stood when the form was filled: what a save is measured against. */
  protected readonly base = signal<Facility | undefined>(undefined);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly filled = signal(false);
  protected readonly loadingProblem = computed(() => {
    const loading = this.loading();
    return loading.kind === 'failed' ? loading.problem : undefined;
  });
  protected readonly missing = computed(() => {
    const id = this.facilityId();
    return id !== undefined && this.loading().kind === 'ready' && !this.known().has(id);
  });

  protected readonly kinds = FACILITY_KINDS.map((value) => ({ value, words: FACILITY_KIND_WORDS[value] }));
  protected readonly methods = BLOCKAGE_METHODS.map((value) => ({
    value,
    words: BLOCKAGE_METHOD_WORDS[value],
  }));
  protected readonly lines = UNCERTAINTY_LINES;
  private readonly kind = computed(() => (this.pulse(), this.form.controls.kind.value));
  protected readonly method = computed(
    () => (this.pulse(), this.form.controls.blockage.controls.method.value),
  );
  protected readonly tunnel = computed(() => isTunnel(this.kind()));
  protected readonly areaLabel = computed(() =>
    this.kind() === 'open-jet' ? $localize`Area of the nozzle` : $localize`Area of the test section`,
  );
  protected readonly back = computed(() => {
    const id = this.facilityId();
    return id === undefined ? ['/facilities'] : ['/facilities', id];
  });
  /** Before a change of corrections is saved, the person says why. */
  protected readonly commentNeeded = computed(() => {
    this.pulse();
    const base = this.base();
    return base !== undefined && changedCorrections(base, facilityFieldsOf(this.form)).length > 0;
  });
  private readonly taken = computed(() => scatterFromAddress(this.scatter()));
  protected readonly takenOver = computed(() =>
    this.facilityId() === undefined ? undefined : this.taken()?.comment,
  );
  private readonly models = rxResource({
    params: () => (this.session.may('results.read') ? this.facilityId() : undefined),
    stream: ({ params }) => this.api.models(params),
  });
  protected readonly tooLarge = computed(() => {
    this.pulse();
    if (!this.tunnel() || !this.models.hasValue()) return undefined;
    return tooLargeModels(this.models.value(), this.form.controls.areaM2.value, this.format);
  });
  protected readonly methodHint = computed(() => BLOCKAGE_METHOD_HINTS[this.method()]);

  /** One key for one wish: sending the same form again after a lost answer does it once. */
  private commandKey = newCommandKey();
  /** What the address carries is put into the form once, not again over what stands after saving. */
  private taking = false;
  private wanted: 'save' | 'retire' | 'bring-back' = 'save';

  constructor() {
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const facilityId = this.facilityId();
      untracked(() => {
        this.filled.set(false);
        this.base.set(undefined);
        this.store.dispatch(FacilityFormPageActions.opened());
        if (facilityId === undefined) this.begin();
      });
    });
    effect(() => {
      const id = this.facilityId();
      const facility = id === undefined ? undefined : this.known().get(id);
      if (facility && this.loading().kind === 'ready') untracked(() => this.show(facility));
    });
    effect(() => {
      const saving = this.saving();
      untracked(() => void this.onOutcome(saving));
    });
    inject(DestroyRef).onDestroy(() => this.store.dispatch(FacilityFormPageActions.left()));
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty;
  }

  protected error(control: AbstractControl): string | undefined {
    this.pulse();
    return controlError(control);
  }

  protected server(control: AbstractControl): string | undefined {
    this.pulse();
    return control.errors?.['server'] as string | undefined;
  }

  protected save(): void {
    revealErrors(this.form);
    const { comment } = this.form.controls;
    if (this.commentNeeded() && comment.value.trim() === '') comment.setErrors({ required: true });
    if (this.form.invalid) {
      afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
      return;
    }
    this.send(facilityChangeOf(this.form), this.base());
  }

  protected async retire(): Promise<void> {
    const facility = this.base();
    if (!facility) return;
    const confirmed = await runInInjectionContext(this.injector, () => confirmFacilityRetirement(facility));
    if (confirmed) this.setRetired(facility, true);
  }

  protected bringBack(): void {
    const facility = this.base();
    if (facility) this.setRetired(facility, false);
  }

  private setRetired(facility: Facility, retired: boolean): void {
    this.wanted = retired ? 'retire' : 'bring-back';
    this.store.dispatch(FacilityFormPageActions.retirementConfirmed({ facility, retired }));
  }

  /** What comes later from the server never overwrites what is being typed. */
  private show(facility: Facility): void {
    const newer = this.base()?.version !== facility.version && !this.form.dirty;
    if (!this.filled() || newer) this.fill(facility);
  }

  private begin(): void {
    this.form.reset();
    this.form.markAsPristine();
    this.filled.set(true);
  }

  private fill(facility: Facility): void {
    setFacility(this.form, facility);
    const taken = this.taken();
    if (taken && !this.taking) takeOver(this.form, taken);
    this.taking = true;
    this.base.set(facility);
    this.filled.set(true);
  }

  private send({ comment, ...fields }: FacilityChange, against: Facility | undefined): void {
    this.problem.set(undefined);
    this.wanted = 'save';
    const { commandKey } = this;
    this.store.dispatch(
      against === undefined
        ? FacilityFormPageActions.creationConfirmed({ fields, commandKey })
        : FacilityFormPageActions.changeConfirmed({
            facility: against,
            fields: comment === undefined ? fields : { ...fields, comment },
            commandKey,
          }),
    );
  }

  private async onOutcome(saving: ReturnType<typeof this.saving>): Promise<void> {
    if (saving.kind === 'idle' || saving.kind === 'saving') return;
    this.store.dispatch(FacilityFormPageActions.outcomeSeen());
    // A lost answer keeps its key: the same command may have been carried out.
    if (saving.kind !== 'refused' || saving.problem.code !== 'no-connection')
      this.commandKey = newCommandKey();
    if (saving.kind === 'saved') this.onSaved(saving.entity);
    if (saving.kind === 'refused') this.onRefused(saving.problem);
    if (saving.kind === 'conflict') await this.onConflict(saving.theirs);
  }

  private onSaved(facility: Facility): void {
    if (this.wanted !== 'save') {
      this.base.set(facility);
      const back = this.wanted === 'bring-back';
      this.undo.offer(
        back ? $localize`${facility.name}:NAME: is back.` : $localize`${facility.name}:NAME: is retired.`,
        () => this.store.dispatch(FacilityFormPageActions.retirementConfirmed({ facility, retired: back })),
      );
      return;
    }
    this.form.markAsPristine();
    this.undo.say($localize`${facility.name}:NAME: is saved.`);
    void this.router.navigate(['/facilities', facility.id]);
  }

  private onRefused(problem: ApiProblem): void {
    const named: readonly ProblemIssue[] =
      problem.code === 'already-exists' && problem.issues.length === 0
        ? [{ where: 'name', detail: problem.message }]
        : problem.issues;
    this.problem.set(problem);
    showIssues(this.form, named);
    afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
  }

  private async onConflict(theirs: Facility): Promise<void> {
    const before = this.base() ?? theirs;
    if (this.wanted !== 'save') {
      this.undo.say($localize`${theirs.name}:NAME: was changed meanwhile. Look again, then decide.`);
      if (!this.form.dirty) this.fill(theirs);
      return;
    }
    const mine = facilityChangeOf(this.form);
    const rows = conflictRows(facilityComparison(this.format, this.preferences.numberLocale()), {
      before,
      mine,
      theirs,
    });
    const answer = await runInInjectionContext(this.injector, () => resolveConflict(theirs.name, rows));
    if (answer === 'take-theirs') this.fill(theirs);
    if (answer === 'save-mine') this.send(mine, theirs);
  }
}
