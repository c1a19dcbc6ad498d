import { DEFAULT_POLICIES } from '../constants';
import { differingItems } from './condition';
import { dynamicPressureOf, machNumber, machVerdict, reynoldsNumber, speedOfDynamicPressure } from './flow';

const within = (found: number, expected: number, allowed: number): void =>
  expect(Math.abs(found - expected)).toBeLessThanOrEqual(allowed);

describe('The Reynolds number', () => {
  it('of the Ahmed body at 60 m/s is 4.29e6 on its length of 1.044 m (SAE 840300, abstract)', () => {
    within(reynoldsNumber(60, 1.044, 1, 1.4607e-5), 4.29e6, 4.29e3);
  });

  it('of the DrivAer model of 1:2.5 at 40 m/s is 4.88e6 (SAE 2012-01-0168 states 4.87e6; computed)', () => {
    within(reynoldsNumber(40, 4.613, 0.4, 1.511e-5), 4.88e6, 0.005 * 4.88e6);
  });

  it('of a 4.5 m car at 120 km/h is 1.0e7', () => {
    within(reynoldsNumber(120 / 3.6, 4.5, 1, 1.4607e-5), 1.0e7, 0.05e7);
  });
});

describe('The Mach number', () => {
  it('of a quarter-scale model at full-scale Reynolds number is 0.4532 at 560 km/h (computed): excluded', () => {
    const mach = machNumber(140 / 0.25 / 3.6, 343.23);
    within(mach / 0.4532, 1, 1e-3);
    expect(machVerdict(mach, DEFAULT_POLICIES)).toBe('excluded');
  });

  it('passes up to 0.2 and is a caution up to 0.3, where q_c/q is 1.0225 (1 + M²/4; computed)', () => {
    expect([0.2, 0.21, 0.3, 0.31].map((mach) => machVerdict(mach, DEFAULT_POLICIES))).toEqual([
      'passes',
      'caution',
      'caution',
      'excluded',
    ]);
    for (const [mach, ratio] of [
      [0.1, 1.0025],
      [DEFAULT_POLICIES.machCaution, 1.01],
      [DEFAULT_POLICIES.machExcluded, 1.0225],
    ] as const) {
      within(1 + (mach * mach) / 4, ratio, 1e-4);
    }
  });
});

it('Dynamic pressure and speed undo each other', () => {
  within(speedOfDynamicPressure(dynamicPressureOf(38.9, 1.18), 1.18), 38.9, 1e-12);
});

describe('The comparison of conditions', () => {
  const reference = { ground: 'five-belts', rideHeightFrontMm: 0, payload: null };

  it('finds nothing where every item of the reference is matched, whatever else is stated', () => {
    expect(differingItems(reference, { ground: 'five-belts', rideHeightFrontMm: 0, tyres: 'x' })).toEqual([]);
    expect(differingItems(undefined, undefined)).toEqual([]);
  });

  it('counts an item that is not stated, or of another type, as different', () => {
    expect(differingItems(reference, { rideHeightFrontMm: '0' })).toEqual(['ground', 'rideHeightFrontMm']);
    expect(differingItems(reference, undefined)).toEqual(['ground', 'rideHeightFrontMm']);
  });
});
