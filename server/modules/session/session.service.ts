import { permissionsOf } from '#shared/access/permissions';
import type { SessionState } from '#shared/contracts/session';
import type { PublicContext, SessionIdentity } from '../../http/context';
import { fail } from '../../http/problem-error';
import { authenticatePassword, type Credentials } from './password-strategy';
import { hashPassword } from './passwords';
import {
  findLatestProgramme,
  isDemoUser,
  lookAtPerson,
  readDemoUsers,
  readMemberships,
  storePassword,
  useToken,
} from './session.repository';

/** Who is signed in. A session whose membership has ended is over. */
export async function describeSession(
  context: PublicContext,
  identity: SessionIdentity | undefined,
): Promise<SessionState> {
  const demoPeople = context.demo ? await listDemoPeople(context) : undefined;
  if (identity === undefined) return { demoPeople };
  const places = await context.inPlatform(identity.userId, 'read', readMemberships);
  const here = places.find((place) => place.organisationId === identity.organisationId);
  if (here === undefined) {
    await context.session.end();
    return { demoPeople };
  }
  const latestProgrammeId = await context.inTenant(identity, 'read', ({ tx }) =>
    findLatestProgramme(tx, identity.userId),
  );
  return {
    member: {
      userId: identity.userId,
      displayName: here.displayName,
      email: here.email,
      organisationId: here.organisationId,
      role: here.role,
      permissions: [...permissionsOf(here.role)],
      memberships: places.map(({ displayName: _name, email: _email, ...place }) => place),
      latestProgrammeId,
    },
    demoPeople,
  };
}

/** One entry per demo person, at the first place that they hold. */
async function listDemoPeople(context: PublicContext): Promise<NonNullable<SessionState['demoPeople']>> {
  return context.inPlatform(undefined, 'read', async (tx) => {
    const people: NonNullable<SessionState['demoPeople']> = [];
    for (const person of await readDemoUsers(tx)) {
      await lookAtPerson(tx, person.userId);
      const [place] = await readMemberships(tx);
      if (place === undefined) continue;
      people.push({
        userId: person.userId,
        displayName: person.displayName,
        role: place.role,
        organisationName: place.organisationName,
        task: person.task ?? '',
      });
    }
    return people;
  });
}

export async function signInWithPassword(
  context: PublicContext,
  credentials: Credentials,
): Promise<SessionState> {
  const account = `${credentials.organisationSlug}/${credentials.email}`;
  await context.signIn.countAttempt(context.clientAddress, account);
  const identity = (await authenticatePassword(context, credentials)) ?? fail('sign-in-refused');
  await context.signIn.forgetAttempts(context.clientAddress, account);
  return begin(context, identity);
}

/** "Continue as" a demo person; anywhere but in the demo there is nothing here. */
export async function continueAs(context: PublicContext, userId: string): Promise<SessionState> {
  if (!context.demo) fail('not-found');
  await context.signIn.countAttempt(context.clientAddress, `demo/${userId}`);
  const place = await context.inPlatform(userId, 'read', async (tx) =>
    (await isDemoUser(tx, userId)) ? (await readMemberships(tx))[0] : undefined,
  );
  if (place === undefined) fail('not-found');
  await context.signIn.forgetAttempts(context.clientAddress, `demo/${userId}`);
  return begin(context, { userId, organisationId: place.organisationId });
}

export async function switchOrganisation(
  context: PublicContext,
  organisationId: string,
): Promise<SessionState> {
  const { userId } = context.session.identity() ?? fail('not-signed-in');
  const places = await context.inPlatform(userId, 'read', readMemberships);
  if (!places.some((place) => place.organisationId === organisationId)) fail('not-found');
  return begin(context, { userId, organisationId });
}

export async function endSession(context: PublicContext): Promise<SessionState> {
  await context.session.end();
  return describeSession(context, undefined);
}

export async function setPassword(context: PublicContext, token: string, password: string) {
  await context.signIn.countAttempt(context.clientAddress, 'password-token');
  // Hashed before the transaction: it takes a tenth of a second, and no row should be locked for that.
  const passwordHash = await hashPassword(password);
  const place = await context.inPlatform(undefined, 'write', async (tx) => {
    const userId = (await useToken(tx, token, context.now)) ?? fail('sign-in-refused', { detail: STALE });
    await storePassword(tx, userId, passwordHash);
    await lookAtPerson(tx, userId);
    return (await readMemberships(tx))[0] ?? fail('sign-in-refused', { detail: STALE });
  });
  await context.signIn.forgetAttempts(context.clientAddress, 'password-token');
  return { email: place.email, organisationSlug: place.organisationSlug };
}

const STALE = 'This link has been used or has run out. Ask for a new one.';

async function begin(context: PublicContext, identity: SessionIdentity): Promise<SessionState> {
  await context.session.begin(identity);
  return describeSession(context, identity);
}
