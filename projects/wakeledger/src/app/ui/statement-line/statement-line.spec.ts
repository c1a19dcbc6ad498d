import { inputBinding, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { StatementFigures } from './statement-figures';
import { StatementLine } from './statement-line';

const draw = (figures: StatementFigures): SVGElement => {
  const axis = { from: 0.5, to: 0.7, ticks: [0.5, 0.6, 0.7], digits: 1 };
  const fixture = TestBed.createComponent(StatementLine, {
    bindings: [inputBinding('figures', signal(figures)), inputBinding('axis', signal(axis))],
  });
  fixture.detectChanges();
  return (fixture.nativeElement as HTMLElement).querySelector('svg')!;
};
const xOf = (picture: SVGElement, mark: string): string | null | undefined =>
  picture.querySelector(mark)?.parentElement?.getAttribute('x');

describe('the statement line', () => {
  beforeEach(() => localStorage.clear());

  it('draws every mark where its figure lies on the shared axis', () => {
    const picture = draw({
      opening: 0.65,
      postings: [{ after: 0.64 }, { after: 0.66 }],
      carried: { value: 0.6, expandedU: 0.01 },
      expected: 0.55,
      target: 0.59,
    });
    expect(xOf(picture, '.opening')).toMatch(/^75\.?0*\d*%$/);
    expect(Number.parseFloat(xOf(picture, '.carried') ?? '')).toBeCloseTo(50, 6);
    expect(Number.parseFloat(xOf(picture, '.expected') ?? '')).toBeCloseTo(25, 6);
    expect(Number.parseFloat(xOf(picture, '.target') ?? '')).toBeCloseTo(45, 6);
    const band = picture.querySelector('.band');
    expect(Number.parseFloat(band?.getAttribute('x') ?? '')).toBeCloseTo(45, 6);
    expect(Number.parseFloat(band?.getAttribute('width') ?? '')).toBeCloseTo(10, 6);
    expect(picture.querySelectorAll('.posting.raises')).toHaveLength(1);
  });

  it('draws only what is known', () => {
    const picture = draw({ carried: { value: 0.6 } });
    for (const mark of ['.opening', '.posting', '.expected', '.target', '.band']) {
      expect(picture.querySelector(mark)).toBeNull();
    }
  });

  it('is a sentence for those who listen', () => {
    expect(
      draw({ opening: 0.601, carried: { value: 0.594, expandedU: 0.008 }, target: 0.59 }).getAttribute(
        'aria-label',
      ),
    ).toBe(
      'Drag area: opens at 0.601\u202fm²; carried 0.594 ±\u00a00.008\u202fm²; target 0.590\u202fm²; over target.',
    );
    expect(draw({}).getAttribute('aria-label')).toBe('No drag area yet.');
  });

  it('says that a figure is simulated by word and by mark', () => {
    const picture = draw({ carried: { value: 0.6 }, simulated: true });
    expect(picture.getAttribute('aria-label')).toContain('simulated and not measured');
    expect(picture.querySelector('.carried.simulated')).not.toBeNull();
  });
});
