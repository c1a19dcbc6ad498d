import { join } from 'node:path';
import { currentUrls } from './start/database';
import { evaluateAdoptions } from './start/evaluate-adoptions';
import { seedDemoOnce, seedReference } from './start/seeding';
import { openSecrets, STATE_FOLDER } from './start/state-folder';

/** `npm run seed`: the built-in cycles; and the demo scenario, where the cluster is this installation's own and empty. */
const { urls, external } = currentUrls(process.env, process.cwd());
await seedReference(urls.maintenance);

// Accounts that everybody knows have no place in a database that was given to us.
const seeded =
  !external && (await seedDemoOnce(urls.maintenance, openSecrets(join(process.cwd(), STATE_FOLDER)).demo));
await evaluateAdoptions(urls);
process.stdout.write(
  `The built-in cycles are in place.${seeded ? ' The demo scenario has been set up.' : ''}\n`,
);
