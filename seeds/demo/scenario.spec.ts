import { controlChart, type ChartSession } from '#shared/core/uncertainty/control-chart';
import { facilityFields } from '#shared/contracts/facilities';
import { resultFields } from '#shared/contracts/results';
import { variantFields } from '#shared/contracts/variants';
import { evaluateRank } from '#shared/core/ranking/rank';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { builtInCycle } from '../reference/cycles/built-in-cycles';
import { ALDERMERE_SCENARIO } from './scenario/aldermere';
import { rankingInputOf } from './scenario/ranking-input';
import { VELTHORPE_SCENARIO } from './scenario/velthorpe';
import { stableId } from './stable-id';

const rank = (
  evidence: 'adopted' | 'newest',
  request: NonNullable<RankingInput['request']> = {},
  scenario = ALDERMERE_SCENARIO,
) => evaluateRank(rankingInputOf(scenario, evidence, request), builtInCycle);

const adopted = rank('adopted', { cycle: 'wltc-class-3b' });
const everything = rank('newest');
const reducedOf = (resultId: string) => {
  const found = everything.reducedResults.find((reduced) => reduced.resultId === resultId);
  if (found === undefined) throw new Error(`${resultId} was not reduced`);
  return found;
};
const rawOf = (name: string) => {
  const found = ALDERMERE_SCENARIO.results.find((result) => result.name === name);
  if (found === undefined) throw new Error(`${name} is not in the scenario`);
  return found;
};
const rulesOf = (resultId: string) =>
  everything.excludedResults.find((excluded) => excluded.resultId === resultId)?.rules ?? [];

describe('the demo programme', () => {
  it('ranks its five bodies from 0.546 to 0.732 m²', () => {
    expect(
      adopted.ranking.map(({ variantId, dragAreaM2, expandedUncertaintyM2 }) => [
        variantId,
        dragAreaM2.toFixed(3),
        expandedUncertaintyM2.toFixed(3),
      ]),
    ).toEqual([
      ['liftback', '0.546', '0.007'],
      ['hatch', '0.595', '0.008'],
      ['sport', '0.600', '0.010'],
      ['tourer', '0.634', '0.009'],
      ['crossback', '0.732', '0.009'],
    ]);
  });

  it('has 45 results that stand and count, of which the method refuses one: beyond the range of the correlation', () => {
    expect(everything.reducedResults).toHaveLength(44);
    expect(everything.excludedResults.filter(({ rules }) => rules[0]?.startsWith('refused'))).toEqual([
      { resultId: 'M-24-105', variantId: 'crossback', rules: ['refused:correlation-range'] },
    ]);
  });

  it('would be ordered otherwise on each variant’s own area: Sport behind Tourer', () => {
    expect(adopted.ownAreaOrderDisagrees).toBe(true);
    expect(adopted.orderByOwnAreaCoefficient).toEqual(['liftback', 'hatch', 'tourer', 'sport', 'crossback']);
  });

  it('has two variants that cannot be separated, Hatch and Sport, and no other', () => {
    expect(adopted.inseparableGroups).toEqual([['hatch', 'sport']]);
    expect(adopted.probabilityLowerThanLaterOnes[1]?.[0]).toBeGreaterThan(0.6);
    expect(adopted.probabilityLowerThanLaterOnes[1]?.[0]).toBeLessThan(0.95);
  });

  it('costs Sport more energy than Tourer, by its wide tyres', () => {
    expect(adopted).toMatchObject({ energyOrderDisagrees: true });
    expect(adopted.orderByEnergy).toEqual(['liftback', 'hatch', 'tourer', 'sport', 'crossback']);
  });

  it('turns Hatch and Sport round where wind from the side is averaged in', () => {
    const averaged = rank('adopted', { basis: 'wind-averaged' });
    expect(averaged.orderByDragArea).toEqual(['liftback', 'sport', 'hatch', 'tourer', 'crossback']);
  });

  it('has a newer result of Hatch than the adopted one, with which it changes places with Sport', () => {
    expect(adopted.ranking[1]?.resultIds).toEqual(['H-2609-06']);
    expect(everything.ranking.find(({ variantId }) => variantId === 'hatch')?.resultIds).toEqual([
      'H-2611-02',
    ]);
    expect(everything.orderByDragArea.slice(1, 3)).toEqual(['sport', 'hatch']);
  });
});

