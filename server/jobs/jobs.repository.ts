import { and, asc, eq, lt, or, sql } from 'drizzle-orm';
import type { Tx } from '../db/pools';
import { organisations } from '../db/tables/organisations';
import { jobs } from '../db/tables/work';

export type JobRow = typeof jobs.$inferSelect;

export async function insertJob(
  tx: Tx,
  job: {
    readonly kind: string;
    readonly payload: unknown;
    readonly createdBy: string;
    readonly total?: number;
  },
): Promise<string> {
  const [row] = await tx.insert(jobs).values(job).returning({ id: jobs.id });
  if (row === undefined) throw new Error('the job was not stored');
  return row.id;
}

export async function readJob(tx: Tx, jobId: string): Promise<JobRow | undefined> {
  const [row] = await tx.select().from(jobs).where(eq(jobs.id, jobId));
  return row;
}

/** Asks a job to stop; one that nobody has begun stops at once. Returns whether there was anything to stop. */
export async function requestCancel(tx: Tx, jobId: string, now: Date): Promise<boolean> {
  const stopped = await tx
    .update(jobs)
    .set({ cancelRequestedAt: now })
    .where(and(eq(jobs.id, jobId), or(eq(jobs.state, 'queued'), eq(jobs.state, 'running'))))
    .returning({ id: jobs.id });
  return stopped.length > 0;
}

/** Takes the oldest job that waits, or whose runner has died, for `leaseS` seconds. */
export async function claimJob(tx: Tx, leaseS: number): Promise<JobRow | undefined> {
  const free = or(
    and(
      eq(jobs.state, 'queued'),
      or(sql`${jobs.leaseUntil} is null`, lt(jobs.leaseUntil, sql`clock_timestamp()`)),
    ),
    and(eq(jobs.state, 'running'), lt(jobs.leaseUntil, sql`clock_timestamp()`)),
  );
  const [candidate] = await tx
    .select({ id: jobs.id })
    .from(jobs)
    .where(free)
    .orderBy(asc(jobs.createdAt))
    .limit(1)
    .for('update', { skipLocked: true });
  if (candidate === undefined) return undefined;
  const [claimed] = await tx
    .update(jobs)
    .set({
      state: 'running',
      attempts: sql`${jobs.attempts} + 1`,
      leaseUntil: lease(leaseS),
      startedAt: sql`coalesce(${jobs.startedAt}, clock_timestamp())`,
    })
    .where(eq(jobs.id, candidate.id))
    .returning();
  return claimed;
}

export interface Progress {
  readonly progress?: number;
  readonly total?: number;
  readonly message?: string;
}

/**
 * Stores progress and prolongs the lease, as long as this attempt still holds the job. Returns `lost` when another
 * runner has taken it over, `cancelled` when a person asked to stop.
 */
export async function holdJob(
  tx: Tx,
  job: JobRow,
  leaseS: number,
  progress: Progress,
): Promise<'held' | 'cancelled' | 'lost'> {
  const [row] = await tx
    .update(jobs)
    .set({ ...progress, leaseUntil: lease(leaseS) })
    .where(stillOurs(job))
    .returning({ cancelRequestedAt: jobs.cancelRequestedAt });
  if (row === undefined) return 'lost';
  return row.cancelRequestedAt === null ? 'held' : 'cancelled';
}

export async function finishJob(
  tx: Tx,
  job: JobRow,
  state: 'done' | 'failed' | 'cancelled',
  message: string | undefined,
): Promise<boolean> {
  const finished = await tx
    .update(jobs)
    .set({ state, message, leaseUntil: null, finishedAt: sql`clock_timestamp()` })
    .where(stillOurs(job))
    .returning({ id: jobs.id });
  return finished.length > 0;
}

/** Puts a job back for another attempt in `afterS` seconds; one that a shutdown interrupted keeps its attempt. */
export async function requeueJob(tx: Tx, job: JobRow, afterS: number, refund: boolean): Promise<void> {
  await tx
    .update(jobs)
    .set({ state: 'queued', leaseUntil: lease(afterS), attempts: refund ? job.attempts - 1 : job.attempts })
    .where(stillOurs(job));
}

export async function listOrganisationIds(tx: Tx): Promise<readonly string[]> {
  const rows = await tx.select({ id: organisations.id }).from(organisations);
  return rows.map((row) => row.id);
}

const lease = (seconds: number) => sql`clock_timestamp() + make_interval(secs => ${seconds})`;

const stillOurs = (job: JobRow) =>
  and(eq(jobs.id, job.id), eq(jobs.state, 'running'), eq(jobs.attempts, job.attempts));
