import { facilityCreate } from '#shared/contracts/facilities';
import { programmeCreate } from '#shared/contracts/programmes';
import { resultEnter } from '#shared/contracts/results';
import {
  testSessionCreate,
  testSessionList,
  testSessionRead,
  testSessionUpdate,
} from '#shared/contracts/test-sessions';
import { variantCreate } from '#shared/contracts/variants';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

describe('sessions over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;
  let facilityId: string;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
    facilityId = (await aerodynamicist.ok(facilityCreate, { body: facilityFields() })).id;
  });
  afterAll(() => api.close());

  const add = (body: { name: string; startDate?: string; endDate?: string; remark?: string }) =>
    aerodynamicist.ok(testSessionCreate, { params: { facilityId }, body });

  it('come back as they were entered, newest first, those without a date on top', async () => {
    const spring = await add({
      name: 'Spring',
      startDate: '2026-03-02',
      endDate: '2026-03-04',
      remark: 'Five belts',
    });
    expect(spring).toMatchObject({
      name: 'Spring',
      startDate: '2026-03-02',
      endDate: '2026-03-04',
      remark: 'Five belts',
      version: 1,
      results: 0,
      installations: [],
      checkMeasurements: 0,
    });
    await add({ name: 'Next' });
    await add({ name: 'Autumn', startDate: '2026-09-14' });
    const { sessions } = await aerodynamicist.ok(testSessionList, { params: { facilityId } });
    expect(sessions.map(({ name }) => name)).toEqual(['Next', 'Autumn', 'Spring']);
    const params = { facilityId, testSessionId: spring.id };
    expect(await aerodynamicist.ok(testSessionRead, { params })).toEqual(spring);
  });

  it('count the results entered under their name and name the installations', async () => {
    const programme = await aerodynamicist.ok(programmeCreate, { body: programmeFields() });
    const params = { programmeId: programme.id };
    const variant = await aerodynamicist.ok(variantCreate, { params, body: variantFields() });
    const session = await add({ name: 'Counted', startDate: '2026-09-14' });
    for (const [name, installation] of [
      ['C1', 'first'],
      ['C2', 'second'],
      ['C3', 'first'],
    ] as const) {
      await aerodynamicist.ok(resultEnter, {
        params,
        body: resultFields({ variantId: variant.id, facilityId }, { name, installation, session: 'counted' }),
      });
    }
    const read = { params: { facilityId, testSessionId: session.id } };
    expect(await aerodynamicist.ok(testSessionRead, read)).toMatchObject({
      results: 3,
      installations: ['first', 'second'],
    });
    expect(
      await aerodynamicist.refused(testSessionUpdate, {
        ...read,
        ifMatch: 1,
        body: { name: 'Counted', startDate: '2026-09-15', endDate: '2026-09-16' },
      }),
    ).toMatchObject({ code: 'unusable-input', where: 'startDate' });
  });

  it('are renamed with all their results, with the version that was seen', async () => {
    const { id: testSessionId } = await add({ name: 'Wrong nmae' });
    const read = { params: { facilityId, testSessionId } };
    const renamed = { ...read, ifMatch: 1, body: { name: 'Right name' } };
    expect(await aerodynamicist.ok(testSessionUpdate, renamed)).toMatchObject({
      name: 'Right name',
      version: 2,
    });
    expect(await aerodynamicist.refused(testSessionUpdate, renamed)).toMatchObject({
      code: 'conflict',
      currentVersion: 2,
    });
    expect((await aerodynamicist.refused(testSessionUpdate, { ...read, body: { name: 'R' } })).code).toBe(
      'precondition-missing',
    );
  });

  it('of two people who change one at once, the second is told', async () => {
    const { id: testSessionId } = await add({ name: 'Contested' });
    const both = await Promise.all(
      ['First wish', 'Second wish'].map((name) =>
        aerodynamicist.call(testSessionUpdate, {
          params: { facilityId, testSessionId },
          ifMatch: 1,
          body: { name },
        }),
      ),
    );
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('have names of their own within a facility, and the same name in another', async () => {
    const params = { facilityId };
    await add({ name: 'Winter' });
    const body = { name: 'WINTER' };
    expect((await aerodynamicist.refused(testSessionCreate, { params, body })).code).toBe('already-exists');
    const other = await aerodynamicist.ok(facilityCreate, { body: facilityFields({ name: 'Other' }) });
    await aerodynamicist.ok(testSessionCreate, { params: { facilityId: other.id }, body });
  });

  it.each([
    [{ name: 'Bad', startDate: '2026-02-30' }, 'malformed-input'],
    [{ name: 'Bad', startDate: '14.9.2026' }, 'malformed-input'],
    [{ name: 'Bad', startDate: '2026-09-14', endDate: '2026-09-13' }, 'unusable-input'],
    [{ name: 'Bad', endDate: '2026-09-13' }, 'unusable-input'],
    [{ name: ' ' }, 'malformed-input'],
  ])('are refused as %j', async (body, code) => {
    expect((await aerodynamicist.refused(testSessionCreate, { params: { facilityId }, body })).code).toBe(
      code,
    );
  });

  it('are read by every role of the maker, changed by aerodynamicists, and unknown elsewhere', async () => {
    const { id: testSessionId } = await add({ name: 'Seen' });
    const params = { facilityId, testSessionId };
    const viewer = await api.asMember('viewer');
    expect(await viewer.ok(testSessionRead, { params })).toMatchObject({ name: 'Seen' });
    const create = { params: { facilityId }, body: { name: 'Mine' } };
    expect((await viewer.refused(testSessionCreate, create)).code).toBe('forbidden');
    const stranger = await api.asMember('aerodynamicist', api.second);
    expect((await stranger.refused(testSessionList, { params: { facilityId } })).code).toBe('not-found');
    expect((await stranger.refused(testSessionCreate, create)).code).toBe('not-found');
    const change = { params, ifMatch: 1, body: { name: 'Taken' } };
    expect((await stranger.refused(testSessionUpdate, change)).code).toBe('not-found');
    const elsewhere = await aerodynamicist.ok(facilityCreate, {
      body: facilityFields({ name: 'Elsewhere' }),
    });
    expect(
      (await aerodynamicist.refused(testSessionRead, { params: { facilityId: elsewhere.id, testSessionId } }))
        .code,
    ).toBe('not-found');
  });
});
