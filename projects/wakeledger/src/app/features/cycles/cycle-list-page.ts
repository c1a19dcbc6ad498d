import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  computed,
  inject,
  input,
  runInInjectionContext,
} from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { of } from 'rxjs';
import type { CycleSummary } from '#shared/contracts/cycles';
import { asApiProblem } from '../../core/api/api-problem';
import { Undo } from '../../core/editing/undo';
import { Session } from '../../core/session/session';
import { CyclesApi } from '../../data/cycles/cycles-api';
import { CyclesPageActions } from '../../data/cycles/cycles.actions';
import { cyclesFeature } from '../../data/cycles/cycles.feature';
import { Busy } from '../../ui/busy/busy';
import { confirmInDialog } from '../../ui/confirm-dialog/confirm-dialog';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { Quantity } from '../../ui/quantity/quantity';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { CycleFigures } from './cycle-figures';

/** Which speed traces is energy computed on? The list with its totals; the chosen one (`?cycle=`) with its trace. */
@Component({
  selector: 'wl-cycle-list-page',
  imports: [Busy, CycleFigures, ProblemBanner, Quantity, RouterLink],
  templateUrl: './cycle-list-page.html',
  styleUrl: './cycle-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CycleListPage {
  /** Key of the chosen cycle, from the address. */
  readonly cycle = input<string>();

  private readonly store = inject(Store);
  private readonly api = inject(CyclesApi);
  private readonly session = inject(Session);
  private readonly injector = inject(Injector);
  private readonly undo = inject(Undo);
  private readonly format = inject(QuantityFormat);

  protected readonly page = this.store.selectSignal(cyclesFeature.selectListPage);
  protected readonly mayEdit = computed(() => this.session.may('cycles.edit'));
  protected readonly speedUnit = computed(() => this.format.display('speed').unit);
  protected readonly problem = computed(() => {
    const { loading, refusal } = this.page();
    return loading.kind === 'failed' ? loading.problem : refusal;
  });
  protected readonly groups = computed(() => {
    const { builtIn, own, retired } = this.page();
    return [
      { title: $localize`Your organisation’s own`, cycles: own },
      { title: $localize`Built in`, cycles: builtIn },
      { title: $localize`Retired`, cycles: retired },
    ].filter(({ cycles }) => cycles.length > 0);
  });

  protected readonly chosen = rxResource({
    params: () => this.cycle(),
    stream: ({ params }) => (params ? this.api.read(params) : of(undefined)),
  });
  protected readonly trace = computed(() => (this.chosen.hasValue() ? this.chosen.value() : undefined));
  protected readonly traceProblem = computed(() => {
    const error = this.chosen.error();
    return error && asApiProblem(error.cause ?? error);
  });

  constructor() {
    this.store.dispatch(CyclesPageActions.opened());
  }

  protected retry(): void {
    this.store.dispatch(CyclesPageActions.askedAgain());
  }

  protected async retire(cycle: CycleSummary): Promise<void> {
    const yes = await runInInjectionContext(this.injector, () =>
      confirmInDialog({
        title: $localize`Retire ${cycle.name}:NAME:?`,
        detail: $localize`It can no longer be chosen. What was computed on it is kept, and it can be brought back.`,
        confirm: $localize`Retire`,
        cancel: $localize`Cancel`,
        severe: true,
      }),
    );
    if (!yes) return;
    this.dispatchRetirement(cycle, true);
    this.undo.offer($localize`${cycle.name}:NAME: is retired.`, () => this.dispatchRetirement(cycle, false));
  }

  protected bringBack(cycle: CycleSummary): void {
    this.dispatchRetirement(cycle, false);
  }

  private dispatchRetirement({ key: cycleKey }: CycleSummary, retired: boolean): void {
    this.store.dispatch(CyclesPageActions.retirementConfirmed({ cycleKey, retired }));
  }
}
