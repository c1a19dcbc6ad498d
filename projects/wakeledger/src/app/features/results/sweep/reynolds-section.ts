import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import type { ReynoldsChoice } from '#shared/contracts/judgements';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import type { ReductionContext } from '#shared/core/reduction/reduction';
import { reynoldsWords } from '../../../ui/checks/check-figures';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { reynoldsOffers, type ReynoldsOffer } from './reynolds-offers';
import { SweepPanel } from './sweep-panel';

const keyOf = (choice: ReynoldsChoice): string =>
  choice.kind === 'sweep-of' ? `sweep:${choice.resultId}` : choice.kind;

/** How does the figure get to the reference Reynolds number? What each way would give, chosen before it is saved. */
@Component({
  selector: 'wl-reynolds-section',
  imports: [SweepPanel],
  templateUrl: './reynolds-section.html',
  styleUrl: './reynolds-section.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReynoldsSection {
  readonly resultId = input.required<string>();
  readonly inputs = input.required<RankingInput>();
  readonly context = input.required<ReductionContext>();
  /** What holds now. */
  readonly held = input.required<ReynoldsChoice>();
  readonly mayJudge = input.required<boolean>();
  readonly busy = input(false);
  readonly chosen = output<ReynoldsChoice>();

  private readonly format = inject(QuantityFormat);
  private readonly found = computed(() => reynoldsOffers(this.resultId(), this.inputs(), this.context()));
  protected readonly looked = linkedSignal(() => keyOf(this.held()));

  protected readonly reference = computed(() => reynoldsWords(this.context().referenceReynolds, this.format));
  protected readonly offers = computed(() =>
    this.found().map((offer) => ({
      key: keyOf(offer.choice),
      name: this.nameOf(offer),
      figure: this.figureOf(offer),
      refused: offer.outcome.kind === 'refused' ? offer.outcome.why.detail : undefined,
      cautioned:
        offer.outcome.kind === 'reduced' && offer.outcome.reduction.output.cautions.includes('transition'),
      held: keyOf(offer.choice) === keyOf(this.held()),
    })),
  );
  private readonly inView = computed(() =>
    this.found().find(({ choice }) => keyOf(choice) === this.looked()),
  );
  protected readonly sweep = computed(() => {
    const offer = this.inView();
    return offer?.sweep?.kind === 'fitted'
      ? { view: offer.sweep.view, name: offer.sweepOf?.name ?? '' }
      : undefined;
  });
  protected readonly mayTake = computed(() => {
    const offer = this.inView();
    return (
      offer !== undefined && offer.outcome.kind === 'reduced' && keyOf(offer.choice) !== keyOf(this.held())
    );
  });

  protected take(): void {
    const offer = this.inView();
    if (offer !== undefined) this.chosen.emit(offer.choice);
  }

  private nameOf({ choice, sweepOf }: ReynoldsOffer): string {
    switch (choice.kind) {
      case 'friction-line':
        return this.context().policies.frictionLine === 'on'
          ? $localize`Friction line`
          : $localize`No correction (the friction line is switched off for this programme)`;
      case 'own-sweep':
        return $localize`Its own sweep`;
      case 'sweep-of':
        return $localize`The sweep of ${sweepOf?.name ?? ''}:RESULT:`;
    }
  }

  private figureOf({ outcome }: ReynoldsOffer): string {
    if (outcome.kind === 'refused') return $localize`refused`;
    const { dragAreaM2, expandedUncertaintyM2: expandedU } = outcome.reduction.output.zeroYaw;
    return this.format.text(dragAreaM2, 'drag-area', { expandedU, digits: 4 });
  }
}
