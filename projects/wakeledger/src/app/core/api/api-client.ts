import { HttpClient, HttpErrorResponse, HttpHeaders } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { type Observable, Subject, catchError, defer, map, throwError } from 'rxjs';
import type * as z from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint';
import { ApiProblem, toApiProblem } from './api-problem';
import { newCommandKey } from './command-key';
import { Connection } from './connection';
import { endpointAddress } from './endpoint-address';

/** A part may be left out where the contract asks for nothing in it. */
type Part<Name extends string, Schema extends z.ZodType> =
  Record<never, never> extends z.input<Schema>
    ? { readonly [K in Name]?: z.input<Schema> }
    : { readonly [K in Name]: z.input<Schema> };

export type CallInput<E extends Endpoint> = Part<'params', E['params']> &
  Part<'query', E['query']> &
  Part<'body', E['body']> & {
    /** The version that was edited; needed where the contract is versioned. */
    readonly ifMatch?: number;
    /** Send the same key again to repeat a command whose outcome is unknown. */
    readonly commandKey?: string;
    /** For uploads: the file, sent as the part `file` beside the body's fields. */
    readonly file?: File;
  };

export type CallOutput<E extends Endpoint> = z.output<E['response']>;

interface LooseInput {
  readonly params?: unknown;
  readonly query?: unknown;
  readonly body?: unknown;
  readonly ifMatch?: number;
  readonly commandKey?: string;
  readonly file?: File;
}

/**
 * The only way from the browser to the server: a contract goes in, a parsed value comes out, every failure is an
 * {@link ApiProblem}. Used by the `*-api.ts` files and by the session, by nobody else.
 */
@Injectable({ providedIn: 'root' })
export class ApiClient {
  private readonly http = inject(HttpClient);
  private readonly connection = inject(Connection);
  private readonly ended = new Subject<void>();

  /** The server no longer knows the session. */
  readonly sessionEnded = this.ended.asObservable();

  call<E extends Endpoint>(endpoint: E, input: CallInput<E>): Observable<CallOutput<E>> {
    return defer(() => this.send(endpoint, input)).pipe(
      map((answer) => {
        this.connection.report(true);
        const parsed = endpoint.response.safeParse(answer);
        if (!parsed.success) {
          throw new ApiProblem('unreadable-answer', undefined, { cause: parsed.error });
        }
        return parsed.data as CallOutput<E>;
      }),
      catchError((error: unknown) => throwError(() => this.problemOf(error, endpoint))),
    );
  }

  /** Where a download lies: for a link, so that the browser saves it and shows its progress. */
  addressOf<E extends Endpoint>(endpoint: E, input: Pick<CallInput<E>, 'params' | 'query'>): string {
    const { params, query } = input as LooseInput;
    return endpointAddress(endpoint, fieldsOf(params), fieldsOf(query));
  }

  private send(endpoint: Endpoint, input: LooseInput): Observable<unknown> {
    const address = endpointAddress(endpoint, fieldsOf(input.params), fieldsOf(input.query));
    let headers = new HttpHeaders();
    if (endpoint.command) headers = headers.set('Idempotency-Key', input.commandKey ?? newCommandKey());
    if (endpoint.versioned && input.ifMatch !== undefined)
      headers = headers.set('If-Match', `"${input.ifMatch}"`);
    const bodiless = endpoint.method === 'GET' || endpoint.method === 'DELETE';
    const body = bodiless ? undefined : endpoint.kind === 'upload' ? formOf(input) : (input.body ?? {});
    return this.http.request(endpoint.method, address, { body, headers, responseType: 'json' });
  }

  private problemOf(error: unknown, endpoint: Endpoint): ApiProblem {
    if (error instanceof ApiProblem) return error;
    if (!(error instanceof HttpErrorResponse)) {
      return new ApiProblem('unreadable-answer', undefined, { cause: error });
    }
    const found = toApiProblem(error.status, error.error, error);
    this.connection.report(found.code !== 'no-connection');
    if (found.code === 'not-signed-in' && endpoint.access !== 'public') this.ended.next();
    return found;
  }
}

function fieldsOf(part: unknown): Readonly<Record<string, unknown>> {
  return typeof part === 'object' && part !== null ? (part as Record<string, unknown>) : {};
}

/** Fields first: a server that reads the stream knows them before the file begins. */
function formOf(input: LooseInput): FormData {
  const form = new FormData();
  for (const [name, value] of Object.entries(fieldsOf(input.body))) {
    if (value !== undefined) form.append(name, String(value));
  }
  if (input.file) form.append('file', input.file, input.file.name);
  return form;
}
