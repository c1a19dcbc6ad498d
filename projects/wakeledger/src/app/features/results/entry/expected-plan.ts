import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { catchError, of } from 'rxjs';
import type { TestPlan } from '#shared/contracts/test-plans';
import { formPulse } from '../../../core/editing/form-pulse';
import { Undo } from '../../../core/editing/undo';
import { TestPlansApi } from '../../../data/test-plans/test-plans-api';
import type { ResultForm } from './result-form';
import { takePlan } from './take-plan';

/**
 * The test that was planned for what is being entered: taken over from the address (`?plan=`), or offered once variant and facility
 * are those of a plan from which results are expected.
 */
@Component({
  selector: 'wl-expected-plan',
  imports: [RouterLink],
  template: `
    @if (taken(); as plan) {
      <p class="wl-notice" role="status">
        <ng-container i18n
          ><strong>From a plan</strong> Scale, speed and condition are those of
          <a [routerLink]="['/programmes', programmeId(), 'test-plans', plan.id]">{{ plan.name }}</a>. Type
          what was measured where it differs.</ng-container
        >
      </p>
    } @else {
      @for (plan of offered(); track plan.id) {
        <p class="wl-notice" role="status">
          <ng-container i18n
            ><strong>Expected</strong> For this variant and facility the test {{ plan.name }} is
            planned.</ng-container
          >
          <button type="button" class="wl-link" (click)="take(plan)" i18n>
            Take over its scale, speed and condition
          </button>
        </p>
      }
    }
  `,
  styles: `
    p {
      margin: 0 0 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ExpectedPlan {
  readonly programmeId = input.required<string>();
  readonly form = input.required<ResultForm>();
  /** Id of the plan in the address. */
  readonly plan = input<string>();

  private readonly api = inject(TestPlansApi);
  private readonly undo = inject(Undo);
  private readonly pulse = formPulse(this.form);
  /** A help and no more: where the plans cannot be had, a result is entered as without them. */
  private readonly plans = rxResource({
    params: () => this.programmeId(),
    stream: ({ params }) => this.api.list(params).pipe(catchError(() => of([]))),
  });
  private readonly expected = computed(() =>
    this.plans.hasValue()
      ? this.plans.value().filter(({ expectedSince }) => expectedSince !== undefined)
      : [],
  );
  private readonly takenId = computed(() => (this.pulse(), this.form().controls.planId.value));
  protected readonly taken = computed(() => this.expected().find(({ id }) => id === this.takenId()));
  protected readonly offered = computed(() => {
    this.pulse();
    const { variantId, facilityId } = this.form().getRawValue();
    return this.expected().filter((plan) => plan.variantId === variantId && plan.facilityId === facilityId);
  });

  constructor() {
    effect(() => {
      const plan = this.expected().find(({ id }) => id === this.plan());
      untracked(() => {
        if (plan && !this.form().dirty) takePlan(this.form(), plan);
      });
    });
  }

  protected take(plan: TestPlan): void {
    const before = this.form().getRawValue();
    takePlan(this.form(), plan);
    this.form().markAsDirty();
    this.undo.offer($localize`Taken over from ${plan.name}:NAME:.`, () => this.form().patchValue(before));
  }
}
