import { planningLimits } from '#shared/core/planning/limits';
import { planningSettingOf } from '#shared/core/planning/planning-setting';
import {
  blockageAt,
  highestKmhAt,
  keepsEveryLimit,
  lowestKmhAt,
  regionOf,
  type SpeedScaleModel,
} from './map-region';

const setting = planningSettingOf({
  scale: 0.4,
  characteristicLengthM: 4.5,
  referenceSpeedKmh: 120,
  referenceAir: { state: 'iso-2533-sea-level' },
  tunnelAir: { temperatureC: 15, pressurePa: 101_325 },
  facility: { kind: 'closed', areaM2: 8.2 },
  frontalAreaM2: 2.27,
  dragCoefficient: 0.285,
});
function modelOf(
  input: Partial<Parameters<typeof planningLimits>[1]> = {},
  change: Partial<SpeedScaleModel> = {},
): SpeedScaleModel {
  return {
    limits: planningLimits(setting, { targetReynolds: 1e7, ...input }),
    fullSectionScale: Math.sqrt(8.2 / 2.27),
    machCaution: 0.2,
    machLimit: 0.3,
    targetReynolds: 1e7,
    acceptedReynolds: undefined,
    minimumReynolds: 2e6,
    balanceN: undefined,
    working: { scale: 0.4, speedKmh: 300 },
    neededKmh: 300,
    ...change,
  };
}

describe('the region of the map in which every limit is kept', () => {
  it('begins where the target meets the Mach limit and ends at the blockage limit', () => {
    const model = modelOf();
    const slices = regionOf(model);
    const [first, last] = [slices[0], slices.at(-1)];
    expect(first?.lowestKmh).toBeCloseTo(first?.highestKmh ?? 0, 8);
    // β = s²·2.27/8.2 = 0.10 at s = 0.601.
    expect(last?.scale).toBeCloseTo(Math.sqrt((0.1 * 8.2) / 2.27), 12);
    expect(blockageAt(model, last?.scale ?? 0)).toBeCloseTo(0.1, 12);
    for (const { scale, lowestKmh, highestKmh } of slices.slice(1)) {
      expect(keepsEveryLimit(model, { scale, speedKmh: (lowestKmh + highestKmh) / 2 })).toBe(true);
      expect(keepsEveryLimit(model, { scale, speedKmh: lowestKmh - 1 })).toBe(false);
      expect(keepsEveryLimit(model, { scale, speedKmh: highestKmh + 1 })).toBe(false);
    }
  });

  it('grows with a Reynolds number that a sweep accepts', () => {
    const accepted = regionOf(modelOf({ acceptedReynolds: 4e6 }));
    expect(accepted[0]?.scale).toBeLessThan(regionOf(modelOf())[0]?.scale ?? 0);
  });

  it('is empty where the balance carries too little, or the section is too small', () => {
    expect(regionOf(modelOf({ balanceRangeN: 20 }))).toEqual([]);
    expect(regionOf(modelOf({ targetReynolds: 3e7 }))).toEqual([]);
  });

  it('is bounded above by the lowest of Mach limit, facility and balance', () => {
    const model = modelOf({ balanceRangeN: 300 });
    expect(highestKmhAt(model, 0.1)).toBeCloseTo(model.limits.machLimitMs * 3.6, 10);
    expect(highestKmhAt(model, 1)).toBeLessThan(model.limits.machLimitMs * 3.6);
    expect(lowestKmhAt(model, 1)).toBeCloseTo(lowestKmhAt(model, 0.5) / 2, 10);
  });
});
