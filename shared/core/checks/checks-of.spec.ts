import fc from 'fast-check';
import { AIR_LIMITS, DEFAULT_CHECK_LIMITS } from '../constants';
import type { RankingInput, ResultInput } from '../ranking/ranking-input';
import { reduceResults } from '../reduction/reduce';
import { aFacility, aRanking, aResult, aVariant } from '../testing/ranking-builders';
import { CHECK_NAMES, CHECK_VERDICTS, gravest, type Check, type CheckName } from './check';
import { checksOf, checksOfRefused } from './checks-of';
import { limitIssues } from './limit-issues';
import { DEFAULT_LIMITS, policiesInputOf, type CheckLimits } from './limits';

/** The checks of the first result of an input, by name, with the limits that the ranking would use. */
function checked(
  changes: Partial<RankingInput> = {},
  limits: CheckLimits = DEFAULT_LIMITS,
  frictionLine: 'on' | 'off' = 'on',
): ReadonlyMap<CheckName, Check> {
  const input = aRanking(changes);
  const programme = { ...input.programme, policies: policiesInputOf(limits, 1, frictionLine) };
  const { context, reductions, refused } = reduceResults({ ...input, programme });
  const [reduction] = reductions;
  const [refusal] = refused;
  const checks = reduction
    ? checksOf(reduction, { context, limits }, 'hatch')
    : checksOfRefused(refusal!, input.results[0]!, limits);
  return new Map(checks.map((each) => [each.check, each]));
}

const withResult = (changes: Partial<ResultInput>): Partial<RankingInput> => ({
  results: [aResult('r-a', 'a', changes)],
});
const quarterScale = (changes: Partial<ResultInput> = {}): Partial<RankingInput> =>
  withResult({ scale: 0.25, quotedAreaM2: 2.24 / 16, quotedAreaScale: 'model', ...changes });

