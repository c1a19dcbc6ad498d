import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

interface Piece {
  readonly words: string;
  readonly lowered: boolean;
}

/** Text with symbols as they are typed, `ν_k = 1.5 m²/s`, with true subscripts. */
@Component({
  selector: 'wl-symbols',
  template: `@for (piece of pieces(); track $index) {
    @if (piece.lowered) {
      <sub>{{ piece.words }}</sub>
    } @else {
      <span>{{ piece.words }}</span>
    }
  }`,
  styles: `
    sub {
      line-height: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Symbols {
  readonly text = input.required<string>();

  protected readonly pieces = computed((): readonly Piece[] =>
    // Every second piece of the split is what stood behind an underscore.
    this.text()
      .split(/(?<=\p{L})_(\p{L}+|\d+)/u)
      .map((words, index) => ({ words, lowered: index % 2 === 1 }))
      .filter(({ words }) => words !== ''),
  );
}
