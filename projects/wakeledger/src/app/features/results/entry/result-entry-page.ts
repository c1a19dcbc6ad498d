import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  afterNextRender,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { type AbstractControl, NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { QUANTITIES } from '#shared/contracts/results';
import type { ApiProblem, ProblemIssue } from '../../../core/api/api-problem';
import { newCommandKey } from '../../../core/api/command-key';
import { formPulse } from '../../../core/editing/form-pulse';
import { focusFirstFault, revealErrors } from '../../../core/editing/reveal-errors';
import { Undo } from '../../../core/editing/undo';
import { type HoldsChanges, warnBeforeUnload } from '../../../core/editing/unsaved-changes';
import { facilitiesFeature } from '../../../data/facilities/facilities.feature';
import { policiesFeature } from '../../../data/policies/policies.feature';
import { ResultEntryPageActions } from '../../../data/results/results.actions';
import { resultsFeature } from '../../../data/results/results.feature';
import { variantsFeature } from '../../../data/variants/variants.feature';
import { ConditionFields } from '../../../ui/condition/condition-fields';
import { setCondition } from '../../../ui/condition/condition-form';
import { controlError, showIssues } from '../../../ui/field/control-error';
import { Field, WlInput } from '../../../ui/field/field';
import { NumberField } from '../../../ui/field/number-field';
import { ProblemBanner } from '../../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { QUANTITY_UNITS, QUANTITY_WORDS } from '../../../ui/words/evidence-words';
import { exactly } from '../page/raw-lines';
import { EvidenceFile } from './evidence-file';
import { ExpectedPlan } from './expected-plan';
import { FlowFields } from './flow-fields';
import { PointsTable } from './points-table';
import { previewOf } from './preview';
import { PreviewPanel } from './preview-panel';
import { resultFieldsOf, resultForm } from './result-form';

/** What was measured? A result typed by hand, with what it would come to beside it. */
@Component({
  selector: 'wl-result-entry-page',
  imports: [
    ConditionFields,
    EvidenceFile,
    ExpectedPlan,
    Field,
    FlowFields,
    NumberField,
    PointsTable,
    PreviewPanel,
    ProblemBanner,
    ReactiveFormsModule,
    RouterLink,
    WlInput,
  ],
  templateUrl: './result-entry-page.html',
  styleUrl: './result-entry-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResultEntryPage implements HoldsChanges {
  readonly programmeId = input.required<string>();
  /** From the address: the planned test that this result is of. */
  readonly plan = input<string>();

  private readonly store = inject(Store);
  private readonly router = inject(Router);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  private readonly format = inject(QuantityFormat);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  protected readonly form = resultForm(inject(NonNullableFormBuilder));
  private readonly pulse = formPulse(signal(this.form));
  private readonly deed = this.store.selectSignal(resultsFeature.selectDeed);
  private readonly programme = this.store.selectSignal(resultsFeature.selectProgramme);
  private readonly results = this.store.selectSignal(resultsFeature.selectResults);
  private readonly loading = this.store.selectSignal(resultsFeature.selectLoading);
  /** For what the organisation’s adjustments and correlations make of it. */
  private readonly inputs = this.store.selectSignal(resultsFeature.selectInputs);
  private readonly policies = this.store.selectSignal(policiesFeature.selectInForce);
  protected readonly variants = this.store.selectSignal(variantsFeature.selectActive);
  protected readonly facilities = this.store.selectSignal(facilitiesFeature.selectActive);
  protected readonly busy = computed(() => this.deed().kind === 'under-way');
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly loadingProblem = computed(() => {
    const loading = this.loading();
    return loading.kind === 'failed' ? loading.problem : undefined;
  });

  protected readonly quantities = QUANTITIES.map((value) => ({ value, words: QUANTITY_WORDS[value] }));
  protected readonly today = new Date().toISOString().slice(0, 10);

  protected readonly value = computed(() => {
    this.pulse();
    return this.form.getRawValue();
  });
  protected readonly unit = computed(() => QUANTITY_UNITS[this.value().quantity]);
  protected readonly valueWords = computed(() => QUANTITY_WORDS[this.value().quantity]);
  protected readonly asksArea = computed(() => ['coefficient', 'force'].includes(this.value().quantity));
  protected readonly tareInside = computed(
    () => this.value().quantity === 'force' && this.value().tareAlreadySubtracted === 'no',
  );
  protected readonly isModel = computed(() => (this.value().scale ?? 1) < 1);
  private readonly chosenFacility = computed(() =>
    this.facilities().find(({ id }) => id === this.value().facilityId),
  );
  private readonly chosenVariant = computed(() =>
    this.variants().find(({ id }) => id === this.value().variantId),
  );
  /** The facility whose usual condition could be taken over, where the person has typed another one. */
  protected readonly offersUsual = computed(() => {
    this.pulse();
    const facility = this.chosenFacility();
    return facility && this.form.controls.condition.dirty ? facility : undefined;
  });
  private readonly ofFacility = computed(() =>
    this.results().filter(({ facilityId }) => facilityId === this.value().facilityId),
  );
  protected readonly sessions = computed(() => distinct(this.ofFacility().map(({ session }) => session)));
  protected readonly installations = computed(() =>
    distinct(this.ofFacility().map(({ installation }) => installation)),
  );
  protected readonly models = computed(() => distinct(this.results().map(({ model }) => model)));

  protected readonly preview = computed(() => {
    const { points } = this.value();
    const [programme, policies] = [this.programme(), this.policies()];
    const [variant, facility] = [this.chosenVariant(), this.chosenFacility()];
    if (!programme || !policies || !variant || !facility) return undefined;
    if (points.every(({ value }) => value === null)) return undefined;
    const complete = resultFieldsOf(this.form);
    // Rows that are only begun do not stop the others from being shown.
    const typed = complete.points.filter(
      ({ value, yawDeg }) => !Number.isNaN(value) && !Number.isNaN(yawDeg),
    );
    const fields = { ...complete, points: typed };
    return previewOf(fields, { programme, variant, facility, policies, document: this.inputs() });
  });
  protected readonly before = computed(() => {
    const value = this.value().points.find((point) => point.yawDeg === 0)?.value ?? null;
    if (value === null) return '';
    const unit = this.unit();
    return unit === '' ? exactly(value, this.format) : `${exactly(value, this.format)}\u202f${unit}`;
  });

  private commandKey = newCommandKey();
  private usualOf = '';

  constructor() {
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const programmeId = this.programmeId();
      untracked(() => this.store.dispatch(ResultEntryPageActions.opened({ programmeId })));
    });
    effect(() => {
      const facility = this.chosenFacility();
      untracked(() => {
        const { condition } = this.form.controls;
        if (!facility || facility.id === this.usualOf || condition.dirty) return;
        this.usualOf = facility.id;
        setCondition(condition, facility.usualCondition);
      });
    });
    effect(() => {
      const deed = this.deed();
      untracked(() => {
        if (deed.kind === 'none' || deed.kind === 'under-way') return;
        this.store.dispatch(ResultEntryPageActions.outcomeSeen());
        if (deed.kind === 'refused') this.onRefused(deed.problem);
        if (deed.kind === 'entered') this.onEntered(deed.result.id, deed.result.name);
      });
    });
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty;
  }

  protected error(control: AbstractControl): string | undefined {
    this.pulse();
    return controlError(control);
  }

  protected takeUsual(): void {
    const facility = this.chosenFacility();
    if (!facility) return;
    this.usualOf = facility.id;
    setCondition(this.form.controls.condition, facility.usualCondition);
    this.form.controls.condition.markAsPristine();
  }

  protected setAttachment(attachmentId: string): void {
    this.form.controls.attachmentId.setValue(attachmentId);
    this.form.markAsDirty();
  }

  protected save(): void {
    if (this.busy()) return;
    revealErrors(this.form);
    if (this.form.invalid) {
      afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
      return;
    }
    this.problem.set(undefined);
    const { commandKey } = this;
    this.store.dispatch(
      ResultEntryPageActions.entryConfirmed({
        programmeId: this.programmeId(),
        fields: resultFieldsOf(this.form),
        commandKey,
      }),
    );
  }

  private onEntered(resultId: string, name: string): void {
    this.form.markAsPristine();
    this.undo.say($localize`${name}:NAME: is entered.`);
    void this.router.navigate(['/programmes', this.programmeId(), 'results', resultId]);
  }

  private onRefused(problem: ApiProblem): void {
    // A lost answer keeps its key: the same command may have been carried out.
    if (problem.code !== 'no-connection') this.commandKey = newCommandKey();
    const named: readonly ProblemIssue[] =
      problem.code === 'already-exists' && problem.issues.length === 0
        ? [{ where: 'name', detail: problem.message }]
        : problem.issues;
    this.problem.set(problem);
    showIssues(this.form, named);
    afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
  }
}

function distinct(names: readonly (string | undefined)[]): readonly string[] {
  return [...new Set(names.filter((name) => name !== undefined))].sort();
}
