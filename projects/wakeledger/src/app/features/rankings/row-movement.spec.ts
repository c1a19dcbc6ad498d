import { Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { RowMovement } from './row-movement';

const ROW_PX = 40;

@Component({
  imports: [RowMovement],
  template: `<div [wlRowMovement]="ids()">
    @for (id of ids(); track id) {
      <p [attr.data-row-id]="id">{{ id }}</p>
    }
  </div>`,
})
class Rows {
  readonly ids = signal<readonly string[]>(['a', 'b', 'c']);
}

/** Rows of 40 px, one below the other, in a document that moves nothing itself. */
function rows({ still }: { readonly still: boolean }) {
  window.matchMedia = ((query: string) => ({ matches: still, media: query })) as typeof window.matchMedia;
  const moved: { readonly id: string | undefined; readonly from: unknown; readonly ms: unknown }[] = [];
  jest.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockImplementation(function (this: HTMLElement) {
    const index = [...(this.parentElement?.querySelectorAll('[data-row-id]') ?? [])].indexOf(this);
    return { top: 100 + Math.max(0, index) * ROW_PX } as DOMRect;
  });
  HTMLElement.prototype.animate = function (this: HTMLElement, frames, options) {
    const [first] = frames as Keyframe[];
    const { duration } = options as KeyframeAnimationOptions;
    moved.push({ id: this.dataset['rowId'], from: first?.['transform'], ms: duration });
    return {} as Animation;
  };
  const fixture = TestBed.createComponent(Rows);
  document.body.append(fixture.nativeElement as HTMLElement);
  TestBed.tick();
  const order = (ids: readonly string[]) => {
    fixture.componentInstance.ids.set(ids);
    TestBed.tick();
  };
  return { moved, order };
}

describe('the movement of rows', () => {
  const { matchMedia } = window;
  const { animate } = HTMLElement.prototype;
  afterEach(() => {
    jest.restoreAllMocks();
    window.matchMedia = matchMedia;
    HTMLElement.prototype.animate = animate;
    document.body.replaceChildren();
  });

  it('slides each row from where it stood, within 200 ms, and leaves the others', () => {
    const { moved, order } = rows({ still: false });
    expect(moved).toEqual([]);
    order(['b', 'a', 'c']);
    expect(moved.map(({ id, from }) => [id, from])).toEqual([
      ['b', `translateY(${ROW_PX}px)`],
      ['a', `translateY(${-ROW_PX}px)`],
    ]);
    expect(moved.every(({ ms }) => Number(ms) <= 200)).toBe(true);
  });

  it('does not move for those who ask for stillness', () => {
    const { moved, order } = rows({ still: true });
    order(['c', 'b', 'a']);
    expect(moved).toEqual([]);
  });

  it('does not move a row that has just come in', () => {
    const { moved, order } = rows({ still: false });
    order(['a', 'b', 'c', 'd']);
    expect(moved).toEqual([]);
  });

  it('does not move more rows than the eye can follow', () => {
    const { moved, order } = rows({ still: false });
    const many = Array.from({ length: 61 }, (_, index) => `row-${index}`);
    order(many);
    order(many.toReversed());
    expect(moved).toEqual([]);
  });
});
