import * as fc from 'fast-check';
import { cycleEnergy } from '../road-load/cycle-energy';
import { prepareCycle } from '../cycles/cycle';
import { chosenCycle, constantCycleKey, constantSpeedOf } from './chosen-cycle';

const CYCLES = [
  { key: 'own', name: 'Own', source: 'a test', timeS: [0, 1, 2], speedKmh: [0, 5, 0] },
  { key: 'empty', name: 'Without rows', source: 'a test', timeS: [], speedKmh: [] },
];

describe('the cycle of a choice', () => {
  it('is the one with that key, else the first that has rows', () => {
    expect(chosenCycle(CYCLES, 'own')?.name).toBe('Own');
    expect(chosenCycle(CYCLES, 'nowhere')?.key).toBe('own');
    expect(chosenCycle([], 'nowhere')).toBeUndefined();
  });

  it.each([
    'constant:',
    'constant:0',
    'constant:-50',
    'constant:501',
    'constant:1e2',
    'constant:fast',
    '120',
  ])('takes %s for no constant speed', (key) => {
    expect(constantSpeedOf(key)).toBeNull();
    expect(chosenCycle(CYCLES, key)?.key).toBe('own');
  });

  it('reads the speed that it wrote', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 500_000 }), (thousandths) => {
        const speedKmh = thousandths / 1000;
        expect(constantSpeedOf(constantCycleKey(speedKmh))).toBe(speedKmh);
      }),
    );
  });

  it('needs at a constant speed the resisting force times the way, by definition of work', () => {
    const cycle = chosenCycle(CYCLES, 'constant:120');
    if (!cycle) throw new Error('there is a cycle');
    const { wheelEnergyJ, distanceM } = cycleEnergy(
      prepareCycle(cycle),
      { f0N: 120, f1NPerKmh: 0.8, f2NPerKmh2: 0.03 },
      1500,
      1.03,
    );
    expect(distanceM).toBeCloseTo(120_000, 6);
    expect(wheelEnergyJ / distanceM).toBeCloseTo(120 + 0.8 * 120 + 0.03 * 120 ** 2, 9);
  });
});
