import type { Refusal } from '#shared/core/refusal';
import { REFUSAL_TITLES } from './refusal-titles';

/** Problem object (RFC 9457) as the machine entry prints it. */
export interface MethodProblem {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly code: string;
  readonly detail: string;
  readonly where: string;
}

const STATUS: { readonly [code: string]: number } = {
  'not-json': 400,
  'malformed-input': 400,
  'unknown-operation': 404,
  'not-available': 501,
};

export function problemOfRefusal({ code, where, detail }: Refusal): MethodProblem {
  return {
    type: `/problems/${code}`,
    title: REFUSAL_TITLES[code] ?? 'The method cannot be applied to this.',
    status: STATUS[code] ?? 422,
    code,
    detail,
    where,
  };
}
