import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { QuantityFormat } from '../quantity/quantity-format';
import { type DragAxis, alongAxis } from './drag-axis';
import type { StatementFigures } from './statement-figures';
import { statementSentence } from './statement-sentence';

/**
 * One variant's account on the shared drag-area axis: open ring (opening), ticks (postings) stepping to a disc
 * (carried) in its uncertainty band, hollow diamond (expected), notched stroke (target).
 */
@Component({
  selector: 'wl-statement-line',
  templateUrl: './statement-line.svg',
  styleUrl: './statement-line.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StatementLine {
  readonly figures = input.required<StatementFigures>();
  readonly axis = input.required<DragAxis>();

  private readonly format = inject(QuantityFormat);

  protected readonly sentence = computed(() =>
    statementSentence(this.figures(), {
      figure: (value, expandedU) => this.format.text(value, 'drag-area', { expandedU }),
    }),
  );

  protected readonly grid = computed(() => this.axis().ticks.map((tick) => this.at(tick)));

  protected readonly drawn = computed(() => {
    const { opening, postings, carried, expected, target, simulated } = this.figures();
    const stops = [
      opening,
      ...(postings ?? []).map((posting) => posting.after),
      carried?.value,
      expected,
    ].filter((value) => value !== undefined);
    const u = carried?.expandedU;
    return {
      path:
        stops.length > 1 ? { from: this.at(Math.min(...stops)), to: this.at(Math.max(...stops)) } : undefined,
      opening: this.maybe(opening),
      postings: this.steps(opening, postings ?? []),
      carried: this.maybe(carried?.value),
      band:
        carried && u
          ? { from: this.at(carried.value - u), width: (2 * u * 100) / (this.axis().to - this.axis().from) }
          : undefined,
      expected: this.maybe(expected),
      target: this.maybe(target),
      simulated: simulated === true,
    };
  });

  private steps(
    opening: number | undefined,
    postings: readonly { readonly after: number }[],
  ): readonly { readonly x: string; readonly raises: boolean }[] {
    return postings.map(({ after }, index) => {
      const before = index === 0 ? opening : postings[index - 1]?.after;
      return { x: `${this.at(after)}%`, raises: before !== undefined && after > before };
    });
  }

  private maybe(value: number | undefined): string | undefined {
    return value === undefined ? undefined : `${this.at(value)}%`;
  }

  private at(value: number): number {
    return alongAxis(value, this.axis());
  }
}
