import { Directive, ElementRef, afterRenderEffect, inject, input } from '@angular/core';

const DURATION_MS = 180;
/** Beyond this many rows a movement explains nothing and costs time. */
const MOST_ROWS = 60;

/** Lets the rows of a table slide to their new places when their order changes; not for those who ask for stillness. */
@Directive({ selector: '[wlRowMovement]' })
export class RowMovement {
  /** Ids of the rows in their order; each row carries its own as `data-row-id`. */
  readonly wlRowMovement = input.required<readonly string[]>();

  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  private tops: ReadonlyMap<string, number> = new Map();

  constructor() {
    afterRenderEffect(() => {
      const count = this.wlRowMovement().length;
      const before = this.tops;
      this.tops = count > MOST_ROWS ? new Map() : this.measured();
      if (!this.still()) this.slide(before);
    });
  }

  private rows(): readonly HTMLElement[] {
    return [...this.element.querySelectorAll<HTMLElement>('[data-row-id]')];
  }

  /** From the table's own top, so that a scrolled page moves nothing. */
  private measured(): ReadonlyMap<string, number> {
    const origin = this.element.getBoundingClientRect().top;
    return new Map(
      this.rows().map((row) => [row.dataset['rowId'] ?? '', row.getBoundingClientRect().top - origin]),
    );
  }

  private still(): boolean {
    const view = this.element.ownerDocument.defaultView;
    return view?.matchMedia?.('(prefers-reduced-motion: reduce)').matches !== false;
  }

  private slide(before: ReadonlyMap<string, number>): void {
    for (const row of this.rows()) {
      const id = row.dataset['rowId'] ?? '';
      const [from, to] = [before.get(id), this.tops.get(id)];
      if (from === undefined || to === undefined || from === to) continue;
      row.animate([{ transform: `translateY(${from - to}px)` }, { transform: 'none' }], {
        duration: DURATION_MS,
        easing: 'ease-out',
      });
    }
  }
}
