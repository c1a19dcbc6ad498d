import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** An empty screen says what to do first; the way to do it is projected. */
@Component({
  selector: 'wl-empty-state',
  template: `
    <h2>{{ title() }}</h2>
    <p><ng-content /></p>
    <div class="wl-actions"><ng-content select="[action]" /></div>
  `,
  styles: `
    :host {
      display: block;
      padding: 28px 24px;
      border: 1px dashed var(--wl-edge);
      border-radius: var(--wl-corner);
    }
    p {
      margin: 8px 0 14px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EmptyState {
  readonly title = input.required<string>();
}
