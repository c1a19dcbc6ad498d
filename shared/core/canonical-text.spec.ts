import fc from 'fast-check';
import { canonicalText } from './canonical-text';

describe('canonical text', () => {
  it('is the same whatever the order of the keys, with what is absent left out', () => {
    expect(canonicalText({ b: [1, { d: null, c: 2 }], a: undefined, e: 'x' })).toBe(
      '{"b":[1,{"c":2}],"e":"x"}',
    );
    expect(canonicalText({ a: 1, b: 2 })).toBe(canonicalText({ b: 2, a: 1 }));
  });

  it('keeps the order and the gaps of a list', () => {
    expect(canonicalText([2, null, 1])).toBe('[2,null,1]');
  });

  it('brings back every number to the last digit', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (number) => {
        expect((JSON.parse(canonicalText({ number })) as { number: number }).number).toBe(number + 0);
      }),
    );
  });
});
