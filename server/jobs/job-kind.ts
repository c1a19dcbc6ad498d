import type { Work } from '../http/context';

/** What a job is told while it runs. */
export interface JobRun {
  readonly jobId: string;
  readonly payload: unknown;
  /** 1 at the first attempt; more after a restart. */
  readonly attempt: number;
  /** One transaction inside the job's organisation; long work uses several, each leaving a state to resume from. */
  readonly inTransaction: <T>(work: (work: Work) => Promise<T>) => Promise<T>;
  /** Stores how far the work is and prolongs the lease. @throws {JobCancelled} when a person asked to stop */
  readonly progress: (done: number, total?: number, message?: string) => Promise<void>;
}

/** Thrown by `progress` inside a job that was cancelled; let it pass. */
export class JobCancelled extends Error {
  override readonly name = 'JobCancelled';
}

export interface JobKind {
  readonly kind: string;
  /** Does the work; what it throws fails the job after its attempts are used up. */
  readonly run: (run: JobRun) => Promise<void>;
  /** Tidies up after a failure or a cancellation, in one transaction with the job's own last state. */
  readonly onEnd?: (
    work: Work,
    payload: unknown,
    outcome: 'failed' | 'cancelled',
    reason: string,
  ) => Promise<void>;
  /** How often it is tried when the server dies or it throws; 3 unless stated. */
  readonly maximumAttempts?: number;
}
