import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { Preferences } from '../../core/preferences/preferences';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { missingAdjustments } from './missing-adjustments';
import { stayedOutEntries } from './stayed-out-groups';

/** What stayed out of the ranking, by which rule, and who may do what about it. */
@Component({
  selector: 'wl-stayed-out',
  imports: [RouterLink],
  template: `
    <h2 i18n>What stayed out</h2>
    @for (each of entries(); track each.id) {
      <details>
        <summary>
          @if (each.count !== null) {
            <strong i18n>{each.count, plural, =1 {1 result} other {{{ each.count }} results}}</strong>:
          }
          {{ each.words }}
          @if (each.adopted) {
            <span class="wl-ochre">
              @if (each.count === null) {
                <ng-container i18n>(adopted)</ng-container>
              } @else {
                <ng-container i18n>(adopted evidence among them)</ng-container>
              }
            </span>
          }
        </summary>
        @for (remedy of each.remedies; track remedy) {
          <p>{{ remedy }}</p>
        }
        @if (each.results.length) {
          <ul>
            @for (result of each.results; track result.id) {
              <li>
                {{ result.words }}
                @if (result.adopted) {
                  <span class="wl-ochre" i18n>(adopted)</span>
                }
              </li>
            }
          </ul>
        }
      </details>
    } @empty {
      <p i18n>Nothing: every result can be used.</p>
    }
    @if (missing().length) {
      <p class="missing" i18n>What would bring results in:</p>
      <ul>
        @for (each of missing(); track each.words) {
          <li>
            <a routerLink="/adjustments/new" [queryParams]="each.query">{{ each.words }}</a>
          </li>
        }
      </ul>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    h2 {
      margin-bottom: 6px;
    }
    details {
      padding: 3px 0;
    }
    summary {
      min-height: 24px;
      cursor: pointer;
    }
    details p {
      margin: 4px 0 6px 16px;
      font-size: var(--wl-small);
    }
    ul {
      margin: 0 0 6px 16px;
      padding-left: 16px;
      font-size: var(--wl-small);
    }
    li {
      padding: 2px 0;
    }
    li a {
      display: inline-block;
      min-height: 24px;
    }
    .missing {
      margin: 8px 0 2px;
      font-size: var(--wl-small);
    }
    /* Paper cannot be opened: what is folded on the screen prints whole. */
    @media print {
      details::details-content {
        content-visibility: visible;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StayedOut {
  readonly exclusions = input.required<RankingView['stayedOut']>();
  /** Whether the person may add the adjustment that is missing. */
  readonly mayAdjust = input(false);

  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);

  protected readonly missing = computed(() =>
    this.mayAdjust() ? missingAdjustments(this.exclusions(), this.preferences.numberLocale()) : [],
  );
  protected readonly entries = computed(() =>
    stayedOutEntries(this.exclusions(), this.format, this.preferences.numberLocale()),
  );
}
