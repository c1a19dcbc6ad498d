import { facilityCreate } from '#shared/contracts/facilities';
import { programmeCreate } from '#shared/contracts/programmes';
import { resultEnter } from '#shared/contracts/results';
import {
  testPlanCreate,
  testPlanExpect,
  testPlanList,
  testPlanRead,
  testPlanRetire,
  testPlanUpdate,
  type TestPlanInputs,
} from '#shared/contracts/test-plans';
import { variantCreate } from '#shared/contracts/variants';
import {
  facilityFields,
  programmeFields,
  resultFields,
  testPlanFields,
  variantFields,
} from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

describe('test plans over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;
  let manager: ApiMember;
  let programmeId: string;
  let ids: { readonly variantId: string; readonly facilityId: string };

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
    manager = await api.asMember('programme-manager');
    ({ id: programmeId } = await aerodynamicist.ok(programmeCreate, { body: programmeFields() }));
    const params = { programmeId };
    const variant = await aerodynamicist.ok(variantCreate, { params, body: variantFields() });
    const facility = await aerodynamicist.ok(facilityCreate, {
      body: facilityFields({
        name: 'Small section',
        kind: 'closed',
        areaM2: 3,
        blockage: { method: 'none' },
      }),
    });
    ids = { variantId: variant.id, facilityId: facility.id };
  });
  afterAll(() => api.close());

  const save = (name: string, change: Partial<TestPlanInputs> = {}) =>
    aerodynamicist.ok(testPlanCreate, { params: { programmeId }, body: testPlanFields(ids, change, name) });
  const place = (testPlanId: string) => ({ programmeId, testPlanId });

  it('come back exactly as they were saved, with who saved them', async () => {
    const fields = testPlanFields(
      ids,
      {
        target: { basis: 'typed', reynolds: 4e6 },
        speedKmh: 180,
        maximumSpeedKmh: 220,
        maximumForceN: 600,
        coefficientAreaM2: 2.2,
        coolingGas: 'nitrogen',
        turbulence: true,
        remark: 'Trips along the bonnet',
      },
      'Whole',
    );
    const saved = await aerodynamicist.ok(testPlanCreate, { params: { programmeId }, body: fields });
    expect(saved).toEqual({
      ...fields,
      id: saved.id,
      programmeId,
      version: 1,
      createdAt: saved.createdAt,
      createdBy: 'aerodynamicist of First Motors',
    });
    expect(await manager.ok(testPlanRead, { params: place(saved.id) })).toEqual(saved);
    expect((await manager.ok(testPlanList, { params: { programmeId } })).plans).toContainEqual(saved);
  });

  it('are changed with the version that was seen; what is left out is cleared', async () => {
    const { id } = await save('Changing', { maximumForceN: 500 });
    const body = testPlanFields(ids, { scale: 0.5 }, 'Changed');
    const changed = await manager.ok(testPlanUpdate, { params: place(id), ifMatch: 1, body });
    expect(changed).toMatchObject({ name: 'Changed', version: 2, inputs: body.inputs });
    expect(changed.inputs).not.toHaveProperty('maximumForceN');
    expect(
      await aerodynamicist.refused(testPlanUpdate, { params: place(id), ifMatch: 1, body }),
    ).toMatchObject({ code: 'conflict', currentVersion: 2 });
  });

  it('have names of their own within the programme', async () => {
    const { id } = await save('Named');
    const taken = await manager.refused(testPlanCreate, {
      params: { programmeId },
      body: testPlanFields(ids, {}, 'NAMED'),
    });
    expect(taken).toMatchObject({ code: 'already-exists', where: 'name' });
    const body = testPlanFields(ids, {}, 'NAMED');
    expect(await manager.ok(testPlanUpdate, { params: place(id), ifMatch: 1, body })).toMatchObject({
      name: 'NAMED',
    });
  });

  it.each([
    ['inputs.scale', { scale: 1, frontalAreaM2: 3.2 }],
    ['inputs.tunnelTemperatureC', { tunnelTemperatureC: 293 }],
    ['inputs.tunnelPressurePa', { tunnelPressurePa: 1013 }],
    ['inputs.speedKmh', { speedKmh: 300, maximumSpeedKmh: 220 }],
  ] satisfies readonly (readonly [string, Partial<TestPlanInputs>])[])(
    'are refused at %s, and nothing is saved',
    async (where, change) => {
      const problem = await aerodynamicist.refused(testPlanCreate, {
        params: { programmeId },
        body: testPlanFields(ids, change, `Refused ${where}`),
      });
      expect(problem).toMatchObject({ code: 'unusable-input', where });
      const { plans } = await manager.ok(testPlanList, { params: { programmeId } });
      expect(plans.map((plan) => plan.name)).not.toContain(`Refused ${where}`);
    },
  );

  it.each([{ scale: 0 }, { scale: 1.2 }, { speedKmh: 0 }, { dragCoefficient: 0 }])(
    'are refused as malformed with %j',
    async (change) => {
      const body = testPlanFields(ids, change, 'Malformed');
      const problem = await aerodynamicist.refused(testPlanCreate, { params: { programmeId }, body });
      expect(problem.code).toBe('malformed-input');
    },
  );

  it('rest on a sweep only of the programme’s own results', async () => {
    const { id: resultId } = await aerodynamicist.ok(resultEnter, {
      params: { programmeId },
      body: resultFields(ids, { name: 'Swept' }),
    });
    const target = { basis: 'sweep', reynolds: 3.5e6, resultId } as const;
    expect((await save('On a sweep', { target })).inputs.target).toEqual(target);
    const unknown = { ...target, resultId: '00000000-0000-4000-8000-000000000000' };
    const problem = await aerodynamicist.refused(testPlanCreate, {
      params: { programmeId },
      body: testPlanFields(ids, { target: unknown }, 'On another’s sweep'),
    });
    expect(problem).toMatchObject({ code: 'unusable-input', where: 'inputs.target.resultId' });
  });

  it('are expected once a speed is settled on, keep it through a change, and lose it when they retire', async () => {
    const { id } = await save('Expected');
    const early = await manager.refused(testPlanExpect, {
      params: place(id),
      ifMatch: 1,
      body: { expected: true },
    });
    expect(early).toMatchObject({ code: 'wrong-state', detail: expect.stringContaining('speed') });

    const tooFast = testPlanFields(ids, { speedKmh: 600 }, 'Too fast');
    const refused = await aerodynamicist.ok(testPlanCreate, { params: { programmeId }, body: tooFast });
    expect(
      await manager.refused(testPlanExpect, {
        params: place(refused.id),
        ifMatch: 1,
        body: { expected: true },
      }),
    ).toMatchObject({ code: 'wrong-state', detail: expect.stringContaining('Mach 0.49') });

    const settled = testPlanFields(ids, { speedKmh: 190 }, 'Expected');
    await manager.ok(testPlanUpdate, { params: place(id), ifMatch: 1, body: settled });
    const expected = await manager.ok(testPlanExpect, {
      params: place(id),
      ifMatch: 2,
      body: { expected: true },
    });
    expect(expected).toMatchObject({ version: 3, expectedSince: expect.any(String) });

    const faster = testPlanFields(ids, { speedKmh: 200 }, 'Expected');
    const changed = await manager.ok(testPlanUpdate, { params: place(id), ifMatch: 3, body: faster });
    expect(changed.expectedSince).toBe(expected.expectedSince);
    const without = testPlanFields(ids, {}, 'Expected');
    expect(
      (await manager.refused(testPlanUpdate, { params: place(id), ifMatch: 4, body: without })).code,
    ).toBe('wrong-state');

    const retired = await manager.ok(testPlanRetire, {
      params: place(id),
      ifMatch: 4,
      body: { retired: true },
    });
    expect(retired).toMatchObject({ version: 5, retiredAt: expect.any(String) });
    expect(retired).not.toHaveProperty('expectedSince');
    expect(
      (await manager.refused(testPlanExpect, { params: place(id), ifMatch: 5, body: { expected: true } }))
        .code,
    ).toBe('wrong-state');
    const { plans } = await manager.ok(testPlanList, { params: { programmeId } });
    expect(plans.at(-1)).toMatchObject({ id });
    await manager.ok(testPlanRetire, { params: place(id), ifMatch: 5, body: { retired: false } });

    const trail = await api.database.query<{ action: string }>(
      'maintenance',
      'select action from audit_events where entity_id = $1 order by at',
      [id],
    );
    expect(trail.map((event) => event.action)).toEqual([
      'test-plan.saved',
      'test-plan.changed',
      'test-plan.expected',
      'test-plan.changed',
      'test-plan.retired',
      'test-plan.brought-back',
    ]);
  });

  it('are read by stylists and viewers, changed by aerodynamicists and programme managers, unknown elsewhere', async () => {
    const { id } = await save('Seen');
    for (const role of ['stylist', 'viewer'] as const) {
      const reader = await api.asMember(role);
      expect((await reader.ok(testPlanRead, { params: place(id) })).name).toBe('Seen');
      expect(
        (await reader.refused(testPlanExpect, { params: place(id), ifMatch: 1, body: { expected: true } }))
          .code,
      ).toBe('forbidden');
    }
    const stranger = await api.asMember('aerodynamicist', api.second);
    expect((await stranger.refused(testPlanRead, { params: place(id) })).code).toBe('not-found');
    expect(
      (await stranger.refused(testPlanRetire, { params: place(id), ifMatch: 1, body: { retired: true } }))
        .code,
    ).toBe('not-found');
  });
});
