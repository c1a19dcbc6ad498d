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
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { map, startWith } from 'rxjs';
import { AIR_STATES } from '#shared/contracts/condition';
import type { Programme, ProgrammeFields } from '#shared/contracts/programmes';
import type { ApiProblem } from '../../core/api/api-problem';
import { newCommandKey } from '../../core/api/command-key';
import { resolveConflict } from '../../core/editing/conflict-dialog';
import { conflictRows } from '../../core/editing/conflict-rows';
import { focusFirstFault, revealErrors } from '../../core/editing/reveal-errors';
import { Undo } from '../../core/editing/undo';
import { type HoldsChanges, warnBeforeUnload } from '../../core/editing/unsaved-changes';
import { Preferences } from '../../core/preferences/preferences';
import { Session } from '../../core/session/session';
import { FacilityNamesActions } from '../../data/facilities/facilities.actions';
import { facilitiesFeature } from '../../data/facilities/facilities.feature';
import { ProgrammeFormPageActions } from '../../data/programmes/programmes.actions';
import { programmesFeature } from '../../data/programmes/programmes.feature';
import { VariantNamesActions } from '../../data/variants/variants.actions';
import { variantsFeature } from '../../data/variants/variants.feature';
import { Busy } from '../../ui/busy/busy';
import { ConditionFields } from '../../ui/condition/condition-fields';
import { confirmInDialog } from '../../ui/confirm-dialog/confirm-dialog';
import { controlError, showIssues } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { NumberField } from '../../ui/field/number-field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { AIR_STATE_WORDS } from '../../ui/words/evidence-words';
import { FRICTION_LINE_WORDS, programmeComparison } from './programme-comparison';
import {
  fillProgrammeForm,
  milestoneForm,
  newProgrammeValues,
  programmeForm,
  readProgrammeForm,
} from './programme-form';

