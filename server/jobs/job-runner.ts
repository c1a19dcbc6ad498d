import type { Container } from '../container';
import { inPlatform, inTenant } from '../db/in-tenant';
import type { Work } from '../http/context';
import { expectedFailure } from '../http/problem-details';
import { JobCancelled, type JobKind, type JobRun } from './job-kind';
import {
  claimJob,
  finishJob,
  holdJob,
  type JobRow,
  listOrganisationIds,
  type Progress,
  requeueJob,
} from './jobs.repository';

const LEASE_S = 30;
const SWEEP_MS = 20_000;
const MAXIMUM_AT_ONCE = 2;

/** Thrown into a job whose lease another runner took over: it must leave no further trace. */
class LeaseLost extends Error {
  override readonly name = 'LeaseLost';
}

/** Thrown into a job when the server shuts down: it goes back to the queue and resumes at the next start. */
class ShuttingDown extends Error {
  override readonly name = 'ShuttingDown';
}

export interface JobRunner {
  readonly start: () => void;
  /** Takes no new job and waits for running ones to reach their next step. */
  readonly stop: () => Promise<void>;
  /** Resolves when everything queued so far has been done; for tests. */
  readonly idle: () => Promise<void>;
}

/**
 * Does queued work, organisation by organisation, as the tenant role inside the job's own organisation. A lease tells a
 * dead runner's jobs from living ones.
 */
export function createJobRunner(container: Container, kinds: readonly JobKind[]): JobRunner {
  const byName = new Map(kinds.map((kind) => [kind.kind, kind]));
  const waiting = new Set<string>();
  const running = new Set<Promise<void>>();
  let stopping = false;
  let sweeper: NodeJS.Timeout | undefined;

  const wake = (organisationId: string) => {
    waiting.add(organisationId);
    advance();
  };

  const advance = () => {
    for (const organisationId of waiting) {
      if (stopping || running.size >= MAXIMUM_AT_ONCE) return;
      waiting.delete(organisationId);
      const turn: Promise<void> = serve(organisationId)
        .catch((err: unknown) => container.log.error({ err, organisationId }, 'jobs cannot be run'))
        .finally(() => {
          running.delete(turn);
          advance();
        });
      running.add(turn);
    }
  };

  const serve = async (organisationId: string) => {
    const job = await inTenant(container.pools, { organisationId }, 'write', (tx) => claimJob(tx, LEASE_S));
    if (job === undefined) return;
    // The organisation goes to the end of the line, so that one with many jobs does not hold up the others.
    waiting.add(organisationId);
    await runJob(container, byName.get(job.kind), job, () => stopping);
  };

  const sweep = async () => {
    const ids = await inPlatform(container.pools, undefined, 'read', listOrganisationIds);
    ids.forEach(wake);
  };
  const sweepQuietly = () => {
    sweep().catch((err: unknown) => container.log.warn({ err }, 'the queue of jobs cannot be looked at'));
  };

  return {
    start: () => {
      container.onWakeJobs(wake);
      sweepQuietly();
      sweeper = setInterval(sweepQuietly, SWEEP_MS);
      sweeper.unref();
    },
    stop: async () => {
      stopping = true;
      clearInterval(sweeper);
      await Promise.all(running);
    },
    idle: async () => {
      await sweep();
      while (running.size > 0) await Promise.all(running);
    },
  };
}

async function runJob(
  container: Container,
  kind: JobKind | undefined,
  job: JobRow,
  isStopping: () => boolean,
): Promise<void> {
  const maximumAttempts = kind?.maximumAttempts ?? 3;
  const transaction = <T>(work: (work: Work) => Promise<T>) => jobTransaction(container, job, work);
  const hold = async (progress: Progress) => {
    const state = await transaction(({ tx }) => holdJob(tx, job, LEASE_S, progress));
    if (state === 'lost') throw new LeaseLost();
    if (state === 'cancelled') throw new JobCancelled();
    if (isStopping()) throw new ShuttingDown();
  };
  const run: JobRun = {
    jobId: job.id,
    payload: job.payload,
    attempt: job.attempts,
    inTransaction: transaction,
    progress: (done, total, message) => hold({ progress: done, total, message }),
  };
  // Keeps the lease alive through a long step; what it finds is reported by the next call of `progress`.
  const heartbeat = setInterval(
    () => {
      transaction(({ tx }) => holdJob(tx, job, LEASE_S, {})).catch((err: unknown) =>
        container.log.warn({ err, jobId: job.id }, 'a job’s lease was not prolonged'),
      );
    },
    (LEASE_S * 1000) / 3,
  );
  try {
    if (kind === undefined) throw new Error(`nobody knows how to do a job of the kind ${job.kind}`);
    if (job.attempts > maximumAttempts) throw new Error('the job was interrupted too often');
    await hold({});
    await kind.run(run);
    await transaction(({ tx }) => finishJob(tx, job, 'done', undefined));
  } catch (error) {
    if (error instanceof LeaseLost) return;
    if (error instanceof ShuttingDown) {
      await transaction(({ tx }) => requeueJob(tx, job, 0, true));
    } else if (error instanceof JobCancelled) {
      await end(transaction, kind, job, 'cancelled', 'Cancelled.');
    } else {
      const expected = expectedFailure(error);
      if (expected === undefined)
        container.log.error({ err: error, jobId: job.id, kind: job.kind }, 'a job failed');
      if (expected === undefined && kind !== undefined && job.attempts < maximumAttempts) {
        await transaction(({ tx }) => requeueJob(tx, job, 2 ** job.attempts, false));
      } else {
        await end(transaction, kind, job, 'failed', expected?.message ?? 'Something went wrong on our side.');
      }
    }
  } finally {
    clearInterval(heartbeat);
  }
}

/** The job's last state and what its kind tidies up stand together or not at all. */
async function end(
  transaction: JobRun['inTransaction'],
  kind: JobKind | undefined,
  job: JobRow,
  outcome: 'failed' | 'cancelled',
  reason: string,
): Promise<void> {
  await transaction(async (work) => {
    const ours = await finishJob(work.tx, job, outcome, reason);
    if (ours) await kind?.onEnd?.(work, job.payload, outcome, reason);
  });
}

async function jobTransaction<T>(
  container: Container,
  job: JobRow,
  work: (work: Work) => Promise<T>,
): Promise<T> {
  const { organisationId } = job;
  if (job.createdBy === null) throw new Error(`job ${job.id} has nobody who asked for it`);
  const userId = job.createdBy;
  const requestId = `job-${job.id}`;
  const afterwards: (() => void)[] = [];
  const result = await inTenant(container.pools, { organisationId, userId, requestId }, 'write', (tx) =>
    work({
      tx,
      organisationId,
      userId,
      requestId,
      now: container.clock(),
      log: container.log,
      afterCommit: (deed) => afterwards.push(deed),
    }),
  );
  for (const deed of afterwards) deed();
  return result;
}
