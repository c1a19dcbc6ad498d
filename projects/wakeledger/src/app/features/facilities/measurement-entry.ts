import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  afterNextRender,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
} from '@angular/core';
import { type AbstractControl, NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { firstValueFrom } from 'rxjs';
import type { CheckMeasurement, TestSession } from '#shared/contracts/test-sessions';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { newCommandKey } from '../../core/api/command-key';
import { formPulse } from '../../core/editing/form-pulse';
import { focusFirstFault, revealErrors } from '../../core/editing/reveal-errors';
import { TestSessionsApi } from '../../data/facilities/test-sessions-api';
import { controlError, showIssues } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { NumberField } from '../../ui/field/number-field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { clearForNext, measurementFieldsOf, measurementForm } from './measurement-form';

/** Types in what the check body measured, one line after the other. */
@Component({
  selector: 'wl-measurement-entry',
  imports: [Field, NumberField, ProblemBanner, ReactiveFormsModule, WlInput],
  templateUrl: './measurement-entry.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MeasurementEntry {
  readonly facilityId = input.required<string>();
  /** Newest first; the first is offered. */
  readonly sessions = input.required<readonly TestSession[]>();
  readonly entered = output<CheckMeasurement>();

  private readonly api = inject(TestSessionsApi);
  private readonly injector = inject(Injector);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  protected readonly today = new Date().toISOString().slice(0, 10);
  protected readonly form = measurementForm(inject(NonNullableFormBuilder));
  private readonly pulse = formPulse(signal(this.form));
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly busy = signal(false);
  private commandKey = newCommandKey();

  constructor() {
    effect(() => {
      const sessions = this.sessions();
      untracked(() => this.offer(sessions));
    });
    this.form.controls.testSessionId.valueChanges.subscribe((id) => this.offerDay(id));
  }

  protected error(control: AbstractControl): string | undefined {
    this.pulse();
    return controlError(control);
  }

  protected server(control: AbstractControl): string | undefined {
    this.pulse();
    return control.errors?.['server'] as string | undefined;
  }

  protected async enter(): Promise<void> {
    revealErrors(this.form);
    const fields = measurementFieldsOf(this.form);
    if (this.form.invalid || fields === undefined) return this.toFault();
    if (this.busy()) return;
    this.busy.set(true);
    this.problem.set(undefined);
    try {
      const measurement = await firstValueFrom(this.api.enter(this.facilityId(), fields, this.commandKey));
      this.commandKey = newCommandKey();
      clearForNext(this.form);
      this.entered.emit(measurement);
    } catch (error) {
      this.refuse(asApiProblem(error));
    } finally {
      this.busy.set(false);
    }
  }

  /** The newest session stands there until another is chosen. */
  private offer(sessions: readonly TestSession[]): void {
    const { testSessionId } = this.form.controls;
    const [newest] = sessions;
    if (newest && !sessions.some(({ id }) => id === testSessionId.value)) testSessionId.setValue(newest.id);
  }

  /** The session's first day, while no day was typed. */
  private offerDay(sessionId: string): void {
    const { measuredOn } = this.form.controls;
    if (measuredOn.dirty) return;
    const { startDate } = this.sessions().find(({ id }) => id === sessionId) ?? {};
    measuredOn.setValue(startDate !== undefined && startDate <= this.today ? startDate : '');
  }

  private refuse(problem: ApiProblem): void {
    // A lost answer keeps its key: the same command may have been carried out.
    if (problem.code !== 'no-connection') this.commandKey = newCommandKey();
    this.problem.set(problem);
    showIssues(this.form, problem.issues);
    this.toFault();
  }

  private toFault(): void {
    afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
  }
}
