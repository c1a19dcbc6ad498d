import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type BodyDimensions, silhouette } from './silhouette';

/** A variant's silhouette, drawn from its dimensions. Several at one scale: give them the same `scaleLengthMm`. */
@Component({
  selector: 'wl-picture',
  template: `
    @if (drawn(); as it) {
      <svg
        role="img"
        [attr.aria-label]="name()"
        [attr.viewBox]="viewBox()"
        preserveAspectRatio="xMidYMax meet"
      >
        <line
          class="ground"
          [attr.x1]="-40"
          [attr.x2]="it.width + 40"
          [attr.y1]="it.height"
          [attr.y2]="it.height"
        />
        <path class="body" [attr.d]="it.body" />
        <path class="glass" [attr.d]="it.glass" />
        @for (wheel of it.wheels; track wheel.x) {
          <circle class="tyre" [attr.cx]="wheel.x" [attr.cy]="wheel.y" [attr.r]="wheel.radius" />
          <circle class="rim" [attr.cx]="wheel.x" [attr.cy]="wheel.y" [attr.r]="wheel.radius * 0.6" />
        }
      </svg>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    svg {
      display: block;
      width: 100%;
      height: 100%;
    }
    .body {
      fill: var(--wl-band);
      stroke: var(--wl-ink);
      stroke-width: 16px;
      stroke-linejoin: round;
    }
    .glass {
      fill: var(--wl-sheet);
      stroke: var(--wl-ink);
      stroke-width: 10px;
      stroke-linejoin: round;
    }
    .tyre {
      fill: var(--wl-ink);
    }
    .rim {
      fill: var(--wl-sheet);
    }
    .ground {
      stroke: var(--wl-edge);
      stroke-width: 10px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Picture {
  readonly name = input.required<string>();
  readonly dimensions = input.required<BodyDimensions>();
  readonly scaleLengthMm = input<number>();

  protected readonly drawn = computed(() => silhouette(this.dimensions()));
  protected readonly viewBox = computed(() => {
    const { width, height } = this.drawn();
    const length = Math.max(width, this.scaleLengthMm() ?? 0);
    return `${(width - length) / 2 - 40} -20 ${length + 80} ${height + 30}`;
  });
}
