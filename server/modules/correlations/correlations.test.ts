import {
  correlationAdopt,
  correlationCreate,
  correlationEnd,
  correlationList,
  correlationRead,
  correlationVersionAdd,
  type CorrelationPair,
} from '#shared/contracts/correlations';
import { facilityCreate } from '#shared/contracts/facilities';
import { facilityFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

const pair = (dragAreaM2: number, referenceDragAreaM2: number): CorrelationPair => ({
  geometry: `Body of ${dragAreaM2} m²`,
  dragAreaM2,
  uM2: 0.004,
  referenceDragAreaM2,
  referenceUM2: 0.003,
});
const PAIRS = [0.5, 0.55, 0.6, 0.65, 0.7].map((x) => pair(x, 0.02 + 0.98 * x));
const FALLING = [0.5, 0.55, 0.6, 0.65, 0.7].map((x) => pair(x, 1.2 - x));

describe('correlations over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
  });
  afterAll(() => api.close());

  async function facilities(name: string) {
    const facility = (body: string) =>
      aerodynamicist.ok(facilityCreate, { body: facilityFields({ name: body }) });
    const { id: facilityId } = await facility(`${name} small`);
    const { id: referenceFacilityId } = await facility(`${name} large`);
    return { facilityId, referenceFacilityId };
  }
  async function add(name: string) {
    const ids = await facilities(name);
    const body = { name, ...ids, replaces: ['blockage'], pairs: PAIRS, comment: 'First five bodies' };
    return aerodynamicist.ok(correlationCreate, { body });
  }
  const adopt = (correlationId: string, versionNumber: number, effectiveDate: string) =>
    aerodynamicist.ok(correlationAdopt, {
      params: { correlationId },
      body: { versionNumber, effectiveDate, comment: 'Agreed in the tunnel meeting' },
    });

  it('keep their pairs as they stood, with the reason of one that was left out, and are not yet in use', async () => {
    const ids = await facilities('Kept');
    const pairs = [...PAIRS, { ...pair(0.8, 0.7), leftOutReason: 'Another mirror was fitted' }];
    const created = await aerodynamicist.ok(correlationCreate, {
      body: { name: 'Kept', ...ids, replaces: ['reynolds', 'blockage'], pairs, comment: 'First six bodies' },
    });
    expect(created).toMatchObject({ ...ids, latestNumber: 1, adoptions: [] });
    expect(created).not.toHaveProperty('inUse');
    expect(created.versions).toEqual([
      expect.objectContaining({ number: 1, pairs, replaces: ['reynolds', 'blockage'] }),
    ]);
    const params = { correlationId: created.id };
    expect(await aerodynamicist.ok(correlationRead, { params })).toEqual(created);
  });

  it.each([
    ['a falling line', FALLING, 'method-refused', 'correlation-negative-slope'],
    [
      'an uncertainty of zero',
      [{ ...PAIRS[0]!, uM2: 0 }, ...PAIRS.slice(1)],
      'unusable-input',
      'uncertainty-zero',
    ],
    [
      'one drag area only',
      PAIRS.map((one) => ({ ...one, dragAreaM2: 0.6 })),
      'unusable-input',
      'correlation-no-spread',
    ],
    ['a single pair', PAIRS.slice(0, 1), 'unusable-input', 'correlation-too-few-pairs'],
  ])('are refused with %s, by name', async (about, pairs, code, reason) => {
    const ids = await facilities(about);
    const body = { name: about, ...ids, replaces: [], pairs, comment: 'Tried' };
    expect(await aerodynamicist.refused(correlationCreate, { body })).toMatchObject({ code, reason });
  });

  it('get another version beside the one before, unless somebody added one meanwhile', async () => {
    const { id, versions } = await add('Versions');
    const params = { correlationId: id };
    const body = {
      replaces: [],
      pairs: PAIRS.slice(0, 4),
      comment: 'Without the last body',
      basedOnNumber: 1,
    };
    const second = await aerodynamicist.ok(correlationVersionAdd, { params, body });
    expect(second.versions.map(({ number }) => number)).toEqual([2, 1]);
    expect(second.versions[1]).toEqual(versions[0]);
    expect(await aerodynamicist.refused(correlationVersionAdd, { params, body })).toMatchObject({
      code: 'conflict',
      currentVersion: 2,
    });
  });

  it('are used from a date on, change the version at a date, and end; what was said stays listed', async () => {
    const { id } = await add('In use');
    const params = { correlationId: id };
    await aerodynamicist.ok(correlationVersionAdd, {
      params,
      body: { replaces: [], pairs: PAIRS, comment: 'Blockage is corrected apart', basedOnNumber: 1 },
    });
    expect(await adopt(id, 1, '2026-01-10')).toMatchObject({
      inUse: { versionNumber: 1, since: '2026-01-10' },
    });
    expect(await adopt(id, 2, '2999-01-01')).toMatchObject({ inUse: { versionNumber: 1 } });
    const listed = await aerodynamicist.ok(correlationList);
    expect(listed.correlations.find((one) => one.id === id)).toMatchObject({
      latestNumber: 2,
      inUse: { versionNumber: 1, since: '2026-01-10' },
    });
    const early = { effectiveDate: '2026-02-01', comment: 'Too early' };
    expect(await aerodynamicist.refused(correlationEnd, { params, body: early })).toMatchObject({
      code: 'unusable-input',
      where: 'effectiveDate',
    });
    const ended = await aerodynamicist.ok(correlationEnd, {
      params,
      body: { effectiveDate: '2999-01-01', comment: 'The tunnel is rebuilt' },
    });
    expect(ended.adoptions.map(({ versionNumber }) => versionNumber ?? 'end')).toEqual(['end', 2, 1]);
  });

  it('are not two in use between the same facilities', async () => {
    const first = await add('First of two');
    const { facilityId, referenceFacilityId } = first;
    const second = await aerodynamicist.ok(correlationCreate, {
      body: {
        name: 'Second of two',
        facilityId,
        referenceFacilityId,
        replaces: [],
        pairs: PAIRS,
        comment: 'Tried',
      },
    });
    await adopt(first.id, 1, '2026-01-10');
    const refused = await aerodynamicist.refused(correlationAdopt, {
      params: { correlationId: second.id },
      body: { versionNumber: 1, effectiveDate: '2026-03-01', comment: 'Newer' },
    });
    expect(refused).toMatchObject({ code: 'wrong-state', reason: 'another-in-use' });
    expect(refused.detail).toContain('First of two');
  });

  it('cannot be adopted in a version that is not there, nor ended before use', async () => {
    const { id } = await add('Unused');
    const params = { correlationId: id };
    const ending = { effectiveDate: '2026-03-01', comment: 'Never used' };
    expect(
      await aerodynamicist.refused(correlationAdopt, { params, body: { versionNumber: 7, ...ending } }),
    ).toMatchObject({ code: 'unusable-input', where: 'versionNumber' });
    expect((await aerodynamicist.refused(correlationEnd, { params, body: ending })).code).toBe('wrong-state');
  });

  it('are listed to every role of the maker, read with results, made by aerodynamicists, unknown elsewhere', async () => {
    const { id } = await add('Seen');
    const params = { correlationId: id };
    const stylist = await api.asMember('stylist');
    expect((await stylist.ok(correlationList)).correlations.map((one) => one.id)).toContain(id);
    expect((await stylist.refused(correlationRead, { params })).code).toBe('forbidden');
    const manager = await api.asMember('programme-manager');
    expect((await manager.ok(correlationRead, { params })).name).toBe('Seen');
    expect(
      (
        await manager.refused(correlationAdopt, {
          params,
          body: { versionNumber: 1, effectiveDate: '2026-03-01', comment: 'Not mine to say' },
        })
      ).code,
    ).toBe('forbidden');
    const stranger = await api.asMember('aerodynamicist', api.second);
    expect((await stranger.refused(correlationRead, { params })).code).toBe('not-found');
  });
});
