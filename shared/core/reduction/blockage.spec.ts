import * as fc from 'fast-check';
import { DEFAULT_POLICIES } from '../constants';
import { blockageRatio, blockageVerdict, correctForBlockage, frontalAreaThroughBlockage } from './blockage';

const within = (found: number, expected: number, allowed: number): void =>
  expect(Math.abs(found - expected)).toBeLessThanOrEqual(allowed);

describe('The area-ratio method', () => {
  it('gives q_c/q = 1.024 for 3.06 ft² in 64.5 ft² (SAE 700036 (1970), table II, column Pope)', () => {
    const ratio = blockageRatio(1, 3.06, 64.5);
    within(ratio / 4, 0.01186, 5e-4);
    const corrected = correctForBlockage({ method: 'area-ratio' }, 1, ratio, 64.5);
    within(1 / corrected.modelDragAreaM2, 1.024, 5e-4);
  });

  it('lies between the other methods of that table, 1.019 (Hensel) and 1.054 (Herriot), which differ threefold', () => {
    const factor = 1 / correctForBlockage({ method: 'area-ratio' }, 1, 3.06 / 64.5, 64.5).modelDragAreaM2;
    expect(factor).toBeGreaterThan(1.019);
    expect(factor).toBeLessThan(1.054);
  });

  it('makes 0.292638 of 0.3 at 5 % (computed)', () => {
    const corrected = correctForBlockage({ method: 'area-ratio' }, 0.3, 0.05, 20).modelDragAreaM2;
    within(corrected, 0.292638, 3e-6);
    // One-dimensional continuity overcorrects: 0.27075 is the bound (computed).
    expect(corrected).toBeGreaterThan(0.3 * 0.95 ** 2);
  });

  it('carries the frontal area as the derivative through β does', () => {
    const dragArea = (areaM2: number): number =>
      correctForBlockage({ method: 'area-ratio' }, 0.1, blockageRatio(0.4, areaM2, 8), 8).modelDragAreaM2 /
      0.16;
    const slope = (dragArea(2.3 + 1e-5) - dragArea(2.3 - 1e-5)) / 2e-5;
    const ratio = blockageRatio(0.4, 2.3, 8);
    const amount = frontalAreaThroughBlockage({ method: 'area-ratio' }, dragArea(2.3), 0.4, 1, ratio, 8);
    within(amount, slope, 1e-8);
  });
});

it("Maskell's method makes 0.289157 of 0.3 at S/C = 0.05, θ = 5/2 (ARC R&M 3400; θ from memory)", () => {
  const method = { method: 'maskell', theta: 2.5 };
  within(correctForBlockage(method, 0.3 * 2, 0.05, 40).modelDragAreaM2 / 2, 0.289157, 3e-6);
});

it('every method reports the derivative of its own correction', () => {
  const methods = [
    { method: 'none' },
    { method: 'area-ratio' },
    { method: 'maskell', theta: 1.7 },
    { method: 'factor', factor: 1.02 },
  ];
  fc.assert(
    fc.property(fc.constantFrom(...methods), fc.double({ min: 0.01, max: 1, noNaN: true }), (method, x) => {
      const at = (value: number): number => correctForBlockage(method, value, 0.06, 9).modelDragAreaM2;
      const slope = (at(x + 1e-5) - at(x - 1e-5)) / 2e-5;
      return Math.abs(correctForBlockage(method, x, 0.06, 9).derivative - slope) < 1e-8;
    }),
  );
});

describe('The limits of blockage', () => {
  it('are 0.05 and 0.10 in closed sections (SAE J1252 and older practice, memory), also for slotted walls', () => {
    expect(DEFAULT_POLICIES).toMatchObject({ blockageCaution: 0.05, blockageExcluded: 0.1 });
    for (const kind of ['closed', 'slotted'] as const) {
      expect([0.05, 0.051, 0.1, 0.101].map((ratio) => blockageVerdict(kind, ratio))).toEqual([
        'passes',
        'caution',
        'caution',
        'excluded',
      ]);
    }
  });

  it('are 0.35 of the nozzle in open jets (Regulation (EU) 2017/1151, Annex XXI, Sub-Annex 4, 3.2.4)', () => {
    expect([0.1, 0.35, 0.351].map((ratio) => blockageVerdict('open-jet', ratio))).toEqual([
      'passes',
      'passes',
      'excluded',
    ]);
  });

  it('end where the model would fill the section', () => {
    expect(() => blockageRatio(1, 2, 2)).toThrow('model-larger-than-section');
    expect(() => correctForBlockage({ method: 'solid' }, 1, 0.1, 9)).toThrow('unknown-method');
  });
});
