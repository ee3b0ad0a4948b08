import { spawn, type ChildProcess } from 'node:child_process';
import { openSync, readFileSync } from 'node:fs';
import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import type { Knex } from 'knex';
import { openDatabase } from '../../../server/database.js';
import { startMariaDb } from '../../../server/local/mariadb.mjs';
import { freePort } from '../../../server/local/start/ports.mjs';
import {
  answers,
  programArguments,
  projectDir,
  startMailbox,
  startSearch,
  type RunningService,
} from '../../../server/local/start/services.mjs';
import { migrateToLatest } from '../../../server/migration-source.js';
import type { AccountRole } from '../../../shared/contract/vocabulary.js';
import {
  cookiesOfFirstVisit,
  insertAccount,
  openAgent,
  signIn,
  type MemberAgent,
} from '../../api/support/agents.js';
import { openMailbox, type TestMailbox } from '../../api/support/mailbox.js';
import { makeDataFolder } from '../../api/support/services.js';

/** A server of its own with all it leans on, as processes that can be killed and started again. */
export interface Site {
  readonly address: string;
  /** The database seen from outside the server; opens anew after the database was killed. */
  readonly knex: Knex;
  readonly mailbox: TestMailbox;
  member(role: AccountRole, displayName: string): Promise<MemberAgent>;
  /** SIGKILL: no handler runs, nothing is finished. */
  killServer(): Promise<void>;
  startServer(): Promise<void>;
  isServerUp(): boolean;
  killDatabase(): Promise<void>;
  startDatabase(): Promise<void>;
  stop(): Promise<void>;
}

export async function startSite(): Promise<Site> {
  const dataDir = await makeDataFolder();
  const [dbPort, port] = [await freePort(), await freePort()];
  const [search, mailbox] = await Promise.all([
    startSearch({ dataDir, port: await freePort(), key: 'key-of-the-test-run', compiled: false }),
    startMailbox({
      dataDir,
      smtpPort: await freePort(),
      pagePort: await freePort(),
      compiled: false,
    }),
  ]);
  process.env['TEST_MAILBOX_URL'] = mailbox.pageUrl;
  let database = await startMariaDb({ dataDir, port: dbPort });
  const knex = openDatabase(database.url);
  await migrateToLatest(knex);

  const address = `http://127.0.0.1:${port}`;
  const environment = {
    ...process.env,
    NODE_ENV: 'production',
    PORT: String(port),
    PUBLIC_ADDRESS: address,
    DATABASE_URL: database.url,
    MEILI_HOST: search.url,
    MEILI_KEY: search.key,
    SMTP_URL: mailbox.url,
    PHOTO_DIR: join(dataDir, 'photos'),
    WEB_DIR: join(dataDir, 'no-pages'),
    SESSION_SECRET: 'a session secret for the tests only',
    LOG_LEVEL: 'warn',
  };
  let server: ChildProcess | undefined;
  const logFile = join(dataDir, 'server.log');

  const startServer = async (): Promise<void> => {
    const child = spawn(process.execPath, programArguments('server/main', false), {
      cwd: projectDir,
      env: environment,
      stdio: ['ignore', openSync(logFile, 'a'), openSync(logFile, 'a')],
    });
    server = child;
    const end = Date.now() + 60_000;
    while (!(await answers(`${address}/api/account/session`))) {
      if (child.exitCode !== null)
        throw new Error(`The server ended while starting:\n${readFileSync(logFile, 'utf8')}`);
      if (Date.now() > end) throw new Error('The server did not answer within 60 s.');
      await pause(50);
    }
  };
  const killServer = async (): Promise<void> => {
    const child = server;
    if (!child || child.exitCode !== null || child.signalCode !== null) return;
    const gone = new Promise((resolve) => child.once('exit', resolve));
    child.kill('SIGKILL');
    await gone;
  };
  const startDatabase = async (): Promise<void> => {
    database = await startMariaDb({ dataDir, port: dbPort });
  };
  await startServer();
  const cookies = await cookiesOfFirstVisit(address);

  return {
    address,
    knex,
    mailbox: openMailbox(),
    startServer,
    killServer,
    isServerUp: () => server?.exitCode === null && server.signalCode === null,
    startDatabase,
    killDatabase: () => kill(database),
    member: async (role, displayName) =>
      signIn(openAgent(address, cookies), await insertAccount(knex, role, displayName, new Date())),
    async stop() {
      await killServer();
      await knex.destroy();
      for (const service of [mailbox, search, database]) await service.stop();
      await rm(dataDir, { recursive: true, force: true });
    },
  };
}

async function kill(service: RunningService): Promise<void> {
  if (service.pid !== undefined) process.kill(service.pid, 'SIGKILL');
  await service.exited;
}

export function pause(milliseconds: number): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, milliseconds));
}

/** Asks again until `good` holds of the answer; throws after `seconds`. */
export async function until<T>(
  ask: () => Promise<T>,
  good: (answer: T) => boolean,
  seconds = 30,
): Promise<T> {
  const end = Date.now() + seconds * 1000;
  for (;;) {
    const answer = await ask();
    if (good(answer)) return answer;
    if (Date.now() > end)
      throw new Error(`Not so within ${seconds} s; the last answer: ${JSON.stringify(answer)}`);
    await pause(100);
  }
}
