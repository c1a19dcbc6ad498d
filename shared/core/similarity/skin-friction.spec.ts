import * as fc from 'fast-check';
import { moveAlongFrictionLine } from './friction-line';
import { evaluateFrictionLine } from './friction-line-operation';
import { reynoldsOfSkinFriction, skinFriction } from './skin-friction';

const reynolds = fc.double({ min: 1e4, max: 1e8, noNaN: true });
const dragArea = fc.double({ min: 0.1, max: 3, noNaN: true });
const share = fc.double({ min: 0, max: 0.5, noNaN: true });

describe('Skin friction after Prandtl and Schlichting', () => {
  it.each([
    [1e6, 4.471e-3],
    [5e6, 3.364e-3],
    [1e7, 3.004e-3],
  ])('at Re %d is %d (evaluated apart, four figures)', (re, expected) => {
    expect(skinFriction(re)).toBeCloseTo(expected, 6);
  });

  it('falls as the Reynolds number grows', () => {
    fc.assert(
      fc.property(reynolds, fc.double({ min: 1.001, max: 10, noNaN: true }), (re, factor) => {
        expect(skinFriction(re * factor)).toBeLessThan(skinFriction(re));
      }),
    );
  });

  it('is inverted exactly', () => {
    fc.assert(
      fc.property(reynolds, (re) => {
        expect(reynoldsOfSkinFriction(skinFriction(re)) / re).toBeCloseTo(1, 10);
      }),
    );
  });

  it.each([1000, 0, -5, NaN])('says nothing about Re %d', (re) => {
    expect(() => skinFriction(re)).toThrow(expect.objectContaining({ code: 'reynolds-out-of-range' }));
  });
});

describe('The friction line', () => {
  const policies = { frictionShare: 0.12, frictionShareU: 0.06 };

  it('asks for 1.441 % from 5e6 to 1e7 at a share of 0.12', () => {
    const { dragAreaAtReferenceM2 } = moveAlongFrictionLine(1, 5e6, 1e7, policies);
    expect(Math.abs(100 * (1 / dragAreaAtReferenceM2 - 1) - 1.441)).toBeLessThan(0.001);
  });

  it('has amounts that are the derivatives of the move itself', () => {
    fc.assert(
      fc.property(dragArea, reynolds, reynolds, share, (cda, test, reference, frictionShare) => {
        const at = (changedShare: number, changedArea: number): number =>
          moveAlongFrictionLine(changedArea, test, reference, {
            frictionShare: changedShare,
            frictionShareU: 0,
          }).dragAreaAtReferenceM2;
        const move = moveAlongFrictionLine(cda, test, reference, { frictionShare, frictionShareU: 0.06 });
        const byShare = (at(frictionShare + 1e-5, cda) - at(frictionShare - 1e-5, cda)) / 2e-5;
        const byArea = (at(frictionShare, cda + 1e-5) - at(frictionShare, cda - 1e-5)) / 2e-5;
        expect(move.frictionShareAmountM2).toBeCloseTo(byShare * 0.06, 7);
        expect(move.derivative).toBeCloseTo(byArea, 8);
      }),
    );
  });

  it('moves there and back to the same figure, up in the one direction and down in the other', () => {
    fc.assert(
      fc.property(dragArea, reynolds, reynolds, share, (cda, test, reference, frictionShare) => {
        const one = { frictionShare, frictionShareU: 0 };
        const there = moveAlongFrictionLine(cda, test, reference, one).dragAreaAtReferenceM2;
        if (reference > test) expect(there).toBeLessThanOrEqual(cda);
        else expect(there).toBeGreaterThanOrEqual(cda);
        // The share is that at the reference, so the way back has the share that is left there.
        const drag = 1 + frictionShare * (skinFriction(test) / skinFriction(reference) - 1);
        const shareAtTest = (frictionShare * skinFriction(test)) / skinFriction(reference) / drag;
        const back = { frictionShare: shareAtTest, frictionShareU: 0 };
        expect(moveAlongFrictionLine(there, reference, test, back).dragAreaAtReferenceM2).toBeCloseTo(
          cda,
          11,
        );
      }),
    );
  });

  it('leaves a result alone that was tested at the reference', () => {
    expect(evaluateFrictionLine({ dragAreaM2: 0.65, testReynolds: 8e6, referenceReynolds: 8e6 })).toEqual({
      dragAreaAtReferenceM2: 0.65,
      derivative: 1,
      frictionShareAmountM2: -0,
      reynoldsShapeAmountM2: 0,
    });
  });
});
