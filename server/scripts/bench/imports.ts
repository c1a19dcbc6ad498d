import pg from 'pg';
import { facilityCreate } from '#shared/contracts/facilities';
import { importConfirm, importMap, importRead, importUpload } from '#shared/contracts/import-endpoints';
import { IMPORT_LIMIT_ROWS, type ImportDetail } from '#shared/contracts/imports';
import { programmeCreate } from '#shared/contracts/programmes';
import { variantCreate } from '#shared/contracts/variants';
import { facilityFields, programmeFields, variantFields } from '#shared/testing/domain-fields';
import { createJobRunner } from '../../jobs/job-runner';
import { importsModule } from '../../modules/imports';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import { startTestCluster } from '../../testing/test-cluster';
import type { BenchLine, BenchPart } from './bench-part';

const ROWS = IMPORT_LIMIT_ROWS;
const STATEMENT_ROWS = 500;

/** 20 000 rows of forces with air and repeats: the kind of file that comes from a tunnel, with many columns. */
function file(): string {
  const heading =
    'Run,Variant,Facility,Date,F [N],Scale,U [km/h],T [degC],p [hPa],rH [%],Tare subtracted,s [N],n,Session,Remark';
  const rows = Array.from({ length: ROWS }, (_, i) => {
    const force = (500 + (i % 997) / 10).toFixed(1);
    return `R-${String(i)},Dunlin Hatch,Halmere,2026-04-01,${force},1,140,22.1,1008.2,45,yes,0.6,5,Block ${String(i % 20)},wheels 17 in`;
  });
  return `${heading}\n${rows.join('\n')}\n`;
}

async function seconds<T>(work: () => Promise<T>): Promise<readonly [number, T]> {
  const start = performance.now();
  const result = await work();
  return [(performance.now() - start) / 1000, result];
}

/** The yardstick: the very rows that the import stored, written again by plain INSERTs of many rows, in one transaction. */
async function plainInsert(api: ApiHarness, importId: string): Promise<number> {
  const client = new pg.Client({ connectionString: api.database.url('maintenance') });
  await client.connect();
  try {
    const results = await rowsOf(
      client,
      'select * from results where import_id = $1 order by entry_sequence',
      importId,
    );
    const points = await rowsOf(
      client,
      'select p.* from result_points p join results r on r.id = p.result_id where r.import_id = $1',
      importId,
    );
    const fresh = new Map(results.map((row) => [row['id'], crypto.randomUUID()]));
    const again = results.map((row) => ({
      ...row,
      id: fresh.get(row['id']),
      name: `again ${String(row['name'])}`,
      entry_sequence: Number(row['entry_sequence']) + ROWS,
    }));
    const pointsAgain = points.map((row) => ({
      ...row,
      id: crypto.randomUUID(),
      result_id: fresh.get(row['result_id']),
    }));
    const [taken] = await seconds(async () => {
      await client.query('begin');
      await insertMany(client, 'results', again);
      await insertMany(client, 'result_points', pointsAgain);
      await client.query('commit');
    });
    return taken;
  } finally {
    await client.end();
  }
}

type Row = Readonly<Record<string, unknown>>;

async function rowsOf(client: pg.Client, text: string, importId: string): Promise<readonly Row[]> {
  return (await client.query<Row>(text, [importId])).rows;
}

async function insertMany(client: pg.Client, table: string, rows: readonly Row[]): Promise<void> {
  const columns = Object.keys(rows[0] ?? {});
  for (let at = 0; at < rows.length; at += STATEMENT_ROWS) {
    const batch = rows.slice(at, at + STATEMENT_ROWS);
    const places = batch.map(
      (_, i) => `(${columns.map((__, j) => `$${String(i * columns.length + j + 1)}`).join(',')})`,
    );
    await client.query(
      `insert into ${table} (${columns.join(',')}) values ${places.join(',')}`,
      batch.flatMap((row) => columns.map((column) => row[column])),
    );
  }
}

async function measure(api: ApiHarness): Promise<readonly BenchLine[]> {
  const runner = createJobRunner(api.container, importsModule.jobs ?? []);
  const member = await api.asMember('aerodynamicist');
  const programmeId = (await member.ok(programmeCreate, { body: programmeFields() })).id;
  await member.ok(variantCreate, { params: { programmeId }, body: variantFields() });
  await member.ok(facilityCreate, { body: facilityFields() });
  const content = Buffer.from(file());
  const before = process.memoryUsage().rss;

  const [reading, fresh] = await seconds(() =>
    member.ok(importUpload, { params: { programmeId }, file: { name: 'runs.csv', content } }),
  );
  const params = { programmeId, importId: fresh.id };
  const read = (): Promise<ImportDetail> => member.ok(importRead, { params });
  const [checking] = await seconds(async () => {
    await member.ok(importMap, { params, body: fresh.mapping, ifMatch: fresh.version });
    await runner.idle();
  });
  const ready = await read();
  const [storing] = await seconds(async () => {
    await member.ok(importConfirm, { params, body: { leavingOutRefusedRows: 0 }, ifMatch: ready.version });
    await runner.idle();
  });
  const done = await read();
  if (done.resultCount !== ROWS)
    throw new Error(`${String(done.resultCount)} results were stored: ${done.message ?? ''}`);
  const peak = process.resourceUsage().maxRSS * 1024;
  const plain = await plainInsert(api, fresh.id);
  await runner.stop();
  const rate = (taken: number): string => `${Math.round(ROWS / taken).toLocaleString('en')} rows/s`;
  const mb = (bytes: number): string => `${String(Math.round(bytes / 1e6))} MB`;
  return [
    {
      what: `${String(ROWS)} rows (${mb(content.length)}) read, checked, stored`,
      measured: `${reading.toFixed(1)} s, ${checking.toFixed(1)} s, ${storing.toFixed(1)} s`,
    },
    {
      what: 'storing (every row judged again) beside a plain multi-row INSERT of the same rows',
      measured: `${rate(storing)} beside ${rate(plain)}: ${(plain / storing).toFixed(2)} of it`,
    },
    {
      what: 'peak memory of the process, server and caller together',
      measured: `${mb(peak)}, ${mb(peak - before)} above the start`,
    },
  ];
}

/** Import rows per second beside a plain multi-row INSERT of the same rows, and the memory that it takes. */
export const imports: BenchPart = {
  name: 'imports',
  run: async () => {
    const { cluster, end } = await startTestCluster();
    process.env['WAKELEDGER_TEST_CLUSTER'] = JSON.stringify(cluster);
    try {
      const api = await startApi();
      try {
        return await measure(api);
      } finally {
        await api.close();
      }
    } finally {
      await end();
    }
  },
};