describe('the traps in its data', () => {
  it('leave out a model run beyond Mach 0.3, one beyond the correlation, one over a fixed floor, one on the road', () => {
    expect(reducedOf('C-2409-06').mach).toBeGreaterThan(0.3);
    expect(everything.excludedResults.map(({ resultId, rules }) => [resultId, ...rules])).toEqual([
      ['B-2603-05', 'not-comparable'],
      ['C-2409-06', 'mach'],
      ['M-24-105', 'refused:correlation-range'],
      ['R-2610-02', 'not-comparable'],
    ]);
    expect(rulesOf('C-2409-05')).toEqual([]);
  });

  it('are seen without choosing anything: two excluded bodies stay listed beside the adopted evidence', () => {
    expect(adopted.excludedResults.map(({ variantId, rules }) => [variantId, ...rules])).toEqual([
      ['crossback', 'not-comparable'],
      ['tourer', 'mach'],
      ['crossback', 'refused:correlation-range'],
      ['tourer', 'not-comparable'],
    ]);
  });

  it('caution Mach 0.21, blockage over 5 %, transition under 2 million and air outside the density formula’s range', () => {
    expect(reducedOf('S-2608-04')).toMatchObject({ cautions: ['mach'], excludedBy: [] });
    expect(reducedOf('C-2409-07').cautions).toEqual(['blockage', 'outside-cipm-2007-range']);
    expect(reducedOf('C-2409-03')).toMatchObject({ cautions: ['transition'], excludedBy: [] });
    expect(reducedOf('C-2409-03').reynolds).toBeLessThan(2e6);
  });

  it('give Sport a coefficient below Hatch’s, because it was divided by Liftback’s area', () => {
    const [sport, hatch] = [rawOf('M-25-013'), rawOf('M-25-012')];
    expect(sport.quotedAreaM2).toBe(rawOf('M-25-011').quotedAreaM2);
    expect(sport.points[0]?.value).toBeLessThan(hatch.points[0]?.value ?? 0);
    expect(reducedOf('M-25-013').zeroYaw.dragAreaM2).toBeGreaterThan(
      reducedOf('M-25-012').zeroYaw.dragAreaM2,
    );
  });

  it('quote coefficients on the model’s area, a sixth of the car’s, and come out beside the others', () => {
    const model = rawOf('S-2505-01');
    expect(model).toMatchObject({ quotedAreaScale: 'model', scale: 0.4 });
    expect(model.quotedAreaM2).toBeLessThan(0.4);
    expect(reducedOf('S-2505-01').zeroYaw.dragAreaM2).toBeCloseTo(0.564, 3);
  });

  it('hold one force with its tare still in it, which would rank Sport 5 % too high', () => {
    const sport = rawOf('C-2409-04');
    expect(sport).toMatchObject({ quantity: 'force', tareAlreadySubtracted: false, tareN: 4.6 });
    expect(reducedOf('C-2409-04').zeroYaw.dragAreaM2).toBeCloseTo(0.617, 3);
  });

  it('state two coastdowns in two states of the air, nearly 2 % apart in density', () => {
    expect([rawOf('R-2610-01').air?.state, rawOf('R-2610-02').air?.state]).toEqual([
      'un-gtr-15',
      'sae-j2263',
    ]);
    expect(reducedOf('R-2610-02').zeroYaw.dragAreaM2).toBeCloseTo(0.649, 3);
  });

  it('withdraw one run of Tourer, with the reason and the run that replaces it', () => {
    const [withdrawal] = ALDERMERE_SCENARIO.withdrawals;
    expect(withdrawal?.reason).toContain('H-2606-11');
    expect(everything.reducedResults.map(({ resultId }) => resultId)).not.toContain(withdrawal?.result);
  });
});

