import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, DOCUMENT, computed, inject, input } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { asApiProblem } from '../../core/api/api-problem';
import { Preferences } from '../../core/preferences/preferences';
import { TestPlansApi } from '../../data/test-plans/test-plans-api';
import { Busy } from '../../ui/busy/busy';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { PlanCautions } from './plan-cautions';
import { PlanFigures } from './plan-figures';
import { sheetLines } from './plan-sheet-lines';
import { planSurroundings } from './plan-surroundings';
import { answerOf, STATE_WORDS, stateOf } from './plan-words';
import { isTunnel, planned } from './planned';

/** A planned test as a page to hand over: what, where, in which condition, with which numbers, limits and cautions. */
@Component({
  selector: 'wl-plan-sheet-page',
  imports: [Busy, DatePipe, PlanCautions, PlanFigures, ProblemBanner, RouterLink],
  templateUrl: './plan-sheet-page.html',
  styleUrl: './plan-sheet-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanSheetPage {
  readonly programmeId = input.required<string>();
  readonly testPlanId = input.required<string>();

  private readonly api = inject(TestPlansApi);
  private readonly document = inject(DOCUMENT);
  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);
  private readonly around = planSurroundings(this.programmeId);
  private readonly saved = rxResource({
    params: () => ({ programmeId: this.programmeId(), testPlanId: this.testPlanId() }),
    stream: ({ params }) => this.api.read(params.programmeId, params.testPlanId),
  });
  protected readonly problem = computed(() => {
    const error = this.saved.error();
    return error ? asApiProblem(error.cause ?? error) : this.around.problem();
  });
  protected readonly today = new Date();

  protected readonly sheet = computed(() => {
    const ground = this.around.ground();
    if (!ground || !this.saved.hasValue()) return undefined;
    const plan = this.saved.value();
    const facility = this.around.facilitiesById().get(plan.facilityId);
    const variant = this.around.variantsById().get(plan.variantId);
    if (!facility || !variant) return undefined;
    const state = isTunnel(facility) ? planned(plan.inputs, { ...ground, tunnel: facility }) : undefined;
    const figures = state?.kind === 'planned' ? state : undefined;
    return {
      plan,
      programme: ground.programme.name,
      state: STATE_WORDS[stateOf(plan)],
      lines: sheetLines({ plan, facility, variant, ...ground }, this.format, this.preferences.numberLocale()),
      figures,
      answer: figures && answerOf(figures, this.format),
    };
  });

  protected print(): void {
    this.document.defaultView?.print();
  }
}
