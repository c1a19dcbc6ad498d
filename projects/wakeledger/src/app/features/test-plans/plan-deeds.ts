import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  computed,
  inject,
  input,
  output,
  runInInjectionContext,
  signal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { type Observable, firstValueFrom } from 'rxjs';
import type { TestPlan } from '#shared/contracts/test-plans';
import { asApiProblem } from '../../core/api/api-problem';
import { Undo } from '../../core/editing/undo';
import { problemWords } from '../../core/errors/problem-words';
import { TestPlansApi } from '../../data/test-plans/test-plans-api';
import { confirmInDialog } from '../../ui/confirm-dialog/confirm-dialog';
import { STATE_WORDS, stateOf } from './plan-words';

/** What can be done with a saved plan: print it, expect results from it, retire it. */
@Component({
  selector: 'wl-plan-deeds',
  imports: [RouterLink],
  template: `
    <span class="state">{{ words() }}</span>
    <a
      class="wl-button"
      [routerLink]="['/programmes', plan().programmeId, 'test-plans', plan().id, 'sheet']"
      i18n
      >Sheet to hand over</a
    >
    @if (mayEdit()) {
      @switch (state()) {
        @case ('draft') {
          <button type="button" class="wl-button" [disabled]="busy()" (click)="expect(true)" i18n>
            Expect results from it
          </button>
          <button type="button" class="wl-button wl-severe" [disabled]="busy()" (click)="retire()" i18n>
            Retire
          </button>
        }
        @case ('expected') {
          <a
            class="wl-button"
            [routerLink]="['/programmes', plan().programmeId, 'results', 'new']"
            [queryParams]="{ plan: plan().id }"
            i18n
            >Enter a result from it</a
          >
          <button type="button" class="wl-button" [disabled]="busy()" (click)="expect(false)" i18n>
            Expect no results any more
          </button>
          <button type="button" class="wl-button wl-severe" [disabled]="busy()" (click)="retire()" i18n>
            Retire
          </button>
        }
        @case ('retired') {
          <button type="button" class="wl-button" [disabled]="busy()" (click)="bringBack()" i18n>
            Bring back
          </button>
        }
      }
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 8px 12px;
    }
    .state {
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanDeeds {
  readonly plan = input.required<TestPlan>();
  readonly mayEdit = input(true);
  /** Something is typed that is not saved: a plan is expected as it is saved, not as it is typed. */
  readonly unsaved = input(false);
  readonly done = output<TestPlan>();

  private readonly api = inject(TestPlansApi);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  protected readonly busy = signal(false);
  protected readonly state = computed(() => stateOf(this.plan()));
  protected readonly words = computed(() => STATE_WORDS[this.state()]);

  protected async expect(expected: boolean): Promise<void> {
    if (expected && this.unsaved()) {
      this.undo.say($localize`Save the changes first: results are held against the plan as it is saved.`);
      return;
    }
    const { name } = this.plan();
    await this.attempt(
      this.api.expect(this.plan(), expected),
      expected
        ? $localize`Results of this variant and facility are held against ${name}:NAME: from now on.`
        : $localize`No results are held against ${name}:NAME: any more.`,
    );
  }

  protected async retire(): Promise<void> {
    const { name } = this.plan();
    const yes = await runInInjectionContext(this.injector, () =>
      confirmInDialog({
        title: $localize`Retire ${name}:NAME:?`,
        detail: $localize`No results are expected from it any more. It stays readable and can be brought back.`,
        confirm: $localize`Retire`,
        cancel: $localize`Cancel`,
        severe: true,
      }),
    );
    if (yes) await this.attempt(this.api.retire(this.plan(), true), $localize`${name}:NAME: is retired.`);
  }

  protected async bringBack(): Promise<void> {
    const { name } = this.plan();
    await this.attempt(this.api.retire(this.plan(), false), $localize`${name}:NAME: is back.`);
  }

  private async attempt(deed: Observable<TestPlan>, done: string): Promise<void> {
    this.busy.set(true);
    try {
      this.done.emit(await firstValueFrom(deed));
      this.undo.say(done);
    } catch (error) {
      const { title, detail } = problemWords(asApiProblem(error));
      this.undo.say(detail === undefined ? title : `${title} ${detail}`);
    } finally {
      this.busy.set(false);
    }
  }
}
