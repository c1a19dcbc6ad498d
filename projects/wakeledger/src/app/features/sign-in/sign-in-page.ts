import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { Router } from '@angular/router';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { roleWords } from '../../core/session/role-words';
import { type DemoPerson, Session } from '../../core/session/session';
import { controlError } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';

/** Sign in: by organisation and password, or in the demo by continuing as one of its people. */
@Component({
  selector: 'wl-sign-in-page',
  imports: [Field, ProblemBanner, ReactiveFormsModule, WlInput],
  templateUrl: './sign-in-page.html',
  styleUrl: './sign-in-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  /** The address asked for before sign-in. */
  readonly return = input<string>();

  private readonly session = inject(Session);
  private readonly router = inject(Router);

  protected readonly form = inject(NonNullableFormBuilder).group({
    organisationSlug: ['', [Validators.required, Validators.maxLength(60)]],
    email: ['', [Validators.required, Validators.minLength(3), Validators.maxLength(254)]],
    password: ['', [Validators.required, Validators.maxLength(1024)]],
  });
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly busy = signal(false);
  protected readonly error = controlError;
  protected readonly roleWords = roleWords;

  protected readonly demoPeople = computed(() => {
    const byOrganisation = new Map<string, DemoPerson[]>();
    for (const person of this.session.demoPeople()) {
      const group = byOrganisation.get(person.organisationName);
      if (group) group.push(person);
      else byOrganisation.set(person.organisationName, [person]);
    }
    return [...byOrganisation].map(([organisation, people]) => ({ organisation, people }));
  });

  constructor() {
    this.session.load().catch((error: unknown) => this.problem.set(asApiProblem(error)));
  }

  protected async signIn(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid) return;
    await this.attempt(() => this.session.signIn(this.form.getRawValue()));
  }

  protected async continueAs(person: DemoPerson): Promise<void> {
    await this.attempt(() => this.session.continueAs(person.userId));
  }

  private async attempt(deed: () => Promise<void>): Promise<void> {
    if (this.busy()) return;
    this.busy.set(true);
    this.problem.set(undefined);
    try {
      await deed();
      await this.router.navigateByUrl(this.destination());
    } catch (error) {
      this.problem.set(asApiProblem(error));
    } finally {
      this.busy.set(false);
    }
  }

  /** Where the person wanted to go, else their latest programme, else all of them. Only addresses within the product. */
  private destination(): string {
    const wanted = this.return();
    if (wanted?.startsWith('/') && !wanted.startsWith('//') && !wanted.startsWith('/sign-in')) return wanted;
    const latest = this.session.member()?.latestProgrammeId;
    return latest ? `/programmes/${latest}/ranking` : '/programmes';
  }
}
