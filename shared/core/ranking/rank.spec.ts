import * as fc from 'fast-check';
import { dynamicPressureOf } from '../similarity/flow';
import { airOf } from '../air/air';
import { aFacility, aRanking, aResult, aVariant } from '../testing/ranking-builders';
import { evaluateRank } from './rank';
import type { RankingInput, ResultInput } from './ranking-input';

const noCycles = (): undefined => undefined;
const rank = (input: RankingInput) => evaluateRank(input, noCycles);
const within = (found: number | undefined, expected: number, allowed: number): void =>
  expect(Math.abs((found ?? NaN) - expected)).toBeLessThanOrEqual(allowed);

describe('The Ahmed body (SAE 840300; C_D by slant from a secondary copy): A = 0.112 m², 60 m/s, length 1.044 m', () => {
  const slants: readonly (readonly [string, number])[] = [
    ['0', 0.25],
    ['12.5', 0.23],
    ['25', 0.285],
    ['30', 0.378],
    ['35', 0.26],
    ['40', 0.255],
  ];
  const seaLevel = { state: 'iso-2533-sea-level' };
  const warm = { temperatureC: 27, pressurePa: 95000, relativeHumidity: 0.4 };
  const q = dynamicPressureOf(60, airOf(warm).densityKgM3);
  const base = { facilityId: 'jet', speedKmh: 216, blockageAlreadyCorrectedBy: 'the source', scale: 1 };
  const results = slants.map(([slant, coefficient], i): ResultInput => {
    const asForce = { quantity: 'force', tareAlreadySubtracted: true, air: warm };
    const points = [{ value: i % 2 === 0 ? coefficient : coefficient * 0.112 * q }];
    if (i === 4) {
      const onAnother = { quotedAreaM2: 0.1, points: [{ value: (coefficient * 0.112) / 0.1 }] };
      return aResult(`r${slant}`, slant, { ...base, air: seaLevel, ...onAnother });
    }
    return aResult(`r${slant}`, slant, {
      ...base,
      quotedAreaM2: 0.112,
      air: seaLevel,
      points,
      ...(i % 2 === 1 && asForce),
    });
  });
  const output = rank(
    aRanking({
      programme: { ...aRanking().programme, characteristicLengthM: 1.044, commonAreaM2: 0.112 },
      facilities: [aFacility('jet', { kind: 'open-jet', areaM2: 6 })],
      variants: slants.map(([slant]) => aVariant(slant, { frontalAreaM2: 0.112 })),
      results,
    }),
  );

  it('comes out in the order 12.5, 0, 40, 35, 25, 30, half of it entered as forces in another air', () => {
    expect(output.orderByDragArea).toEqual(['12.5', '0', '40', '35', '25', '30']);
  });

  it('has drag areas from 0.02576 to 0.04234 m² and the coefficients that went in', () => {
    within(output.ranking[0]?.dragAreaM2, 0.02576, 5e-6);
    within(output.ranking.at(-1)?.dragAreaM2, 0.04234, 5e-6);
    for (const [slant, coefficient] of slants) {
      const row = output.ranking.find((one) => one.variantId === slant);
      within(row?.coefficientOnCommonArea, coefficient, 0.005);
      within(row?.coefficientOnOwnArea, coefficient, 1e-12);
    }
  });

  it('was measured at Re 4.29e6', () => {
    within(output.reducedResults[0]?.reynolds ?? undefined, 4.29e6, 4.29e3);
  });
});

