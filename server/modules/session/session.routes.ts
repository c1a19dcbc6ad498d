import {
  demoSignIn,
  organisationSwitch,
  passwordSet,
  passwordSignIn,
  sessionRead,
  signOut,
} from '#shared/contracts/session';
import { publicRoute } from '../../http/module';
import {
  continueAs,
  describeSession,
  endSession,
  setPassword,
  signInWithPassword,
  switchOrganisation,
} from './session.service';

export const sessionRoutes = [
  publicRoute(sessionRead, (_input, context) => describeSession(context, context.session.identity())),
  publicRoute(passwordSignIn, ({ body }, context) => signInWithPassword(context, body)),
  publicRoute(passwordSet, ({ body }, context) => setPassword(context, body.token, body.password)),
  publicRoute(demoSignIn, ({ body }, context) => continueAs(context, body.userId)),
  publicRoute(organisationSwitch, ({ body }, context) => switchOrganisation(context, body.organisationId)),
  publicRoute(signOut, (_input, context) => endSession(context)),
];
