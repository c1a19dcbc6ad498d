import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import type { TestPlan } from '#shared/contracts/test-plans';
import { asApiProblem } from '../../core/api/api-problem';
import { Preferences } from '../../core/preferences/preferences';
import { Session } from '../../core/session/session';
import { TestPlansApi } from '../../data/test-plans/test-plans-api';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { planDifferences, resultsOfPlan } from './plan-differences';

/** What came in since results are expected, and in what it departs from the plan. */
@Component({
  selector: 'wl-plan-results',
  imports: [DatePipe, ProblemBanner, RouterLink],
  template: `
    <h2 i18n>Did it go as planned?</h2>
    <p i18n>
      Results of this variant in this facility that were entered since
      {{ plan().expectedSince | date: 'd MMMM y' }}.
    </p>
    <wl-problem-banner [problem]="problem()" />
    @if (!maySee()) {
      <p i18n>Your role does not include the results themselves.</p>
    } @else {
      <ul>
        @for (row of rows(); track row.id) {
          <li>
            <a [routerLink]="['/programmes', plan().programmeId, 'results', row.id]">{{ row.name }}</a>
            @if (row.differences.length) {
              <span class="wl-ochre"
                ><span aria-hidden="true">▲ </span
                ><ng-container i18n>differs from the plan:</ng-container></span
              >
              {{ row.differences.join('; ') }}
            } @else {
              <span class="wl-moss"
                ><span aria-hidden="true">● </span><ng-container i18n>as planned</ng-container></span
              >
            }
          </li>
        } @empty {
          @if (loaded()) {
            <li i18n>None yet.</li>
          }
        }
      </ul>
    }
  `,
  styles: `
    p {
      margin: 4px 0;
    }
    ul {
      display: grid;
      gap: 4px;
      margin: 4px 0 0;
      padding: 0;
      list-style: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanResults {
  readonly plan = input.required<TestPlan>();

  private readonly api = inject(TestPlansApi);
  private readonly session = inject(Session);
  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);
  protected readonly maySee = computed(() => this.session.may('results.read'));
  private readonly results = rxResource({
    params: () => (this.maySee() ? this.plan().programmeId : undefined),
    stream: ({ params }) => this.api.results(params),
  });
  protected readonly loaded = computed(() => this.results.hasValue());
  protected readonly problem = computed(() => {
    const error = this.results.error();
    return error && asApiProblem(error.cause ?? error);
  });
  protected readonly rows = computed(() => {
    if (!this.results.hasValue()) return [];
    const plan = this.plan();
    const locale = this.preferences.numberLocale();
    return resultsOfPlan(plan, this.results.value()).map((result) => ({
      id: result.id,
      name: result.name,
      differences: planDifferences(plan, result, this.format, locale),
    }));
  });
}
