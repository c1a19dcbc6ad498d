import type { Permission } from '#shared/access/permissions';
import type { OrganisationKind, Role } from '#shared/access/roles';
import type { TransactionMode } from '../db/in-tenant';
import type { Tx } from '../db/pools';

export interface Log {
  readonly error: (details: object, message: string) => void;
  readonly warn: (details: object, message: string) => void;
  readonly info: (details: object, message: string) => void;
}

/** One piece of work inside one organisation and one transaction: what services and repositories are given. */
export interface Work {
  readonly tx: Tx;
  readonly organisationId: string;
  /** Whose work it is; a job runs as the person who asked for it. */
  readonly userId: string;
  readonly requestId: string;
  readonly now: Date;
  readonly log: Log;
  /** Called once the transaction has been committed, never when it was rolled back. */
  readonly afterCommit: (deed: () => void) => void;
}

export interface Member {
  readonly userId: string;
  readonly displayName: string;
  readonly email: string;
  readonly role: Role;
  readonly organisationKind: OrganisationKind;
}

/** What a handler for members is given beside its parsed input. */
export interface MemberContext extends Work {
  readonly member: Member;
  readonly may: (permission: Permission) => boolean;
  /** Wakes the job runner for this organisation after the commit. */
  readonly wakeJobs: () => void;
}

export interface SessionIdentity {
  readonly userId: string;
  readonly organisationId: string;
}

/** What a public handler (and those of the session itself) may do: no tenant transaction, but the session. */
export interface PublicContext {
  readonly requestId: string;
  readonly now: Date;
  readonly log: Log;
  readonly clientAddress: string;
  readonly demo: boolean;
  /** Runs as the platform role, seeing the memberships of `userId` only. */
  readonly inPlatform: <T>(
    userId: string | undefined,
    mode: TransactionMode,
    work: (tx: Tx) => Promise<T>,
  ) => Promise<T>;
  readonly inTenant: <T>(
    identity: SessionIdentity,
    mode: TransactionMode,
    work: (work: Work) => Promise<T>,
  ) => Promise<T>;
  readonly session: {
    readonly identity: () => SessionIdentity | undefined;
    /** Starts a new session (the old one is destroyed: no fixation). */
    readonly begin: (identity: SessionIdentity) => Promise<void>;
    readonly end: () => Promise<void>;
  };
  readonly signIn: SignInServices;
}

/** The parts of sign-in that keep state outside a transaction. */
export interface SignInServices {
  /** @throws {ProblemError} too-many-attempts */
  readonly countAttempt: (address: string, account: string) => Promise<void>;
  readonly forgetAttempts: (address: string, account: string) => Promise<void>;
}
