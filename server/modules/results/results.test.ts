import { attachmentUpload } from '#shared/contracts/attachments';
import { facilityCreate } from '#shared/contracts/facilities';
import { programmeCreate } from '#shared/contracts/programmes';
import {
  resultEnter,
  resultList,
  resultRead,
  resultWithdraw,
  type ResultFields,
} from '#shared/contracts/results';
import { variantCreate } from '#shared/contracts/variants';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

const UNKNOWN = '00000000-0000-4000-8000-000000000000';

describe('results over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;
  let programmeId: string;
  let variantId: string;
  let facilityId: string;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
    programmeId = (await aerodynamicist.ok(programmeCreate, { body: programmeFields() })).id;
    const params = { programmeId };
    variantId = (await aerodynamicist.ok(variantCreate, { params, body: variantFields() })).id;
    facilityId = (await aerodynamicist.ok(facilityCreate, { body: facilityFields() })).id;
  });
  afterAll(() => api.close());

  const fields = (change: Partial<ResultFields>) => resultFields({ variantId, facilityId }, change);
  const enter = (change: Partial<ResultFields>) =>
    aerodynamicist.ok(resultEnter, { params: { programmeId }, body: fields(change) });
  const refused = (change: Partial<ResultFields>, member = aerodynamicist) =>
    member.refused(resultEnter, { params: { programmeId }, body: fields(change) });

  it('keep every raw value as it came', async () => {
    const whole = fields({
      name: 'Whole',
      quantity: 'force',
      quotedAreaUM2: 0.004,
      dynamicPressurePa: 915.25,
      tareAlreadySubtracted: false,
      tareN: 31.4,
      air: { state: 'custom', temperatureC: 23.1, pressurePa: 98_640, relativeHumidity: 0.41 },
      condition: { ground: 'several-belts', wheels: 'rotating', rideHeightFrontMm: 142.5, payloadKg: 0 },
      turbulenceGenerationOrTrips: false,
      stated: { expandedU: 2.1, k: 2, degreesOfFreedom: 12, includesFacilityBias: true },
      session: 'September entry',
      installation: 'second mounting',
      model: 'hard model 2',
      source: 'Halmere protocol 88',
      remark: 'Wind noise tape on',
      blockageAlreadyCorrectedBy: 'the tunnel',
      points: [
        { yawDeg: 0, value: 580.25, s: 0.9, n: 3, frontLift: 30.5, rearLift: -12, sideForce: 0 },
        { yawDeg: 5, value: 596, tareN: 32, speedKmh: 140, dynamicPressurePa: 914 },
      ],
    });
    const entered = await aerodynamicist.ok(resultEnter, { params: { programmeId }, body: whole });
    expect(entered).toEqual({
      ...whole,
      id: entered.id,
      programmeId,
      entrySequence: expect.any(Number),
      enteredAt: expect.any(String),
      enteredBy: 'aerodynamicist of First Motors',
      state: 'entered',
      adopted: false,
    });
    const params = { programmeId, resultId: entered.id };
    expect(await aerodynamicist.ok(resultRead, { params })).toEqual(entered);
    expect((await aerodynamicist.ok(resultList, { params: { programmeId } })).results).toContainEqual(
      entered,
    );
  });

  it('are numbered in the order of entry, without doubles when many come at once', async () => {
    const entered = await Promise.all([1, 2, 3, 4, 5].map((i) => enter({ name: `Parallel ${i}` })));
    const numbers = entered.map((result) => result.entrySequence).sort((a, b) => a - b);
    expect(new Set(numbers).size).toBe(5);
    expect((numbers[4] ?? 0) - (numbers[0] ?? 0)).toBe(4);
    const later = await enter({ name: 'Later', testDate: '2020-01-01' });
    expect(later.entrySequence).toBe((numbers[4] ?? 0) + 1);
  });

  it('share the session of their name in a facility, which reaches from the first to the last test', async () => {
    await enter({ name: 'S1', session: 'Spring', testDate: '2026-03-03' });
    await enter({ name: 'S2', session: 'spring', testDate: '2026-03-01' });
    const other = await aerodynamicist.ok(facilityCreate, { body: facilityFields({ name: 'Other tunnel' }) });
    const elsewhere = await aerodynamicist.ok(resultEnter, {
      params: { programmeId },
      body: fields({ name: 'S3', session: 'Spring', facilityId: other.id }),
    });
    expect(elsewhere.session).toBe('Spring');
    const sessions = await api.database.query<{ start: string; end: string }>(
      'maintenance',
      `select start_date::text as start, end_date::text as end from test_sessions
       where lower(name) = 'spring' and facility_id = $1`,
      [facilityId],
    );
    expect(sessions).toEqual([{ start: '2026-03-01', end: '2026-03-03' }]);
  });

  it('are refused field by field, and say what would be accepted', async () => {
    const problem = await refused({
      name: 'Bad',
      testDate: '2199-01-01',
      quotedAreaScale: undefined,
      air: { temperatureC: 22 },
      points: [{ yawDeg: 5, value: 0.27, s: 0.001, n: 1 }],
    });
    expect(problem).toMatchObject({ code: 'unusable-input', where: 'testDate' });
    expect(problem.issues?.map((issue) => issue.where)).toEqual([
      'testDate',
      'quotedAreaScale',
      'air.pressurePa',
      'air.relativeHumidity',
      'points.0.n',
      'points',
    ]);
  });

  it('refer to a variant, a facility and evidence that are there', async () => {
    expect(await refused({ name: 'Nowhere', variantId: UNKNOWN, facilityId: UNKNOWN })).toMatchObject({
      code: 'unusable-input',
      issues: [{ where: 'variantId' }, { where: 'facilityId' }],
    });
    expect(await refused({ name: 'Nowhere', attachmentId: UNKNOWN })).toMatchObject({
      where: 'attachmentId',
    });
    const file = { name: 'protocol.pdf', content: '%PDF-1.7\n' };
    const evidence = await aerodynamicist.ok(attachmentUpload, { query: { purpose: 'evidence' }, file });
    expect(await enter({ name: 'With evidence', attachmentId: evidence.id })).toMatchObject({
      attachmentId: evidence.id,
    });
  });

  it('never refer to another organisation’s variant or facility, which answer like unknown ones', async () => {
    const stranger = await api.asMember('aerodynamicist', api.second);
    const theirs = await stranger.ok(programmeCreate, { body: programmeFields() });
    const own = await stranger.ok(variantCreate, {
      params: { programmeId: theirs.id },
      body: variantFields(),
    });
    const attempt = async (change: Partial<ResultFields>) => {
      const { requestId: _requestId, ...rest } = await stranger.refused(resultEnter, {
        params: { programmeId: theirs.id },
        body: resultFields({ variantId: own.id, facilityId: UNKNOWN }, change),
      });
      return rest;
    };
    expect(await attempt({ facilityId })).toEqual(await attempt({ facilityId: UNKNOWN }));
    expect(await attempt({ variantId })).toEqual(await attempt({ variantId: UNKNOWN }));
    expect((await refused({ name: 'Foreign programme' }, stranger)).code).toBe('not-found');
  });

  it('have names of their own, which a withdrawn result gives free for the corrected entry', async () => {
    const wrong = await enter({ name: 'Run 7' });
    expect((await refused({ name: 'RUN 7' })).code).toBe('already-exists');
    const params = { programmeId, resultId: wrong.id };
    const withdrawn = await aerodynamicist.ok(resultWithdraw, { params, body: { reason: 'typed wrongly' } });
    expect(withdrawn.withdrawn).toMatchObject({
      reason: 'typed wrongly',
      by: 'aerodynamicist of First Motors',
    });
    expect(await enter({ name: 'Run 7' })).not.toHaveProperty('withdrawn');
    const { results } = await aerodynamicist.ok(resultList, { params: { programmeId } });
    expect(results.filter((result) => result.name === 'Run 7')).toHaveLength(2);
  });

  it('are withdrawn once', async () => {
    const { id } = await enter({ name: 'Twice' });
    const call = { params: { programmeId, resultId: id }, body: { reason: 'belt stood still' } };
    await aerodynamicist.ok(resultWithdraw, call);
    expect((await aerodynamicist.refused(resultWithdraw, call)).code).toBe('wrong-state');
  });

  it('are never changed: the request role has no right to', async () => {
    for (const statement of [
      'update results set name = name',
      'delete from results',
      'delete from result_points',
    ]) {
      await expect(api.database.query('tenant', statement)).rejects.toThrow(/permission denied/);
    }
  });

  it('are read by managers, entered and withdrawn by aerodynamicists, and hidden from stylists', async () => {
    const manager = await api.asMember('programme-manager');
    const stylist = await api.asMember('stylist');
    expect((await manager.ok(resultList, { params: { programmeId } })).results.length).toBeGreaterThan(0);
    expect((await refused({ name: 'By a manager' }, manager)).code).toBe('forbidden');
    expect((await stylist.refused(resultList, { params: { programmeId } })).code).toBe('forbidden');
  });

  it('enter the audit trail with their values, and only when they were stored', async () => {
    const { id } = await enter({ name: 'Told' });
    await refused({ name: 'Told' });
    const trail = await api.database.query<{
      entity_id: string;
      summary: { field: string; after: unknown }[];
    }>(
      'maintenance',
      `select entity_id, summary from audit_events where action = 'result.entered' and summary @> $1`,
      [JSON.stringify([{ field: 'name', after: 'Told' }])],
    );
    expect(trail.map((event) => event.entity_id)).toEqual([id]);
    expect(trail[0]?.summary).toContainEqual({ field: 'quotedAreaM2', after: 2.19 });
  });
});
