import {
  programmeCreate,
  programmeList,
  programmeOpened,
  programmeRead,
  programmeRetire,
  programmeUpdate,
} from '#shared/contracts/programmes';
import { facilityCreate } from '#shared/contracts/facilities';
import { resultEnter, resultWithdraw } from '#shared/contracts/results';
import { variantCreate, variantRetire } from '#shared/contracts/variants';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

const UNKNOWN = '00000000-0000-4000-8000-000000000000';

describe('programmes over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;
  let manager: ApiMember;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
    manager = await api.asMember('programme-manager');
  });
  afterAll(() => api.close());

  const create = (name: string) => manager.ok(programmeCreate, { body: programmeFields({ name }) });

  it('come back exactly as they were entered, with ids and the first version', async () => {
    const fields = programmeFields({ name: 'Kept', remark: 'Two words', confidence: 0.9 });
    const created = await manager.ok(programmeCreate, { body: fields });
    expect(created).toMatchObject({ ...fields, version: 1, milestones: [{ name: 'Clay freeze' }] });
    expect(await aerodynamicist.ok(programmeRead, { params: { programmeId: created.id } })).toEqual(created);
  });

  it('are refused with everything that is wrong at once', async () => {
    const problem = await manager.refused(programmeCreate, {
      body: programmeFields({
        name: 'Wrong',
        windSpeedMs: 29.9,
        referenceSpeedKmh: 100,
        referenceAir: { temperatureC: 200 },
        commonArea: { kind: 'variant', variantId: UNKNOWN },
      }),
    });
    expect(problem).toMatchObject({ code: 'unusable-input', where: 'referenceAir.pressurePa' });
    expect(problem.issues?.map((issue) => issue.where)).toEqual([
      'referenceAir.pressurePa',
      'referenceAir.relativeHumidity',
      'referenceAir.temperatureC',
      'windSpeedMs',
      'commonArea.variantId',
    ]);
  });

  it('have names of their own within the organisation, and only there', async () => {
    await create('Unique');
    const problem = await manager.refused(programmeCreate, { body: programmeFields({ name: 'UNIQUE' }) });
    expect(problem).toMatchObject({ code: 'already-exists', where: 'name' });
    const elsewhere = await api.asMember('programme-manager', api.second);
    expect(await elsewhere.ok(programmeCreate, { body: programmeFields({ name: 'Unique' }) })).toHaveProperty(
      'id',
    );
  });

  it('detect a colleague’s change and say which version stands', async () => {
    const { id } = await create('Edited');
    const fields = programmeFields({ name: 'Edited', confidence: 0.9 });
    const changed = await manager.ok(programmeUpdate, {
      params: { programmeId: id },
      ifMatch: 1,
      body: fields,
    });
    expect(changed).toMatchObject({ version: 2, confidence: 0.9 });
    expect(
      await aerodynamicist.refused(programmeUpdate, {
        params: { programmeId: id },
        ifMatch: 1,
        body: fields,
      }),
    ).toMatchObject({ code: 'conflict', currentVersion: 2 });
  });

  it('clear what is left out, keep the ids of milestones, and drop milestones that are left out', async () => {
    const created = await manager.ok(programmeCreate, {
      body: programmeFields({
        name: 'Milestones',
        remark: 'gone soon',
        milestones: [
          { name: 'Launch', date: '2028-05-01' },
          { name: 'Clay freeze', date: '2027-03-14' },
        ],
      }),
    });
    const [clay] = created.milestones;
    expect(created.milestones.map((milestone) => milestone.name)).toEqual(['Clay freeze', 'Launch']);
    const changed = await manager.ok(programmeUpdate, {
      params: { programmeId: created.id },
      ifMatch: 1,
      body: programmeFields({
        name: 'Milestones',
        commonArea: undefined,
        milestones: [
          { id: clay?.id, name: 'Clay freeze', date: '2027-04-01' },
          { name: 'Tooling', date: '2027-06-01' },
        ],
      }),
    });
    expect(changed).not.toHaveProperty('remark');
    expect(changed).not.toHaveProperty('commonArea');
    expect(changed.milestones).toEqual([
      { id: clay?.id, name: 'Clay freeze', date: '2027-04-01' },
      { id: expect.any(String), name: 'Tooling', date: '2027-06-01' },
    ]);
  });

  it('are retired and brought back', async () => {
    const { id } = await create('Retired');
    const params = { programmeId: id };
    expect(await manager.ok(programmeRetire, { params, ifMatch: 1, body: { retired: true } })).toHaveProperty(
      'retiredAt',
    );
    expect(
      await manager.ok(programmeRetire, { params, ifMatch: 2, body: { retired: false } }),
    ).not.toHaveProperty('retiredAt');
  });

  it('are counted in the list without retired variants and withdrawn results', async () => {
    const { id: programmeId } = await manager.ok(programmeCreate, {
      body: programmeFields({
        name: 'Counted',
        milestones: [
          { name: 'Past', date: '2020-01-01' },
          { name: 'Far', date: '2099-01-01' },
          { name: 'Near', date: '2098-01-01' },
        ],
      }),
    });
    const params = { programmeId };
    const facility = await aerodynamicist.ok(facilityCreate, { body: facilityFields({ name: 'Counting' }) });
    const variant = (name: string) => manager.ok(variantCreate, { params, body: variantFields({ name }) });
    const [tested, untested, retired] = [await variant('A'), await variant('B'), await variant('C')];
    await manager.ok(variantRetire, {
      params: { programmeId, variantId: retired.id },
      ifMatch: 1,
      body: { retired: true },
    });
    const enter = (variantId: string, name: string, testDate: string) =>
      aerodynamicist.ok(resultEnter, {
        params,
        body: resultFields({ variantId, facilityId: facility.id }, { name, testDate }),
      });
    await enter(tested.id, 'one', '2026-05-01');
    await enter(tested.id, 'two', '2026-06-01');
    const wrong = await enter(untested.id, 'three', '2026-07-01');
    await aerodynamicist.ok(resultWithdraw, {
      params: { programmeId, resultId: wrong.id },
      body: { reason: 'wrong car' },
    });

    const { programmes } = await manager.ok(programmeList);
    expect(programmes.find((programme) => programme.id === programmeId)).toEqual({
      id: programmeId,
      name: 'Counted',
      variantCount: 2,
      variantsWithoutResult: 1,
      resultCount: 2,
      latestResultDate: '2026-06-01',
      nextMilestone: { id: expect.any(String), name: 'Near', date: '2098-01-01' },
    });
  });

  it('are remembered by whoever opened them, the latest last', async () => {
    const [one, two] = [await create('Opened first'), await create('Opened second')];
    const viewer = await api.asMember('viewer');
    await viewer.ok(programmeOpened, { params: { programmeId: two.id } });
    await viewer.ok(programmeOpened, { params: { programmeId: one.id } });
    const recent = await api.database.query<{ programme_id: string }>(
      'maintenance',
      'select programme_id from recent_programmes where user_id = $1 order by at desc',
      [viewer.userId],
    );
    expect(recent.map((row) => row.programme_id)).toEqual([one.id, two.id]);
  });

  it('write the fields that differ into the audit trail, with the person', async () => {
    const { id } = await create('Audited');
    await manager.ok(programmeUpdate, {
      params: { programmeId: id },
      ifMatch: 1,
      body: programmeFields({
        name: 'Audited',
        referenceSpeedKmh: 140,
        milestones: [],
      }),
    });
    const trail = await api.database.query<{ action: string; actor_user_id: string; summary: unknown[] }>(
      'maintenance',
      'select action, actor_user_id, summary from audit_events where entity_id = $1 order by at',
      [id],
    );
    expect(trail.map((event) => event.action)).toEqual(['programme.opened', 'programme.changed']);
    expect(trail[1]).toMatchObject({ actor_user_id: manager.userId });
    expect(trail[1]?.summary).toEqual([
      expect.objectContaining({ field: 'milestones', after: [] }),
      { field: 'referenceSpeedKmh', before: 120, after: 140 },
      { field: 'version', before: 1, after: 2 },
    ]);
  });

  it('are not found by anybody else, and a foreign id answers like an unknown one', async () => {
    const { id } = await create('Mine');
    const stranger = await api.asMember('aerodynamicist', api.second);
    const withoutRequestId = async (programmeId: string) => {
      const { requestId: _requestId, ...rest } = await stranger.refused(programmeRead, {
        params: { programmeId },
      });
      return rest;
    };
    expect(await withoutRequestId(id)).toEqual(await withoutRequestId(UNKNOWN));
    expect((await withoutRequestId(id)).code).toBe('not-found');
  });

  it('may be changed by programme managers and aerodynamicists only', async () => {
    for (const role of ['administrator', 'stylist', 'viewer'] as const) {
      const member = await api.asMember(role);
      expect((await member.refused(programmeCreate, { body: programmeFields() })).code).toBe('forbidden');
      expect((await member.ok(programmeList)).programmes.length).toBeGreaterThan(0);
    }
  });
});
