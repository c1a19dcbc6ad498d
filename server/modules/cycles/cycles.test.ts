import pg from 'pg';
import { cycleCreate, cycleList, cycleRead, cycleRetire } from '#shared/contracts/cycles';
import { loadReferenceCycles } from '../../../seeds/reference/load-reference-cycles';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

const UNKNOWN = '00000000-0000-4000-8000-000000000000';
const trace = (name: string, csv: string, change: object = {}) => ({
  name,
  csv,
  timeUnit: 's',
  speedUnit: 'km/h',
  checkOnly: false,
  ...change,
});

describe('cycles over HTTP', () => {
  let api: ApiHarness;
  let member: ApiMember;

  beforeAll(async () => {
    api = await startApi();
    member = await api.asMember('aerodynamicist');
    const client = new pg.Client({ connectionString: api.database.url('maintenance') });
    await client.connect();
    await loadReferenceCycles(client);
    await loadReferenceCycles(client);
    await client.end();
  });
  afterAll(() => api.close());

  it('offer the built-in ones to every organisation, in their order, with the totals of the regulations', async () => {
    for (const organisation of [api.first, api.second]) {
      const viewer = await api.asMember('viewer', organisation);
      const { cycles } = await viewer.ok(cycleList);
      const builtIn = cycles.filter((cycle) => cycle.origin === 'built-in');
      expect(builtIn.map((cycle) => cycle.key)).toEqual([
        'wltc-class-3b',
        'wltc-class-3a',
        'nedc',
        'udds',
        'hwfet',
        'us06',
      ]);
      expect(builtIn[0]).toMatchObject({ name: 'WLTC class 3b', durationS: 1800, maximumSpeedKmh: 131.3 });
      expect(builtIn[0]?.distanceM).toBeCloseTo(23_266.2778, 3);
    }
  });

  it('are read point by point', async () => {
    const cycle = await member.ok(cycleRead, { params: { cycleKey: 'nedc' } });
    expect(cycle.timeS).toHaveLength(1181);
    expect(Math.max(...cycle.speedKmh)).toBe(120);
  });

  it('are brought in with units of one’s own, and belong to the organisation', async () => {
    const stored = await member.ok(cycleCreate, {
      body: trace('To the works', 'min;m/s\n0;0\n0,5;10\n1;10\n1,5;0\n', {
        timeUnit: 'min',
        speedUnit: 'm/s',
      }),
    });
    expect(stored).toMatchObject({
      origin: 'own',
      durationS: 90,
      distanceM: 600,
      maximumSpeedKmh: 36,
      timeS: [0, 30, 60, 90],
      speedKmh: [0, 36, 36, 0],
      source: 'Own trace, 4 rows in min and m/s',
    });
    expect(stored.cautions).toEqual([expect.stringContaining('30 s between two rows')]);
    const params = { cycleKey: stored.key };
    expect(await member.ok(cycleRead, { params })).toEqual(stored);
    const stranger = await api.asMember('aerodynamicist', api.second);
    expect((await stranger.refused(cycleRead, { params })).code).toBe('not-found');
  });

  it('are only checked where that is asked, and nothing is kept', async () => {
    const checked = await member.ok(cycleCreate, {
      body: trace('Tried', '0,0\n1,5\n2,0', { checkOnly: true }),
    });
    expect(checked).toMatchObject({ durationS: 2, key: 'not-stored' });
    expect((await member.ok(cycleList)).cycles.map((cycle) => cycle.name)).not.toContain('Tried');
  });

  it('are refused row by row, with what would be accepted', async () => {
    const problem = await member.refused(cycleCreate, { body: trace('Bad', 't,v\n0,0\n1,x\n1,-3\n') });
    expect(problem).toMatchObject({ code: 'unusable-input' });
    expect(problem.issues?.map((issue) => issue.where)).toEqual(['csv line 3, speed', 'csv line 4, speed']);
  });

  it('are refused where the method refuses the trace, by its code', async () => {
    expect(await member.refused(cycleCreate, { body: trace('Stands', '0,0\n1,0\n') })).toMatchObject({
      code: 'unusable-input',
      reason: 'cycle-standing',
    });
    expect(await member.refused(cycleCreate, { body: trace('Short', '0,5\n') })).toMatchObject({
      reason: 'cycle-too-short',
    });
  });

  it('have names that no built-in and no own cycle has', async () => {
    const body = trace('Once', '0,0\n1,5\n2,0');
    await member.ok(cycleCreate, { body });
    expect((await member.refused(cycleCreate, { body })).code).toBe('already-exists');
    expect((await member.refused(cycleCreate, { body: { ...body, name: 'wltc CLASS 3b' } })).code).toBe(
      'already-exists',
    );
  });

  it('are retired and brought back when they are one’s own, and stay when they are built in', async () => {
    const { key } = await member.ok(cycleCreate, { body: trace('Old route', '0,0\n1,5\n2,0') });
    const params = { cycleKey: key };
    expect(await member.ok(cycleRetire, { params, body: { retired: true } })).toHaveProperty('retiredAt');
    expect(await member.ok(cycleRetire, { params, body: { retired: false } })).not.toHaveProperty(
      'retiredAt',
    );
    expect(
      await member.refused(cycleRetire, { params: { cycleKey: 'nedc' }, body: { retired: true } }),
    ).toMatchObject({ code: 'wrong-state' });
  });

  it('answer an unknown key and an unknown id alike', async () => {
    for (const cycleKey of ['no-such-cycle', UNKNOWN]) {
      expect((await member.refused(cycleRead, { params: { cycleKey } })).code).toBe('not-found');
    }
  });

  it('may not be brought in by viewers', async () => {
    const viewer = await api.asMember('viewer');
    expect((await viewer.refused(cycleCreate, { body: trace('V', '0,0\n1,5') })).code).toBe('forbidden');
  });
});
