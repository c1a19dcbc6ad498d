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
import { rxResource } from '@angular/core/rxjs-interop';
import { type AbstractControl, NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { firstValueFrom, of } from 'rxjs';
import type { TestPlan, TestPlanFields } from '#shared/contracts/test-plans';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { newCommandKey } from '../../core/api/command-key';
import { resolveConflict } from '../../core/editing/conflict-dialog';
import { conflictRows } from '../../core/editing/conflict-rows';
import { formPulse } from '../../core/editing/form-pulse';
import { focusFirstFault, revealErrors } from '../../core/editing/reveal-errors';
import { Undo } from '../../core/editing/undo';
import { type HoldsChanges, warnBeforeUnload } from '../../core/editing/unsaved-changes';
import { Preferences } from '../../core/preferences/preferences';
import { Session } from '../../core/session/session';
import { TestPlansApi } from '../../data/test-plans/test-plans-api';
import { Busy } from '../../ui/busy/busy';
import { ConditionFields } from '../../ui/condition/condition-fields';
import { setCondition } from '../../ui/condition/condition-form';
import { controlError, showIssues } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { NumberField } from '../../ui/field/number-field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import type { MapPoint } from '../../ui/speed-scale-map/map-region';
import { FACILITY_KIND_WORDS } from '../../ui/words/evidence-words';
import { PlanAnswer } from './plan-answer';
import { PlanCautions } from './plan-cautions';
import { planComparison } from './plan-comparison';
import { PlanDeeds } from './plan-deeds';
import { planFaults } from './plan-faults';
import { inMillions, planFieldsOf, planForm, setPlan, type PlanField } from './plan-form';
import { PlanResults } from './plan-results';
import { planSurroundings } from './plan-surroundings';
import { reynoldsWords } from './plan-words';
import { isTunnel, planned, type PlanState } from './planned';
import type { Trial } from './ways-out';

/** One planned test: with what, where, and what that comes to, computed as it is typed. */
@Component({
  selector: 'wl-plan-page',
  imports: [
    Busy,
    ConditionFields,
    Field,
    NumberField,
    PlanAnswer,
    PlanCautions,
    PlanDeeds,
    PlanResults,
    ProblemBanner,
    ReactiveFormsModule,
    RouterLink,
    WlInput,
  ],
  templateUrl: './plan-page.html',
  styleUrl: './plan-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanPage implements HoldsChanges {
  readonly programmeId = input.required<string>();
  /** Absent: a new plan. */
  readonly testPlanId = input<string>();

  private readonly api = inject(TestPlansApi);
  private readonly router = inject(Router);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  private readonly session = inject(Session);
  private readonly preferences = inject(Preferences);
  private readonly format = inject(QuantityFormat);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  protected readonly form = planForm(inject(NonNullableFormBuilder));
  protected readonly inputs = this.form.controls.inputs.controls;
  private readonly pulse = formPulse(signal(this.form));
  protected readonly mayEdit = computed(() => this.session.may('plans.edit'));
  protected readonly busy = signal(false);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  /** As it stood when the form was filled: what a save is measured against. */
  protected readonly base = signal<TestPlan | undefined>(undefined);

  private readonly saved = rxResource({
    params: () => ({ programmeId: this.programmeId(), testPlanId: this.testPlanId() }),
    stream: ({ params: { programmeId, testPlanId } }) =>
      testPlanId === undefined ? of(undefined) : this.api.read(programmeId, testPlanId),
  });
  private readonly around = planSurroundings(this.programmeId);
  protected readonly variants = this.around.variants;
  protected readonly tunnels = this.around.tunnels;
  protected readonly ready = computed(() => this.around.ground() !== undefined && !this.saved.isLoading());
  protected readonly loadingProblem = computed(() => {
    const error = this.saved.error();
    return error ? asApiProblem(error.cause ?? error) : this.around.problem();
  });

  private readonly value = computed(() => (this.pulse(), this.form.getRawValue()));
  private readonly tunnel = computed(() => {
    const facility = this.around.facilitiesById().get(this.value().facilityId);
    return isTunnel(facility) ? facility : undefined;
  });
  protected readonly tunnelWords = computed(() => {
    const tunnel = this.tunnel();
    return (
      tunnel &&
      `${FACILITY_KIND_WORDS[tunnel.kind]}, ${this.format.text(tunnel.areaM2, 'area', { digits: 2 })}`
    );
  });
  private readonly faults = computed(() => planFaults(this.value().inputs, this.tunnel(), this.format));
  protected readonly state = computed((): PlanState => {
    const [tunnel, ground] = [this.tunnel(), this.around.ground()];
    if (!tunnel || !ground || Object.keys(this.faults()).length > 0) return { kind: 'waiting' };
    this.value();
    return planned(planFieldsOf(this.form).inputs, { ...ground, tunnel });
  });
  protected readonly targetBasis = computed(() => this.value().inputs.targetBasis);
  protected readonly referenceWords = computed(() => {
    const state = this.state();
    return state.kind === 'planned' ? reynoldsWords(state.output.targetReynolds, this.format) : undefined;
  });
  protected readonly sweeps = computed(() =>
    this.around.evidence().sweeps.filter(({ variantId }) => variantId === this.value().variantId),
  );
  protected readonly sweepOptions = computed(() =>
    this.sweeps().map(({ resultId, name, lowestReynolds }) => ({
      resultId,
      words: $localize`${name}:NAME:: from ${reynoldsWords(lowestReynolds, this.format)}:REYNOLDS: on`,
    })),
  );
  /** C_D on the frontal area, as the variant's evidence says it. */
  protected readonly suggestedCoefficient = computed(() => {
    const { variantId, inputs } = this.value();
    const dragArea = this.around.evidence().dragAreas.get(variantId);
    if (dragArea === undefined || inputs.frontalAreaM2 === null || !(inputs.frontalAreaM2 > 0))
      return undefined;
    const coefficient = Number((dragArea / (inputs.coefficientAreaM2 ?? inputs.frontalAreaM2)).toFixed(4));
    return coefficient === inputs.dragCoefficient ? undefined : coefficient;
  });
  protected readonly suggestedWords = computed(() => {
    const coefficient = this.suggestedCoefficient();
    return coefficient === undefined ? undefined : this.format.value(coefficient, 'coefficient');
  });

  /** One key for one wish: sending the same form again after a lost answer does it once. */
  private commandKey = newCommandKey();

  constructor() {
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const plan = this.saved.hasValue() ? this.saved.value() : undefined;
      untracked(() => plan && !this.form.dirty && this.show(plan));
    });
    effect(() => {
      const coefficient = this.suggestedCoefficient();
      const control = this.inputs.dragCoefficient;
      if (coefficient !== undefined && control.value === null && !control.touched)
        control.setValue(coefficient);
    });
    effect(() => {
      if (!this.mayEdit()) this.form.disable();
    });
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty;
  }

  protected error(control: AbstractControl): string | undefined {
    this.pulse();
    return controlError(control);
  }

  /** What is wrong with a figure, once the person has left the field. */
  protected fault(field: PlanField): string | undefined {
    this.pulse();
    const control = this.inputs[field];
    const server = control.errors?.['server'] as string | undefined;
    return server ?? (control.touched ? this.faults()[field] : undefined);
  }

  protected takeVariant(): void {
    const variant = this.variants().find(({ id }) => id === this.form.controls.variantId.value);
    const area = variant?.frontalAreas[0]?.areaM2;
    if (area === undefined) return;
    this.form.patchValue({ inputs: { frontalAreaM2: area, dragCoefficient: null } });
    const coefficient = this.suggestedCoefficient();
    if (coefficient !== undefined) this.inputs.dragCoefficient.setValue(coefficient);
    if (this.targetBasis() === 'sweep') this.takeSweep('');
  }

  protected takeFacility(): void {
    const { condition } = this.inputs;
    const tunnel = this.tunnel();
    if (tunnel && !condition.dirty) setCondition(condition, tunnel.usualCondition);
  }

  protected takeCoefficient(): void {
    const coefficient = this.suggestedCoefficient();
    if (coefficient === undefined) return;
    this.inputs.dragCoefficient.setValue(coefficient);
    this.form.markAsDirty();
  }

  protected takeSweep(resultId: string): void {
    const sweep = this.sweeps().find((each) => each.resultId === resultId);
    this.form.patchValue({
      inputs: {
        targetResultId: resultId,
        targetMillions: sweep ? inMillions(Math.ceil(sweep.lowestReynolds)) : null,
      },
    });
    this.form.markAsDirty();
  }

  protected move({ scale, speedKmh }: Partial<MapPoint>): void {
    if (scale !== undefined) this.inputs.scale.setValue(scale);
    if (speedKmh !== undefined) this.inputs.speedKmh.setValue(speedKmh);
    this.inputs.speedKmh.markAsTouched();
    this.form.markAsDirty();
  }

  /** Puts one way out into the form; what stood there comes back on demand. The focus goes to what it comes to. */
  protected attempt({ target, ...fields }: Trial): void {
    const before = this.form.controls.inputs.getRawValue();
    this.form.patchValue({
      inputs: {
        ...fields,
        // The speed that was settled on belonged to the plan as it was.
        speedKmh: null,
        ...(target && {
          targetBasis: target.basis,
          targetMillions: target.basis === 'reference' ? null : inMillions(target.reynolds),
          targetResultId: target.basis === 'sweep' ? target.resultId : '',
        }),
      },
    });
    this.form.markAsDirty();
    this.undo.offer($localize`This way is tried. Nothing is saved yet.`, () =>
      this.form.patchValue({ inputs: before }),
    );
    afterNextRender(() => this.host.querySelector<HTMLElement>('#plan-answer')?.focus(), {
      injector: this.injector,
    });
  }

  protected async save(): Promise<void> {
    revealErrors(this.form);
    if (this.form.invalid || Object.keys(this.faults()).length > 0) {
      afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
      return;
    }
    await this.send(planFieldsOf(this.form), this.base());
  }

  /** After another deed than saving: what is typed stays, and is measured against what stands now. */
  protected onDeed(plan: TestPlan): void {
    if (this.form.dirty) this.base.set(plan);
    else this.show(plan);
  }

  private show(plan: TestPlan): void {
    setPlan(this.form, plan);
    this.base.set(plan);
  }

  private async send(fields: TestPlanFields, against: TestPlan | undefined): Promise<void> {
    if (this.busy()) return;
    this.busy.set(true);
    this.problem.set(undefined);
    try {
      const plan = await firstValueFrom(
        against
          ? this.api.update(against, fields, this.commandKey)
          : this.api.create(this.programmeId(), fields, this.commandKey),
      );
      this.commandKey = newCommandKey();
      this.show(plan);
      this.undo.say($localize`${plan.name}:NAME: is saved.`);
      await this.router.navigate(['/programmes', this.programmeId(), 'test-plans', plan.id]);
    } catch (error) {
      await this.onRefused(asApiProblem(error), against);
    } finally {
      this.busy.set(false);
    }
  }

  private async onRefused(problem: ApiProblem, against: TestPlan | undefined): Promise<void> {
    // A lost answer keeps its key: the same command may have been carried out.
    if (problem.code !== 'no-connection') this.commandKey = newCommandKey();
    if (problem.code === 'conflict' && against) return this.onConflict(against);
    this.problem.set(problem);
    showIssues(this.form, problem.issues);
    afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
  }

  private async onConflict(before: TestPlan): Promise<void> {
    const theirs = await firstValueFrom(this.api.read(before.programmeId, before.id));
    const mine = planFieldsOf(this.form);
    const names = {
      variant: (id: string) => this.variants().find((each) => each.id === id)?.name ?? id,
      facility: (id: string) => this.around.facilitiesById().get(id)?.name ?? id,
    };
    const rows = conflictRows(planComparison(this.format, this.preferences.numberLocale(), names), {
      before,
      mine,
      theirs,
    });
    const answer = await runInInjectionContext(this.injector, () => resolveConflict(theirs.name, rows));
    if (answer === 'take-theirs') this.show(theirs);
    if (answer === 'save-mine') {
      this.busy.set(false);
      await this.send(mine, theirs);
    }
  }
}
