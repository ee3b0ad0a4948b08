import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { ensureBuilt } from './build.mjs';
import { ensureDependencies } from './dependencies.mjs';
import { ensurePackages } from './packages.mjs';
import { demandFreePort } from './ports.mjs';
import { claimDataFolder } from './running.mjs';
import { projectDir } from './services.mjs';
import { readLaunchSettings } from './settings.mjs';
import { startStack } from './stack.mjs';

/**
 * From a fresh checkout to a running app, and down again on Ctrl-C or SIGTERM. Returns the exit code.
 *
 * @param {NodeJS.ProcessEnv} environment
 * @param {{ compiled: boolean }} how `npm start` builds and runs what was built; `npm run dev` runs the TypeScript
 */
export async function launch(environment, { compiled }) {
  const say = (text) => console.log(text);
  const wish = new AbortController();
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => wish.abort());
  let claim;
  let stack;
  try {
    const settings = readLaunchSettings(environment, { compiled });
    claim = await claimDataFolder(settings.dataDir, settings.publicAddress, say);
    await demandFreePorts(settings, compiled);
    await prepare({ settings, compiled, say, signal: wish.signal });
    stack = await startStack({ settings, compiled, say, signal: wish.signal, onChild: claim.noteChild });
    await greet({ settings, stack, compiled, say });
    const end = await Promise.race([stack.broken, wished(wish.signal)]);
    if (end === undefined) return 0;
    console.error(`${end}\nStopping the rest.`);
    return 1;
  } catch (error) {
    if (wish.signal.aborted) return 0;
    console.error(error.message);
    return 1;
  } finally {
    if (stack) {
      say('Stopping …');
      await stack.stop();
      say('Stopped.');
    }
    claim?.release();
  }
}

/** Told before minutes go into installing and building. */
async function demandFreePorts({ ports, environment }, compiled) {
  await demandFreePort(ports.app, 'the app', 'PORT');
  if (!environment.DATABASE_URL) await demandFreePort(ports.database, 'MariaDB', 'SHIMLORE_DB_PORT');
  if (!environment.MEILI_HOST) await demandFreePort(ports.search, 'search', 'SHIMLORE_SEARCH_PORT');
  if (!environment.SMTP_URL) {
    await demandFreePort(ports.smtp, 'mail', 'SHIMLORE_SMTP_PORT');
    await demandFreePort(ports.mailbox, 'the mailbox page', 'SHIMLORE_MAILBOX_PORT');
  }
  if (!compiled) await demandFreePort(ports.pages, 'the dev server', 'SHIMLORE_PAGES_PORT');
}

async function prepare({ settings, compiled, say, signal }) {
  const logDir = join(settings.dataDir, 'logs');
  if (!settings.environment.DATABASE_URL) {
    const packages = {
      'mariadb-server': ['mariadbd', 'mariadb-install-db'],
      'mariadb-client': ['mariadb', 'mariadb-dump'],
    };
    await ensurePackages({ packages, logFile: join(logDir, 'packages.log'), say, signal });
  }
  await ensureDependencies({ projectDir, logFile: join(logDir, 'npm.log'), say, signal });
  if (compiled) await ensureBuilt({ projectDir, logDir, say, signal });
}

async function greet({ settings, stack, compiled, say }) {
  say(`\nShimlore runs at ${stack.address}`);
  if (stack.mailboxUrl) say(`Mail that it sends is shown at ${stack.mailboxUrl}`);
  if (!settings.production) {
    const demoAccounts = await readDemoAccounts(compiled);
    say('Accounts of the demo:');
    for (const { role, email, password } of demoAccounts)
      say(`  ${role.padEnd(14)} ${email.padEnd(34)} ${password}`);
  }
  say('Ctrl-C stops everything.\n');
}

async function readDemoAccounts(compiled) {
  if (compiled)
    return (await import(pathToFileURL(join(projectDir, 'dist/api/seeds/demo/accounts.js')).href))
      .demoAccounts;
  const { tsImport } = await import('tsx/esm/api');
  return (await tsImport(join(projectDir, 'seeds/demo/accounts.ts'), import.meta.url)).demoAccounts;
}

/** Resolves, with undefined, when the wish to stop comes. */
function wished(signal) {
  return new Promise((resolve) => {
    if (signal.aborted) resolve(undefined);
    signal.addEventListener('abort', () => resolve(undefined), { once: true });
  });
}
