import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { migrateDatabase } from '../../db/migrate';
import {
  type ClusterPlace,
  clusterExists,
  createCluster,
  freePort,
  removeCluster,
  startCluster,
  stopCluster,
} from '../cluster/cluster';
import { clusterUser } from '../cluster/find-postgres';
import { bringBuildsUpToDate, CLIENT_FOLDER } from './builds';
import { type DatabaseUrls, externalUrls, prepareDatabase } from './database';
import { startDevelopmentClient } from './development-client';
import { requireDatabase } from './external-database';
import { ensurePostgres } from './install-postgres';
import { readyLine } from './ready-line';
import { evaluateAdoptions } from './evaluate-adoptions';
import { seedDemoOnce, seedReference } from './seeding';
import { SERVER_BUNDLE } from './server-bundle';
import { requirePort, startServer } from './server-process';
import { takeStartLock } from './start-lock';
import {
  clusterFolder,
  openSecrets,
  openStateFolder,
  type Secrets,
  STATE_FOLDER,
  THROWAWAY_FOLDER,
  writePrivate,
} from './state-folder';

const say = (line: string) => process.stdout.write(`${line}\n`);

/** What has been started and must be stopped, last first. */
type Undo = () => Promise<void> | void;

/** Sets up whatever is missing, runs the product until it is asked to stop, and leaves everything in order. */
export async function start(words: readonly string[]): Promise<void> {
  const undo: Undo[] = [];
  const stopped = new Promise<'stopped'>((resolve) => {
    process.on('SIGINT', () => resolve('stopped'));
    process.on('SIGTERM', () => resolve('stopped'));
  });
  let code = 1;
  try {
    const manner = { development: words.includes('--dev'), throwaway: words.includes('--throwaway') };
    const running = bringUp(process.cwd(), manner, undo);
    const first = await Promise.race([stopped, running]);
    const died = first === 'stopped' ? first : await Promise.race([stopped, first.death]);
    if (died === 'stopped') code = 0;
    else process.stderr.write(`${died} has ended by itself. Start again: nothing that was stored is lost.\n`);
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  }
  for (const step of undo.reverse()) await step();
  process.exit(code);
}

interface Manner {
  readonly development: boolean;
  /** For the browser tests: an installation of its own that begins with the bare demo every time. */
  readonly throwaway: boolean;
}

/** Resolves once everything runs; `death` names the part that ends by itself later. */
async function bringUp(
  root: string,
  { development, throwaway }: Manner,
  undo: Undo[],
): Promise<{ readonly death: Promise<string> }> {
  const host = process.env['HOST'] ?? '127.0.0.1';
  const port = Number(process.env['PORT'] ?? 4300);
  const stateName = throwaway ? THROWAWAY_FOLDER : STATE_FOLDER;
  const stateFolder = openStateFolder(root, stateName, clusterUser());
  undo.push(takeStartLock(stateFolder));
  const secrets = openSecrets(stateFolder);
  await requirePort(host, port);

  const external = externalUrls(process.env);
  // What is missing is said before anything is built.
  if (external === undefined) ensurePostgres(say);
  else await requireDatabase(external);
  const built = development ? Promise.resolve() : buildMeanwhile(root, undo);
  const deaths: Promise<string>[] = [];
  let urls: DatabaseUrls;
  if (external === undefined) {
    const place = clusterPlace(root, stateName, stateFolder);
    if (throwaway) await removeCluster(place);
    if (!clusterExists(place)) createCluster(place, secrets.superuser);
    // Beforehand: whoever stops the start while the database comes up leaves none behind.
    undo.push(() => stopCluster(place, 'fast'));
    const cluster = await startCluster(place, {
      superuserPassword: secrets.superuser,
      port: await freePort(),
      throwaway,
    });
    deaths.push(cluster.ended.then(() => 'The database'));
    const note = join(stateFolder, 'running.json');
    writePrivate(note, JSON.stringify({ databasePort: cluster.port, serverPort: port }));
    undo.push(() => rmSync(note, { force: true }));
    urls = await prepareDatabase(cluster, secrets, root);
  } else {
    urls = external;
    await migrateDatabase(urls.owner, join(root, 'migrations'));
  }
  await seedReference(urls.maintenance);
  if (external === undefined && (await seedDemoOnce(urls.maintenance, secrets.demo))) {
    say('The demo scenario has been set up.');
  }
  const { refusals } = await evaluateAdoptions(urls);
  for (const refusal of refusals) say(`The adoptions of a programme could not be evaluated: ${refusal}`);

  await built;
  const server = await startServer(
    development ? ['--watch', '--import', 'tsx', 'server/main.ts'] : ['--enable-source-maps', SERVER_BUNDLE],
    root,
    serverEnvironment(urls, secrets, { host, port, development, demo: external === undefined, root }),
    development ? undefined : join(stateFolder, 'server.log'),
  );
  undo.push(() => server.stop());
  deaths.push(server.ended.then(() => 'The server'));
  if (development) undo.push(startDevelopmentClient(root));

  const demo =
    external === undefined ? { maintenanceUrl: urls.maintenance, password: secrets.demo } : undefined;
  say(await readyLine(process.env['PUBLIC_ORIGINS']?.split(',')[0] ?? `http://${host}:${port}`, demo));
  return { death: Promise.race(deaths) };
}

/** Begins to build what is stale while the database comes up; a start that fails or is stopped ends it. */
function buildMeanwhile(root: string, undo: Undo[]): Promise<void> {
  const stop = new AbortController();
  const built = bringBuildsUpToDate(root, say, stop.signal);
  // Awaited later; until then its failure is nobody's.
  const settled = built.catch(() => undefined);
  undo.push(() => {
    stop.abort();
    return settled;
  });
  return built;
}

function clusterPlace(root: string, stateName: string, stateFolder: string): ClusterPlace {
  const bin = ensurePostgres(say);
  // Asked again: the installation may just have created the user.
  const user = clusterUser();
  openStateFolder(root, stateName, user);
  const { folder, notice } = clusterFolder(stateFolder, user);
  if (notice !== undefined) say(notice);
  return { bin, folder, user };
}

interface ServerSettings {
  readonly host: string;
  readonly port: number;
  readonly development: boolean;
  readonly demo: boolean;
  readonly root: string;
}

/** The server is given the two request logins only: the owner's and the maintenance login stay here. */
function serverEnvironment(
  urls: DatabaseUrls,
  secrets: Secrets,
  settings: ServerSettings,
): NodeJS.ProcessEnv {
  const { DATABASE_URL_OWNER: _owner, DATABASE_URL_MAINTENANCE: _maintenance, ...inherited } = process.env;
  const developmentOrigins = [settings.port, 4200].flatMap((port) => [
    `http://127.0.0.1:${port}`,
    `http://localhost:${port}`,
  ]);
  return {
    ...inherited,
    ...(settings.development
      ? { WAKELEDGER_MODE: 'development', PUBLIC_ORIGINS: developmentOrigins.join(',') }
      : { WAKELEDGER_MODE: 'production', CLIENT_DIRECTORY: join(settings.root, CLIENT_FOLDER) }),
    HOST: settings.host,
    PORT: String(settings.port),
    DATABASE_URL_TENANT: urls.tenant,
    DATABASE_URL_PLATFORM: urls.platform,
    SESSION_SECRET: process.env['SESSION_SECRET'] ?? secrets.session,
    DEMO: settings.demo ? '1' : '0',
  };
}
