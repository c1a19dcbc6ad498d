import { DIALOG_DATA, Dialog, DialogRef } from '@angular/cdk/dialog';
import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  afterNextRender,
  inject,
  runInInjectionContext,
  signal,
} from '@angular/core';
import { type AbstractControl, NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { firstValueFrom } from 'rxjs';
import type { TestSession, TestSessionFields } from '#shared/contracts/test-sessions';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { newCommandKey } from '../../core/api/command-key';
import { resolveConflict } from '../../core/editing/conflict-dialog';
import { type ComparedField, conflictRows } from '../../core/editing/conflict-rows';
import { formPulse } from '../../core/editing/form-pulse';
import { focusFirstFault, revealErrors } from '../../core/editing/reveal-errors';
import { TestSessionsApi } from '../../data/facilities/test-sessions-api';
import { controlError, showIssues } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { sessionFieldsOf, sessionForm, setSession } from './session-form';

interface SessionDialogData {
  readonly facilityId: string;
  /** Absent: a new one. */
  readonly session?: TestSession;
}

const COMPARED: readonly ComparedField<TestSessionFields>[] = [
  { label: $localize`Name`, read: ({ name }) => name },
  { label: $localize`First day`, read: ({ startDate }) => startDate ?? '' },
  { label: $localize`Last day`, read: ({ endDate }) => endDate ?? '' },
  { label: $localize`Remark`, read: ({ remark }) => remark ?? '' },
];

/** Adds a session or changes one. Stays open with what was typed until it is saved or given up. */
@Component({
  selector: 'wl-session-dialog',
  imports: [Field, ProblemBanner, ReactiveFormsModule, WlInput],
  templateUrl: './session-dialog.html',
  styleUrl: './session-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SessionDialog {
  protected readonly data = inject<SessionDialogData>(DIALOG_DATA);
  private readonly dialog = inject<DialogRef<TestSession, SessionDialog>>(DialogRef);
  private readonly api = inject(TestSessionsApi);
  private readonly injector = inject(Injector);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  protected readonly form = sessionForm(inject(NonNullableFormBuilder));
  private readonly pulse = formPulse(signal(this.form));
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly busy = signal(false);
  /** As it stood when the form was filled. */
  private base = this.data.session;
  private commandKey = newCommandKey();

  constructor() {
    if (this.base) setSession(this.form, this.base);
    this.form.controls.startDate.valueChanges.subscribe(() =>
      this.form.controls.endDate.updateValueAndValidity(),
    );
  }

  protected error(control: AbstractControl): string | undefined {
    this.pulse();
    return controlError(control);
  }

  protected close(): void {
    this.dialog.close();
  }

  protected async save(): Promise<void> {
    revealErrors(this.form);
    if (this.form.invalid) return this.toFault();
    await this.send(sessionFieldsOf(this.form));
  }

  private async send(fields: TestSessionFields): Promise<void> {
    if (this.busy()) return;
    this.busy.set(true);
    this.problem.set(undefined);
    try {
      const { base } = this;
      const saved = base
        ? this.api.update(base, fields, this.commandKey)
        : this.api.create(this.data.facilityId, fields, this.commandKey);
      this.dialog.close(await firstValueFrom(saved));
    } catch (error) {
      await this.onRefused(asApiProblem(error), fields);
    } finally {
      this.busy.set(false);
    }
  }

  private async onRefused(problem: ApiProblem, mine: TestSessionFields): Promise<void> {
    // A lost answer keeps its key: the same command may have been carried out.
    if (problem.code !== 'no-connection') this.commandKey = newCommandKey();
    if (problem.code === 'conflict' && this.base) return this.onConflict(this.base, mine);
    this.problem.set(problem);
    showIssues(
      this.form,
      problem.code === 'already-exists' ? [{ where: 'name', detail: problem.message }] : problem.issues,
    );
    this.toFault();
  }

  private async onConflict(before: TestSession, mine: TestSessionFields): Promise<void> {
    const theirs = await firstValueFrom(this.api.read(before));
    const rows = conflictRows(COMPARED, { before, mine, theirs });
    const answer = await runInInjectionContext(this.injector, () => resolveConflict(theirs.name, rows));
    if (answer === undefined) return;
    this.base = theirs;
    if (answer === 'take-theirs') return setSession(this.form, theirs);
    this.busy.set(false);
    await this.send(mine);
  }

  private toFault(): void {
    afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
  }
}

/** Opens the dialog and waits for the saved session; undefined where it was given up. Needs an injection context. */
export async function editSession(data: SessionDialogData): Promise<TestSession | undefined> {
  const dialog = inject(Dialog).open<TestSession, SessionDialogData, SessionDialog>(SessionDialog, {
    data,
    ariaLabelledBy: 'wl-session-title',
    autoFocus: 'input',
  });
  return firstValueFrom(dialog.closed, { defaultValue: undefined });
}
