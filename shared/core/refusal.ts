/**
 * A refusal is an expected outcome of the method: an input that cannot be used, said in words.
 *
 * Calculations throw it, because a refusal stops every later step; it is caught in two places only: around one
 * result (the rest is ranked without it) and around one operation (it becomes a Problem object, RFC 9457).
 */
export interface Refusal {
  /** Stable code, kebab case, as listed in METHODS.md. */
  readonly code: string;
  /** The field or entity that is meant, as a dotted path. */
  readonly where: string;
  /** What is wrong and what would be accepted, for a person. */
  readonly detail: string;
}

export class Refused extends Error implements Refusal {
  override readonly name = 'Refused';

  constructor(
    readonly code: string,
    readonly where: string,
    readonly detail: string,
  ) {
    super(`${code} at ${where}: ${detail}`);
  }
}

/** Stops the calculation with a refusal. @throws {Refused} always */
export function refuse(code: string, where: string, detail: string): never {
  throw new Refused(code, where, detail);
}