/** What does this programme compare on? Its reference condition, area, confidence and milestones. */
@Component({
  selector: 'wl-programme-form-page',
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
  templateUrl: './programme-form-page.html',
  styleUrl: './programme-form-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgrammeFormPage implements HoldsChanges {
  /** Absent for a new programme. */
  readonly programmeId = input<string>();

  private readonly store = inject(Store);
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  private readonly injector = inject(Injector);
  private readonly preferences = inject(Preferences);
  private readonly undo = inject(Undo);
  private readonly builder = inject(NonNullableFormBuilder);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  protected readonly form = programmeForm(this.builder);
  protected readonly page = this.store.selectSignal(programmesFeature.selectFormPage);
  protected readonly variants = this.store.selectSignal(variantsFeature.selectActive);
  protected readonly facilities = this.store.selectSignal(facilitiesFeature.selectActive);
  protected readonly mayEdit = computed(() => this.session.may('programmes.edit'));
  protected readonly mayReadPolicies = computed(() => this.session.may('policies.read'));
  protected readonly frictionWords = FRICTION_LINE_WORDS;
  protected readonly saving = computed(() => this.page().saving.kind === 'saving');
  protected readonly loadingProblem = computed(() => {
    const { opening } = this.page();
    return opening.kind === 'failed' ? opening.problem : undefined;
  });
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly error = controlError;
  protected readonly airStates = AIR_STATES.map((value) => ({ value, words: AIR_STATE_WORDS[value] }));
  private readonly value = toSignal(
    this.form.valueChanges.pipe(
      startWith(null),
      map(() => this.form.getRawValue()),
    ),
    {
      requireSync: true,
    },
  );
  protected readonly customAir = computed(() => this.value().airState === 'custom');
  protected readonly areaPolicy = computed(() => this.value().areaPolicy);
  /** What the person began from, to tell a colleague's change from their own. */
  private before: Programme | undefined;
  private commandKey = newCommandKey();

  constructor() {
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const programmeId = this.programmeId();
      untracked(() => this.begin(programmeId));
    });
    effect(() => {
      const programmeId = this.programmeId();
      if (programmeId) this.store.dispatch(VariantNamesActions.needed({ programmeId }));
    });
    effect(() => this.store.dispatch(FacilityNamesActions.needed()));
    effect(() => {
      const { opened } = this.page();
      if (opened && opened.id === this.programmeId()) untracked(() => this.show(opened));
    });
    effect(() => {
      const { saving } = this.page();
      untracked(() => {
        if (saving.kind === 'saved') this.saved(saving.entity);
        if (saving.kind === 'refused') this.refused(saving.problem);
        if (saving.kind === 'conflict') void this.conflict(saving.theirs);
      });
    });
    inject(DestroyRef).onDestroy(() => this.store.dispatch(ProgrammeFormPageActions.left()));
  }

  hasUnsavedChanges(): boolean {
    return this.form.enabled && this.form.dirty;
  }

  protected addMilestone(): void {
    this.form.controls.milestones.push(milestoneForm(this.builder));
    this.form.markAsDirty();
  }

  protected removeMilestone(index: number): void {
    const removed = this.form.controls.milestones.at(index);
    this.form.controls.milestones.removeAt(index);
    this.form.markAsDirty();
    this.undo.offer($localize`Milestone removed.`, () =>
      this.form.controls.milestones.insert(index, removed),
    );
  }

  protected save(): void {
    revealErrors(this.form);
    if (this.saving()) return;
    if (this.form.invalid || this.areaMissing()) {
      this.showFault();
      return;
    }
    this.problem.set(undefined);
    this.send(readProgrammeForm(this.form));
  }

  protected areaError(): string | undefined {
    const { touched } = this.form.controls.areaVariantId;
    return touched && this.areaMissing() ? $localize`Choose the variant whose area counts.` : undefined;
  }

  private areaMissing(): boolean {
    return this.areaPolicy() === 'variant' && this.value().areaVariantId === '';
  }

  protected async retire(programme: Programme): Promise<void> {
    const retired = programme.retiredAt === undefined;
    const yes = await runInInjectionContext(this.injector, () =>
      confirmInDialog({
        title: retired
          ? $localize`Retire ${programme.name}:NAME:?`
          : $localize`Bring ${programme.name}:NAME: back?`,
        detail: retired
          ? $localize`It leaves the list of programmes. Its results and figures are kept, and it can be brought back.`
          : $localize`It returns to the list of programmes with all its results.`,
        confirm: retired ? $localize`Retire` : $localize`Bring back`,
        cancel: $localize`Cancel`,
        severe: retired,
      }),
    );
    if (yes) this.store.dispatch(ProgrammeFormPageActions.retirementConfirmed({ programme, retired }));
  }

  private begin(programmeId: string | undefined): void {
    this.store.dispatch(ProgrammeFormPageActions.opened({ programmeId }));
    this.before = undefined;
    fillProgrammeForm(this.form, newProgrammeValues(), this.builder);
    this.enableForMember();
  }

  private show(programme: Programme): void {
    this.before = programme;
    fillProgrammeForm(this.form, programme, this.builder);
    this.enableForMember();
  }

  private enableForMember(): void {
    if (this.mayEdit()) this.form.enable();
    else this.form.disable();
    this.form.markAsPristine();
  }

  private send(fields: ProgrammeFields, against = this.before): void {
    const { commandKey } = this;
    this.store.dispatch(
      against
        ? ProgrammeFormPageActions.changeConfirmed({ programme: against, fields, commandKey })
        : ProgrammeFormPageActions.creationConfirmed({ fields, commandKey }),
    );
  }

  private saved(programme: Programme): void {
    const isNew = this.before === undefined;
    this.commandKey = newCommandKey();
    this.form.markAsPristine();
    this.store.dispatch(ProgrammeFormPageActions.outcomeSeen());
    this.undo.say($localize`${programme.name}:NAME: is saved.`);
    if (isNew) void this.router.navigate(['/programmes', programme.id, 'settings']);
  }

  private refused(problem: ApiProblem): void {
    // The next attempt may carry other content, and that is another command.
    if (problem.code !== 'no-connection') this.commandKey = newCommandKey();
    showIssues(this.form, problem.issues);
    this.problem.set(problem);
    this.store.dispatch(ProgrammeFormPageActions.outcomeSeen());
  }

  private async conflict(theirs: Programme): Promise<void> {
    this.store.dispatch(ProgrammeFormPageActions.outcomeSeen());
    this.commandKey = newCommandKey();
    const mine = readProgrammeForm(this.form);
    const rows = conflictRows<ProgrammeFields>(this.comparison(), {
      before: this.before ?? theirs,
      mine,
      theirs,
    });
    const answer = await runInInjectionContext(this.injector, () => resolveConflict(theirs.name, rows));
    if (answer === 'take-theirs') this.show(theirs);
    if (answer === 'save-mine') this.send(mine, theirs);
  }

  private comparison(): ReturnType<typeof programmeComparison> {
    const nameIn = (list: readonly { readonly id: string; readonly name: string }[], id: string): string =>
      list.find((each) => each.id === id)?.name ?? $localize`retired`;
    return programmeComparison({
      locale: this.preferences.numberLocale(),
      variant: (id) => nameIn(this.variants(), id),
      facility: (id) => nameIn(this.facilities(), id),
    });
  }

  private showFault(): void {
    afterNextRender(() => focusFirstFault(this.host), {
      injector: this.injector,
    });
  }
}
