import { inputBinding, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { CorrelationPair } from '#shared/contracts/correlations';
import { ECHARTS_LOADER } from '../../ui/chart/echarts-loader';
import { FitPanel } from './fit-panel';

const pair = (geometry: string, dragAreaM2: number, referenceDragAreaM2: number): CorrelationPair => ({
  geometry,
  dragAreaM2,
  uM2: 0.004,
  referenceDragAreaM2,
  referenceUM2: 0.003,
});
const PAIRS = [
  pair('Hatch', 0.5, 0.508),
  pair('Estate', 0.55, 0.562),
  pair('Van', 0.6, 0.609),
  pair('Coupé', 0.65, 0.664),
  pair('Tall box', 0.9, 0.86),
];

describe('the line through pairs, as it is shown', () => {
  const init = jest.fn(() => ({
    setOption: jest.fn(),
    on: jest.fn(),
    off: jest.fn(),
    resize: jest.fn(),
    dispose: jest.fn(),
    isDisposed: () => false,
    getWidth: () => 400,
    getHeight: () => 300,
  }));
  const shown = (pairs: readonly CorrelationPair[]): HTMLElement => {
    TestBed.configureTestingModule({
      providers: [{ provide: ECHARTS_LOADER, useValue: () => Promise.resolve({ init }) }],
    });
    const fixture = TestBed.createComponent(FitPanel, {
      bindings: [
        inputBinding('pairs', signal(pairs)),
        inputBinding('from', signal('Burnholt')),
        inputBinding('to', signal('Halmere')),
      ],
    });
    fixture.detectChanges();
    return fixture.nativeElement as HTMLElement;
  };
  const words = (element: Element | null | undefined) =>
    element?.textContent?.replace(/\s+/g, ' ').trim() ?? '';

  it('says the line, how sure it is and where it holds', () => {
    const host = shown(PAIRS);
    expect(words(host.querySelector('.line'))).toMatch(
      /^Drag area in Halmere = 0\.\d{4} m² \+ 0\.\d{3} × drag area in Burnholt$/,
    );
    const figures = words(host.querySelector('dl'));
    expect(figures).toContain('Holds from0.5000 m² to 0.9000 m²; a figure outside is refused');
    expect(figures).toContain('5, 3 degrees of freedom');
  });

  it('names the pair without which the line would lie elsewhere, and has both tables behind the charts', () => {
    const host = shown(PAIRS);
    expect(words(host.querySelector('.wl-notice'))).toContain('Look twice at Tall box');
    host.querySelectorAll<HTMLElement>('[aria-expanded]').forEach((opener) => opener.click());
    TestBed.tick();
    const [first, second] = host.querySelectorAll('table');
    expect(words(first)).toContain('Coupé0.65000.00400.66400.0030');
    expect(words(second)).toContain('an offset is left');
  });

  it('says of two pairs that only an offset is fitted', () => {
    expect(words(shown(PAIRS.slice(0, 2)).querySelector('dl'))).toContain(
      '1: under five pairs only the offset is fitted',
    );
  });

  it('says why there is no line, and draws none', () => {
    const host = shown(PAIRS.map((one) => ({ ...one, referenceDragAreaM2: 1.5 - one.dragAreaM2 })));
    expect(words(host)).toContain('The line falls: more drag in one facility would be less in the other');
    expect(host.querySelector('wl-chart')).toBeNull();
  });

  it('says that two pairs are needed where there is none', () => {
    expect(words(shown([]))).toContain('At least two pairs are needed');
  });
});
