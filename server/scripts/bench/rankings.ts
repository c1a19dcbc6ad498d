import type { AddressInfo } from 'node:net';
import autocannon from 'autocannon';
import pg from 'pg';
import * as z from 'zod';
import { nothing } from '#shared/contracts/common';
import { endpoint } from '#shared/contracts/endpoint';
import { facilityCreate } from '#shared/contracts/facilities';
import { programmeCreate } from '#shared/contracts/programmes';
import { resultEnter } from '#shared/contracts/results';
import { variantCreate } from '#shared/contracts/variants';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { loadReferenceCycles } from '../../../seeds/reference/load-reference-cycles';
import { route, type ServerModule } from '../../http/module';
import { MODULES } from '../../modules/registry';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';
import { startTestCluster } from '../../testing/test-cluster';
import type { BenchLine, BenchPart } from './bench-part';

const VARIANTS = 5;
const RESULTS_EACH = 8;
const SECONDS = 6;
const CONNECTIONS = 8;

const constantRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/constant',
  summary: 'A constant behind the same session, permission and transaction',
  access: 'ranking-view.read',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.strictObject({ answer: z.literal(42) }),
  command: false,
  versioned: false,
  problems: [],
});

const constantModule: ServerModule = {
  name: 'constant',
  routes: [route(constantRead, async () => ({ answer: 42 as const }))],
};

/** A programme of the demo's size: five variants with eight results each. */
async function fill(api: ApiHarness): Promise<string> {
  const member = await api.asMember('aerodynamicist');
  const params = { programmeId: (await member.ok(programmeCreate, { body: programmeFields() })).id };
  const { id: facilityId } = await member.ok(facilityCreate, { body: facilityFields() });
  for (let i = 0; i < VARIANTS; i++) {
    const body = variantFields({ name: `Variant ${String(i)}` });
    const { id: variantId } = await member.ok(variantCreate, { params, body });
    for (let k = 0; k < RESULTS_EACH; k++) {
      const value = 0.25 + 0.01 * i + 0.001 * k;
      const points = [0, 5, -5, 10, -10].map((yawDeg) => ({
        yawDeg,
        value: value * (1 + (yawDeg / 40) ** 2),
        s: 0.0006,
        n: 3,
      }));
      const fields = resultFields({ variantId, facilityId }, { name: `R-${String(i)}-${String(k)}`, points });
      await member.ok(resultEnter, { params, body: fields });
    }
  }
  return params.programmeId;
}

async function loadCycles(api: ApiHarness): Promise<void> {
  const maintenance = new pg.Client({ connectionString: api.database.url('maintenance') });
  await maintenance.connect();
  await loadReferenceCycles(maintenance);
  await maintenance.end();
}

/** Requests per second of one address under a steady load, after a short warm-up. */
async function rateOf(api: ApiHarness, member: ApiMember, path: string): Promise<number> {
  const { port } = api.server.address() as AddressInfo;
  const load = {
    url: `http://127.0.0.1:${String(port)}${path}`,
    connections: CONNECTIONS,
    headers: { cookie: member.cookie ?? '' },
  };
  await autocannon({ ...load, duration: 1 });
  const { requests, non2xx, errors } = await autocannon({ ...load, duration: SECONDS });
  // Requests that were under way when the load ended still want the database.
  await new Promise((resolve) => setTimeout(resolve, 1500));
  if (non2xx + errors > 0) throw new Error(`${path}: ${String(non2xx)} refused, ${String(errors)} failed`);
  return requests.average;
}

async function measure(api: ApiHarness): Promise<readonly BenchLine[]> {
  await loadCycles(api);
  const programme = `/api/v1/programmes/${await fill(api)}`;
  const stylist = await api.asMember('stylist');
  const aerodynamicist = await api.asMember('aerodynamicist');
  const bare = await rateOf(api, stylist, '/healthz');
  const constant = await rateOf(api, stylist, '/api/v1/constant');
  const rates = [
    ['ranking-view (computed by the server)', await rateOf(api, stylist, `${programme}/ranking-view`)],
    ['ranking-inputs', await rateOf(api, aerodynamicist, `${programme}/ranking-inputs`)],
  ] as const;
  const size = `${String(VARIANTS)} variants, ${String(VARIANTS * RESULTS_EACH)} results`;
  return rates.map(([what, rate]) => ({
    what: `${what}, ${size}, beside the same server answering a constant (with session and transaction; without)`,
    measured: `${rate.toFixed(0)} requests/s: ${(rate / constant).toFixed(3)} of ${constant.toFixed(0)}; ${(rate / bare).toFixed(3)} of ${bare.toFixed(0)}`,
  }));
}

/** Ranking requests per second beside the same server answering a constant, in one run. */
export const rankings: BenchPart = {
  name: 'rankings',
  run: async () => {
    const { cluster, end } = await startTestCluster();
    process.env['WAKELEDGER_TEST_CLUSTER'] = JSON.stringify(cluster);
    try {
      const api = await startApi({ modules: [...MODULES, constantModule] });
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
