import fc from 'fast-check';
import { evaluatePlan } from './plan';
import { forceAt, planningLimits, smallestScaleWithin, speedAtReynolds } from './limits';
import { planningSettingOf, type PlanInput } from './planning-setting';

const input: PlanInput = {
  scale: 0.4,
  characteristicLengthM: 4.5,
  referenceSpeedKmh: 120,
  referenceAir: { state: 'iso-2533-sea-level' },
  tunnelAir: { temperatureC: 22, pressurePa: 99000 },
  facility: { kind: 'closed', areaM2: 8.2, maximumSpeedKmh: 250 },
  frontalAreaM2: 2.27,
  dragCoefficient: 0.285,
};
const setting = planningSettingOf(input);
const scales = fc.double({ min: 0.05, max: 1, noNaN: true });

describe('The map of speed against scale', () => {
  const limits = planningLimits(setting, {
    targetReynolds: 1e7,
    acceptedReynolds: 4e6,
    balanceRangeN: 150,
  });

  test('draws the line of the target where a plan at that scale puts its required speed', () => {
    fc.assert(
      fc.property(scales, (scale) => {
        const plan = evaluatePlan({ ...input, scale, targetReynolds: 1e7 });
        expect(limits.targetReynolds(scale)).toBeCloseTo(plan.requiredSpeedMs, 9);
      }),
    );
  });

  test('draws the balance’s range where the expected force reaches it', () => {
    fc.assert(
      fc.property(scales, (scale) => {
        expect(forceAt(setting, limits.balanceRange!(scale), scale)).toBeCloseTo(150, 9);
      }),
    );
  });

  test('stands the blockage lines where the verdict of a plan changes', () => {
    const verdictAt = (scale: number) => evaluatePlan({ ...input, scale }).blockageVerdict;
    const { blockageCautionScale, blockageExcludedScale } = limits;
    expect(verdictAt(blockageCautionScale! - 1e-9)).toBe('passes');
    expect(verdictAt(blockageCautionScale! + 1e-9)).toBe('caution');
    expect(verdictAt(blockageExcludedScale - 1e-9)).toBe('caution');
    expect(verdictAt(blockageExcludedScale + 1e-9)).toBe('excluded');
  });

  test('has one line for an open jet: 0.35 of the nozzle', () => {
    const jet = planningLimits(
      planningSettingOf({ ...input, facility: { kind: 'open-jet', areaM2: 2.27 / 0.35 } }),
      { targetReynolds: 1e7 },
    );
    expect(jet.blockageCautionScale).toBeNull();
    expect(jet.blockageExcludedScale).toBeCloseTo(1, 12);
    expect(jet).toMatchObject({ facilityMaximumMs: null, acceptedReynolds: null, balanceRange: null });
  });

  test('meets target and Mach limit at the scale that the plan names as a way out', () => {
    const { waysOut } = evaluatePlan({ ...input, scale: 0.2, targetReynolds: 1e7 });
    const scale = smallestScaleWithin(setting, 1e7, limits.machLimitMs);
    expect(scale).toBeCloseTo(waysOut!.scaleAtMachLimit!, 12);
    expect(speedAtReynolds(setting, 1e7, scale)).toBeCloseTo(limits.machLimitMs, 10);
  });

  test('puts caution below limit, and minimum and accepted Reynolds numbers below the target', () => {
    expect(limits.machCautionMs).toBeLessThan(limits.machLimitMs);
    fc.assert(
      fc.property(scales, (scale) => {
        expect(limits.minimumReynolds(scale)).toBeLessThan(limits.acceptedReynolds!(scale));
        expect(limits.acceptedReynolds!(scale)).toBeLessThan(limits.targetReynolds(scale));
      }),
    );
  });
});
