import { Passport } from 'passport';
import { Strategy } from 'passport-local';
import type { PublicContext, SessionIdentity } from '../../http/context';
import { verifyPassword } from './passwords';
import { findOrganisationId, findPerson, lookAtPerson, readMemberships } from './session.repository';

export interface Credentials {
  readonly organisationSlug: string;
  readonly email: string;
  readonly password: string;
}

/**
 * The verified identity behind credentials, or undefined; through passport, where single sign-on will stand beside it.
 * The strategy reads the credentials from a body of our own making: the handler never sees the request.
 */
export function authenticatePassword(
  context: PublicContext,
  credentials: Credentials,
): Promise<SessionIdentity | undefined> {
  const passport = new Passport();
  passport.use(
    new Strategy({ usernameField: 'email', session: false }, (email, password, done) => {
      verify(context, { ...credentials, email, password }).then(
        (identity) => done(null, identity ?? false),
        (error: unknown) => done(error),
      );
    }),
  );
  return new Promise((resolve, reject) => {
    const settle = (error: unknown, identity: SessionIdentity | false | undefined) => {
      if (error) reject(error);
      else resolve(identity ? identity : undefined);
    };
    const handler: unknown = passport.authenticate('local', { session: false }, settle);
    (handler as (req: object, res: object, next: (error: unknown) => void) => void)(
      { body: credentials, query: {} },
      {},
      reject,
    );
  });
}

async function verify(
  context: PublicContext,
  credentials: Credentials,
): Promise<SessionIdentity | undefined> {
  const found = await context.inPlatform(undefined, 'read', async (tx) => {
    const person = await findPerson(tx, credentials.email);
    const organisationId = await findOrganisationId(tx, credentials.organisationSlug);
    // Looked up even when there is nobody, so that both cases cost the same number of statements.
    await lookAtPerson(tx, person?.userId ?? '00000000-0000-0000-0000-000000000000');
    const places = await readMemberships(tx);
    return { person, organisationId, places };
  });
  const belongs = found.places.some((place) => place.organisationId === found.organisationId);
  const stored = belongs ? (found.person?.passwordHash ?? undefined) : undefined;
  const right = await verifyPassword(stored, credentials.password);
  if (!right || found.person === undefined || found.organisationId === undefined) return undefined;
  return { userId: found.person.userId, organisationId: found.organisationId };
}
