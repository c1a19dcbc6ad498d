import { randomBytes, randomUUID } from 'node:crypto';
import { parseArgs } from 'node:util';
import * as z from 'zod';
import { ORGANISATION_KINDS } from '#shared/access/roles';
import { tokenHash } from '../modules/session';
import { currentUrls, withClient } from './start/database';
import { STATE_FOLDER, THROWAWAY_FOLDER } from './start/state-folder';

const USAGE =
  'npm run organisation:create -- --name "Northgate Cars" --slug northgate --email a@northgate.example --person "Ada Birch" [--kind maker|supplier]';

const wanted = z.object({
  name: z.string().trim().min(1).max(120),
  slug: z.string().regex(/^[a-z0-9][a-z0-9-]{1,59}$/),
  email: z.email().max(254),
  person: z.string().trim().min(1).max(120),
  kind: z.enum(ORGANISATION_KINDS).default('maker'),
});

/** `npm run organisation:create`: founds an organisation and prints its administrator's one-time link, good for a day. */
async function main(): Promise<void> {
  const text = { type: 'string' } as const;
  const { values } = parseArgs({
    options: {
      name: text,
      slug: text,
      email: text,
      person: text,
      kind: text,
      throwaway: { type: 'boolean' },
    },
  });
  // The browser tests have an installation of their own.
  const { throwaway, ...fields } = values;
  const parsed = wanted.safeParse(fields);
  if (!parsed.success) {
    const wrong = parsed.error.issues.map((issue) => `--${issue.path.join('.')}: ${issue.message}`);
    process.stderr.write(`${wrong.join('\n')}\n${USAGE}\n`);
    process.exitCode = 2;
    return;
  }
  const { name, slug, email, person, kind } = parsed.data;
  const { urls } = currentUrls(process.env, process.cwd(), throwaway ? THROWAWAY_FOLDER : STATE_FOLDER);
  const token = randomBytes(32).toString('base64url');
  await withClient(urls.maintenance, async (client) => {
    const organisationId = randomUUID();
    await client.query('begin');
    await client.query('insert into organisations (id, kind, name, slug) values ($1, $2, $3, $4)', [
      organisationId,
      kind,
      name,
      slug,
    ]);
    // Somebody who works elsewhere already keeps their account and their password until the link is used.
    const { rows } = await client.query<{ id: string }>(
      `with known as (select id from users where lower(email) = lower($1)),
         fresh as (insert into users (email, display_name) select $1, $2 where not exists (select from known) returning id)
       select id from known union all select id from fresh`,
      [email, person],
    );
    const userId = rows[0]?.id;
    await client.query(
      `insert into memberships (organisation_id, user_id, organisation_kind, role, display_name, email)
       values ($1, $2, $3, $4, $5, $6)`,
      [
        organisationId,
        userId,
        kind,
        kind === 'maker' ? 'administrator' : 'supplier-administrator',
        person,
        email,
      ],
    );
    await client.query(
      `insert into password_tokens (token_hash, user_id, expires_at) values ($1, $2, now() + interval '1 day')`,
      [tokenHash(token), userId],
    );
    await client.query('commit');
  });
  const origin =
    process.env['PUBLIC_ORIGINS']?.split(',')[0] ?? `http://127.0.0.1:${process.env['PORT'] ?? 4300}`;
  // Behind the hash, so that the token stands in no server's log.
  process.stdout.write(
    `${name} has been founded. For ${person}, once, within a day:\n${origin}/set-password#${token}\n`,
  );
}

await main();
