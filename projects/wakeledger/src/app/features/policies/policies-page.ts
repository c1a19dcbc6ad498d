import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  afterNextRender,
  computed,
  effect,
  inject,
  runInInjectionContext,
  signal,
  untracked,
} from '@angular/core';
import {
  type AbstractControl,
  FormControl,
  NonNullableFormBuilder,
  ReactiveFormsModule,
} from '@angular/forms';
import { Store } from '@ngrx/store';
import type { PolicyValues, PolicyVersion } from '#shared/contracts/policies';
import type { ApiProblem } from '../../core/api/api-problem';
import { newCommandKey } from '../../core/api/command-key';
import { resolveConflict } from '../../core/editing/conflict-dialog';
import { conflictRows } from '../../core/editing/conflict-rows';
import { formPulse } from '../../core/editing/form-pulse';
import { focusFirstFault, revealErrors } from '../../core/editing/reveal-errors';
import { Undo } from '../../core/editing/undo';
import { type HoldsChanges, warnBeforeUnload } from '../../core/editing/unsaved-changes';
import { formatForInput, THIN_SPACE } from '../../core/numbers/format-number';
import { Preferences } from '../../core/preferences/preferences';
import { Session } from '../../core/session/session';
import { PoliciesPageActions } from '../../data/policies/policies.actions';
import { policiesFeature } from '../../data/policies/policies.feature';
import { Busy } from '../../ui/busy/busy';
import { controlError, showIssues } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { NumberField } from '../../ui/field/number-field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { BODY_ROWS, LIMIT_GROUPS, type LimitField } from './limit-fields';
import {
  contradictions,
  fillPoliciesForm,
  policiesForm,
  readPoliciesForm,
  typedFigure,
} from './policies-form';
import { comparedLimits, limitDifferences } from './policy-differences';
import { PolicyHistory } from './policy-history';

/** What do we hold for acceptable? The limits of every check, what each does, and how they came to be. */
@Component({
  selector: 'wl-policies-page',
  imports: [Busy, Field, NumberField, PolicyHistory, ProblemBanner, ReactiveFormsModule, WlInput],
  templateUrl: './policies-page.html',
  styleUrl: './policies-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PoliciesPage implements HoldsChanges {
  private readonly store = inject(Store);
  private readonly session = inject(Session);
  private readonly preferences = inject(Preferences);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  protected readonly form = policiesForm(inject(NonNullableFormBuilder));
  private readonly pulse = formPulse(signal(this.form));
  private readonly loading = this.store.selectSignal(policiesFeature.selectLoading);
  private readonly saving = this.store.selectSignal(policiesFeature.selectSaving);
  private readonly newest = this.store.selectSignal(policiesFeature.selectInForce);
  protected readonly versions = this.store.selectSignal(policiesFeature.selectVersions);
  protected readonly mayEdit = computed(() => this.session.may('policies.edit'));
  protected readonly busy = computed(() => this.saving().kind === 'saving');
  /** The version that the form was filled with: what a change is measured against. */
  protected readonly base = signal<PolicyVersion | undefined>(undefined);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly loadingProblem = computed(() => {
    const loading = this.loading();
    return loading.kind === 'failed' ? loading.problem : undefined;
  });

  protected readonly groups = LIMIT_GROUPS;
  protected readonly bodies = BODY_ROWS;
  private readonly supplied = computed(() => this.versions().find(({ number }) => number === 0)?.values);
  protected readonly changes = computed(() => {
    this.pulse();
    const base = this.base();
    return base
      ? limitDifferences(base.values, readPoliciesForm(this.form), this.preferences.numberLocale())
      : [];
  });

  /** One key for one wish: sending the same change again after a lost answer does it once. */
  private commandKey = newCommandKey();

  constructor() {
    warnBeforeUnload(() => this.hasUnsavedChanges());
    this.store.dispatch(PoliciesPageActions.opened());
    effect(() => {
      const newest = this.newest();
      // What comes later from the server never overwrites what is being typed.
      if (newest && !untracked(() => this.form.dirty)) untracked(() => this.fill(newest));
    });
    effect(() => (this.mayEdit() ? this.form.enable() : this.form.disable()));
    effect(() => {
      const saving = this.saving();
      untracked(() => {
        if (saving.kind === 'saved') this.onSaved(saving.entity);
        if (saving.kind === 'refused') this.onRefused(saving.problem);
        if (saving.kind === 'conflict') void this.onConflict(saving.theirs);
      });
    });
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty;
  }

  protected control({ path }: LimitField): FormControl<number | null> {
    const found = this.form.get(path);
    if (!(found instanceof FormControl)) throw new Error(`There is no limit ${path}.`);
    return found as FormControl<number | null>;
  }

  protected error(control: AbstractControl): string | undefined {
    this.pulse();
    return controlError(control);
  }

  /** The limit that the product comes with, in words. */
  protected suppliedWords(field: LimitField): string {
    const values = this.supplied();
    const figure = values && typedFigure(values, field);
    if (figure === undefined) return '–';
    const text = formatForInput(figure, this.preferences.numberLocale());
    return field.unit === '' ? text : `${text}${THIN_SPACE}${field.unit}`;
  }

  protected isOwn(field: LimitField): boolean {
    const [supplied, base] = [this.supplied(), this.base()?.values];
    return (
      supplied !== undefined &&
      base !== undefined &&
      typedFigure(supplied, field) !== typedFigure(base, field)
    );
  }

  protected retry(): void {
    this.store.dispatch(PoliciesPageActions.askedAgain());
  }

  protected save(): void {
    const base = this.base();
    if (this.busy() || !base || this.changes().length === 0) return;
    revealErrors(this.form);
    if (this.form.valid) showIssues(this.form, contradictions(readPoliciesForm(this.form)));
    if (this.form.invalid) {
      afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
      return;
    }
    this.send(base.number);
  }

  protected discard(): void {
    const newest = this.newest();
    if (newest) this.fill(newest);
  }

  private send(expectedNumber: number): void {
    this.problem.set(undefined);
    const change = {
      expectedNumber,
      values: readPoliciesForm(this.form),
      comment: this.form.controls.comment.value,
    };
    this.store.dispatch(PoliciesPageActions.changeConfirmed({ change, commandKey: this.commandKey }));
  }

  private fill(version: PolicyVersion): void {
    fillPoliciesForm(this.form, version.values);
    this.form.markAsPristine();
    this.base.set(version);
    this.problem.set(undefined);
  }

  private onSaved(version: PolicyVersion): void {
    this.commandKey = newCommandKey();
    this.fill(version);
    this.undo.say($localize`Version ${version.number}:NUMBER: of the limits is in force.`);
  }

  private onRefused(problem: ApiProblem): void {
    // A lost answer keeps its key: the same command may have been carried out.
    if (problem.code !== 'no-connection') this.commandKey = newCommandKey();
    this.problem.set(problem);
    showIssues(
      this.form,
      problem.issues.map(({ where, detail }) => ({ where: where.replace(/^values\./, ''), detail })),
    );
    afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
  }

  private async onConflict(theirs: PolicyVersion): Promise<void> {
    this.commandKey = newCommandKey();
    const before: PolicyValues = this.base()?.values ?? theirs.values;
    const rows = conflictRows(comparedLimits(this.preferences.numberLocale()), {
      before,
      mine: readPoliciesForm(this.form),
      theirs: theirs.values,
    });
    const answer = await runInInjectionContext(this.injector, () =>
      resolveConflict($localize`the limits`, rows),
    );
    if (answer === 'take-theirs') this.fill(theirs);
    if (answer === 'save-mine') this.send(theirs.number);
  }
}
