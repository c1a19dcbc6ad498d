import { prepareCycle, type CycleTrace, type PreparedCycle } from '#shared/core/cycles/cycle';
import { cycleEnergy, whPerKm } from '#shared/core/road-load/cycle-energy';
import { energiesOnCycle } from '#shared/core/road-load/energies-on-cycle';
import { roadLoadOf } from '#shared/core/road-load/road-load';
import { builtInCycle, type BuiltInCycleName } from './built-in-cycles';
import { EXTRA_URBAN_OPERATIONS, traceOfOperations, URBAN_OPERATIONS } from './nedc';

const prepared = (name: BuiltInCycleName): PreparedCycle => prepareCycle(builtInCycle(name));

/** The rows of a trace from one second to another. */
const part = ({ timeS, speedKmh }: CycleTrace, fromS: number, toS: number): PreparedCycle =>
  prepareCycle({
    timeS: Array.from(timeS).slice(fromS, toS + 1),
    speedKmh: Array.from(speedKmh).slice(fromS, toS + 1),
  });

function expectRelative(found: number, expected: number, tolerance: number): void {
  expect(Math.abs(found / expected - 1)).toBeLessThanOrEqual(tolerance);
}

// f0 120 N, f1 0.8 N/(km/h), f2 0.03 N/(km/h)², 1500 kg, factor 1.03. The figures were computed on the regulations' tables
// in two other languages; the form of the equation (UN GTR No. 15, Annex 7, paragraph 5) is from memory.
describe('Energy of one road load on the built-in cycles', () => {
  const LOAD = { f0N: 120, f1NPerKmh: 0.8, f2NPerKmh2: 0.03 };
  const energyOn = (cycle: PreparedCycle) => cycleEnergy(cycle, LOAD, 1500, 1.03);

  test.each([
    ['wltc-class-3b', 12055560.9, 143.9322161, -3220808.6],
    ['wltc-class-3a', 11913881.1, 142.6865079, -3108871.2],
    ['nedc', 4835200.265, 121.9547327, -1415761.608],
    ['udds', 5245912.214, 121.5320127, -2313404.115],
  ] as const)('%s: %f J at the wheel, %f Wh/km, %f J of braking', (name, wheelJ, perKm, negativeJ) => {
    const { wheelEnergyJ, brakingEnergyJ, distanceM } = energyOn(prepared(name));
    expectRelative(wheelEnergyJ, wheelJ, 1e-7);
    expectRelative(whPerKm(wheelEnergyJ, distanceM), perKm, 1e-7);
    expectRelative(-brakingEnergyJ, negativeJ, 1e-7);
  });

  test.each([
    ['hwfet', 7.03213e6],
    ['us06', 8.84701e6],
  ] as const)('%s: %f J at the wheel, to the digits that were noted', (name, wheelJ) => {
    expectRelative(energyOn(prepared(name)).wheelEnergyJ, wheelJ, 1e-6);
  });

  test('WLTC 3b: phase 1 takes 1 294 760.2 J, phase 4 takes 5 161 005.2 J, and the four sum to the cycle', () => {
    const trace = builtInCycle('wltc-class-3b');
    const phases = [
      [0, 589],
      [589, 1022],
      [1022, 1477],
      [1477, 1800],
    ].map(([from = 0, to = 0]) => energyOn(part(trace, from, to)).wheelEnergyJ);
    expectRelative(phases[0] ?? NaN, 1294760.2, 1e-7);
    expectRelative(phases[3] ?? NaN, 5161005.2, 1e-7);
    expectRelative(
      phases.reduce((sum, energy) => sum + energy, 0),
      energyOn(prepareCycle(trace)).wheelEnergyJ,
      1e-13,
    );
  });
});