describe('The checks of a result', () => {
  it('pass for a usual full-size test, each once and in the order in which they are shown', () => {
    const checks = [...checked().values()];
    expect(gravest(checks)).toBe('passes');
    const names = checks.map(({ check }) => check);
    expect(names).toEqual(CHECK_NAMES.filter((name) => names.includes(name)));
    expect(new Set(names).size).toBe(names.length);
  });

  it('hold Mach numbers to 0.2 and 0.3 (common practice): 140 km/h passes, 260 is a caution, 400 excluded', () => {
    const verdicts = [140, 260, 400].map(
      (speedKmh) => checked(withResult({ speedKmh })).get('mach')?.verdict,
    );
    expect(verdicts).toEqual(['passes', 'caution', 'excluded']);
    expect(checked(withResult({ speedKmh: 260 })).get('mach')).toMatchObject({
      limit: { to: 0.2, excludedAbove: 0.3 },
      policy: 'machCaution',
    });
  });

  it('hold blockage to 5 % and 10 % in a closed section and to 35 % of an open jet (Regulation (EU) 2017/1151)', () => {
    const inTunnel = (kind: 'closed' | 'open-jet', areaM2: number): Check | undefined =>
      checked({ facilities: [aFacility('tunnel', { kind, areaM2 })] }).get('blockage');
    expect([46, 30, 20].map((areaM2) => inTunnel('closed', areaM2)?.verdict)).toEqual([
      'passes',
      'caution',
      'excluded',
    ]);
    expect([10, 6].map((areaM2) => inTunnel('open-jet', areaM2)?.verdict)).toEqual(['passes', 'excluded']);
    expect(inTunnel('open-jet', 6)).toMatchObject({ policy: 'openJetLimit', limit: { to: null } });
    expect(checked({ facilities: [aFacility('tunnel', { kind: 'road' })] }).has('blockage')).toBe(false);
  });

  it('doubt transition on a small model below 2e6 without trips (common practice), and not with them', () => {
    const slow = checked(quarterScale({ speedKmh: 80 })).get('transition');
    expect(slow).toMatchObject({ verdict: 'caution', finding: null, limit: { from: 2e6 } });
    const tripped = checked(quarterScale({ speedKmh: 80, turbulenceGenerationOrTrips: true }));
    expect(tripped.get('transition')).toMatchObject({ verdict: 'passes', finding: 'trips' });
    expect(checked(quarterScale({ speedKmh: 140 })).get('transition')).toMatchObject({
      verdict: 'passes',
      finding: null,
    });
    expect(checked().has('transition')).toBe(false);
  });

  it('call a long way along the friction line an estimate: 1.441 % of the drag area from 5e6 to 1e7 at φ = 0.12', () => {
    const found = checked(quarterScale({ speedKmh: 240 })).get('reynolds');
    expect(found).toMatchObject({
      verdict: 'caution',
      finding: 'friction-line',
      policy: 'reynoldsToleranceM2',
    });
    expect(found?.value).toBeGreaterThan(0.01 * 0.28 * 2.24);
    expect(found?.value).toBeLessThan(0.02 * 0.28 * 2.24);
    expect(checked().get('reynolds')?.verdict).toBe('passes');
    const off = checked(quarterScale({ speedKmh: 240 }), DEFAULT_LIMITS, 'off').get('reynolds');
    expect(off).toMatchObject({ verdict: 'caution', finding: 'no-reynolds-correction', value: found?.value });
  });

  it('find a measured sweep enough, and one that is flat above the minimum clears the doubt about transition', () => {
    const sweeping = (speeds: readonly number[]): ReadonlyMap<CheckName, Check> =>
      checked(
        quarterScale({
          reynoldsMethod: 'own-sweep',
          speedKmh: null,
          points: speeds.map((speedKmh, i) => ({ speedKmh, value: 0.28 + (i % 2) * 1e-4, s: 0.0005, n: 5 })),
        }),
      );
    const high = sweeping([80, 110, 140, 170, 200]);
    expect(high.get('reynolds')).toMatchObject({ verdict: 'passes', finding: 'own-sweep' });
    expect(high.get('transition')?.verdict).toBe('passes');
    expect(sweeping([50, 60, 70, 80]).get('transition')?.verdict).not.toBe('passes');
  });

  it('compare drag coefficient and frontal area with what the body shape usually has', () => {
    const implausible = checked(withResult({ points: [{ value: 2.8, s: 0.0005, n: 5 }] }));
    expect(implausible.get('drag-coefficient')).toMatchObject({ verdict: 'caution', policy: 'plausible' });
    const lorry = checked({ variants: [aVariant('a', { frontalAreaM2: 4.2 })] });
    expect(lorry.get('frontal-area')).toMatchObject({ verdict: 'caution', value: 4.2, unit: 'm²' });
    const nothingUsual = checked({}, { ...DEFAULT_LIMITS, plausible: [] });
    expect(nothingUsual.has('drag-coefficient')).toBe(false);
  });

  it('notice a coefficient quoted on another area: the part’s own instead of the car’s', () => {
    expect(checked(withResult({ quotedAreaM2: 0.12 })).get('quoted-area')?.verdict).toBe('caution');
    expect(checked(withResult({ quotedAreaM2: 2.1 })).get('quoted-area')?.verdict).toBe('passes');
  });

  it('find readings that scatter by more than the limit, and take the facility’s where there are none', () => {
    const own = checked(withResult({ points: [{ value: 0.28, s: 0.0028, n: 5 }] })).get('repeatability');
    expect(own).toMatchObject({ verdict: 'caution', finding: null });
    expect(own?.value).toBeCloseTo(0.01, 12);
    expect(checked(withResult({ points: [{ value: 0.28 }] })).get('repeatability')).toMatchObject({
      verdict: 'passes',
      finding: 'facility-repeatability',
    });
    const stated = checked({
      facilities: [aFacility('tunnel', { repeatabilityURelative: null })],
      ...withResult({ points: [{ value: 0.28 }], stated: { expandedU: 0.004, k: 2 } }),
    });
    expect(stated.get('repeatability')).toMatchObject({ finding: 'stated-uncertainty', value: null });
  });

  it('measure how far a yaw sweep reaches on the side where it reaches less', () => {
    const sweep = (angles: readonly number[]): Check | undefined =>
      checked(
        withResult({
          points: angles.map((yawDeg) => ({ yawDeg, value: 0.28 + yawDeg * yawDeg * 1e-4, s: 5e-4, n: 5 })),
        }),
      ).get('yaw-coverage');
    expect(sweep([0])).toMatchObject({ verdict: 'passes', finding: 'zero-yaw-only' });
    expect(sweep([-10, -5, 0, 5, 10])).toMatchObject({ verdict: 'passes', value: 10 });
    expect(sweep([-8, -4, 0, 4, 10])).toMatchObject({ verdict: 'caution', value: 8, finding: null });
    expect(sweep([0, 5, 10])).toMatchObject({ verdict: 'passes', value: 10 });
    expect(sweep([0, 10])).toMatchObject({ verdict: 'caution', finding: 'no-wind-average' });
  });

  it('see the air of a hall that is not usual, and what CIPM-2007 was not made for', () => {
    const hot = checked(withResult({ air: { temperatureC: 50, pressurePa: 100000, relativeHumidity: 0.3 } }));
    expect(hot.get('hall-temperature')).toMatchObject({ verdict: 'caution', finding: null });
    expect(hot.get('air-formula')).toMatchObject({ verdict: 'caution', unit: '°C', value: 50 });
    const high = checked(withResult({ air: { temperatureC: 20, pressurePa: 58000, relativeHumidity: 0.3 } }));
    expect(high.get('hall-pressure')).toMatchObject({ verdict: 'caution', value: 58000 });
    expect(high.get('air-formula')).toMatchObject({ verdict: 'caution', unit: 'Pa' });
    expect(checked(withResult({ air: { state: 'un-gtr-15' } })).has('hall-temperature')).toBe(false);
  });

  it.each([
    [{ temperatureC: 293.15, pressurePa: 100000, relativeHumidity: 0.5 }, 'kelvin'],
    [{ temperatureC: 68, pressurePa: 100000, relativeHumidity: 0.5 }, 'fahrenheit'],
    [{ temperatureC: 20, pressurePa: 1000, relativeHumidity: 0.5 }, 'hectopascal'],
    [{ temperatureC: 20, pressurePa: 100, relativeHumidity: 0.5 }, 'kilopascal'],
    [{ temperatureC: 20, pressurePa: 1, relativeHumidity: 0.5 }, 'bar'],
    [{ temperatureC: 20, pressurePa: 100000, relativeHumidity: 50 }, 'percent'],
  ])('say of %j which unit was probably meant: %s', (air, finding) => {
    const checks = checked(withResult({ air }));
    expect([...checks.keys()]).toEqual(['refused']);
    expect(checks.get('refused')).toMatchObject({ verdict: 'excluded', finding });
  });

  it('take an odd but possible temperature for the unit in which it would be usual: 59 °F is 15 °C', () => {
    const checks = checked(
      withResult({ air: { temperatureC: 59, pressurePa: 100000, relativeHumidity: 0.2 } }),
    );
    expect(checks.get('hall-temperature')).toMatchObject({ verdict: 'caution', finding: 'fahrenheit' });
  });

  it('keep what is not comparable out, unless it is included with a reason or adjusted', () => {
    const fixedFloor = { condition: { ground: 'fixed-floor', wheels: 'rotating' } };
    const items = [{ item: 'ground', reference: 'five-belts', stated: 'fixed-floor' }];
    expect(checked(withResult(fixedFloor)).get('condition')).toMatchObject({ verdict: 'excluded', items });
    expect(
      checked(withResult({ ...fixedFloor, includedWithReason: 'The only one there is' })).get('condition'),
    ).toMatchObject({ verdict: 'caution', finding: 'included-with-reason', items });
    const adjustments = [
      {
        id: 'belts',
        item: 'ground',
        fromValue: 'fixed-floor',
        toValue: 'five-belts',
        deltaDragAreaM2: -0.01,
        uM2: 0.003,
      },
    ];
    expect(checked({ ...withResult(fixedFloor), adjustments }).get('condition')).toMatchObject({
      verdict: 'passes',
      finding: 'adjusted',
      items,
    });
  });

  it('hold lift coefficients at zero yaw to their limits, front and rear, where they are stated', () => {
    const checks = checked(
      withResult({ points: [{ value: 0.28, s: 5e-4, n: 5, frontLift: 0.05, rearLift: 0.31 }] }),
    );
    expect(checks.get('front-lift')).toMatchObject({ verdict: 'passes', policy: 'frontLiftLimit' });
    expect(checks.get('front-lift')?.value).toBeCloseTo(0.05, 12);
    expect(checks.get('rear-lift')).toMatchObject({ verdict: 'caution' });
    expect(checked().has('front-lift')).toBe(false);
  });
});

