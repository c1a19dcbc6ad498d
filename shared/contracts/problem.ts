import './zod-setup';
import * as z from 'zod';

/**
 * Expected failures, each with one sentence for a person. The HTTP status stands beside it, so that server, client
 * and the OpenAPI document cannot disagree. Method refusals (see METHODS.md) travel as `method-refused` with their own
 * code in `reason`.
 */
export const PROBLEMS = {
  'malformed-input': { status: 400, title: 'Something in the request is not of the expected form.' },
  'not-signed-in': { status: 401, title: 'Sign in to continue.' },
  'sign-in-refused': { status: 401, title: 'E-mail address or password is not right.' },
  forbidden: { status: 403, title: 'Your role does not include this.' },
  'origin-refused': { status: 403, title: 'The request came from another site and was not carried out.' },
  'not-found': { status: 404, title: 'There is nothing here, or it is not yours to see.' },
  conflict: { status: 409, title: 'It was changed by someone else since you opened it.' },
  'already-exists': { status: 409, title: 'There is one of this name already.' },
  'still-in-use': { status: 409, title: 'Something else depends on it.' },
  'idempotency-key-reused': {
    status: 409,
    title: 'The same command key was sent with another content.',
  },
  'command-in-progress': { status: 409, title: 'The same command is still being carried out.' },
  'wrong-state': { status: 409, title: 'It is not in a state in which this can be done.' },
  'precondition-missing': { status: 428, title: 'The version that you edited is not stated.' },
  'idempotency-key-missing': { status: 428, title: 'The command carries no key.' },
  'too-large': { status: 413, title: 'The file is larger than what can be taken.' },
  'unsupported-file': { status: 415, title: 'This kind of file cannot be read here.' },
  'unusable-input': { status: 422, title: 'The content cannot be used as it is.' },
  'method-refused': { status: 422, title: 'The method cannot be applied to this.' },
  'too-many-attempts': { status: 429, title: 'Too many attempts. Wait a moment, then try again.' },
  'internal-error': { status: 500, title: 'Something went wrong on our side.' },
  'not-ready': { status: 503, title: 'The service is not ready yet.' },
} as const satisfies Record<string, { readonly status: number; readonly title: string }>;

export type ProblemCode = keyof typeof PROBLEMS;

export const problemCode = z.enum(Object.keys(PROBLEMS) as [ProblemCode, ...ProblemCode[]]);

/** Problem object after RFC 9457, with the fields that the product adds. */
export const problem = z.strictObject({
  type: z.string().describe('`/problems/<code>`'),
  title: z.string(),
  status: z.int(),
  code: problemCode,
  detail: z.string().optional().describe('Words for a person: what was wrong, and what would be accepted.'),
  where: z.string().optional().describe('The field or entity that is meant, as a dotted path.'),
  reason: z.string().optional().describe('A finer code, for example that of a refused method.'),
  requestId: z.string().optional(),
  issues: z
    .array(z.strictObject({ where: z.string(), detail: z.string(), reason: z.string().optional() }))
    .optional()
    .describe('All that is wrong, when it is more than one thing.'),
  currentVersion: z.int().optional().describe('With `conflict`: the version that stands now.'),
  retryAfterS: z.number().optional(),
});
export type Problem = z.infer<typeof problem>;
