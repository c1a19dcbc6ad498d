import { ChangeDetectionStrategy, Component, input } from '@angular/core';

export type LegendMark = 'opening' | 'posting' | 'carried' | 'simulated' | 'expected' | 'target';

/** One line that says what the marks mean; only those that the picture uses. */
@Component({
  selector: 'wl-statement-legend',
  template: `
    @for (mark of marks(); track mark) {
      <span class="entry">
        <svg width="26" height="18" viewBox="-13 -9 26 18" aria-hidden="true">
          @switch (mark) {
            @case ('opening') {
              <circle class="opening" r="5" />
            }
            @case ('posting') {
              <path class="path" d="M-9 0H6" />
              <line class="posting" x1="6" x2="6" y1="-5" y2="5" />
            }
            @case ('carried') {
              <rect class="band" x="-12" y="-7" width="24" height="14" />
              <circle class="carried" r="5.5" />
            }
            @case ('simulated') {
              <circle class="carried simulated" r="5.5" />
              <circle class="core" r="2" />
            }
            @case ('expected') {
              <path class="expected" d="M0-7 7 0 0 7-7 0Z" />
            }
            @case ('target') {
              <path class="target" d="M0-8V8M-4-8H4M-4 8H4" />
            }
          }
        </svg>
        @switch (mark) {
          @case ('opening') {
            <ng-container i18n>opening figure</ng-container>
          }
          @case ('posting') {
            <ng-container i18n>posting</ng-container>
          }
          @case ('carried') {
            <ng-container i18n>carried figure with U</ng-container>
          }
          @case ('simulated') {
            <ng-container i18n>simulated, not measured</ng-container>
          }
          @case ('expected') {
            <ng-container i18n>expected figure</ng-container>
          }
          @case ('target') {
            <ng-container i18n>target</ng-container>
          }
        }
      </span>
    }
  `,
  styleUrl: './statement-legend.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StatementLegend {
  readonly marks = input<readonly LegendMark[]>(['opening', 'posting', 'carried', 'expected', 'target']);
}
