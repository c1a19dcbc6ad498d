import { ChangeDetectionStrategy, Component, inject, input, output, signal } from '@angular/core';
import {
  type AbstractControl,
  NonNullableFormBuilder,
  ReactiveFormsModule,
  Validators,
} from '@angular/forms';
import type { Observable } from 'rxjs';
import type { Correlation } from '#shared/contracts/correlations';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { newCommandKey } from '../../core/api/command-key';
import { formPulse } from '../../core/editing/form-pulse';
import { revealErrors } from '../../core/editing/reveal-errors';
import { CorrelationsApi } from '../../data/correlations/correlations-api';
import { controlError, showIssues } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';

/** From when on a version is used, or that its use ends, with a comment. */
@Component({
  selector: 'wl-use-form',
  imports: [Field, ProblemBanner, ReactiveFormsModule, WlInput],
  template: `
    <form class="wl-form" [formGroup]="form" (ngSubmit)="adopt()" novalidate>
      <fieldset class="wl-group">
        <legend i18n>Its use</legend>
        <wl-field
          label="From this date on"
          i18n-label
          hint="Every ranking uses it from then on; adopted figures keep what they were made with"
          i18n-hint
          [error]="error(form.controls.effectiveDate)"
        >
          <input wlInput type="date" formControlName="effectiveDate" />
        </wl-field>
        <wl-field label="Comment on its use" i18n-label [error]="error(form.controls.comment)">
          <textarea wlInput rows="2" formControlName="comment"></textarea>
        </wl-field>
        <wl-problem-banner class="wl-wide" [problem]="problem()" />
        <div class="wl-wide wl-actions">
          <button type="submit" class="wl-button wl-main" [disabled]="busy()" i18n>
            Adopt version {{ versionNumber() }}
          </button>
          @if (endable()) {
            <button type="button" class="wl-button wl-severe" [disabled]="busy()" (click)="end()" i18n>
              End its use
            </button>
          }
        </div>
      </fieldset>
    </form>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UseForm {
  readonly correlation = input.required<Correlation>();
  readonly versionNumber = input.required<number>();
  readonly endable = input.required<boolean>();
  readonly done = output<Correlation>();

  private readonly api = inject(CorrelationsApi);
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly form = this.builder.group({
    effectiveDate: [new Date().toISOString().slice(0, 10), [Validators.required]],
    comment: ['', [Validators.required, Validators.minLength(3), Validators.maxLength(1000)]],
  });
  private readonly pulse = formPulse(signal(this.form));
  protected readonly busy = signal(false);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  /** One key for one wish: sending the same again after a lost answer does it once. */
  private commandKey = newCommandKey();

  protected error(control: AbstractControl): string | undefined {
    this.pulse();
    return controlError(control);
  }

  protected adopt(): void {
    const order = { ...this.form.getRawValue(), versionNumber: this.versionNumber() };
    this.send(() => this.api.adopt(this.correlation().id, order, this.commandKey));
  }

  protected end(): void {
    this.send(() => this.api.end(this.correlation().id, this.form.getRawValue(), this.commandKey));
  }

  private send(call: () => Observable<Correlation>): void {
    revealErrors(this.form);
    if (this.form.invalid) return;
    this.problem.set(undefined);
    this.busy.set(true);
    call().subscribe({
      next: (correlation) => {
        this.busy.set(false);
        this.commandKey = newCommandKey();
        this.form.controls.comment.reset();
        this.done.emit(correlation);
      },
      error: (thrown: unknown) => {
        this.busy.set(false);
        const problem = asApiProblem(thrown);
        // A lost answer keeps its key: the same command may have been carried out.
        if (problem.code !== 'no-connection') this.commandKey = newCommandKey();
        this.problem.set(problem);
        showIssues(this.form, problem.issues);
      },
    });
  }
}
