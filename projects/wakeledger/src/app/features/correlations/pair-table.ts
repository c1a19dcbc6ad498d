import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { cautionWord, ruleWord } from './correlation-words';
import { lacksReason, type PairDecision, type PairDraft } from './pair-drafts';

/** Pairs on offer, each taken in or left out with a reason. */
@Component({
  selector: 'wl-pair-table',
  templateUrl: './pair-table.html',
  styleUrl: './pair-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PairTable {
  readonly drafts = input.required<readonly PairDraft[]>();
  readonly from = input.required<string>();
  readonly to = input.required<string>();
  /** Reasons that are missing are said once the person has tried to save. */
  readonly strict = input(false);
  readonly decided = output<{ readonly key: string; readonly decision: PairDecision }>();
  readonly removed = output<string>();

  private readonly format = inject(QuantityFormat);
  protected readonly rows = computed(() => this.drafts().map((draft) => this.row(draft)));

  protected take(draft: PairDraft, included: boolean): void {
    this.decided.emit({ key: draft.key, decision: { included, reason: draft.reason } });
  }

  protected say(draft: PairDraft, reason: string): void {
    this.decided.emit({ key: draft.key, decision: { included: draft.included, reason } });
  }

  private row(draft: PairDraft) {
    const { pair, about, origin } = draft;
    const area = (value: number, u: number): string =>
      $localize`${this.format.value(value, 'drag-area', { digits: 4 })}:VALUE:, u ${this.format.value(u, 'drag-area', { digits: 4 })}:U:`;
    const notes = [
      ...about.excludedBy.map(ruleWord),
      ...about.cautions.map(cautionWord),
      ...(about.formerDragAreaM2 === undefined
        ? []
        : [
            $localize`the version before held ${this.format.text(about.formerDragAreaM2, 'drag-area', { digits: 4 })}:VALUE:`,
          ]),
    ];
    return {
      draft,
      geometry: pair.geometry,
      origin:
        origin === 'hand'
          ? $localize`typed by hand`
          : origin === 'version'
            ? $localize`from the version before; not among today’s results`
            : `${about.programme}: ${about.resultNames}`,
      byHand: origin === 'hand',
      figure: area(pair.dragAreaM2, pair.uM2),
      reference: area(pair.referenceDragAreaM2, pair.referenceUM2),
      notes,
      lacking: this.strict() && lacksReason(draft),
      takeLabel: $localize`Take ${pair.geometry}:GEOMETRY: in`,
      reasonLabel: $localize`Why ${pair.geometry}:GEOMETRY: is left out`,
      removeLabel: $localize`Remove ${pair.geometry}:GEOMETRY:`,
    };
  }
}
