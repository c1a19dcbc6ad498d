import {
  facilityCreate,
  facilityList,
  facilityRead,
  facilityRetire,
  facilityUpdate,
} from '#shared/contracts/facilities';
import { facilityFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

describe('facilities over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
  });
  afterAll(() => api.close());

  it('come back exactly as they were entered', async () => {
    const fields = facilityFields({
      name: 'Complete',
      biasUM2: 0.0004,
      sessionURelative: 0.0015,
      sessionUM2: 0,
      sessionDegreesOfFreedom: 7.5,
      installationURelative: 0.001,
      installationDegreesOfFreedom: 5,
      remark: 'Five belts',
    });
    const created = await aerodynamicist.ok(facilityCreate, { body: fields });
    expect(created).toEqual({ ...fields, id: created.id, version: 1, versionNumber: 1 });
    expect(await aerodynamicist.ok(facilityRead, { params: { facilityId: created.id } })).toEqual(created);
  });

  it('are refused at each field that contradicts another', async () => {
    const problem = await aerodynamicist.refused(facilityCreate, {
      body: facilityFields({ name: 'Wrong', areaM2: undefined, blockage: { method: 'maskell', factor: 1 } }),
    });
    expect(problem.code).toBe('unusable-input');
    expect(problem.issues?.map((issue) => issue.where)).toEqual([
      'areaM2',
      'blockage.theta',
      'blockage.factor',
    ]);
  });

  it('are changed with the version that was seen; what is left out is cleared', async () => {
    const { id } = await aerodynamicist.ok(facilityCreate, { body: facilityFields({ name: 'Changing' }) });
    const params = { facilityId: id };
    const { biasURelative: _bias, ...rest } = facilityFields({ name: 'Changing' });
    const without = { ...rest, comment: 'The calibration was withdrawn' };
    const changed = await aerodynamicist.ok(facilityUpdate, { params, ifMatch: 1, body: without });
    expect(changed).not.toHaveProperty('biasURelative');
    expect(await aerodynamicist.refused(facilityUpdate, { params, ifMatch: 1, body: without })).toMatchObject(
      { code: 'conflict', currentVersion: 2 },
    );
    expect((await aerodynamicist.refused(facilityUpdate, { params, body: without })).code).toBe(
      'precondition-missing',
    );
  });

  it('have names of their own, which changing may keep', async () => {
    const { id } = await aerodynamicist.ok(facilityCreate, { body: facilityFields({ name: 'Named' }) });
    expect(
      (await aerodynamicist.refused(facilityCreate, { body: facilityFields({ name: 'named' }) })).code,
    ).toBe('already-exists');
    const body = facilityFields({ name: 'NAMED' });
    expect(
      await aerodynamicist.ok(facilityUpdate, { params: { facilityId: id }, ifMatch: 1, body }),
    ).toMatchObject({ name: 'NAMED' });
  });

  it('are retired, brought back and audited', async () => {
    const { id } = await aerodynamicist.ok(facilityCreate, { body: facilityFields({ name: 'Closing' }) });
    const params = { facilityId: id };
    const retired = await aerodynamicist.ok(facilityRetire, { params, ifMatch: 1, body: { retired: true } });
    expect(retired).toMatchObject({ version: 2, retiredAt: expect.any(String) });
    await aerodynamicist.ok(facilityRetire, { params, ifMatch: 2, body: { retired: false } });
    const trail = await api.database.query<{ action: string }>(
      'maintenance',
      'select action from audit_events where entity_id = $1 order by at',
      [id],
    );
    expect(trail.map((event) => event.action)).toEqual([
      'facility.added',
      'facility.retired',
      'facility.brought-back',
    ]);
  });

  it('are seen by every role of the maker, changed by aerodynamicists, and unknown elsewhere', async () => {
    const { id } = await aerodynamicist.ok(facilityCreate, { body: facilityFields({ name: 'Seen' }) });
    const manager = await api.asMember('programme-manager');
    expect((await manager.ok(facilityList)).facilities.map((facility) => facility.name)).toContain('Seen');
    expect((await manager.refused(facilityCreate, { body: facilityFields() })).code).toBe('forbidden');
    const stranger = await api.asMember('aerodynamicist', api.second);
    expect((await stranger.refused(facilityRead, { params: { facilityId: id } })).code).toBe('not-found');
    expect(
      (
        await stranger.refused(facilityUpdate, {
          params: { facilityId: id },
          ifMatch: 1,
          body: facilityFields(),
        })
      ).code,
    ).toBe('not-found');
  });
});
