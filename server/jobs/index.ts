import type { MemberContext } from '../http/context';
import { insertJob } from './jobs.repository';

export { JobCancelled, type JobKind, type JobRun } from './job-kind';
export { readJob, requestCancel } from './jobs.repository';

/** Asks for long work in the transaction of the command; the runner takes it up once that has been committed. */
export async function enqueueJob(
  context: MemberContext,
  kind: string,
  payload: unknown,
  total?: number,
): Promise<string> {
  const jobId = await insertJob(context.tx, { kind, payload, createdBy: context.userId, total });
  context.wakeJobs();
  return jobId;
}
