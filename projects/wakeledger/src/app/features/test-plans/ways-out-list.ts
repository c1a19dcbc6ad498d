import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { wayInWords } from './way-words';
import type { Trial, WayOut } from './ways-out';

/** What can be done instead: each way with its own number, its validity and a way to try it. */
@Component({
  selector: 'wl-ways-out-list',
  template: `
    <h2 i18n>What can be done instead</h2>
    <ul>
      @for (way of words(); track way.kind) {
        <li>
          <h3>{{ way.title }}</h3>
          <p>
            @for (sentence of way.sentences; track $index) {
              {{ sentence }}
            }
            @if (way.validity; as validity) {
              <span class="validity">{{ validity }}</span>
            }
          </p>
          @if (way.trial; as trial) {
            @if (mayTry()) {
              <button type="button" class="wl-button" (click)="tried.emit(trial)">{{ way.tryIt }}</button>
            }
          }
        </li>
      }
    </ul>
  `,
  styles: `
    ul {
      display: grid;
      gap: 12px;
      margin: 8px 0 0;
      padding: 0;
      list-style: none;
    }
    li {
      padding-top: 10px;
      border-top: 1px solid var(--wl-rule);
    }
    p {
      margin: 2px 0 6px;
    }
    .validity {
      font-size: var(--wl-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WaysOutList {
  readonly ways = input.required<readonly WayOut[]>();
  readonly mayTry = input(true);
  readonly tried = output<Trial>();

  private readonly format = inject(QuantityFormat);
  protected readonly words = computed(() =>
    this.ways().map((way) => ({ kind: way.kind, trial: way.trial, ...wayInWords(way, this.format) })),
  );
}