describe('Mean values of the cycles', () => {
  /** Σ v̄³·Δt over the distance [m²/s²]: the energy that f2 alone takes, read back. */
  const meanSquare = (cycle: PreparedCycle): number => {
    const { wheelEnergyJ, distanceM } = cycleEnergy(cycle, { f0N: 0, f1NPerKmh: 0, f2NPerKmh2: 1 }, 0);
    return wheelEnergyJ / 3.6 ** 2 / distanceM;
  };

  test.each([
    ['WLTC class 3b', builtInCycle('wltc-class-3b'), 514.6722],
    ['NEDC', builtInCycle('nedc'), 362.2233],
    ['the urban cycle of the NEDC', traceOfOperations(URBAN_OPERATIONS), 100.1594],
    ['the extra-urban cycle of the NEDC', traceOfOperations(EXTRA_URBAN_OPERATIONS), 515.144],
    ['UDDS', builtInCycle('udds'), 219.1579],
  ])('Σ v³/distance of %s', (_, trace, expected) => {
    expectRelative(meanSquare(prepareCycle(trace)), expected, 1e-6);
  });

  test('With full recuperation the NEDC and its parts come to the textbook 363, 100 and 515 m²/s² (memory: Guzzella and Sciarretta)', () => {
    expectRelative(meanSquare(prepared('nedc')), 363, 0.004);
    expectRelative(meanSquare(prepareCycle(traceOfOperations(URBAN_OPERATIONS))), 100, 0.004);
    expectRelative(meanSquare(prepareCycle(traceOfOperations(EXTRA_URBAN_OPERATIONS))), 515, 0.004);
  });

  test('In traction only, the NEDC has 314.35 m²/s², 0.8482 and 0.1114 m/s² (own evaluation; the textbook differs)', () => {
    const cycle = prepared('nedc');
    const load = roadLoadOf({ massKg: 1500, rollingResistance: 0.012 }, 0.6, 1.18);
    // Each mean value is the part of the traction energy that its term takes.
    let square = 0;
    let rolling = 0;
    let inertia = 0;
    for (let i = 0; i < cycle.steps; i++) {
      const speed = cycle.meanSpeedKmh[i] as number;
      const acceleration = cycle.accelerationMs2[i] as number;
      const distance = cycle.stepDistanceM[i] as number;
      if (load.f0N + load.f2NPerKmh2 * speed ** 2 + 1500 * acceleration <= 0) continue;
      square += (speed / 3.6) ** 2 * distance;
      rolling += distance;
      inertia += acceleration * distance;
    }
    expectRelative(square / cycle.distanceM, 314.35, 0.001);
    expectRelative(rolling / cycle.distanceM, 0.8482, 0.001);
    expectRelative(inertia / cycle.distanceM, 0.1114, 0.001);
    const { wheelEnergyJ } = cycleEnergy(cycle, load, 1500, 1);
    const summed = (load.f2NPerKmh2 * 3.6 ** 2 * square + load.f0N * rolling + 1500 * inertia) / wheelEnergyJ;
    expect(summed).toBeCloseTo(1, 12);
  });

  test('A_f 2.0 m², c_d 0.3, 1500 kg, c_r 0.012 take 42 813 kJ per 100 km of NEDC, 3.1 % above the textbook 41 520 (memory)', () => {
    const load = roadLoadOf({ massKg: 1500, rollingResistance: 0.012 }, 2.0 * 0.3, 1.18);
    const { wheelEnergyJ, distanceM } = cycleEnergy(prepared('nedc'), load, 1500, 1);
    const kJPer100Km = (wheelEnergyJ / distanceM) * 100;
    expectRelative(kJPer100Km, 42813, 0.005);
    expectRelative(1.9e4 * 2.0 * 0.3 + 8.4e2 * 1500 * 0.012 + 10 * 1500, 41520, 0.005);
    expectRelative(kJPer100Km / 41520, 1.031, 0.005);
  });
});

// 1500 kg, C_rr 0.009, C_D·A 0.65 m², ρ 1.189 kg/m³, factor 1.03, no recuperation. Computed on the same tables elsewhere.
describe('What drag area is worth', () => {
  const energyAt = (cycle: PreparedCycle, dragAreaM2: number): number =>
    cycleEnergy(cycle, roadLoadOf({ massKg: 1500, rollingResistance: 0.009 }, dragAreaM2, 1.189), 1500, 1.03)
      .wheelEnergyJ;
  const percent = (cycle: PreparedCycle, change: number): number =>
    (energyAt(cycle, 0.65 + change) / energyAt(cycle, 0.65) - 1) * 100;

  test.each([
    ['wltc-class-3b', -3.650762, -1.238775, 0.8448154, 1.639676],
    ['nedc', -2.992998, -1.013015, 0.6906918, 1.142051],
    ['udds', -1.622733, -0.5503316, 0.3769034, 0.6354541],
  ] as const)(
    '%s: −10 %% of C_D·A %f %%, −0.022 m² %f %%, +0.015 m² %f %%, 0.022 m² %f Wh/km',
    (name, tenth, count, accuracy, perKm) => {
      const cycle = prepared(name);
      expectRelative(percent(cycle, -0.065), tenth, 1e-4);
      expectRelative(percent(cycle, -0.022), count, 1e-4);
      expectRelative(percent(cycle, 0.015), accuracy, 1e-4);
      expectRelative(whPerKm(energyAt(cycle, 0.65) - energyAt(cycle, 0.628), cycle.distanceM), perKm, 1e-4);
    },
  );

  test.each([
    ['hwfet', -4.93],
    ['us06', -3.98],
  ] as const)('%s: −10 %% of C_D·A changes the energy by %f %%', (name, expected) => {
    expect(percent(prepared(name), -0.065)).toBeCloseTo(expected, 2);
  });

  test('0.01 in C_D on 2.2 m² is 1.086 g/km of CO2 on the WLTC at the regulation’s 184 g/MJ (petrol, turbo) and 0.95 at 161 (diesel)', () => {
    const cycle = prepared('wltc-class-3b');
    const megajoulesPerKm = whPerKm(energyAt(cycle, 0.65) - energyAt(cycle, 0.628), cycle.distanceM) * 3.6e-3;
    expectRelative(megajoulesPerKm * 184, 1.086, 0.001);
    expect(megajoulesPerKm * 161).toBeCloseTo(0.95, 2);
  });

  test('Half of the highway energy is aerodynamic, as EPA says of its highway cycle (54 %, read in an archived page)', () => {
    const cycle = prepared('hwfet');
    const load = { load: roadLoadOf({ massKg: 1500, rollingResistance: 0.009 }, 0.65, 1.189), massKg: 1500 };
    const { exchangeRateJPerM2, wheelEnergyJ } = energiesOnCycle(cycle, [load], 1.189, 1.03);
    const share = ((exchangeRateJPerM2[0] as number) * 0.65) / (wheelEnergyJ[0] as number);
    expect(Math.abs(share - 0.54)).toBeLessThan(0.06);
  });
});
