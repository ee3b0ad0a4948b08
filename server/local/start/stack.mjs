import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { startMariaDb } from '../mariadb.mjs';
import { startChild, untilReady } from './child.mjs';
import { createCrew } from './crew.mjs';
import { runToEnd } from './run-to-end.mjs';
import { readSecrets } from './secrets.mjs';
import { answers, programArguments, projectDir, startMailbox, startSearch } from './services.mjs';

/**
 * Starts the app and all it leans on: database, search and mailbox (unless the environment names others), schema, demo
 * where the database is empty, search index, app. When any of it fails, what has been started is stopped again.
 *
 * @param {object} options
 * @param {ReturnType<import('./settings.mjs').readLaunchSettings>} options.settings
 * @param {boolean} [options.compiled] runs what was built; otherwise the TypeScript, started anew on every change
 * @param {(text: string) => void} options.say
 * @param {(child: { name: string; pid: number }) => void} [options.onChild]
 * @param {AbortSignal} [options.signal] breaks the start off
 */
export async function startStack({ settings, compiled = true, say, onChild = () => undefined, signal }) {
  const crew = createCrew(onChild);
  const breakOff = () => crew.stop();
  signal?.addEventListener('abort', breakOff);
  try {
    const step = { settings, crew, compiled, say, signal };
    const environment = await startSurroundings(step);
    await prepareData({ ...step, environment });
    await startApp({ ...step, environment });
    if (!compiled) await startDevServer({ ...step, environment });
    return {
      address: settings.publicAddress,
      mailboxUrl: environment.MAILBOX_URL,
      databaseUrl: environment.DATABASE_URL,
      broken: crew.broken,
      stop: crew.stop,
    };
  } catch (error) {
    await crew.stop();
    throw error;
  } finally {
    signal?.removeEventListener('abort', breakOff);
  }
}

/** Starts what the environment does not name, and returns the environment that the app is to have. */
async function startSurroundings({ settings, crew, compiled, say, signal }) {
  const { dataDir, ports } = settings;
  const secrets = readSecrets(dataDir);
  const environment = appEnvironment(settings, secrets);
  const common = { dataDir, compiled, onStart: crew.add };
  mkdirSync(environment.PHOTO_DIR, { recursive: true });
  if (!environment.DATABASE_URL) {
    signal?.throwIfAborted();
    say('Starting MariaDB …');
    environment.DATABASE_URL = (await startMariaDb({ ...common, port: ports.database })).url;
  }
  if (!environment.MEILI_HOST) {
    signal?.throwIfAborted();
    say('Starting search …');
    const search = await startSearch({ ...common, port: ports.search, key: secrets.search });
    Object.assign(environment, { MEILI_HOST: search.url, MEILI_KEY: search.key });
  }
  if (!environment.SMTP_URL) {
    signal?.throwIfAborted();
    say('Starting the mailbox …');
    const mailbox = await startMailbox({ ...common, smtpPort: ports.smtp, pagePort: ports.mailbox });
    Object.assign(environment, { SMTP_URL: mailbox.url, MAILBOX_URL: mailbox.pageUrl });
  }
  return environment;
}

function appEnvironment(settings, secrets) {
  const given = settings.environment;
  return {
    ...given,
    NODE_ENV: given.NODE_ENV || 'development',
    PORT: String(settings.ports.app),
    PUBLIC_ADDRESS: settings.publicAddress,
    PHOTO_DIR: given.PHOTO_DIR || join(settings.dataDir, 'photos'),
    DUMP_DIR: given.DUMP_DIR || join(settings.dataDir, 'dump'),
    SESSION_SECRET: given.SESSION_SECRET || secrets.session,
    BOUNCE_SECRET: given.BOUNCE_SECRET || secrets.bounce,
  };
}

async function prepareData({ settings, environment, compiled, say, signal }) {
  const run = (name, file, ...args) =>
    runToEnd({
      name,
      command: process.execPath,
      args: [...programArguments(file, compiled), ...args],
      env: environment,
      cwd: projectDir,
      logFile: join(settings.dataDir, 'logs/preparation.log'),
      signal,
    });
  say('Bringing the schema up to date …');
  await run('The migration', 'server/local/migrate');
  if (!settings.production) {
    say('Looking for data (an empty database gets the demo) …');
    await run('Making the demo', 'server/local/seed', '--if-empty');
  }
  say('Looking after the search index …');
  await run('Making the search index', 'server/local/rebuild-search', '--if-needed');
}

async function startApp({ settings, environment, crew, compiled, say, signal }) {
  signal?.throwIfAborted();
  say('Starting the app …');
  const app = startChild({
    name: 'app',
    command: process.execPath,
    args: [
      ...(compiled ? [] : ['--watch', '--watch-preserve-output']),
      ...programArguments('server/main', compiled),
    ],
    env: environment,
    cwd: projectDir,
    logFile: join(settings.dataDir, 'logs/app.log'),
    onStart: crew.add,
  });
  await untilReady(app, () => answers(`${insideAddress(settings, environment)}/api/health`));
}

async function startDevServer({ settings, environment, crew, say, signal }) {
  signal?.throwIfAborted();
  say('Starting the dev server (up to a minute) …');
  const server = startChild({
    name: 'dev server',
    command: process.execPath,
    args: [
      join(projectDir, 'node_modules/@angular/cli/bin/ng.js'),
      'serve',
      '--port',
      String(settings.ports.pages),
    ],
    env: {
      ...environment,
      NG_CLI_ANALYTICS: 'false',
      SHIMLORE_INTERNAL_ADDRESS: insideAddress(settings, environment),
    },
    cwd: projectDir,
    logFile: join(settings.dataDir, 'logs/dev-server.log'),
    onStart: crew.add,
  });
  await untilReady(server, () => answers(`http://localhost:${settings.ports.pages}/`), 180);
}

function insideAddress(settings, environment) {
  return `http://${environment.HOST || '127.0.0.1'}:${settings.ports.app}`;
}
