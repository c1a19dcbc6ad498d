import { TestBed } from '@angular/core/testing';
import { DEFAULT_POLICIES } from '#shared/core/constants';
import { skinFriction } from '#shared/core/similarity/skin-friction';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { decadeTicks } from './sweep-chart-options';
import { readSweep } from './sweep-view';
import { offTheFit, sweepVerdicts } from './sweep-words';

const reference = {
  referenceReynolds: 1e7,
  policies: { ...DEFAULT_POLICIES, policyId: 'policy', frictionLine: 'on' } as never,
};
const onTheLine = (reynolds: number, k: number) => ({
  reynolds,
  dragAreaM2: 0.6 + k * skinFriction(reynolds),
});
const sweep = (k: number, ...reynolds: readonly number[]) =>
  readSweep(
    reynolds.map((each) => onTheLine(each, k)),
    reference,
  );

function fitted(reading: ReturnType<typeof readSweep>) {
  if (reading.kind !== 'fitted') throw new Error(reading.why.detail);
  return reading.view;
}

describe('a Reynolds sweep on screen', () => {
  const words = (reading: ReturnType<typeof readSweep>) =>
    sweepVerdicts(fitted(reading), TestBed.inject(QuantityFormat))
      .map((each) => each.words)
      .join(' ');

  it('draws the line through points that lie on it, with no band', () => {
    const view = fitted(sweep(20, 2e6, 4e6, 6e6, 8e6));
    for (const { reynolds, dragAreaM2, expandedUncertaintyM2 } of view.curve) {
      expect(dragAreaM2).toBeCloseTo(0.6 + 20 * skinFriction(reynolds), 10);
      expect(expandedUncertaintyM2).toBeLessThan(1e-9);
    }
    expect(view.points.every((point) => Math.abs(offTheFit(view, point)) < 1e-12)).toBe(true);
  });

  it('spans all points and the reference', () => {
    const { curve } = fitted(sweep(1, 1.5e6, 2e6, 4e6, 6e6));
    expect(curve[0]?.reynolds).toBeLessThan(1.5e6);
    expect(curve.at(-1)?.reynolds).toBeGreaterThan(1e7);
  });

  it('says that a flat sweep above the minimum resolves the caution about transition', () => {
    expect(words(sweep(1, 1.5e6, 2e6, 4e6, 6e6))).toContain('resolved');
  });

  it('says that a sweep wholly below the minimum leaves the caution standing', () => {
    const below = words(sweep(0.5, 0.4e6, 0.8e6, 1.2e6, 1.9e6));
    expect(below).toContain('wholly below');
    expect(below).toContain('stands');
  });

  it('says that a steep sweep is not flat although it reaches above the minimum', () => {
    expect(words(sweep(60, 1.5e6, 2e6, 4e6, 6e6))).toMatch(/Not flat.*but is not flat/);
  });

  it('refuses two points and equal Reynolds numbers by the method’s own codes', () => {
    expect(sweep(1, 2e6, 4e6)).toMatchObject({ kind: 'refused', why: { code: 'sweep-too-few-points' } });
    expect(sweep(1, 2e6, 2e6, 2e6, 2e6)).toMatchObject({
      kind: 'refused',
      why: { code: 'sweep-too-narrow' },
    });
  });

  it('refuses to reach for a reference further away than the sweep is wide', () => {
    expect(sweep(1, 0.9e6, 1.1e6, 1.4e6, 1.9e6)).toMatchObject({
      kind: 'refused',
      why: { code: 'sweep-extrapolation' },
    });
  });

  it('labels 1, 2 and 5 of each decade', () => {
    expect(decadeTicks(1.5e6, 1.1e7)).toEqual([2e6, 5e6, 1e7]);
  });
});
