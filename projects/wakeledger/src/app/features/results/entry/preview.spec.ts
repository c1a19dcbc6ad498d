import type { Facility } from '#shared/contracts/facilities';
import type { PolicyVersion } from '#shared/contracts/policies';
import type { Programme } from '#shared/contracts/programmes';
import type { Variant } from '#shared/contracts/variants';
import { DEFAULT_LIMITS } from '#shared/core/checks/limits';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { previewOf } from './preview';

const ids = { variantId: 'variant', facilityId: 'facility' };
const surroundings = {
  programme: { ...programmeFields(), id: 'programme', version: 1, milestones: [] } as Programme,
  variant: { ...variantFields(), id: 'variant', programmeId: 'programme', version: 1 } as Variant,
  facility: { ...facilityFields(), id: 'facility', version: 1 } as Facility,
  policies: { number: 0, values: DEFAULT_LIMITS } as unknown as PolicyVersion,
  document: null,
};

describe('the preview of a typed result', () => {
  it('is a full-scale drag area of 0.2712/1.01·2.19 m² in this tunnel, brought along the friction line', () => {
    const preview = previewOf(resultFields(ids), surroundings);
    expect(preview.kind).toBe('reduced');
    const output = preview.kind === 'reduced' ? preview.reduction.output : undefined;
    const [atFullScale, atTheReference] = output?.steps ?? [];
    expect(atFullScale?.dragAreaM2).toBeCloseTo((0.2712 / 1.01) * 2.19, 12);
    expect(atTheReference).toMatchObject({ step: 'reynolds', dragAreaM2: output?.zeroYaw.dragAreaM2 });
    expect(output?.zeroYaw.expandedUncertaintyM2).toBeGreaterThan(0);
    expect(output?.excludedBy).toEqual([]);
  });

  it('says at once that another ground is not comparable', () => {
    const preview = previewOf(resultFields(ids, { condition: { ground: 'fixed-floor' } }), surroundings);
    expect(preview.kind === 'reduced' && preview.reduction.output.excludedBy).toEqual(['not-comparable']);
  });

  it('brings another ground to the reference where the organisation knows what it is worth', () => {
    const adjustments = [
      {
        id: 'belts',
        item: 'ground',
        fromValue: 'fixed-floor',
        toValue: 'several-belts',
        deltaDragAreaM2: -0.011,
        uM2: 0.003,
      },
    ];
    const fields = resultFields(ids, { condition: { ground: 'fixed-floor', wheels: 'rotating' } });
    const preview = previewOf(fields, { ...surroundings, document: { facilities: [], adjustments } });
    expect(preview).toMatchObject({ kind: 'reduced', reduction: { output: { excludedBy: [] } } });
    const condition = 'checks' in preview && preview.checks.find(({ check }) => check === 'condition');
    expect(condition).toMatchObject({ verdict: 'passes', finding: 'adjusted' });
  });

  it('says in the method’s words what is missing', () => {
    const preview = previewOf(
      resultFields(ids, { air: { state: 'custom', temperatureC: 20 } }),
      surroundings,
    );
    expect(preview).toMatchObject({ kind: 'refused', refusal: { code: 'missing-input' } });
  });

  it('finds no figure in a result without a point at zero yaw', () => {
    const preview = previewOf(resultFields(ids, { points: [{ yawDeg: 5, value: 0.28 }] }), surroundings);
    expect(preview).toMatchObject({ kind: 'refused', refusal: { code: 'yaw-no-zero' } });
  });

  it('checks what is typed against the organisation’s limits', () => {
    const verdictOf = (limits: object): string | undefined => {
      const policies = { number: 1, values: { ...DEFAULT_LIMITS, ...limits } } as unknown as PolicyVersion;
      const preview = previewOf(resultFields(ids), { ...surroundings, policies });
      return preview.kind === 'reduced'
        ? preview.checks.find(({ check }) => check === 'mach')?.verdict
        : undefined;
    };
    expect(verdictOf({})).toBe('passes');
    expect(verdictOf({ machCaution: 0.05 })).toBe('caution');
    expect(verdictOf({ machCaution: 0.05, machExcluded: 0.06 })).toBe('excluded');
  });

  it('says which unit was probably meant', () => {
    const air = { state: 'custom' as const, temperatureC: 293.15, pressurePa: 100000, relativeHumidity: 0.5 };
    expect(previewOf(resultFields(ids, { air }), surroundings)).toMatchObject({
      kind: 'refused',
      checks: [{ check: 'refused', finding: 'kelvin' }],
    });
  });
});
