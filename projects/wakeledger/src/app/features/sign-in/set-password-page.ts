import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  inject,
  signal,
  viewChild,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { Session } from '../../core/session/session';
import { controlError } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';

/** As the contract demands it of a password and of a token. */
const MINIMUM_PASSWORD = 12;
const MAXIMUM_PASSWORD = 1024;
const MINIMUM_TOKEN = 20;

/**
 * Where a one-time link leads: choose a password, and be signed in with it. The token stands behind the # sign, which
 * browsers do not send, so that it is in no server's log.
 */
@Component({
  selector: 'wl-set-password-page',
  imports: [Field, ProblemBanner, ReactiveFormsModule, RouterLink, WlInput],
  templateUrl: './set-password-page.html',
  styleUrl: './set-password-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SetPasswordPage {
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  private readonly fragment = toSignal(inject(ActivatedRoute).fragment);
  private readonly outcome = signal<'stale' | 'set' | undefined>(undefined);
  private readonly input = viewChild<ElementRef<HTMLInputElement>>('password');

  protected readonly minimum = MINIMUM_PASSWORD;
  protected readonly form = inject(NonNullableFormBuilder).group({
    password: [
      '',
      [Validators.required, Validators.minLength(MINIMUM_PASSWORD), Validators.maxLength(MAXIMUM_PASSWORD)],
    ],
  });
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly busy = signal(false);
  protected readonly shown = signal(false);
  protected readonly error = controlError;
  protected readonly step = computed(
    () => this.outcome() ?? ((this.fragment() ?? '').length < MINIMUM_TOKEN ? 'incomplete' : 'choosing'),
  );

  protected toggleShown(): void {
    this.shown.update((shown) => !shown);
  }

  protected async setPassword(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid) {
      this.input()?.nativeElement.focus();
      return;
    }
    if (this.busy()) return;
    this.busy.set(true);
    this.problem.set(undefined);
    try {
      const { password } = this.form.getRawValue();
      const account = await this.session.setPassword(this.fragment() ?? '', password);
      this.outcome.set('set');
      await this.session.signIn({ ...account, password });
      // The address with the used token does not stay in the history.
      await this.router.navigateByUrl('/programmes', { replaceUrl: true });
    } catch (error) {
      this.explain(asApiProblem(error));
    } finally {
      this.busy.set(false);
    }
  }

  private explain(found: ApiProblem): void {
    if (found.code === 'sign-in-refused' && this.outcome() === undefined) this.outcome.set('stale');
    else this.problem.set(found);
  }
}