describe('Invariance', () => {
  const area = fc.double({ min: 0.5, max: 5, noNaN: true });

  it('C_D·A does not depend on the area that a source divided by, nor on where it states it', () => {
    fc.assert(
      fc.property(
        area,
        fc.constantFrom('model', 'full'),
        fc.double({ min: 0.2, max: 1, noNaN: true }),
        (a, at, s) => {
          const areaAtModel = at === 'full' ? a * s * s : a;
          const result = aResult('r', 'a', {
            scale: s,
            quotedAreaM2: a,
            quotedAreaScale: at as 'model' | 'full',
            points: [{ value: (0.63 * s * s) / areaAtModel, n: 4 }],
            blockageAlreadyCorrectedBy: 'the source',
          });
          within(rank(aRanking({ results: [result] })).ranking[0]?.dragAreaM2, 0.63, 1e-12);
        },
      ),
    );
  });

  it('C_D·A of a similar model does not depend on its scale, correction for blockage included', () => {
    const dragArea = (scale: number): number | undefined => {
      const facility = aFacility('tunnel', {
        areaM2: 46 * scale * scale,
        blockage: { method: 'maskell', theta: 1.4 },
      });
      const results = [aResult('r', 'a', { scale })];
      return rank(aRanking({ facilities: [facility], results })).ranking[0]?.dragAreaM2;
    };
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 1, noNaN: true }), (scale) => {
        within(dragArea(scale), dragArea(1) ?? NaN, 1e-12);
      }),
    );
  });

  const several = (values: readonly number[]): RankingInput =>
    aRanking({
      variants: values.map((_, i) => aVariant(`v${i}`, { frontalAreaM2: 2 + (i % 4) / 10 })),
      results: values.map((value, i) =>
        aResult(`r${i}`, `v${i}`, { points: [{ value, s: 0.001, n: 3 }], blockageAlreadyCorrectedBy: 'x' }),
      ),
    });
  const values = fc.array(fc.double({ min: 0.2, max: 0.4, noNaN: true }), { minLength: 2, maxLength: 12 });

  it('the ranking, its figures and probabilities do not depend on the common area', () => {
    fc.assert(
      fc.property(values, area, (list, commonAreaM2) => {
        const input = several(list);
        const other = rank({ ...input, programme: { ...input.programme, commonAreaM2 } });
        const first = rank(input);
        expect(other.orderByDragArea).toEqual(first.orderByDragArea);
        expect(other.inseparableGroups).toEqual(first.inseparableGroups);
        expect(other.probabilityLowerThanLaterOnes).toEqual(first.probabilityLowerThanLaterOnes);
        expect(other.probabilityLowest).toEqual(first.probabilityLowest);
      }),
      { numRuns: 8 },
    );
  });

  it('the groups are the maximal runs without a separable pair, found by trying all', () => {
    fc.assert(
      fc.property(values, (list) => {
        const {
          probabilityLowerThanLaterOnes: table,
          inseparableGroups,
          orderByDragArea,
        } = rank(several(list));
        const separable = (i: number, j: number): boolean => {
          const p = table[i]?.[j - i - 1] ?? NaN;
          return Math.max(p, 1 - p) >= 0.95;
        };
        const isRun = (from: number, to: number): boolean => {
          for (let i = from; i < to; i++) for (let j = i + 1; j <= to; j++) if (separable(i, j)) return false;
          return true;
        };
        const expected: string[][] = [];
        const last = orderByDragArea.length - 1;
        for (let from = 0; from < last; from++) {
          for (let to = from + 1; to <= last; to++) {
            const grows = (from > 0 && isRun(from - 1, to)) || (to < last && isRun(from, to + 1));
            if (isRun(from, to) && !grows) expected.push(orderByDragArea.slice(from, to + 1));
          }
        }
        expect(inseparableGroups).toEqual(expected);
      }),
      { numRuns: 15 },
    );
  });

  it('a larger reading never ranks lower, and the facility’s bias cancels between its results', () => {
    const biased = (biasURelative: number) => {
      const input = several([0.28, 0.28001]);
      return rank({ ...input, facilities: [aFacility('tunnel', { biasURelative, biasUM2: 0 })] });
    };
    expect(biased(0).orderByDragArea).toEqual(['v0', 'v1']);
    within(
      biased(0.05).probabilityLowerThanLaterOnes[0]?.[0],
      biased(0).probabilityLowerThanLaterOnes[0]?.[0] ?? NaN,
      1e-5,
    );
  });
});

