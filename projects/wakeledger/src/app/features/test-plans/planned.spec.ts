import type { TestPlanInputs } from '#shared/contracts/test-plans';
import {
  CLOSED_TUNNEL as tunnel,
  ONE_FIFTH,
  PLANNED_PROGRAMME as programme,
  POLICIES_IN_FORCE as policies,
} from '../../../testing/planning-ground';
import { planned, type Planned } from './planned';
import { waysOut } from './ways-out';

const ID = '00000000-0000-4000-8000-000000000001';
const stateOf = (change: Partial<TestPlanInputs> = {}) =>
  planned({ ...ONE_FIFTH, ...change }, { programme, policies, tunnel });

function planOf(change: Partial<TestPlanInputs> = {}): Planned {
  const state = stateOf(change);
  if (state.kind !== 'planned') throw new Error(`not planned: ${state.kind}`);
  return state;
}

const way = <Kind extends ReturnType<typeof waysOut>[number]['kind']>(
  plan: Planned,
  kind: Kind,
  sweeps: Parameters<typeof waysOut>[1] = [],
) => {
  const found = waysOut(plan, sweeps).find((each) => each.kind === kind);
  if (found?.kind !== kind) throw new Error(`no way ${kind}`);
  return found as Extract<ReturnType<typeof waysOut>[number], { kind: Kind }>;
};

describe('a planned test', () => {
  it('asks one fifth of a full-size 120 km/h for 600 km/h and Mach 0.49, and is refused by the Mach number', () => {
    const plan = planOf();
    expect(plan.needed.speedKmh).toBeCloseTo(600, 4);
    expect(plan.needed.mach).toBeCloseTo(0.49, 3);
    expect(plan.needed.machVerdict).toBe('refused');
    expect(plan.reachable).toBe(false);
    expect(plan.attainable).toMatchObject({ ceiling: 'mach', mach: expect.closeTo(0.3, 12) });
  });

  it('is held down by the lowest of Mach number, facility and force balance', () => {
    expect(planOf({ maximumSpeedKmh: 220 }).attainable).toMatchObject({
      ceiling: 'facility',
      speedKmh: expect.closeTo(220, 10),
    });
    const weak = planOf({ maximumSpeedKmh: 220, maximumForceN: 20 });
    expect(weak.attainable.ceiling).toBe('balance');
    expect(weak.attainable.forceN).toBeCloseTo(20, 10);
    expect(weak.needed.withinBalance).toBe(false);
  });

  it('can be run at the Reynolds number that a sweep accepts', () => {
    const target = { basis: 'sweep', reynolds: 3e6, resultId: ID } as const;
    const plan = planOf({ target, maximumSpeedKmh: 220 });
    expect(plan.wantedReynolds).toBe(3e6);
    expect(plan.needed.reynolds).toBeCloseTo(3e6, 3);
    expect(plan.reachable).toBe(true);
    expect(plan.output.targetReynolds).toBeGreaterThan(9e6);
  });

  it('says what the flow is at the speed that is settled on', () => {
    const { settled, output } = planOf({ speedKmh: 180 });
    expect(settled?.reynolds).toBeCloseTo((output.targetReynolds * 180) / output.requiredSpeedKmh, 3);
    expect(settled?.dynamicPressurePa).toBeCloseTo(0.5 * output.tunnelAirDensityKgM3 * 50 ** 2, 8);
    expect(planOf().settled).toBeUndefined();
  });

  it('waits for figures that are missing, and is refused in words by the method', () => {
    expect(stateOf({ scale: Number.NaN }).kind).toBe('waiting');
    expect(stateOf({ target: { basis: 'typed', reynolds: Number.NaN } }).kind).toBe('waiting');
    const state = stateOf({ scale: 1, frontalAreaM2: 9 });
    expect(state).toMatchObject({ kind: 'refused', refusal: { code: 'model-larger-than-section' } });
  });
});

