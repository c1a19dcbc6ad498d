import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import type { JudgementChange } from '#shared/contracts/proposals';
import type { EvidenceRule } from '#shared/core/ranking/ranking-input';
import type { RankingSources } from '../../../data/rankings/rankings-api';

/** Which results a variant rests on, and by which rule. */
@Component({
  selector: 'wl-try-evidence',
  template: `
    <label>
      <span class="label" i18n>Variant</span>
      <select #which class="wl-input" [value]="chosen()" (change)="choose(which.value)">
        <option value="" i18n>Choose a variant</option>
        @for (variant of sources().inputs.variants; track variant.id) {
          <option [value]="variant.id" [selected]="variant.id === chosen()">{{ variant.name }}</option>
        }
      </select>
    </label>
    @if (chosen()) {
      <fieldset>
        <legend class="label" i18n>It rests on (none chosen: on its newest usable result)</legend>
        @for (offer of offers(); track offer.id) {
          <label class="wl-check">
            <input
              #box
              type="checkbox"
              [checked]="picked().includes(offer.id)"
              (change)="pick(offer.id, box.checked)"
            />
            <span>{{ offer.words }}</span>
          </label>
        }
      </fieldset>
      @if (picked().length > 1) {
        <fieldset>
          <legend class="label" i18n>Of several results</legend>
          <label class="wl-check">
            <input
              type="radio"
              name="tried-rule"
              [checked]="rule() === 'newest'"
              (change)="rule.set('newest')"
            />
            <ng-container i18n>the newest of them counts</ng-container>
          </label>
          <label class="wl-check">
            <input
              type="radio"
              name="tried-rule"
              [checked]="rule() === 'weighted-mean'"
              (change)="rule.set('weighted-mean')"
            />
            <ng-container i18n>their weighted mean counts</ng-container>
          </label>
        </fieldset>
      }
      <span class="wl-actions">
        <button type="button" class="wl-button" (click)="emit()" i18n>Try this evidence</button>
      </span>
    }
  `,
  styleUrl: './try-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TryEvidence {
  readonly sources = input.required<RankingSources>();
  readonly tried = output<JudgementChange>();

  protected readonly chosen = signal('');
  protected readonly picked = signal<readonly string[]>([]);
  protected readonly rule = signal<EvidenceRule>('newest');
  protected readonly offers = computed(() => {
    const { inputs, context } = this.sources();
    const aside = new Set(context.setAside.map(({ resultId }) => resultId));
    const facilities = new Map(inputs.facilities.map(({ id, name }) => [id, name ?? id]));
    return inputs.results
      .filter(({ id, variantId }) => variantId === this.chosen() && !aside.has(id))
      .map(({ id, name, testDate, facilityId }) => ({
        id,
        words: [name ?? id, testDate, facilities.get(facilityId) ?? facilityId].join(', '),
      }));
  });

  protected choose(variantId: string): void {
    this.chosen.set(variantId);
    const standing = this.sources().context.adoptions.find((adoption) => adoption.variantId === variantId);
    this.picked.set(standing?.resultIds ?? []);
    this.rule.set(standing?.rule ?? 'newest');
  }

  protected pick(resultId: string, picked: boolean): void {
    const others = this.picked().filter((id) => id !== resultId);
    this.picked.set(picked ? [...others, resultId] : others);
  }

  protected emit(): void {
    const resultIds = [...this.picked()];
    const rule = resultIds.length > 1 ? this.rule() : 'newest';
    this.tried.emit({ kind: 'evidence', variantId: this.chosen(), resultIds, rule });
  }
}
