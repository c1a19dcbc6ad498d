import fc from 'fast-check';
import { rankingView } from '../../contracts/rankings';
import {
  fiveVariants,
  manyVariants,
  SHORT_CYCLE,
  type RankingScenario,
} from '../../testing/ranking-scenario';
import { sampleLowest } from './lowest-sampling';
import { evaluateRank } from './rank';
import { DEFAULT_CHOICES, type RankingChoices } from './ranking-choices';
import { buildRankingView } from './ranking-view-build';
import { lowestInputOfView } from './ranking-view-lowest';

const CHOICES: RankingChoices = { ...DEFAULT_CHOICES, cycle: 'short' };
const view = ({ inputs, context }: RankingScenario, changes: Partial<RankingChoices> = {}) =>
  buildRankingView(inputs, context, { ...CHOICES, ...changes });
const machine = ({ inputs }: RankingScenario, basis: 'zero-yaw' | 'wind-averaged' = 'zero-yaw') =>
  evaluateRank(
    {
      ...inputs,
      request: { basis, cycle: { timeS: SHORT_CYCLE.timeS, speedKmh: SHORT_CYCLE.speedKmh } },
    },
    () => undefined,
  );

describe('the ranking as it is shown', () => {
  it.each(['zero-yaw', 'wind-averaged'] as const)('holds what the machine entry answers, %s', (basis) => {
    const scenario = fiveVariants();
    const shown = view(scenario, { basis });
    const answered = machine(scenario, basis);
    expect(shown.rows.map(({ variantId }) => variantId)).toEqual(answered.orderByDragArea);
    expect(shown.groups.map(({ variantIds }) => variantIds)).toEqual(answered.inseparableGroups);
    shown.rows.forEach((row, index) => {
      const ranked = answered.ranking[index];
      const energy = answered.energy?.find(({ variantId }) => variantId === row.variantId);
      expect(row.figure.dragAreaM2).toBe(ranked?.dragAreaM2);
      expect(row.figure.expandedUncertaintyM2).toBe(ranked?.expandedUncertaintyM2);
      expect(row.onCommonArea.value).toBe(ranked?.coefficientOnCommonArea);
      expect(row.onOwnArea.value).toBe(ranked?.coefficientOnOwnArea);
      expect(row.energy?.wheelEnergyWhPerKm).toBe(energy?.wheelEnergyWhPerKm);
      expect(row.probabilityLowerThanNext).toBe(answered.probabilityLowerThanLaterOnes[index]?.[0] ?? null);
    });
    expect(shown.stayedOut.map(({ resultId, rules }) => [resultId, rules.map(({ rule }) => rule)])).toEqual(
      answered.excludedResults.map(({ resultId, rules }) => [resultId, rules]),
    );
    expect(sampleLowest(lowestInputOfView(shown))).toEqual(answered.probabilityLowest);
  });

  it('is what its contract says', () => {
    expect(rankingView.parse(view(fiveVariants()))).toEqual(view(fiveVariants()));
  });

  it('says that the order on own areas differs, and who is misplaced by how much', () => {
    const [notice] = view(fiveVariants()).notices;
    expect(notice?.order).toBe('own-area');
    expect(notice?.inversions).toEqual([
      expect.objectContaining({
        name: 'Sport',
        direction: 'behind',
        others: [expect.objectContaining({ name: 'Tourer' })],
        extreme: 'smallest',
      }),
    ]);
    expect(notice?.inversions[0]?.value).toBeGreaterThan(notice?.inversions[0]?.others[0]?.value ?? 1);
  });

  it('brackets variants that the evidence cannot tell apart, with the probability', () => {
    const scenario = fiveVariants();
    const [, hatch] = scenario.inputs.variants;
    const twin = { ...hatch!, id: 'twin', name: 'Twin' };
    const own = scenario.inputs.results.find(({ variantId }) => variantId === 'hatch')!;
    const inputs = {
      ...scenario.inputs,
      variants: [...scenario.inputs.variants, twin],
      results: [...scenario.inputs.results, { ...own, id: 'r-twin', variantId: 'twin' }],
    };
    const group = view({ ...scenario, inputs }).groups.find(({ variantIds }) => variantIds.includes('twin'));
    expect(group?.names.slice(0, 2)).toEqual(['Hatch', 'Twin']);
    expect([group?.fromRank, group?.toRank]).toEqual([2, 3]);
    expect(group?.difference).toBe(0);
    expect(group?.probability).toBeCloseTo(0.5, 12);
  });

  it('lists what stayed out with the items that differ, the words of a refusal and the remedy', () => {
    const { stayedOut } = view(fiveVariants());
    const fixed = stayedOut.find(({ name }) => name === 'VT-0003');
    expect(fixed?.rules).toEqual([
      expect.objectContaining({
        rule: 'not-comparable',
        remedy: 'include-with-reason',
        items: [{ item: 'ground', reference: 'one-belt', stated: 'fixed-floor' }],
      }),
    ]);
    const refused = stayedOut.find(({ name }) => name === 'VT-0004')?.rules[0];
    expect(refused?.rule).toMatch(/^refused:/);
    expect(refused?.detail).toBeTruthy();
  });

  it('ranks an adopted result before a newer one, and says that there is a newer one', () => {
    const scenario = fiveVariants();
    const older = scenario.inputs.results.find(({ id }) => id === 'r-hatch')!;
    const newer = {
      ...older,
      id: 'r-new',
      name: 'VT-0099',
      testDate: '2026-11-20',
      points: older.points!.map((point) => ({ ...point, value: point.value! * 1.2 })),
    };
    const changed = {
      inputs: { ...scenario.inputs, results: [...scenario.inputs.results, newer] },
      context: {
        ...scenario.context,
        adoptions: [
          {
            id: 'a-1',
            variantId: 'hatch',
            resultIds: ['r-hatch'],
            rule: 'newest' as const,
            at: '2026-11-21T08:00:00Z',
            by: 'Ines',
          },
        ],
      },
    };
    const hatch = (evidence: 'adopted' | 'newest') =>
      view(changed, { evidence }).rows.find(({ variantId }) => variantId === 'hatch');
    expect(hatch('adopted')?.evidence[0]?.resultId).toBe('r-hatch');
    expect(hatch('adopted')?.newer?.name).toBe('VT-0099');
    expect(hatch('newest')?.evidence[0]?.resultId).toBe('r-new');
    expect(hatch('newest')?.newer).toBeNull();
  });

  it('lets a base configuration stand in where the chosen one is missing, and says so', () => {
    const { inputs, context } = fiveVariants();
    const variants = context.variants.map((variant) =>
      variant.id === 'sport'
        ? {
            ...variant,
            configurations: [
              ...variant.configurations,
              { id: 'p', name: 'Petrol', massKg: 1400, rollingResistance: 0.009, salesShare: 0 },
            ],
          }
        : variant,
    );
    const { rows } = view({ inputs, context: { ...context, variants } }, { configuration: 'Petrol' });
    const by = new Map(rows.map((row) => [row.variantId, row]));
    expect([by.get('sport')?.massKg, by.get('sport')?.baseStandsIn]).toEqual([1400, false]);
    expect([by.get('hatch')?.massKg, by.get('hatch')?.baseStandsIn]).toEqual([1480, true]);
  });

  it('keeps a variant without mass in the order by energy, at its end and named', () => {
    const { inputs, context } = fiveVariants();
    const variants = context.variants.map((variant) =>
      variant.id === 'liftback' ? { ...variant, configurations: [] } : variant,
    );
    const shown = view({ inputs, context: { ...context, variants } }, { order: 'energy' });
    expect(shown.rows.at(-1)?.variantId).toBe('liftback');
    expect(shown.rows.at(-1)?.energy).toBeNull();
    expect(shown.withoutEnergy).toEqual([{ variantId: 'liftback', name: 'Liftback' }]);
    const energies = shown.rows.slice(0, -1).map(({ energy }) => energy?.wheelEnergyWhPerKm ?? 0);
    expect(energies).toEqual(energies.toSorted((a, b) => a - b));
  });

  it('leaves choices that do not fit at their defaults, and says which', () => {
    const shown = view(fiveVariants(), {
      area: { kind: 'variant', variantId: 'gone' },
      air: { kind: 'stated', air: { temperatureC: 200, pressurePa: 1e5, relativeHumidity: 0 } },
      cycle: 'gone',
      configuration: 'gone',
    });
    expect(shown.ignored).toEqual(['area', 'air', 'cycle', 'configuration']);
    expect(shown.commonAreaM2).toBe(2.19);
  });

  it('gives the same order, groups and drag areas on any common area', () => {
    const scenario = manyVariants(24);
    const own = view(scenario);
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 50, noNaN: true }), (areaM2) => {
        const other = view(scenario, { area: { kind: 'typed', areaM2 } });
        expect(other.rows.map(({ variantId }) => variantId)).toEqual(
          own.rows.map(({ variantId }) => variantId),
        );
        expect(other.groups).toEqual(own.groups);
        other.rows.forEach((row, index) => {
          expect(row.figure).toEqual(own.rows[index]?.figure);
          expect(row.onCommonArea.value * areaM2).toBeCloseTo(row.figure.dragAreaM2, 12);
        });
      }),
      { numRuns: 40 },
    );
  });

  it('draws groups ever wider as more confidence is asked for', () => {
    const scenario = manyVariants(40);
    const widest = (confidence: number): number =>
      Math.max(0, ...view(scenario, { confidence }).groups.map(({ variantIds }) => variantIds.length));
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 0.999, noNaN: true }), (confidence) => {
        expect(widest(Math.min(0.9999, confidence + 0.0005))).toBeGreaterThanOrEqual(widest(confidence));
      }),
      { numRuns: 30 },
    );
  });
});
