import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { gravest } from '#shared/core/checks/check';
import { Checks } from '../../../ui/checks/checks';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { machWords, reynoldsWords } from '../../../ui/checks/check-figures';
import { CHECK_INKS, CHECK_SHAPES, CHECK_WORDS } from '../result-check';
import { readSweep } from '../sweep/sweep-view';
import { sweepVerdicts } from '../sweep/sweep-words';
import type { Preview } from './preview';

/** What is typed, at the programme's reference, while it is typed. Nothing of it is stored. */
@Component({
  selector: 'wl-preview-panel',
  imports: [Checks],
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
        <p [class]="it.ink">
          <strong
            ><span aria-hidden="true">{{ it.shape }}</span> {{ it.words }}</strong
          >
        </p>
        @for (verdict of sweep(); track verdict.words) {
          <p class="small" [class]="verdict.ink">
            <span aria-hidden="true">{{ verdict.shape }} </span>{{ verdict.words }}
          </p>
        }
        <p class="small" i18n>From {{ before() }} as it came. Nothing is stored before you save.</p>
      } @else if (refused()) {
        <p class="wl-ochre">
          <strong
            ><span aria-hidden="true">▲ </span><ng-container i18n>not reducible yet</ng-container></strong
          >
        </p>
      } @else if (noReference(); as words) {
        <p class="wl-ochre">
          <strong
            ><span aria-hidden="true">▲ </span
            ><ng-container i18n>the programme has no usable reference</ng-container></strong
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
    @if (checks(); as made) {
      <wl-checks [checks]="made" />
    }
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

  protected readonly refused = computed(() => this.preview()?.kind === 'refused');
  protected readonly noReference = computed(() => {
    const preview = this.preview();
    return preview?.kind === 'no-reference' ? preview.refusal.detail : undefined;
  });
  protected readonly checks = computed(() => {
    const preview = this.preview();
    return preview === undefined || preview.kind === 'no-reference' ? undefined : preview.checks;
  });
  /** What the typed points say as a Reynolds sweep, where they are one. */
  protected readonly sweep = computed(() => {
    const preview = this.preview();
    if (preview?.kind !== 'reduced' || preview.reduction.reynolds.kind !== 'own-sweep') return [];
    const reading = readSweep(preview.reduction.reynolds.fit.points, preview.context);
    return reading.kind === 'fitted' ? sweepVerdicts(reading.view, this.format) : [];
  });
  protected readonly shown = computed(() => {
    const preview = this.preview();
    if (preview?.kind !== 'reduced') return undefined;
    const { output } = preview.reduction;
    const verdict = gravest(preview.checks);
    const state = verdict === 'passes' ? 'comparable' : verdict;
    return {
      value: this.format.value(output.zeroYaw.dragAreaM2, 'drag-area'),
      u: this.format.value(output.zeroYaw.expandedUncertaintyM2, 'drag-area'),
      reynolds: reynoldsWords(output.reynolds, this.format),
      mach: machWords(output.mach, this.format),
      blockage:
        output.blockageRatio === null
          ? undefined
          : this.format.text(output.blockageRatio * 100, 'percent', { digits: 1 }),
      words: CHECK_WORDS[state],
      shape: CHECK_SHAPES[state],
      ink: CHECK_INKS[state],
    };
  });
}
