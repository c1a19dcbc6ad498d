import pg from 'pg';
import { facilityCreate } from '#shared/contracts/facilities';
import { rankingInputSchema } from '#shared/contracts/method/ranking-input';
import { programmeCreate } from '#shared/contracts/programmes';
import { rankingContextRead, rankingInputsRead, rankingViewRead } from '#shared/contracts/rankings';
import { evidenceAdopt } from '#shared/contracts/adoptions';
import { resultEnter, resultWithdraw } from '#shared/contracts/results';
import { variantCreate, variantRetire } from '#shared/contracts/variants';
import { evaluateRank } from '#shared/core/ranking/rank';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { builtInCycle } from '../../../seeds/reference/cycles/built-in-cycles';
import { loadReferenceCycles } from '../../../seeds/reference/load-reference-cycles';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

const UNKNOWN = '00000000-0000-4000-8000-000000000000';
const RAW_FORCE_N = 3987.654;

describe('the ranking over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;
  let params: { programmeId: string };
  const variants = new Map<string, string>();
  const results = new Map<string, string>();

  const enterAs = async (
    name: string,
    variant: string,
    facilityId: string,
    change: Parameters<typeof resultFields>[1],
  ) => {
    const ids = { variantId: variants.get(variant) ?? '', facilityId };
    const { id } = await aerodynamicist.ok(resultEnter, {
      params,
      body: resultFields(ids, { name, ...change }),
    });
    results.set(name, id);
  };
  const points = (value: number) => [{ yawDeg: 0, value, s: 0.0006, n: 3 }];

  beforeAll(async () => {
    api = await startApi();
    const maintenance = new pg.Client({ connectionString: api.database.url('maintenance') });
    await maintenance.connect();
    await loadReferenceCycles(maintenance);
    await maintenance.end();
    aerodynamicist = await api.asMember('aerodynamicist');
    params = { programmeId: (await aerodynamicist.ok(programmeCreate, { body: programmeFields() })).id };
    for (const [name, areaM2] of [
      ['Liftback', 2.19],
      ['Hatch', 2.17],
      ['Sport', 2.09],
      ['Gone', 2.3],
    ] as const) {
      const body = variantFields({
        name,
        frontalAreas: [
          { areaM2: areaM2 + 0.1, uM2: 0.02, method: 'estimate', date: '2025-01-01' },
          { areaM2, uM2: 0.006, method: 'laser', date: '2026-02-01' },
        ],
      });
      variants.set(name, (await aerodynamicist.ok(variantCreate, { params, body })).id);
    }
    const { id: facilityId } = await aerodynamicist.ok(facilityCreate, { body: facilityFields() });
    await enterAs('L1', 'Liftback', facilityId, {
      points: points(0.249),
      session: 'Spring',
      model: 'clay 2',
    });
    await enterAs('H1', 'Hatch', facilityId, { points: points(0.274), installation: 'first' });
    await enterAs('H2', 'Hatch', facilityId, { points: points(0.3), testDate: '2026-10-01' });
    await enterAs('S1', 'Sport', facilityId, { points: points(0.287) });
    await enterAs('S2', 'Sport', facilityId, { points: points(0.2), testDate: '2026-10-05' });
    await enterAs('S3', 'Sport', facilityId, {
      points: points(0.31),
      testDate: '2026-10-06',
      condition: { ground: 'fixed-floor', wheels: 'rotating' },
    });
    await enterAs('L2', 'Liftback', facilityId, {
      quantity: 'force',
      tareAlreadySubtracted: true,
      speedKmh: 415,
      testDate: '2026-10-07',
      points: points(RAW_FORCE_N),
    });
    await enterAs('G1', 'Gone', facilityId, {});
    await aerodynamicist.ok(variantRetire, {
      params: { ...params, variantId: variants.get('Gone') ?? '' },
      body: { retired: true },
      ifMatch: 1,
    });
    await aerodynamicist.ok(evidenceAdopt, {
      params,
      body: {
        adoptions: [
          { variantId: variants.get('Hatch') ?? '', resultIds: [results.get('H1') ?? ''], rule: 'newest' },
        ],
        comment: 'Cleaner entry',
      },
    });
    await aerodynamicist.ok(resultWithdraw, {
      params: { ...params, resultId: results.get('S2') ?? '' },
      body: { reason: 'Wrong wheels' },
    });
  });
  afterAll(() => api.close());

  const inputs = (evidence?: 'adopted' | 'newest') =>
    aerodynamicist.ok(rankingInputsRead, { params, query: evidence ? { evidence } : {} });

  it('answers the machine entry’s own shape, with names', async () => {
    const answer = await inputs();
    expect(rankingInputSchema.parse(answer)).toEqual(answer);
    expect(answer.programme).toMatchObject({
      name: 'Dunlin',
      commonAreaM2: 2.19,
      policies: { policyId: 'v0', frictionLine: 'on', frictionShare: 0.12, frictionShareU: 0.06 },
    });
    expect(answer.variants.map(({ name }) => name)).toEqual(['Hatch', 'Liftback', 'Sport']);
    expect(answer.variants[0]).toMatchObject({
      frontalAreaM2: 2.17,
      massKg: 1680,
      rollingResistance: 0.0085,
    });
    expect(answer.models).toEqual([{ id: 'clay 2', name: 'clay 2' }]);
    expect(answer.results.every(({ name }) => typeof name === 'string')).toBe(true);
    expect(JSON.stringify(answer)).not.toContain('null');
  });

  it('leaves out what was withdrawn and retired, and on the adopted basis what was not adopted', async () => {
    const names = async (evidence: 'adopted' | 'newest') =>
      (await inputs(evidence)).results.map(({ name }) => name).sort();
    expect(await names('adopted')).toEqual(['H1', 'L1', 'L2', 'S1', 'S3']);
    expect(await names('newest')).toEqual(['H1', 'H2', 'L1', 'L2', 'S1', 'S3']);
  });

  it.each(['adopted', 'newest'] as const)('shows the order that its inputs give, %s', async (evidence) => {
    const answered = evaluateRank({ ...(await inputs(evidence)), request: { cycle: 'nedc' } }, (name) =>
      builtInCycle(name),
    );
    const stylist = await api.asMember('stylist');
    const view = await stylist.ok(rankingViewRead, { params, query: { evidence, cycle: 'nedc' } });
    expect(view.rows.map(({ variantId }) => variantId)).toEqual(answered.orderByDragArea);
    view.rows.forEach((row, index) => {
      const ranked = answered.ranking[index];
      const energy = answered.energy?.find(({ variantId }) => variantId === row.variantId);
      expect(row.figure.dragAreaM2).toBeCloseTo(ranked?.dragAreaM2 ?? 0, 14);
      expect(row.figure.expandedUncertaintyM2).toBeCloseTo(ranked?.expandedUncertaintyM2 ?? 0, 14);
      expect(row.onOwnArea.value).toBeCloseTo(ranked?.coefficientOnOwnArea ?? 0, 14);
      expect(row.energy?.wheelEnergyWhPerKm ?? 0).toBeCloseTo(energy?.wheelEnergyWhPerKm ?? 1, 10);
    });
    expect(view.rows[0]?.name).toBe('Liftback');
  });

  it('shows a stylist why results stayed out, but no raw value', async () => {
    const stylist = await api.asMember('stylist');
    const view = await stylist.ok(rankingViewRead, { params });
    expect(view.stayedOut.map(({ name }) => name).sort()).toEqual(['L2', 'S3']);
    const fixedFloor = view.stayedOut.find(({ name }) => name === 'S3');
    expect(fixedFloor?.rules[0]?.items).toEqual([
      { item: 'ground', reference: 'several-belts', stated: 'fixed-floor' },
    ]);
    const text = JSON.stringify(view);
    expect(text).not.toContain(String(RAW_FORCE_N));
    for (const field of ['"points"', '"value":0.249', '"tareN"', '"quotedAreaM2"', '"air":{"temperatureC"']) {
      expect(text).not.toContain(field);
    }
    expect(view.rows[0]?.steps[0]?.step).toBe('full-scale-drag-area');
  });

  it('gives the screen adoptions that stand, configurations, sessions and every cycle with its rows', async () => {
    const context = await aerodynamicist.ok(rankingContextRead, { params });
    expect(context.adoptions).toEqual([
      expect.objectContaining({ variantId: variants.get('Hatch'), resultIds: [results.get('H1')] }),
    ]);
    expect(context.sessions).toEqual([expect.objectContaining({ name: 'Spring' })]);
    expect(context.variants.find(({ name }) => name === 'Sport')?.configurations[0]?.name).toBe('Electric');
    expect(context.cycles.map(({ key }) => key)).toContain('wltc-class-3b');
    expect(context.cycles.every(({ timeS, speedKmh }) => timeS.length === speedKmh.length)).toBe(true);
  });

  it('is given to the roles that may have it', async () => {
    for (const role of ['stylist', 'viewer', 'administrator'] as const) {
      const member = await api.asMember(role);
      expect((await member.refused(rankingInputsRead, { params })).code).toBe('forbidden');
      expect((await member.refused(rankingContextRead, { params })).code).toBe('forbidden');
      expect((await member.ok(rankingViewRead, { params })).rows).toHaveLength(3);
    }
    const manager = await api.asMember('programme-manager');
    expect((await manager.ok(rankingInputsRead, { params })).results).not.toHaveLength(0);
    expect((await api.asVisitor().refused(rankingViewRead, { params })).code).toBe('not-signed-in');
  });

  it('answers another organisation as it answers an unknown programme', async () => {
    const stranger = await api.asMember('aerodynamicist', api.second);
    for (const endpoint of [rankingInputsRead, rankingContextRead, rankingViewRead]) {
      const foreign = await stranger.refused(endpoint, { params });
      const unknown = await stranger.refused(endpoint, { params: { programmeId: UNKNOWN } });
      expect({ ...foreign, requestId: '' }).toEqual({ ...unknown, requestId: '' });
      expect(foreign.code).toBe('not-found');
    }
  });

  it('says what is missing where there is nothing to rank on', async () => {
    const body = programmeFields({ name: 'Empty', commonArea: undefined });
    const empty = { programmeId: (await aerodynamicist.ok(programmeCreate, { body })).id };
    expect(await aerodynamicist.refused(rankingInputsRead, { params: empty })).toMatchObject({
      code: 'unusable-input',
      reason: 'no-variants',
    });
    await aerodynamicist.ok(variantCreate, { params: empty, body: variantFields() });
    expect(await aerodynamicist.refused(rankingViewRead, { params: empty })).toMatchObject({
      code: 'unusable-input',
      reason: 'no-common-area',
      where: 'commonArea',
    });
  });

  it('ranks on the area asked for where the programme has no common area', async () => {
    const body = programmeFields({ name: 'Without area', commonArea: undefined });
    const bare = { programmeId: (await aerodynamicist.ok(programmeCreate, { body })).id };
    await aerodynamicist.ok(variantCreate, { params: bare, body: variantFields() });
    const asked = { params: bare, query: { area: '2.25' } };
    expect((await aerodynamicist.ok(rankingInputsRead, asked)).programme.commonAreaM2).toBe(2.25);
    const { programme } = await aerodynamicist.ok(rankingContextRead, asked);
    expect(programme.commonArea).toEqual({ kind: 'fixed', areaM2: 2.25 });
    expect((await aerodynamicist.ok(rankingViewRead, asked)).commonAreaM2).toBe(2.25);
    const none = { params: bare, query: { area: 'programme' } };
    expect((await aerodynamicist.refused(rankingInputsRead, none)).reason).toBe('no-common-area');
  });

  it.each([
    [{ area: '-1' }, 'malformed-input'],
    [{ confidence: '1.5' }, 'malformed-input'],
    [{ air: 'mars' }, 'unusable-input'],
    [{ colour: 'red' }, 'malformed-input'],
  ] as const)('refuses choices that are none: %j', async (query, code) => {
    const stylist = await api.asMember('stylist');
    expect((await stylist.refused(rankingViewRead, { params, query })).code).toBe(code);
  });
});
