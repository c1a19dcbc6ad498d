import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { PolicyVersion } from '#shared/contracts/policies';
import { Preferences } from '../../core/preferences/preferences';
import { limitDifferences } from './policy-differences';

/** Every version of the limits: who changed what, when and why. */
@Component({
  selector: 'wl-policy-history',
  imports: [DatePipe],
  template: `
    <h2 id="wl-policy-history" i18n>Versions</h2>
    <p i18n>
      Every derivation names the version that it used. What is adopted keeps its version until it is adopted
      anew.
    </p>
    <ol aria-labelledby="wl-policy-history">
      @for (version of told(); track version.number) {
        <li>
          @if (version.number === 0) {
            <h3 i18n>Version 0, as the product comes</h3>
          } @else {
            <h3>
              <ng-container i18n>Version {{ version.number }}</ng-container>
              @if ($first) {
                <span class="now" i18n>, in force</span>
              }
            </h3>
            <p class="who">
              <ng-container i18n>{{ version.at | date: 'd MMMM y' }}, {{ version.by }}:</ng-container>
              {{ version.comment }}
            </p>
            <ul>
              @for (difference of version.differences; track difference.label) {
                <li>
                  <ng-container i18n
                    >{{ difference.label }}: {{ difference.before || '–' }} →
                    {{ difference.after || '–' }}</ng-container
                  >
                </li>
              }
            </ul>
          }
        </li>
      }
    </ol>
  `,
  styles: `
    ol,
    ul {
      margin: 0;
      padding: 0;
      list-style: none;
    }
    ol > li {
      padding: 12px 0;
      border-top: 1px solid var(--wl-rule);
    }
    ul {
      padding-left: 1.2em;
      list-style: disc;
    }
    p {
      margin: 0 0 6px;
    }
    .now {
      font-weight: 400;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PolicyHistory {
  /** Newest first, down to number 0. */
  readonly versions = input.required<readonly PolicyVersion[]>();

  private readonly preferences = inject(Preferences);

  protected readonly told = computed(() => {
    const versions = this.versions();
    return versions.map((version, place) => {
      const before = versions[place + 1];
      return {
        ...version,
        differences: before
          ? limitDifferences(before.values, version.values, this.preferences.numberLocale())
          : [],
      };
    });
  });
}
