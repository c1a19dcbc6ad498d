import { Refused } from '#shared/core/refusal';
import { type DatabaseUrls, withClient } from './database';

interface Waiting {
  readonly organisation_id: string;
  readonly programme_id: string;
  /** Who adopted last there: in whose name the evaluations are kept. */
  readonly adopted_by: string;
}

const STATEMENT = `
  select distinct on (a.organisation_id, v.programme_id) a.organisation_id, v.programme_id, a.adopted_by
  from adoptions a
  join variants v on v.organisation_id = a.organisation_id and v.id = a.variant_id
  where exists (select from adoption_results ar where ar.organisation_id = a.organisation_id and ar.adoption_id = a.id)
    and not exists (select from evaluations e where e.organisation_id = a.organisation_id and e.adoption_id = a.id)
    and not exists (select from adoptions later where later.organisation_id = a.organisation_id
      and later.variant_id = a.variant_id and (later.adopted_at, later.id) > (a.adopted_at, a.id))
  order by a.organisation_id, v.programme_id, a.adopted_at desc`;

export interface EvaluatedAdoptions {
  readonly stored: number;
  /** Programmes that the method refuses as a whole, and why. */
  readonly refusals: readonly string[];
}

const nobodyListens = { error: () => undefined, warn: () => undefined, info: () => undefined };

/**
 * Keeps the evaluation of every adoption that stands without one: those of the demo scenario, and those from before evaluations
 * were kept. Each programme in a transaction of its own organisation, as the product itself would.
 */
export async function evaluateAdoptions(
  urls: Pick<DatabaseUrls, 'maintenance' | 'tenant' | 'platform'>,
): Promise<EvaluatedAdoptions> {
  const waiting = await withClient(urls.maintenance, async (client) => {
    const { rows } = await client.query<Waiting>(STATEMENT);
    return rows;
  });
  if (waiting.length === 0) return { stored: 0, refusals: [] };
  // Loaded only now: half the product comes with it, and at most starts nothing waits.
  const { inTenant } = await import('../../db/in-tenant');
  const { openPools } = await import('../../db/pools');
  const { storeMissingEvaluations } = await import('../../modules/evaluations');
  const pools = openPools({
    tenantUrl: urls.tenant,
    platformUrl: urls.platform,
    maximumConnections: 1,
    onIdleError: () => undefined,
  });
  try {
    let stored = 0;
    const refusals: string[] = [];
    for (const { organisation_id: organisationId, programme_id, adopted_by: userId } of waiting) {
      try {
        stored += await inTenant(pools, { organisationId, userId }, 'write', (tx) =>
          storeMissingEvaluations(
            {
              tx,
              organisationId,
              userId,
              requestId: 'evaluating adoptions',
              now: new Date(),
              log: nobodyListens,
              afterCommit: () => undefined,
            },
            programme_id,
          ),
        );
      } catch (error) {
        // One programme that the method refuses keeps no other from its evaluations.
        if (!(error instanceof Refused)) throw error;
        refusals.push(`${programme_id}: ${error.detail}`);
      }
    }
    return { stored, refusals };
  } finally {
    await pools.close();
  }
}