describe('what was judged in it', () => {
  const stepsOf = (resultId: string) => reducedOf(resultId).steps.map(({ step }) => step);
  const contributionsOf = (resultId: string) =>
    reducedOf(resultId).zeroYaw.contributions.map(({ key }) => key);

  it('brings an April model to the reference by the sweep of another run, which is flat', () => {
    expect(contributionsOf('S-2604-01')).toContain('sweep:S-2604-03');
    expect(contributionsOf('S-2604-03')).toContain('sweep-level:S-2604-03');
    expect(reducedOf('S-2604-03').cautions).toEqual([]);
  });

  it('moves whatever has no sweep along the friction line, as an estimate', () => {
    expect(stepsOf('H-2609-03')).toContain('reynolds');
    expect(contributionsOf('H-2609-03')).toContain('friction-share:v1');
  });

  it('brings Liftback’s figure over the fixed floor in by two adjustments, and leaves Crossback’s out', () => {
    expect(stepsOf('B-2603-02')).toContain('condition-adjustments');
    expect(contributionsOf('B-2603-02')).toEqual(
      expect.arrayContaining(['adjustment:floor', 'adjustment:wheels']),
    );
    expect(rulesOf('B-2603-05')).toEqual(['not-comparable']);
  });

  it('includes one coastdown with a written reason, and not the other', () => {
    expect(reducedOf('R-2610-01')).toMatchObject({ cautions: ['included-with-reason'], excludedBy: [] });
    expect(rulesOf('R-2610-02')).toEqual(['not-comparable']);
  });

  it('brings simulations to the tunnel of the sign-off by seven pairs, so that they carry its bias', () => {
    expect(stepsOf('M-26-031')).toContain('facility-correlation');
    expect(contributionsOf('M-26-031')).toContain('facility-bias:halmere');
    expect(contributionsOf('M-26-031')).not.toContain('simulation-bias:merle');
  });

  it('rests Liftback on the mean of two installations, which differ by more than their keys explain', () => {
    expect(adopted.ranking[0]).toMatchObject({
      evidence: 'weighted-mean',
      resultIds: ['H-2609-03', 'H-2609-12'],
    });
    expect(adopted.ranking[0]?.combination?.birgeRatio).toBeGreaterThan(1);
  });

  it('sets one simulation aside', () => {
    expect(everything.reducedResults.map(({ resultId }) => resultId)).not.toContain('M-24-103');
  });
});

describe('the demo’s data', () => {
  it.each([
    ['Aldermere', ALDERMERE_SCENARIO],
    ['Velthorpe', VELTHORPE_SCENARIO],
  ])('of %s fits the contracts that a person’s own entries have to fit', (_name, scenario) => {
    const ids = { variantId: stableId('v'), facilityId: stableId('f') };
    for (const fields of Object.values(scenario.facilities)) facilityFields.parse(fields);
    for (const fields of Object.values(scenario.variants)) variantFields.parse(fields);
    for (const { variant, facility, ...fields } of scenario.results) {
      resultFields.parse({ ...fields, ...ids });
      expect([variant in scenario.variants, facility in scenario.facilities]).toEqual([true, true]);
    }
    expect(new Set(scenario.results.map(({ name }) => name)).size).toBe(scenario.results.length);
  });

  it('stands in the order in which it was entered: no result is older than the one before', () => {
    const days = ALDERMERE_SCENARIO.results.map(({ testDate }) => testDate);
    expect(days).toEqual([...days].sort());
  });

  it('has a steady check body at one facility, and one that drifted in the newest session of another', () => {
    const chartOf = (facility: string) => {
      const sessions = new Map<string, ChartSession>();
      for (const check of ALDERMERE_SCENARIO.checks) {
        if (check.facility !== facility || check.struck !== undefined) continue;
        sessions.set(check.session, {
          id: check.session,
          date: check.date,
          measurements: [{ dragAreaM2: check.dragAreaM2, s: check.s, n: 5 }],
        });
      }
      return controlChart([...sessions.values()], new Set([...sessions.keys()].slice(0, -1)));
    };
    const signs = (facility: string) =>
      chartOf(facility).points.flatMap(({ limits, sessionId }) =>
        (limits?.signs ?? []).map((sign) => [sessionId, sign]),
      );
    expect(signs('halmere')).toEqual([]);
    expect(chartOf('halmere').points).toHaveLength(8);
    expect(signs('stennick')).toEqual([['August 2026', 'beyond-action-limit']]);
  });

  it('gives the second maker a ranking of its own', () => {
    expect(rank('adopted', {}, VELTHORPE_SCENARIO).orderByDragArea).toEqual(['saloon', 'estate']);
  });
});
