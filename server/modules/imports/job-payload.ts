import * as z from 'zod';

const payload = z.strictObject({ importId: z.uuid() });

/** What both jobs are told: which import. */
export function importIdOf(given: unknown): string {
  return payload.parse(given).importId;
}
