import { createHmac, randomUUID } from 'node:crypto';
import type { Server } from 'node:http';
import type pg from 'pg';
import supertest from 'supertest';
import type * as z from 'zod';
import type { Role } from '#shared/access/roles';
import type { Endpoint } from '#shared/contracts/endpoint';
import { type Problem, problem } from '#shared/contracts/problem';
import type { TestOrganisation } from './test-members';

export interface Caller {
  readonly server: Server;
  readonly origin: string;
  readonly secret: string;
  readonly platform: pg.Pool;
}

/** What goes with a call; commands get a fresh key unless one is given. */
export interface CallInput {
  readonly params?: Readonly<Record<string, string>>;
  readonly query?: Readonly<Record<string, string>>;
  readonly body?: unknown;
  readonly ifMatch?: number;
  readonly key?: string;
  /** For uploads: sent as the multipart field `file`. */
  readonly file?: { readonly name: string; readonly content: Buffer | string };
}

/** A caller of the API with (or without) a session, speaking in contracts. */
export class ApiMember {
  constructor(
    private readonly caller: Caller,
    readonly cookie: string | undefined,
    readonly organisation?: TestOrganisation,
    readonly userId?: string,
  ) {}

  /** Signs in by writing the session that sign-in would write: fast, and independent of the sign-in under test. */
  static async signIn(caller: Caller, organisation: TestOrganisation, role: Role): Promise<ApiMember> {
    const userId = organisation.userIds.get(role);
    if (userId === undefined) throw new Error(`${organisation.name} has nobody who is ${role}`);
    const sid = randomUUID();
    const sess = {
      cookie: { originalMaxAge: 3_600_000, httpOnly: true, path: '/', sameSite: 'lax' },
      userId,
      organisationId: organisation.id,
    };
    await caller.platform.query(
      `insert into web_sessions (sid, sess, expire) values ($1, $2, now() + interval '1 hour')`,
      [sid, JSON.stringify(sess)],
    );
    const signature = createHmac('sha256', caller.secret).update(sid).digest('base64').replace(/=+$/, '');
    const cookie = `wakeledger=${encodeURIComponent(`s:${sid}.${signature}`)}`;
    return new ApiMember(caller, cookie, organisation, userId);
  }

  /** The raw answer of one operation. */
  async call(endpoint: Endpoint, input: CallInput = {}): Promise<supertest.Response> {
    const path = endpoint.path.replace(/:(\w+)/g, (_all, name: string) =>
      encodeURIComponent(input.params?.[name] ?? `missing-${name}`),
    );
    const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'delete';
    const request = supertest(this.caller.server)
      [method](path)
      .query(input.query ?? {});
    if (this.cookie !== undefined) request.set('Cookie', this.cookie);
    if (endpoint.method !== 'GET') request.set('Origin', this.caller.origin);
    if (endpoint.command) request.set('Idempotency-Key', input.key ?? randomUUID());
    if (input.ifMatch !== undefined) request.set('If-Match', `"${input.ifMatch}"`);
    if (input.file !== undefined) {
      return request.attach('file', Buffer.from(input.file.content), input.file.name);
    }
    return endpoint.method === 'GET' ? request : request.send((input.body ?? {}) as object);
  }

  /** The reply of an operation that must succeed. */
  async ok<E extends Endpoint>(endpoint: E, input: CallInput = {}): Promise<z.output<E['response']>> {
    const answer = await this.call(endpoint, input);
    if (answer.status !== 200) {
      throw new Error(`${endpoint.method} ${endpoint.path} answered ${answer.status}: ${answer.text}`);
    }
    return endpoint.response.parse(answer.body) as z.output<E['response']>;
  }

  /** The Problem of an operation that must be refused. */
  async refused(endpoint: Endpoint, input: CallInput = {}): Promise<Problem> {
    const answer = await this.call(endpoint, input);
    if (answer.status < 400)
      throw new Error(`${endpoint.method} ${endpoint.path} was not refused: ${answer.text}`);
    return problem.parse(JSON.parse(answer.text));
  }
}
