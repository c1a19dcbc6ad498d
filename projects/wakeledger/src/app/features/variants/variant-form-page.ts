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
import { type AbstractControl, NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { BODY_SHAPES, type Variant, type VariantFields } from '#shared/contracts/variants';
import type { ApiProblem, ProblemIssue } from '../../core/api/api-problem';
import { newCommandKey } from '../../core/api/command-key';
import { resolveConflict } from '../../core/editing/conflict-dialog';
import { conflictRows } from '../../core/editing/conflict-rows';
import { formPulse } from '../../core/editing/form-pulse';
import { focusFirstFault, revealErrors } from '../../core/editing/reveal-errors';
import { Undo } from '../../core/editing/undo';
import { type HoldsChanges, warnBeforeUnload } from '../../core/editing/unsaved-changes';
import { Session } from '../../core/session/session';
import { VariantFormPageActions } from '../../data/variants/variants.actions';
import { variantsFeature } from '../../data/variants/variants.feature';
import { Busy } from '../../ui/busy/busy';
import { controlError, showIssues } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { NumberField } from '../../ui/field/number-field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { BODY_SHAPE_NAMES } from '../../ui/words/body-shape-words';
import { configurationForm } from './configuration-form';
import { ConfigurationFields } from './configuration-fields';
import { confirmRetirement } from './confirm-retirement';
import { variantComparison } from './variant-comparison';
import { clearVariant, frontalAreaForm, setVariant, variantFieldsOf, variantForm } from './variant-form';
import { VariantPicture } from './variant-picture';
import { AREA_METHOD_WORDS, standingArea } from './variant-words';

/** One variant: its dimensions, the history of its frontal area, its configurations, its picture. */
@Component({
  selector: 'wl-variant-form-page',
  imports: [
    Busy,
    ConfigurationFields,
    Field,
    NumberField,
    ProblemBanner,
    ReactiveFormsModule,
    RouterLink,
    VariantPicture,
    WlInput,
  ],
  templateUrl: './variant-form-page.html',
  styleUrl: './variant-form-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VariantFormPage implements HoldsChanges {
  readonly programmeId = input.required<string>();
  /** Absent: a new variant. */
  readonly variantId = input<string>();

  private readonly store = inject(Store);
  private readonly router = inject(Router);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  private readonly format = inject(QuantityFormat);
  private readonly builder = inject(NonNullableFormBuilder);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  private readonly session = inject(Session);

  protected readonly form = variantForm(this.builder);
  private readonly pulse = formPulse(signal(this.form));
  protected readonly mayEdit = computed(() => this.session.may('variants.edit'));
  protected readonly loading = this.store.selectSignal(variantsFeature.selectLoading);
  private readonly saving = this.store.selectSignal(variantsFeature.selectSaving);
  private readonly known = this.store.selectSignal(variantsFeature.selectById);
  protected readonly busy = computed(() => this.saving().kind === 'saving');
  /** As it stood when the form was filled: what a save is measured against. */
  protected readonly base = signal<Variant | undefined>(undefined);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly filled = signal(false);
  protected readonly loadingProblem = computed(() => {
    const loading = this.loading();
    return loading.kind === 'failed' ? loading.problem : undefined;
  });
  protected readonly missing = computed(() => {
    const id = this.variantId();
    return id !== undefined && this.loading().kind === 'ready' && !this.known().has(id);
  });

  protected readonly bodyShapes = BODY_SHAPES.map((value) => ({ value, words: BODY_SHAPE_NAMES[value] }));
  protected readonly areaMethods = Object.entries(AREA_METHOD_WORDS).map(([value, words]) => ({
    value,
    words,
  }));
  protected readonly unnamed = $localize`New configuration`;
  protected readonly today = new Date().toISOString().slice(0, 10);

  protected readonly value = computed(() => {
    this.pulse();
    return this.form.getRawValue();
  });
  protected readonly standingDate = computed(() => standingArea(this.value().frontalAreas)?.date);
  protected readonly shareSum = computed(() => {
    const shares = this.value().configurations.map(({ salesShare }) => salesShare ?? 0);
    const sum = shares.reduce((total, share) => total + share, 0);
    return { text: this.format.value(sum, 'number'), right: sum === 0 || Math.abs(sum - 1) < 1e-6 };
  });

  /** One key for one wish: sending the same form again after a lost answer does it once. */
  private commandKey = newCommandKey();
  private wanted: 'save' | 'retire' | 'bring-back' = 'save';

  constructor() {
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const programmeId = this.programmeId();
      const variantId = this.variantId();
      untracked(() => {
        this.filled.set(false);
        this.base.set(undefined);
        this.store.dispatch(VariantFormPageActions.opened({ programmeId }));
        if (variantId === undefined) this.begin();
      });
    });
    effect(() => {
      const id = this.variantId();
      const variant = id === undefined ? undefined : this.known().get(id);
      if (variant && this.loading().kind === 'ready') untracked(() => this.show(variant));
    });
    effect(() => {
      const saving = this.saving();
      untracked(() => void this.onOutcome(saving));
    });
    inject(DestroyRef).onDestroy(() => this.store.dispatch(VariantFormPageActions.left()));
  }

  hasUnsavedChanges(): boolean {
    return this.mayEdit() && this.form.dirty;
  }

  protected error(control: AbstractControl): string | undefined {
    this.pulse();
    return controlError(control);
  }

  protected server(control: AbstractControl): string | undefined {
    this.pulse();
    return control.errors?.['server'] as string | undefined;
  }

  protected addArea(): void {
    this.form.controls.frontalAreas.push(frontalAreaForm(this.builder, { date: this.today }));
    this.form.markAsDirty();
  }

  protected removeArea(position: number): void {
    const { frontalAreas } = this.form.controls;
    const removed = frontalAreas.at(position);
    frontalAreas.removeAt(position);
    this.form.markAsDirty();
    this.undo.offer($localize`The frontal area is taken out.`, () => frontalAreas.insert(position, removed));
  }

  protected addConfiguration(): void {
    this.form.controls.configurations.push(configurationForm(this.builder));
    this.form.markAsDirty();
  }

  protected removeConfiguration(position: number): void {
    const { configurations } = this.form.controls;
    const removed = configurations.at(position);
    configurations.removeAt(position);
    this.form.markAsDirty();
    this.undo.offer($localize`The configuration is taken out.`, () =>
      configurations.insert(position, removed),
    );
  }

  /** The first configuration is the base one, which the ranking uses unless another is chosen. */
  protected makeBase(position: number): void {
    const { configurations } = this.form.controls;
    const chosen = configurations.at(position);
    configurations.removeAt(position);
    configurations.insert(0, chosen);
    this.form.markAsDirty();
  }

  protected setPicture(attachmentId: string): void {
    this.form.controls.pictureAttachmentId.setValue(attachmentId);
    this.form.markAsDirty();
  }

  protected save(): void {
    revealErrors(this.form);
    if (this.form.invalid) {
      afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
      return;
    }
    this.send(variantFieldsOf(this.form), this.base());
  }

  protected async retire(): Promise<void> {
    const variant = this.base();
    if (!variant) return;
    const confirmed = await runInInjectionContext(this.injector, () => confirmRetirement(variant));
    if (confirmed) this.setRetired(variant, true);
  }

  protected bringBack(): void {
    const variant = this.base();
    if (variant) this.setRetired(variant, false);
  }

  private setRetired(variant: Variant, retired: boolean): void {
    this.wanted = retired ? 'retire' : 'bring-back';
    this.store.dispatch(VariantFormPageActions.retirementConfirmed({ variant, retired }));
  }

  /** What comes later from the server never overwrites what is being typed. */
  private show(variant: Variant): void {
    const newer = this.base()?.version !== variant.version && !this.form.dirty;
    if (!this.filled() || newer) this.fill(variant);
  }

  private begin(): void {
    clearVariant(this.form, this.today, this.builder);
    this.filled.set(true);
  }

  private fill(variant: Variant): void {
    setVariant(this.form, variant, this.builder);
    if (!this.mayEdit()) this.form.disable();
    this.base.set(variant);
    this.filled.set(true);
  }

  private send(fields: VariantFields, against: Variant | undefined): void {
    this.problem.set(undefined);
    this.wanted = 'save';
    const { commandKey } = this;
    this.store.dispatch(
      against === undefined
        ? VariantFormPageActions.creationConfirmed({ programmeId: this.programmeId(), fields, commandKey })
        : VariantFormPageActions.changeConfirmed({ variant: against, fields, commandKey }),
    );
  }

  private async onOutcome(saving: ReturnType<typeof this.saving>): Promise<void> {
    if (saving.kind === 'idle' || saving.kind === 'saving') return;
    this.store.dispatch(VariantFormPageActions.outcomeSeen());
    // A lost answer keeps its key: the same command may have been carried out.
    if (saving.kind !== 'refused' || saving.problem.code !== 'no-connection')
      this.commandKey = newCommandKey();
    if (saving.kind === 'saved') this.onSaved(saving.entity);
    if (saving.kind === 'refused') this.onRefused(saving.problem);
    if (saving.kind === 'conflict') await this.onConflict(saving.theirs);
  }

  private onSaved(variant: Variant): void {
    if (this.wanted !== 'save') {
      this.base.set(variant);
      const back = this.wanted === 'bring-back';
      this.undo.offer(
        back ? $localize`${variant.name}:NAME: is back.` : $localize`${variant.name}:NAME: is retired.`,
        () => this.store.dispatch(VariantFormPageActions.retirementConfirmed({ variant, retired: back })),
      );
      return;
    }
    this.form.markAsPristine();
    this.undo.say($localize`${variant.name}:NAME: is saved.`);
    void this.router.navigate(['/programmes', this.programmeId(), 'variants']);
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

  private async onConflict(theirs: Variant): Promise<void> {
    const before = this.base() ?? theirs;
    if (this.wanted !== 'save') {
      this.undo.say($localize`${theirs.name}:NAME: was changed meanwhile. Look again, then decide.`);
      if (!this.form.dirty) this.fill(theirs);
      return;
    }
    const mine = variantFieldsOf(this.form);
    const rows = conflictRows(variantComparison(this.format), { before, mine, theirs });
    const answer = await runInInjectionContext(this.injector, () => resolveConflict(theirs.name, rows));
    if (answer === 'take-theirs') this.fill(theirs);
    if (answer === 'save-mine') this.send(withKnownConfigurations(mine, theirs), theirs);
  }
}

/** A configuration that a colleague removed is entered anew: its old id means nothing any more. */
function withKnownConfigurations(mine: VariantFields, theirs: Variant): VariantFields {
  const known = new Set(theirs.configurations.map(({ id }) => id));
  return {
    ...mine,
    configurations: mine.configurations.map(({ id, ...rest }) =>
      id !== undefined && known.has(id) ? { id, ...rest } : rest,
    ),
  };
}
