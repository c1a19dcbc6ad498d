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
  runInInjectionContext,
  signal,
  untracked,
} from '@angular/core';
import { type AbstractControl, NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import type { Observable } from 'rxjs';
import {
  CATEGORICAL_ITEMS,
  NUMERIC_ITEMS,
  type Adjustment,
  type AdjustmentFields,
} from '#shared/contracts/adjustments';
import { BODY_SHAPES } from '#shared/contracts/variants';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { newCommandKey } from '../../core/api/command-key';
import { resolveConflict } from '../../core/editing/conflict-dialog';
import { conflictRows } from '../../core/editing/conflict-rows';
import { formPulse } from '../../core/editing/form-pulse';
import { focusFirstFault, revealErrors } from '../../core/editing/reveal-errors';
import { Undo } from '../../core/editing/undo';
import { type HoldsChanges, warnBeforeUnload } from '../../core/editing/unsaved-changes';
import { Preferences } from '../../core/preferences/preferences';
import { AdjustmentsApi } from '../../data/adjustments/adjustments-api';
import { Busy } from '../../ui/busy/busy';
import { conditionItemWord } from '../../ui/condition/condition-words';
import { controlError, showIssues } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { NumberField } from '../../ui/field/number-field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { BODY_SHAPE_NAMES } from '../../ui/words/body-shape-words';
import { adjustmentComparison } from './adjustment-comparison';
import { AdjustmentEvidence } from './adjustment-evidence';
import {
  type BodyShape,
  adjustmentFieldsOf,
  adjustmentForm,
  controlOf,
  inSquareMetres,
  setAdjustment,
} from './adjustment-form';
import { UNIT_OF_ITEM, isNumericItem } from './adjustment-words';
import { itemOf, valueChoices } from './value-choices';

/** What one difference of the test condition is worth, how sure that is, and what it rests on. */
@Component({
  selector: 'wl-adjustment-form-page',
  imports: [
    AdjustmentEvidence,
    Busy,
    Field,
    NumberField,
    ProblemBanner,
    ReactiveFormsModule,
    RouterLink,
    WlInput,
  ],
  templateUrl: './adjustment-form-page.html',
  styleUrl: './adjustment-form-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AdjustmentFormPage implements HoldsChanges {
  /** Absent: a new adjustment. */
  readonly adjustmentId = input<string>();
  /** From the address: the difference that a result stayed out for. */
  readonly item = input<string>();
  readonly from = input<string>();
  readonly to = input<string>();

  private readonly api = inject(AdjustmentsApi);
  private readonly router = inject(Router);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  protected readonly form = adjustmentForm(inject(NonNullableFormBuilder));
  private readonly pulse = formPulse(signal(this.form));
  /** As it stood when the form was filled: what a save is measured against. */
  private readonly base = signal<Adjustment | undefined>(undefined);
  protected readonly filled = signal(false);
  protected readonly busy = signal(false);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly loadingProblem = signal<ApiProblem | undefined>(undefined);

  protected readonly items = [...CATEGORICAL_ITEMS, ...NUMERIC_ITEMS].map((value) => ({
    value,
    words: conditionItemWord(value),
  }));
  protected readonly shapes = BODY_SHAPES.map((value) => ({ value, words: BODY_SHAPE_NAMES[value] }));
  private readonly value = computed(() => (this.pulse(), this.form.getRawValue()));
  protected readonly numeric = computed(() => isNumericItem(this.value().item));
  protected readonly choices = computed(() => valueChoices(this.value().item));
  protected readonly attachmentId = computed(() => this.value().attachmentId);
  protected readonly counted = computed(() => this.value().unit === 'counts');
  protected readonly worthUnit = computed(() => {
    const unit = this.counted() ? $localize`counts` : 'm²';
    const { item } = this.value();
    return this.numeric() ? `${unit}/${UNIT_OF_ITEM[item] ?? '1'}` : unit;
  });
  /** What typed counts come to, so that nobody saves a figure that was meant otherwise. */
  protected readonly converted = computed(() => {
    const { worth, u, unit, countsAreaM2 } = this.value();
    const [worthM2, uM2] = [worth, u].map((amount) => inSquareMetres(amount, unit, countsAreaM2));
    if (unit === 'm2' || worthM2 === undefined) return undefined;
    const words = (amount: number): string => this.format.text(amount, 'drag-area', { digits: 5 });
    return uM2 === undefined
      ? $localize`Kept as ${words(worthM2)}:WORTH:.`
      : $localize`Kept as ${words(worthM2)}:WORTH:, u ${words(uM2)}:U:.`;
  });

  /** One key for one wish: sending the same form again after a lost answer does it once. */
  private commandKey = newCommandKey();

  constructor() {
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const id = this.adjustmentId();
      untracked(() => {
        if (id === undefined) this.begin();
        else this.load(id);
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

  protected holdsFor(shape: BodyShape): boolean {
    return this.value().bodyShapes.includes(shape);
  }

  protected toggle(shape: BodyShape): void {
    const { bodyShapes } = this.form.controls;
    const kept = bodyShapes.value.filter((each) => each !== shape);
    bodyShapes.setValue(kept.length < bodyShapes.value.length ? kept : [...kept, shape]);
    bodyShapes.markAsDirty();
  }

  protected attach(attachmentId: string): void {
    this.form.controls.attachmentId.setValue(attachmentId);
    this.form.markAsDirty();
  }

  protected save(): void {
    revealErrors(this.form);
    if (this.form.invalid) {
      this.focusFault();
      return;
    }
    this.send(adjustmentFieldsOf(this.form), this.base());
  }

  private begin(): void {
    this.form.reset();
    const item = itemOf(this.item());
    if (item !== undefined) {
      this.form.patchValue({ item, fromValue: this.from() ?? '', toValue: this.to() ?? '' });
    }
    this.form.markAsPristine();
    this.filled.set(true);
  }

  private load(id: string): void {
    this.filled.set(false);
    this.api.read(id).subscribe({
      next: (adjustment) => this.fill(adjustment),
      error: (thrown: unknown) => this.loadingProblem.set(asApiProblem(thrown)),
    });
  }

  private fill(adjustment: Adjustment): void {
    setAdjustment(this.form, adjustment);
    this.base.set(adjustment);
    this.filled.set(true);
  }

  private send(fields: AdjustmentFields, against: Adjustment | undefined): void {
    this.problem.set(undefined);
    this.busy.set(true);
    const saved: Observable<Adjustment> =
      against === undefined
        ? this.api.create(fields, this.commandKey)
        : this.api.update(against, fields, this.commandKey);
    saved.subscribe({
      next: ({ name }) => {
        this.busy.set(false);
        this.form.markAsPristine();
        this.undo.say($localize`${name}:NAME: is saved.`);
        void this.router.navigate(['/adjustments']);
      },
      error: (thrown: unknown) => this.onRefused(asApiProblem(thrown)),
    });
  }

  private onRefused(problem: ApiProblem): void {
    this.busy.set(false);
    // A lost answer keeps its key: the same command may have been carried out.
    if (problem.code !== 'no-connection') this.commandKey = newCommandKey();
    const base = this.base();
    if (problem.code === 'conflict' && base !== undefined) {
      this.api.read(base.id).subscribe({
        next: (theirs) => void this.onConflict(base, theirs),
        error: (thrown: unknown) => this.problem.set(asApiProblem(thrown)),
      });
      return;
    }
    this.problem.set(problem);
    const named =
      problem.code === 'already-exists' && problem.issues.length === 0
        ? [{ where: 'name', detail: problem.message }]
        : problem.issues;
    showIssues(
      this.form,
      named.map(({ where, detail }) => ({ where: controlOf(where.replace(/^body\./, '')), detail })),
    );
    this.focusFault();
  }

  private async onConflict(before: Adjustment, theirs: Adjustment): Promise<void> {
    const mine = adjustmentFieldsOf(this.form);
    const rows = conflictRows(adjustmentComparison(this.format, this.preferences.numberLocale()), {
      before,
      mine,
      theirs,
    });
    const answer = await runInInjectionContext(this.injector, () => resolveConflict(theirs.name, rows));
    if (answer === 'take-theirs') this.fill(theirs);
    if (answer === 'save-mine') this.send(mine, theirs);
  }

  private focusFault(): void {
    afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
  }
}
