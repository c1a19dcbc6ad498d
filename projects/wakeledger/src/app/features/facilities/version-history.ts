import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { FacilityVersion } from '#shared/contracts/facilities';
import { Preferences } from '../../core/preferences/preferences';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { facilityComparison } from './facility-comparison';
import { versionLines } from './version-words';

/** What were the corrections before? Every version with what changed, why, by whom and when. */
@Component({
  selector: 'wl-version-history',
  imports: [DatePipe],
  template: `
    <ol reversed>
      @for (line of lines(); track line.version.number) {
        <li [value]="line.version.number">
          <p>
            <ng-container i18n>{{ line.version.at | date: 'd MMM y, HH:mm' }}</ng-container>
            @if (line.version.by; as by) {
              <ng-container i18n>, by {{ by }}</ng-container>
            }
            @if (line.first) {
              <ng-container i18n>: as it was added</ng-container>
            }
          </p>
          @if (line.version.comment; as comment) {
            <p class="said">{{ comment }}</p>
          }
          @if (line.differences.length) {
            <ul>
              @for (difference of line.differences; track difference) {
                <li>{{ difference }}</li>
              }
            </ul>
          }
        </li>
      }
    </ol>
  `,
  styles: `
    ol {
      margin: 0;
      padding-left: 28px;
    }
    ol > li {
      padding-bottom: 10px;
    }
    ul {
      margin: 0;
      padding-left: 18px;
      font-size: var(--wl-small);
    }
    p {
      margin: 0;
    }
    .said {
      font-family: var(--wl-title);
      font-style: italic;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VersionHistory {
  readonly versions = input.required<readonly FacilityVersion[]>();

  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);

  protected readonly lines = computed(() =>
    versionLines(this.versions(), facilityComparison(this.format, this.preferences.numberLocale())),
  );
}
