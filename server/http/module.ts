import type * as z from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint';
import type { JobKind } from '../jobs/job-kind';
import type { MemberContext, PublicContext } from './context';

type AnyEndpoint = Endpoint;

/** The request after parsing. */
export interface Input<E extends AnyEndpoint> {
  readonly params: z.output<E['params']>;
  readonly query: z.output<E['query']>;
  readonly body: z.output<E['body']>;
  /** From If-Match, for versioned endpoints; 0 elsewhere. */
  readonly expectedVersion: number;
}

/** An uploaded file, read whole and no larger than the route allows. */
export interface UploadedFile {
  readonly fileName: string;
  readonly mediaType: string;
  readonly content: Buffer;
  readonly sha256: string;
}

export interface Download {
  readonly fileName: string;
  readonly mediaType: string;
  readonly body: Buffer | string;
}

type Reply<E extends AnyEndpoint> = z.input<E['response']>;

export type Route =
  | {
      readonly audience: 'public';
      readonly endpoint: AnyEndpoint;
      readonly handler: (input: Input<AnyEndpoint>, context: PublicContext) => Promise<unknown>;
    }
  | {
      readonly audience: 'member';
      readonly endpoint: AnyEndpoint;
      readonly maximumBytes: number;
      readonly handler: (
        input: Input<AnyEndpoint> & { readonly file?: UploadedFile },
        context: MemberContext,
      ) => Promise<unknown>;
    };

/** A module's front door: its routes and the kinds of job that it knows how to do. */
export interface ServerModule {
  readonly name: string;
  readonly routes: readonly Route[];
  readonly jobs?: readonly JobKind[];
}

// The handlers below are typed against their own endpoint; inside the registry the type is erased, which is sound
// because `handle` parses the input with the schemas of that same endpoint.
type Erased<Context> = (input: unknown, context: Context) => Promise<unknown>;

/** A JSON operation for members of an organisation. */
export function route<E extends AnyEndpoint>(
  endpoint: E,
  handler: (input: Input<E>, context: MemberContext) => Promise<Reply<E>>,
): Route {
  return { audience: 'member', endpoint, maximumBytes: 0, handler: handler as Erased<MemberContext> };
}

/** An operation that takes one file (multipart, field `file`). */
export function uploadRoute<E extends AnyEndpoint>(
  endpoint: E,
  maximumBytes: number,
  handler: (input: Input<E> & { readonly file: UploadedFile }, context: MemberContext) => Promise<Reply<E>>,
): Route {
  return { audience: 'member', endpoint, maximumBytes, handler: handler as Erased<MemberContext> };
}

/** An operation that answers with a file. */
export function downloadRoute<E extends AnyEndpoint>(
  endpoint: E,
  handler: (input: Input<E>, context: MemberContext) => Promise<Download>,
): Route {
  return { audience: 'member', endpoint, maximumBytes: 0, handler: handler as Erased<MemberContext> };
}

/** An operation outside any organisation: sign-in and the session itself. */
export function publicRoute<E extends AnyEndpoint>(
  endpoint: E,
  handler: (input: Input<E>, context: PublicContext) => Promise<Reply<E>>,
): Route {
  return { audience: 'public', endpoint, handler: handler as Erased<PublicContext> };
}
