import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

/** Work under way: said in words, with how far it is where that is known. */
@Component({
  selector: 'wl-busy',
  template: `
    <span role="status">{{ words() }}{{ part() }}</span>
    <progress
      [attr.value]="known() ? done() : null"
      [attr.max]="known() ? total() : null"
      [attr.aria-label]="words()"
    ></progress>
  `,
  styles: `
    :host {
      display: grid;
      gap: 6px;
      max-width: 420px;
      padding: 12px 0;
    }
    progress {
      width: 100%;
      height: 6px;
      border: 0;
      accent-color: var(--wl-petrol);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Busy {
  readonly words = input($localize`Loading …`);
  readonly done = input<number>();
  readonly total = input<number>();

  protected readonly known = computed(() => this.done() !== undefined && (this.total() ?? 0) > 0);
  protected readonly part = computed(() => {
    if (!this.known()) return '';
    const percent = Math.floor(((this.done() ?? 0) / (this.total() ?? 1)) * 100);
    return ` ${Math.min(100, percent)} %`;
  });
}
