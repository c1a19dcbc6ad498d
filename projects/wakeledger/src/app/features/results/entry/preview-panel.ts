import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Preferences } from '../../../core/preferences/preferences';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { CHECK_INKS, CHECK_SHAPES, CHECK_WORDS, checkOf, reynoldsWords } from '../result-check';
import type { Preview } from './preview';

/** What is typed, at the programme's reference, while it is typed. Nothing of it is stored. */
@Component({
  selector: 'wl-preview-panel',
  template: `
    <h2 i18n>What it would come to</h2>
    <div role="status">
      @if (shown(); as it) {
        <p class="figure">
          {{ it.value }}<small>&nbsp;±&nbsp;{{ it.u }}&#8239;m²</small>
        </p>
        <p class="small">
          <ng-container i18n
            >C<sub>D</sub>·A at the reference; Re {{ it.reynolds }}, Mach {{ it.mach }}</ng-container
          >
          @if (it.blockage; as blockage) {
            <ng-container i18n>, blockage {{ blockage }}</ng-container>
          }
        </p>
        <p [class]="it.check.ink">
          <strong
            ><span aria-hidden="true">{{ it.check.shape }}</span> {{ it.check.words }}</strong
          >
        </p>
        @for (reason of it.check.reasons; track $index) {
          <p class="small">{{ reason }}</p>
        }
        <p class="small" i18n>From {{ before() }} as it came. Nothing is stored before you save.</p>
      } @else if (refused(); as words) {
        <p class="wl-ochre">
          <strong
            ><span aria-hidden="true">▲ </span><ng-container i18n>not reducible yet</ng-container></strong
          >
        </p>
        <p class="small">{{ words }}</p>
      } @else {
        <p class="small" i18n>
          Choose variant and facility and type a value: the drag area at the programme’s reference appears
          here.
        </p>
      }
    </div>
  `,
  styles: `
    :host {
      display: grid;
      align-content: start;
      gap: 8px;
      padding: 14px 16px;
      border: 1px solid var(--wl-rule);
      border-radius: var(--wl-corner);
      background: var(--wl-sheet);
    }
    h2 {
      font-size: 1.1rem;
    }
    p {
      margin: 0 0 6px;
    }
    .figure {
      font-size: 1.7rem;
    }
    small {
      font-size: 1.1rem;
    }
    .small {
      font-size: var(--wl-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PreviewPanel {
  readonly preview = input.required<Preview | undefined>();
  /** The raw value in words. */
  readonly before = input('');

  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);

  protected readonly refused = computed(() => {
    const preview = this.preview();
    return preview?.kind === 'refused' ? preview.refusal.detail : undefined;
  });
  protected readonly shown = computed(() => {
    const preview = this.preview();
    if (preview?.kind !== 'reduced') return undefined;
    const { reduction, context } = preview;
    const { output } = reduction;
    const words = { format: this.format, locale: this.preferences.numberLocale() };
    const check = checkOf({}, { context, reduction }, words);
    return {
      value: this.format.value(output.zeroYaw.dragAreaM2, 'drag-area'),
      u: this.format.value(output.zeroYaw.expandedUncertaintyM2, 'drag-area'),
      reynolds: reynoldsWords(output.reynolds, this.format),
      mach: this.format.value(output.mach, 'number', { digits: 2 }),
      blockage:
        output.blockageRatio === null
          ? undefined
          : this.format.text(output.blockageRatio * 100, 'percent', { digits: 1 }),
      check: {
        reasons: check.reasons,
        words: CHECK_WORDS[check.state],
        shape: CHECK_SHAPES[check.state],
        ink: CHECK_INKS[check.state],
      },
    };
  });
}
