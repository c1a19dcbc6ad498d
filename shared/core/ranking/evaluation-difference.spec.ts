import fc from 'fast-check';
import { evaluationDifferences, roundedNumbers } from './evaluation-difference';

describe('two evaluations compared', () => {
  it('are the same to 1e-12 of each number, and differ beyond it', () => {
    const stored = { figure: { dragAreaM2: 0.6 } };
    const now = (part: number) => ({ figure: { dragAreaM2: 0.6 * (1 + part) } });
    expect(evaluationDifferences(stored, now(9e-13))).toEqual([]);
    const [difference] = evaluationDifferences(stored, now(2e-12));
    expect(difference).toMatchObject({ field: 'figure.dragAreaM2', stored: 0.6 });
    expect(difference?.difference).toBeCloseTo(1.2e-12, 15);
  });

  it('name every field that differs by its path, one that is missing as nothing', () => {
    const differences = evaluationDifferences(
      { steps: [{ step: 'reynolds', dragAreaM2: 0.6 }], cautions: [], windAveraged: null },
      {
        steps: [{ step: 'reynolds', dragAreaM2: 0.5 }],
        cautions: ['mach'],
        windAveraged: { dragAreaM2: 0.7 },
      },
    );
    expect(differences.map(({ field, stored, now }) => [field, stored, now])).toEqual([
      ['steps.0.dragAreaM2', 0.6, 0.5],
      ['cautions.0', null, 'mach'],
      ['windAveraged.dragAreaM2', null, 0.7],
    ]);
    expect(differences[1]?.difference).toBeNull();
  });

  it('take a number below the floor of all amounts for nothing', () => {
    expect(evaluationDifferences({ shift: 3e-17 }, { shift: -2e-17 })).toEqual([]);
    expect(evaluationDifferences({ shift: 3e-14 }, { shift: -2e-14 })).toHaveLength(1);
  });

  it('do not differ by what rounding for storage costs', () => {
    const figure = fc.record({
      dragAreaM2: fc.double({ min: 1e-6, max: 10, noNaN: true }),
      shares: fc.array(fc.double({ min: -1, max: 1, noNaN: true })),
    });
    fc.assert(
      fc.property(figure, (value) => {
        const stored = roundedNumbers(value);
        expect(evaluationDifferences(stored, value)).toEqual([]);
        expect(roundedNumbers(stored)).toEqual(stored);
      }),
    );
  });
});
