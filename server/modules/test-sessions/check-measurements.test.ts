import { facilityCreate, facilityUpdate } from '#shared/contracts/facilities';
import {
  checkMeasurementEnter,
  checkMeasurementList,
  checkMeasurementStrike,
  testSessionCreate,
  testSessionRead,
  type CheckMeasurementFields,
} from '#shared/contracts/test-sessions';
import { facilityFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

describe('measurements of a check body over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;
  let facilityId: string;
  let testSessionId: string;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
    const checkBody = { name: 'Grey box' };
    facilityId = (await aerodynamicist.ok(facilityCreate, { body: facilityFields({ checkBody }) })).id;
    const body = { name: 'Spring', startDate: '2026-03-02', endDate: '2026-03-04' };
    testSessionId = (await aerodynamicist.ok(testSessionCreate, { params: { facilityId }, body })).id;
  });
  afterAll(() => api.close());

  const fields = (change: Partial<CheckMeasurementFields> = {}): CheckMeasurementFields => ({
    testSessionId,
    measuredOn: '2026-03-03',
    dragAreaM2: 0.6123,
    ...change,
  });
  const enter = (change: Partial<CheckMeasurementFields> = {}) =>
    aerodynamicist.ok(checkMeasurementEnter, { params: { facilityId }, body: fields(change) });
  const refusal = (body: unknown) =>
    aerodynamicist.refused(checkMeasurementEnter, {
      params: { facilityId },
      body: body as CheckMeasurementFields,
    });

  it('come back exactly as they were typed, with the body, by date', async () => {
    const second = await enter({ s: 0.0004, n: 5, remark: 'After the break' });
    const first = await enter({ measuredOn: '2026-03-02' });
    expect(second).toEqual({
      ...fields({ s: 0.0004, n: 5, remark: 'After the break' }),
      id: second.id,
      checkBody: 'Grey box',
      enteredAt: expect.any(String),
      enteredBy: expect.any(String),
    });
    const { measurements } = await aerodynamicist.ok(checkMeasurementList, { params: { facilityId } });
    expect(measurements.map(({ id }) => id)).toEqual([first.id, second.id]);
  });

  it('stretch their session by a day of setting up, and are counted there', async () => {
    await enter({ measuredOn: '2026-03-01' });
    const session = await aerodynamicist.ok(testSessionRead, { params: { facilityId, testSessionId } });
    expect(session).toMatchObject({ startDate: '2026-03-01', endDate: '2026-03-04' });
    expect(session.checkMeasurements).toBeGreaterThanOrEqual(1);
  });

  it.each([
    [{ dragAreaM2: 0 }, 'malformed-input'],
    [{ dragAreaM2: -0.6 }, 'malformed-input'],
    [{ dragAreaM2: 612 }, 'malformed-input'],
    [{ n: 0 }, 'malformed-input'],
    [{ n: 2.5 }, 'malformed-input'],
    [{ s: -0.001, n: 3 }, 'malformed-input'],
    [{ s: 0.001 }, 'unusable-input'],
    [{ measuredOn: 'yesterday' }, 'malformed-input'],
    [{ measuredOn: '2026-02-29' }, 'malformed-input'],
    [{ measuredOn: '2199-01-01' }, 'unusable-input'],
    [{ measuredOn: '2025-03-03' }, 'unusable-input'],
    [{ testSessionId: '018f0000-0000-7000-8000-0000000000b1' }, 'unusable-input'],
  ])('are refused with %j', async (change, code) => {
    expect((await refusal({ ...fields(), ...change })).code).toBe(code);
  });

  it('need a body that the facility names', async () => {
    const bare = await aerodynamicist.ok(facilityCreate, { body: facilityFields({ name: 'Bare' }) });
    const params = { facilityId: bare.id };
    const session = await aerodynamicist.ok(testSessionCreate, { params, body: { name: 'First' } });
    const body = fields({ testSessionId: session.id });
    expect((await aerodynamicist.refused(checkMeasurementEnter, { params, body })).code).toBe('wrong-state');
  });

  it('are struck out with a reason, once, and stay readable', async () => {
    const { id } = await enter();
    const strike = {
      params: { facilityId, checkMeasurementId: id },
      body: { reason: 'Tape came off the mirror' },
    };
    expect(await aerodynamicist.ok(checkMeasurementStrike, strike)).toMatchObject({
      id,
      dragAreaM2: 0.6123,
      struck: { reason: 'Tape came off the mirror' },
    });
    expect((await aerodynamicist.refused(checkMeasurementStrike, strike)).code).toBe('wrong-state');
    const { measurements } = await aerodynamicist.ok(checkMeasurementList, { params: { facilityId } });
    expect(measurements.find((each) => each.id === id)?.struck?.reason).toBe('Tape came off the mirror');
  });

  it('are struck out by one of two people at once', async () => {
    const { id } = await enter();
    const both = await Promise.all(
      ['Wrong body', 'Wrong unit'].map((reason) =>
        aerodynamicist.call(checkMeasurementStrike, {
          params: { facilityId, checkMeasurementId: id },
          body: { reason },
        }),
      ),
    );
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('keep the name of the body that they were taken of when another takes its place', async () => {
    const old = await enter();
    const body = facilityFields({ checkBody: { name: 'White estate' } });
    await aerodynamicist.ok(facilityUpdate, { params: { facilityId }, ifMatch: 1, body });
    expect(await enter()).toMatchObject({ checkBody: 'White estate' });
    const { measurements } = await aerodynamicist.ok(checkMeasurementList, { params: { facilityId } });
    expect(measurements.find(({ id }) => id === old.id)?.checkBody).toBe('Grey box');
  });

  it('are entered by aerodynamicists and unknown to other organisations', async () => {
    const { id } = await enter();
    const viewer = await api.asMember('viewer');
    const entry = { params: { facilityId }, body: fields() };
    expect((await viewer.refused(checkMeasurementEnter, entry)).code).toBe('forbidden');
    const stranger = await api.asMember('aerodynamicist', api.second);
    expect((await stranger.refused(checkMeasurementList, { params: { facilityId } })).code).toBe('not-found');
    expect((await stranger.refused(checkMeasurementEnter, entry)).code).toBe('not-found');
    const strike = { params: { facilityId, checkMeasurementId: id }, body: { reason: 'Not mine' } };
    expect((await stranger.refused(checkMeasurementStrike, strike)).code).toBe('not-found');
  });
});
