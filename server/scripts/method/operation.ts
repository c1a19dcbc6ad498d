import type * as z from 'zod';

/** An operation of the machine entry: the schema of its input and what it answers. */
export interface Operation {
  readonly schema: z.ZodType;
  readonly evaluate: (input: unknown) => unknown;
}

/** Ties an evaluation to its schema; it must be handed what that schema has passed. */
export function operation<Schema extends z.ZodType>(
  schema: Schema,
  evaluate: (input: z.output<Schema>) => unknown,
): Operation {
  return { schema, evaluate: (input) => evaluate(input as z.output<Schema>) };
}
