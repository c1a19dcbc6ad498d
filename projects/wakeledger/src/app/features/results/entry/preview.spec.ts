import type { Facility } from '#shared/contracts/facilities';
import type { Programme } from '#shared/contracts/programmes';
import type { Variant } from '#shared/contracts/variants';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { previewOf } from './preview';

const ids = { variantId: 'variant', facilityId: 'facility' };
const surroundings = {
  programme: { ...programmeFields(), id: 'programme', version: 1, milestones: [] } as Programme,
  variant: { ...variantFields(), id: 'variant', programmeId: 'programme', version: 1 } as Variant,
  facility: { ...facilityFields(), id: 'facility', version: 1 } as Facility,
};

describe('the preview of a typed result', () => {
  it('is the drag area at the reference: 0.2712/1.01·2.19 m² in this tunnel', () => {
    const preview = previewOf(resultFields(ids), surroundings);
    expect(preview.kind).toBe('reduced');
    const output = preview.kind === 'reduced' ? preview.reduction.output : undefined;
    expect(output?.zeroYaw.dragAreaM2).toBeCloseTo((0.2712 / 1.01) * 2.19, 12);
    expect(output?.zeroYaw.expandedUncertaintyM2).toBeGreaterThan(0);
    expect(output?.excludedBy).toEqual([]);
  });

  it('says at once that another ground is not comparable', () => {
    const preview = previewOf(resultFields(ids, { condition: { ground: 'fixed-floor' } }), surroundings);
    expect(preview.kind === 'reduced' && preview.reduction.output.excludedBy).toEqual(['not-comparable']);
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
});
