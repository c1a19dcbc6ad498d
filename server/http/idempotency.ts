import { createHash } from 'node:crypto';
import { and, eq, sql } from 'drizzle-orm';
import type { Tx } from '../db/pools';
import { commands } from '../db/tables/work';
import { fail } from './problem-error';

/** A command as it was sent: who, under which key, with what. */
export interface CommandIdentity {
  readonly userId: string;
  readonly key: string;
  readonly bodyHash: string;
}

const KEY = /^[\x21-\x7e]{8,200}$/;

/** @throws {ProblemError} idempotency-key-missing, malformed-input */
export function readKey(header: string | undefined): string {
  if (header === undefined) fail('idempotency-key-missing');
  if (!KEY.test(header)) {
    fail('malformed-input', {
      where: 'headers.idempotency-key',
      detail: '8 to 200 visible ASCII characters are expected.',
    });
  }
  return header;
}

/** Fingerprint of everything that makes a command what it is; the same key with another one is refused. */
export function commandHash(parts: readonly unknown[]): string {
  return createHash('sha256').update(JSON.stringify(parts)).digest('hex');
}

/**
 * Carries a command out at most once. The answer is stored in the transaction of the deed, so a repeated command
 * finds either both or neither.
 *
 * @throws {ProblemError} command-in-progress, idempotency-key-reused
 */
export async function once(
  tx: Tx,
  organisationId: string,
  command: CommandIdentity,
  deed: () => Promise<unknown>,
): Promise<unknown> {
  const lock = `${organisationId}/${command.userId}/${command.key}`;
  const answer = await tx.execute<{ locked: boolean }>(
    sql`select pg_try_advisory_xact_lock(hashtextextended(${lock}, 0)) as locked`,
  );
  if (answer.rows[0]?.locked !== true) fail('command-in-progress');
  const [done] = await tx
    .select({ bodyHash: commands.bodyHash, response: commands.response })
    .from(commands)
    .where(and(eq(commands.userId, command.userId), eq(commands.key, command.key)));
  if (done !== undefined) {
    if (done.bodyHash !== command.bodyHash) fail('idempotency-key-reused');
    return done.response;
  }
  const response = await deed();
  await tx.insert(commands).values({ organisationId, ...command, status: 200, response: response ?? {} });
  return response;
}
