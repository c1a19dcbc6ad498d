import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import type { JudgementChange } from '#shared/contracts/proposals';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import type { RankingSources } from '../../../data/rankings/rankings-api';

/** Switches a result in or out, or includes one that is not comparable; each with its reason. */
@Component({
  selector: 'wl-try-result',
  template: `
    <label>
      <span class="label" i18n>Result</span>
      <select #which class="wl-input" [value]="chosen()" (change)="choose(which.value)">
        <option value="" i18n>Choose a result</option>
        @for (offer of offers(); track offer.id) {
          <option [value]="offer.id" [selected]="offer.id === chosen()">{{ offer.words }}</option>
        }
      </select>
    </label>
    @switch (standing()) {
      @case ('aside') {
        <p i18n>It is set aside.</p>
        <button type="button" class="wl-button" (click)="bringBack()" i18n>Bring it back</button>
      }
      @case ('not-comparable') {
        <p i18n>It stays out: its condition is not comparable.</p>
      }
    }
    @if (standing() === 'counts' || standing() === 'not-comparable') {
      <label>
        <span class="label" i18n>Why (at least three characters)</span>
        <input #why class="wl-input" [value]="reason()" (input)="reason.set(why.value)" />
      </label>
      <span class="wl-actions">
        @if (standing() === 'not-comparable') {
          <button type="button" class="wl-button" [disabled]="!reasoned()" (click)="include()" i18n>
            Include it all the same
          </button>
        }
        <button type="button" class="wl-button" [disabled]="!reasoned()" (click)="setAside()" i18n>
          Set it aside
        </button>
      </span>
    }
  `,
  styleUrl: './try-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TryResult {
  readonly sources = input.required<RankingSources>();
  readonly view = input.required<RankingView>();
  readonly tried = output<JudgementChange>();

  protected readonly chosen = signal('');
  protected readonly reason = signal('');
  protected readonly reasoned = computed(() => this.reason().trim().length >= 3);
  protected readonly offers = computed(() => {
    const { variants, results } = this.sources().inputs;
    const names = new Map(variants.map(({ id, name }) => [id, name ?? id]));
    return results
      .map(({ id, name, variantId, testDate }) => ({
        id,
        words: [names.get(variantId) ?? variantId, name ?? id, testDate].join(', '),
      }))
      .sort((a, b) => a.words.localeCompare(b.words));
  });
  protected readonly standing = computed((): 'none' | 'aside' | 'not-comparable' | 'counts' => {
    const resultId = this.chosen();
    if (resultId === '') return 'none';
    if (this.sources().context.setAside.some((held) => held.resultId === resultId)) return 'aside';
    const excluded = this.view().stayedOut.find((each) => each.resultId === resultId);
    return excluded?.rules.some(({ rule }) => rule === 'not-comparable') ? 'not-comparable' : 'counts';
  });

  protected choose(resultId: string): void {
    this.chosen.set(resultId);
    this.reason.set('');
  }

  protected bringBack(): void {
    this.tried.emit({ kind: 'bring-back', resultId: this.chosen() });
  }

  protected setAside(): void {
    this.tried.emit({ kind: 'set-aside', resultId: this.chosen(), reason: this.reason().trim() });
  }

  protected include(): void {
    this.tried.emit({
      kind: 'include-not-comparable',
      resultId: this.chosen(),
      reason: this.reason().trim(),
    });
  }
}
