import { Directive, ElementRef, afterRenderEffect, inject, input } from '@angular/core';

const STEPS: Readonly<Record<string, readonly [number, number]>> = {
  ArrowUp: [-1, 0],
  ArrowDown: [1, 0],
  ArrowLeft: [0, -1],
  ArrowRight: [0, 1],
  PageUp: [-10, 0],
  PageDown: [10, 0],
};

/**
 * One stop for the tab key in a whole table: inside it the arrow keys go from one thing that can be opened to the next
 * (ARIA grid pattern). Things that can be opened are marked `data-stop`.
 */
@Directive({
  selector: '[wlGridFocus]',
  host: { '(keydown)': 'move($event)', '(focusin)': 'settle($event)' },
})
export class GridFocus {
  /** Changes whenever the rows are drawn anew. */
  readonly wlGridFocus = input.required<unknown>();

  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  constructor() {
    afterRenderEffect(() => {
      this.wlGridFocus();
      const stops = this.stops().flat();
      const standing = stops.find((stop) => stop.tabIndex === 0) ?? stops[0];
      for (const stop of stops) stop.tabIndex = stop === standing ? 0 : -1;
    });
  }

  protected move(event: KeyboardEvent): void {
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    const stops = this.stops();
    const row = stops.findIndex((each) => each.includes(event.target as HTMLElement));
    if (row < 0) return;
    const column = stops[row]?.indexOf(event.target as HTMLElement) ?? 0;
    const next = this.destination(event.key, stops, row, column);
    if (!next) return;
    event.preventDefault();
    next.focus();
  }

  /** What has the focus is where the tab key comes back to. */
  protected settle(event: FocusEvent): void {
    const stops = this.stops().flat();
    if (!stops.includes(event.target as HTMLElement)) return;
    for (const stop of stops) stop.tabIndex = stop === event.target ? 0 : -1;
  }

  private destination(
    key: string,
    stops: readonly (readonly HTMLElement[])[],
    row: number,
    column: number,
  ): HTMLElement | undefined {
    if (key === 'Home') return stops[row]?.[0];
    if (key === 'End') return stops[row]?.at(-1);
    const step = STEPS[key];
    if (!step) return undefined;
    const target = Math.min(stops.length - 1, Math.max(0, row + step[0]));
    const line = stops[target];
    return line?.[Math.min(line.length - 1, Math.max(0, column + step[1]))];
  }

  private stops(): readonly (readonly HTMLElement[])[] {
    return [...this.element.querySelectorAll<HTMLElement>('[role=row]')]
      .map((row) => [...row.querySelectorAll<HTMLElement>('[data-stop]')])
      .filter((stops) => stops.length > 0);
  }
}