describe('the ways out of a refused test', () => {
  it('name a smaller model where it fills too much of the section', () => {
    const plan = planOf({ scale: 0.7 });
    expect(plan.reachable).toBe(false);
    const [smaller, ...others] = waysOut(plan, []);
    // β = s²·2.27/8.2 = 0.10 at s = 0.601.
    expect(smaller).toMatchObject({ kind: 'smaller', limit: 0.1, trial: { scale: 0.601 } });
    expect(others).toEqual([]);
    expect(planOf({ scale: 0.601 }).reachable).toBe(true);
  });

  it('raise neither pressure nor cold where only the force balance holds the speed down', () => {
    const plan = planOf({ scale: 0.5, maximumForceN: 100 });
    expect(plan.attainable.ceiling).toBe('balance');
    expect(waysOut(plan, []).map(({ kind }) => kind)).toEqual(['sweep', 'turbulence']);
    const tried = planOf({ scale: 0.5, maximumForceN: 100, ...way(plan, 'sweep').trial });
    expect(tried.reachable).toBe(true);
  });

  it('each bring it within the Mach limit when they are tried', () => {
    const plan = planOf();
    for (const kind of ['scale', 'pressure'] as const) {
      const tried = planOf({ ...way(plan, kind).trial });
      expect(tried.needed.machVerdict).toBe('caution');
      expect(tried.needed.mach).toBeCloseTo(0.3, 3);
      expect(tried.needed.mach).toBeLessThanOrEqual(0.3);
    }
    const { scale, blockage } = way(plan, 'scale');
    expect(scale).toBe(0.327);
    expect(blockage?.ratio).toBeCloseTo((0.327 ** 2 * 2.27) / 8.2, 10);
    expect(way(plan, 'pressure')).toMatchObject({
      pressurePa: 165_500,
      ratio: expect.closeTo(0.49 / 0.3, 2),
    });
  });

  it('try a colder gas only as far as the air of this page goes', () => {
    const far = way(planOf(), 'temperature');
    expect(far.temperatureK).toBeGreaterThan(100);
    expect(far.trial).toEqual({ tunnelTemperatureC: -40 });
    const tried = planOf({ ...far.trial });
    expect(tried.attainable.reynolds).toBeCloseTo(far.coldest?.reynolds ?? 0, 3);

    const near = planOf({ scale: 0.31 });
    const cold = way(near, 'temperature');
    expect(cold.coldest).toBeNull();
    expect(planOf({ scale: 0.31, ...cold.trial }).needed.mach).toBeLessThanOrEqual(0.3);
  });

  it('say where no model is large enough and no gas cold enough', () => {
    const target = { basis: 'typed', reynolds: 6e7 } as const;
    const plan = planOf({ target });
    expect(way(plan, 'scale')).toMatchObject({ scale: null, trial: undefined });
    const { pressurePa } = way(plan, 'pressure');
    expect(planOf({ target, tunnelPressurePa: pressurePa }).needed.mach).toBeCloseTo(0.3, 4);
    const further = planOf({ target: { basis: 'typed', reynolds: 7e7 } });
    expect(way(further, 'pressure').trial).toBeUndefined();
    expect(way(plan, 'temperature').temperatureK).toBeNull();
  });

  it('keep within the speed of the facility where that is the lower limit', () => {
    const plan = planOf({ maximumSpeedKmh: 220 });
    const tried = planOf({ maximumSpeedKmh: 220, ...way(plan, 'scale').trial });
    expect(tried.needed.speedKmh).toBeLessThanOrEqual(220);
    expect(tried.needed.speedKmh).toBeCloseTo(220, 0);
  });

  it('name the sweep that accepts least, or where one would have to be run', () => {
    const plan = planOf();
    const swept = (name: string, lowestReynolds: number) => ({
      resultId: name,
      name,
      variantId: ID,
      lowestReynolds,
      flat: true,
      toleranceM2: 0.005,
    });
    const named = way(plan, 'sweep', [swept('a', 4e6), swept('b', 3e6), swept('c', 2e7)]);
    expect(named.trial).toEqual({ target: { basis: 'sweep', reynolds: 3e6, resultId: 'b' } });
    const none = way(plan, 'sweep', [swept('c', 2e7)]);
    expect(none.sweep).toBeUndefined();
    expect(none.toKmh / none.fromKmh).toBeCloseTo(1.5, 12);
    expect(planOf({ ...none.trial }).reachable).toBe(true);
  });

  it('offer turbulence as the answer only below the minimum Reynolds number', () => {
    expect(way(planOf(), 'turbulence')).toMatchObject({ helps: false, trial: { turbulence: true } });
    expect(way(planOf({ scale: 0.06 }), 'turbulence').helps).toBe(true);
    expect(way(planOf({ turbulence: true }), 'turbulence')).toMatchObject({
      planned: true,
      trial: undefined,
    });
  });
});
