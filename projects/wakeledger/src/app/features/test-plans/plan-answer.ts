import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { scaleAtBlockage } from '#shared/core/planning/limits';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import type { MapPoint, SpeedScaleModel } from '../../ui/speed-scale-map/map-region';
import { SpeedScaleMap } from '../../ui/speed-scale-map/speed-scale-map';
import { PlanFigures } from './plan-figures';
import { answerOf } from './plan-words';
import type { Planned, PlanState } from './planned';
import type { SweptResult } from './swept-results';
import { waysOut, type Trial } from './ways-out';
import { WaysOutList } from './ways-out-list';

/** What a plan comes to: the answer in a sentence, the figures, the map, and what can be done instead. */
@Component({
  selector: 'wl-plan-answer',
  imports: [PlanFigures, SpeedScaleMap, WaysOutList],
  template: `
    @if (plan(); as plan) {
      <div
        class="wl-notice"
        id="plan-answer"
        tabindex="-1"
        role="status"
        [class.wl-trouble]="answer()?.tone === 'trouble'"
        [class.wl-good]="answer()?.tone === 'good'"
      >
        <strong>{{ answer()?.title }}.</strong>
        @for (sentence of answer()?.sentences; track $index) {
          {{ ' ' + sentence }}
        }
      </div>
      <wl-plan-figures [plan]="plan" />
      @if (ways(); as ways) {
        <wl-ways-out-list [ways]="ways" [mayTry]="mayEdit()" (tried)="tried.emit($event)" />
      }
      @if (model(); as model) {
        <wl-speed-scale-map [model]="model" [movable]="mayEdit()" (moved)="moved.emit($event)" />
      }
    } @else {
      <p class="wl-notice" role="status" id="plan-answer" tabindex="-1">
        @if (refusal(); as words) {
          <strong i18n>Not computed</strong> {{ words }}
        } @else {
          <ng-container i18n
            ><strong>Nothing to say yet</strong> Choose the variant and the tunnel, and fill in what is asked
            for; what that comes to stands here as you type.</ng-container
          >
        }
      </p>
    }
  `,
  styles: `
    :host {
      display: grid;
      align-content: start;
      gap: 18px;
      min-width: 0;
    }
    p {
      margin: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanAnswer {
  readonly state = input.required<PlanState>();
  readonly sweeps = input<readonly SweptResult[]>([]);
  readonly mayEdit = input(true);
  readonly tried = output<Trial>();
  readonly moved = output<Partial<MapPoint>>();

  private readonly format = inject(QuantityFormat);
  protected readonly plan = computed(() => plannedOf(this.state()));
  protected readonly refusal = computed(() => {
    const state = this.state();
    return state.kind === 'refused' ? state.refusal.detail : undefined;
  });
  protected readonly answer = computed(() => {
    const plan = this.plan();
    return plan && answerOf(plan, this.format);
  });
  protected readonly ways = computed(() => {
    const plan = this.plan();
    return plan && !plan.reachable ? waysOut(plan, this.sweeps()) : undefined;
  });
  protected readonly model = computed(() => {
    const plan = this.plan();
    return plan && mapModelOf(plan);
  });
}

function plannedOf(state: PlanState): Planned | undefined {
  return state.kind === 'planned' ? state : undefined;
}

/** Where no speed is settled on, the test stands at the needed one, or at the highest allowed. */
function mapModelOf({
  setting,
  limits,
  output,
  inputs,
  needed,
  attainable,
  settled,
}: Planned): SpeedScaleModel {
  return {
    limits,
    fullSectionScale: scaleAtBlockage(setting, 1),
    machCaution: setting.machCaution,
    machLimit: setting.machLimit,
    targetReynolds: output.targetReynolds,
    acceptedReynolds: output.accepted?.reynolds,
    minimumReynolds: setting.minimumReynolds,
    balanceN: inputs.maximumForceN,
    working: {
      scale: setting.scale,
      speedKmh: settled?.speedKmh ?? Math.min(needed.speedKmh, attainable.speedKmh),
    },
    neededKmh: needed.speedKmh,
  };
}