describe('Evidence', () => {
  const dated = (id: string, testDate: string, changes: Partial<ResultInput> = {}): ResultInput =>
    aResult(id, 'a', { testDate, ...changes });
  const used = (results: readonly ResultInput[]) => rank(aRanking({ results })).ranking[0]?.resultIds;

  it('is the newest by date, then by entry, then by id', () => {
    expect(used([dated('r2', '2031-05-02'), dated('r1', '2031-05-01')])).toEqual(['r2']);
    expect(
      used([
        dated('r1', '2031-05-01', { entrySequence: 3 }),
        dated('r2', '2031-05-01', { entrySequence: 2 }),
      ]),
    ).toEqual(['r1']);
    expect(used([dated('r1', '2031-05-01'), dated('r2', '2031-05-01')])).toEqual(['r2']);
  });

  it('passes over what is refused, excluded or not comparable, and says why', () => {
    const results = [
      dated('good', '2031-01-01'),
      dated('other-floor', '2031-02-01', { condition: { ground: 'fixed-floor', wheels: 'rotating' } }),
      dated('supersonic', '2031-03-01', { speedKmh: 1300 }),
      dated('single-s', '2031-04-01', { points: [{ value: 0.3, s: 0.01 }] }),
    ];
    expect(used(results)).toEqual(['good']);
    expect(rank(aRanking({ results })).excludedResults).toEqual([
      { resultId: 'other-floor', variantId: 'a', rules: ['not-comparable'] },
      { resultId: 'single-s', variantId: 'a', rules: ['refused:repeatability-needs-two'] },
      { resultId: 'supersonic', variantId: 'a', rules: ['mach'] },
    ]);
  });

  it('may be missing: the variant is named and the rest is ranked', () => {
    const output = rank(aRanking({ variants: [aVariant('b'), aVariant('a'), aVariant('0')] }));
    expect(output.orderByDragArea).toEqual(['a']);
    expect(output.variantsWithoutEvidence.map((one) => one.variantId)).toEqual(['0', 'b']);
  });
});

describe('Energy', () => {
  const onCycle = (changes: Partial<RankingInput> = {}) =>
    rank(aRanking({ request: { cycle: { constantSpeedKmh: 100, durationS: 600 } }, ...changes }));
  const pair = (values: readonly number[], massKg: readonly number[]): Partial<RankingInput> => ({
    variants: values.map((_, i) => aVariant(`v${i}`, { massKg: massKg[i] ?? 1500 })),
    results: values.map((value, i) => aResult(`r${i}`, `v${i}`, { points: [{ value, n: 4 }] })),
  });

  it('grows with C_D·A and with mass', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.2, max: 0.3, noNaN: true }),
        fc.double({ min: 1.001, max: 1.5, noNaN: true }),
        (value, factor) => {
          expect(onCycle(pair([value, value * factor], [])).orderByEnergy).toEqual(['v0', 'v1']);
          expect(onCycle(pair([value, value], [1500, 1500 * factor])).orderByEnergy).toEqual(['v0', 'v1']);
        },
      ),
      { numRuns: 8 },
    );
  });

  it('says where its order differs from that of the drag areas', () => {
    const output = onCycle(pair([0.28, 0.281], [1900, 1200]));
    expect(output.orderByDragArea).toEqual(['v0', 'v1']);
    expect(output).toMatchObject({ orderByEnergy: ['v1', 'v0'], energyOrderDisagrees: true });
  });

  it('has the uncertainty of the drag area times the exchange rate', () => {
    const output = onCycle();
    const [energy] = output.energy ?? [];
    within(
      energy?.standardUncertaintyJ,
      (energy?.exchangeRateJPerM2 ?? NaN) * (output.ranking[0]?.standardUncertaintyM2 ?? NaN),
      1e-9,
    );
  });

  it('needs mass and rolling resistance of the variants that are ranked', () => {
    const without = (changes: object) => () => onCycle({ variants: [aVariant('a', changes)] });
    expect(without({ massKg: null })).toThrow('missing-input');
    expect(without({ rollingResistance: null })).toThrow('missing-input');
  });
});
