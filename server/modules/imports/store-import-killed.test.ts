import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { setTimeout as pause } from 'node:timers/promises';
import { facilityCreate } from '#shared/contracts/facilities';
import { importConfirm, importMap, importRead, importUpload } from '#shared/contracts/import-endpoints';
import { programmeCreate } from '#shared/contracts/programmes';
import { resultList } from '#shared/contracts/results';
import { variantCreate } from '#shared/contracts/variants';
import { facilityFields, programmeFields, variantFields } from '#shared/testing/domain-fields';
import { createJobRunner } from '../../jobs/job-runner';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import { importsModule } from '.';

const ROWS = 2500;
const FILE = [
  'Run,Variant,Facility,Date,CdA [m²],Scale,Speed [km/h],Air state,Session',
  ...Array.from(
    { length: ROWS },
    (_, i) => `R-${String(i)},Dunlin Hatch,Halmere,2026-04-01,0.6,1,140,ISA,Block`,
  ),
].join('\n');

/** A server of its own process, which takes up whatever jobs wait. */
function startServer(api: ApiHarness): ChildProcess {
  return spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
    env: {
      ...process.env,
      WAKELEDGER_MODE: 'test',
      DATABASE_URL_TENANT: api.database.url('tenant'),
      DATABASE_URL_PLATFORM: api.database.url('platform'),
      SESSION_SECRET: 'a secret that is used in tests only, and nowhere else',
      PORT: '0',
      LOG_LEVEL: 'fatal',
    },
    stdio: 'ignore',
  });
}

describe('A server that is killed while it stores an import', () => {
  let api: ApiHarness;
  let server: ChildProcess | undefined;

  beforeAll(async () => {
    api = await startApi();
  });
  afterAll(async () => {
    server?.kill('SIGKILL');
    await api.close();
  });

  it('leaves nothing of it, and the next one stores all of it', async () => {
    const runner = createJobRunner(api.container, importsModule.jobs ?? []);
    const member = await api.asMember('aerodynamicist');
    const programmeId = (await member.ok(programmeCreate, { body: programmeFields() })).id;
    await member.ok(variantCreate, { params: { programmeId }, body: variantFields() });
    await member.ok(facilityCreate, { body: facilityFields() });
    const fresh = await member.ok(importUpload, {
      params: { programmeId },
      file: { name: 'runs.csv', content: FILE },
    });
    const params = { programmeId, importId: fresh.id };
    await member.ok(importMap, { params, body: fresh.mapping, ifMatch: fresh.version });
    await runner.idle();
    const ready = await member.ok(importRead, { params });
    await member.ok(importConfirm, { params, body: { leavingOutRefusedRows: 0 }, ifMatch: ready.version });
    await runner.stop();

    server = startServer(api);
    const exited = once(server, 'exit');
    const done = async (): Promise<number> =>
      (await member.ok(importRead, { params })).progress?.done ?? ROWS;
    while ((await done()) < 500) await pause(20);
    server.kill('SIGKILL');
    await exited;
    const during = await member.ok(importRead, { params });
    expect(during.state).toBe('storing');
    expect(during.progress?.done).toBeGreaterThanOrEqual(500);
    expect((await member.ok(resultList, { params: { programmeId } })).results).toEqual([]);
    expect(await api.database.query('maintenance', 'select from test_sessions')).toHaveLength(0);

    // The dead server's lease runs out by itself in half a minute; the test does not wait for it.
    await api.database.query('maintenance', `update jobs set lease_until = now() - interval '1 second'`);
    const next = createJobRunner(api.container, importsModule.jobs ?? []);
    await next.idle();
    await next.stop();
    expect(await member.ok(importRead, { params })).toMatchObject({ state: 'stored', resultCount: ROWS });
    const [counted] = await api.database.query<{ results: number }>(
      'maintenance',
      'select count(*)::int as results from results',
    );
    expect(counted).toEqual({ results: ROWS });
  }, 120_000);
});
