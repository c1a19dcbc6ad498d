import { hash, verify } from '@node-rs/argon2';

// Argon2id, 64 MB, 3 passes: about 100 ms on the machines that the product is meant for.
const COST = { memoryCost: 65_536, timeCost: 3, parallelism: 1 } as const;

export function hashPassword(password: string): Promise<string> {
  return hash(password, COST);
}

let decoy: Promise<string> | undefined;

/**
 * Whether the password is right. Without a stored hash (an unknown person, or one without a password) the same work
 * is done against a decoy, so that the time taken does not tell which addresses exist.
 */
export async function verifyPassword(stored: string | undefined, password: string): Promise<boolean> {
  decoy ??= hashPassword('the decoy’s password, which nobody has');
  const right = await verify(stored ?? (await decoy), password);
  return right && stored !== undefined;
}
