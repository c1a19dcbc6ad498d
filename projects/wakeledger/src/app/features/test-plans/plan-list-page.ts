import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import type { TestPlan } from '#shared/contracts/test-plans';
import { asApiProblem } from '../../core/api/api-problem';
import { Session } from '../../core/session/session';
import { TestPlansApi } from '../../data/test-plans/test-plans-api';
import { Busy } from '../../ui/busy/busy';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { MACH_LOOKS, machWords, reynoldsWords, speedWords, STATE_WORDS, stateOf } from './plan-words';
import { flowAt, isTunnel, planned } from './planned';
import { planSurroundings } from './plan-surroundings';

/** Which tests are planned, and did they go as planned? */
@Component({
  selector: 'wl-plan-list-page',
  imports: [Busy, EmptyState, ProblemBanner, RouterLink],
  templateUrl: './plan-list-page.html',
  styles: `
    .retired {
      margin-top: 20px;
    }
    .state {
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanListPage {
  readonly programmeId = input.required<string>();

  private readonly api = inject(TestPlansApi);
  private readonly session = inject(Session);
  private readonly format = inject(QuantityFormat);
  private readonly around = planSurroundings(this.programmeId);
  protected readonly mayEdit = computed(() => this.session.may('plans.edit'));
  protected readonly plans = rxResource({
    params: () => this.programmeId(),
    stream: ({ params }) => this.api.list(params),
  });
  protected readonly problem = computed(() => {
    const error = this.plans.error();
    return error ? asApiProblem(error.cause ?? error) : this.around.problem();
  });
  private readonly all = computed(() => (this.plans.hasValue() ? this.plans.value() : []));
  protected readonly rows = computed(() =>
    this.rowsOf(this.all().filter(({ retiredAt }) => retiredAt === undefined)),
  );
  protected readonly retired = computed(() =>
    this.rowsOf(this.all().filter(({ retiredAt }) => retiredAt !== undefined)),
  );

  protected retry(): void {
    this.plans.reload();
  }

  private rowsOf(plans: readonly TestPlan[]) {
    return plans.map((plan) => ({
      plan,
      link: ['/programmes', plan.programmeId, 'test-plans', plan.id],
      variant: this.around.variantsById().get(plan.variantId)?.name ?? '–',
      facility: this.around.facilitiesById().get(plan.facilityId)?.name ?? '–',
      scale: this.format.value(plan.inputs.scale, 'number', { digits: 3 }),
      state: STATE_WORDS[stateOf(plan)],
      expected: stateOf(plan) === 'expected',
      ...this.figures(plan),
    }));
  }

  /** At the speed that is settled on, else at the needed one. */
  private figures(plan: TestPlan): {
    readonly speed: string;
    readonly mach: string;
    readonly reynolds: string;
    /** The word where that speed is beyond the Mach limit. */
    readonly refused: string | undefined;
  } {
    const ground = this.around.ground();
    const tunnel = this.around.facilitiesById().get(plan.facilityId);
    const state = ground && isTunnel(tunnel) ? planned(plan.inputs, { ...ground, tunnel }) : undefined;
    if (state?.kind !== 'planned') return { speed: '–', mach: '–', reynolds: '–', refused: undefined };
    const speedKmh = plan.inputs.speedKmh ?? state.needed.speedKmh;
    const flow = flowAt(state.setting, speedKmh, plan.inputs.maximumForceN);
    return {
      speed: speedWords(flow.speedKmh, this.format),
      mach: machWords(flow.mach, this.format),
      reynolds: reynoldsWords(flow.reynolds, this.format),
      refused: flow.machVerdict === 'refused' ? MACH_LOOKS.refused.word : undefined,
    };
  }
}