describe('A stricter limit', () => {
  const GRAVITY = (check: Check | undefined): number => CHECK_VERDICTS.indexOf(check?.verdict ?? 'passes');
  const results: readonly Partial<RankingInput>[] = [
    {},
    quarterScale({ speedKmh: 80 }),
    quarterScale({ speedKmh: 300 }),
    withResult({
      points: [-12, -6, 0, 6, 12].map((yawDeg) => ({ yawDeg, value: 0.29, s: 0.002, n: 3, rearLift: 0.2 })),
    }),
    { facilities: [aFacility('tunnel', { areaM2: 32 })] },
  ];
  const share = fc.double({ min: 0.2, max: 1, noNaN: true });

  it('never turns a caution into a pass', () => {
    fc.assert(
      fc.property(fc.constantFrom(...results), share, (result, part) => {
        const wide = DEFAULT_LIMITS;
        const strict: CheckLimits = {
          ...wide,
          machCaution: wide.machCaution * part,
          machExcluded: wide.machExcluded * part,
          blockageCaution: wide.blockageCaution * part,
          blockageExcluded: wide.blockageExcluded * part,
          openJetLimit: wide.openJetLimit * part,
          minimumReynolds: wide.minimumReynolds / part,
          reynoldsToleranceM2: wide.reynoldsToleranceM2 * part,
          yawCoverageDeg: wide.yawCoverageDeg / part,
          repeatabilityCaution: wide.repeatabilityCaution * part,
          frontLiftLimit: wide.frontLiftLimit * part,
          rearLiftLimit: wide.rearLiftLimit * part,
        };
        const before = checked(result, wide);
        for (const [name, check] of checked(result, strict)) {
          expect(GRAVITY(check)).toBeGreaterThanOrEqual(GRAVITY(before.get(name)));
        }
      }),
      { numRuns: 60 },
    );
  });
});

describe('The limits themselves', () => {
  it('that the product comes with can be used', () => {
    expect(limitIssues(DEFAULT_LIMITS)).toEqual([]);
    expect(DEFAULT_LIMITS.airTemperatureC.from).toBeGreaterThan(AIR_LIMITS.minC);
    expect(DEFAULT_LIMITS.plausible).toBe(DEFAULT_CHECK_LIMITS.plausible);
  });

  it('are refused one by one where they contradict each other or are no number', () => {
    const wrong: CheckLimits = {
      ...DEFAULT_LIMITS,
      blockageCaution: 0.2,
      openJetLimit: 1.5,
      minimumReynolds: 0,
      airPressurePa: { from: 105000, to: NaN },
      plausible: [
        { bodyShape: 'hatch', dragCoefficient: { from: 0.4, to: 0.2 }, frontalAreaM2: { from: 1, to: 2 } },
      ],
    };
    expect(limitIssues(wrong).map(({ where, rule }) => `${where} ${rule}`)).toEqual([
      'openJetLimit fraction',
      'minimumReynolds above-zero',
      'blockageCaution caution-above-excluded',
      'airPressurePa.to not-a-number',
      'plausible.0.dragCoefficient.to from-not-below-to',
    ]);
  });
});
