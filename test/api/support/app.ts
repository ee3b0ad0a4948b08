import { mkdtemp, rm } from 'node:fs/promises';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Express } from 'express';
import type { Knex } from 'knex';
import { Meilisearch } from 'meilisearch';
import { createTransport } from 'nodemailer';
import { pino, type Logger } from 'pino';
import { createApp } from '../../../server/app.js';
import { readSettings } from '../../../server/config.js';
import { ensureSearchIndex } from '../../../server/search/index-settings.js';
import type { Worker } from '../../../server/worker.js';
import type { AccountRole } from '../../../shared/contract/vocabulary.js';
import {
  cookiesOfFirstVisit,
  insertAccount,
  openAgent,
  signIn,
  type Agent,
  type MemberAgent,
} from './agents.js';
import { openEmptyDatabase } from './database.js';
import { fromSetUp, workerNumber } from './environment.js';
import { openMailbox, type TestMailbox } from './mailbox.js';

export type { Agent, MemberAgent } from './agents.js';

export interface TestApp {
  readonly app: Express;
  readonly knex: Knex;
  /** `http://127.0.0.1:<port>` */
  readonly url: string;
  /** Mail and search work; a second `start` does nothing. Asking the mailbox to wait starts them. */
  readonly workers: readonly Worker[];
  readonly mailbox: TestMailbox;
  readonly photoDir: string;
  /** A browser without an account that has opened the site. */
  visitor(): Agent;
  /** A new account of that role, signed in. */
  as(role: AccountRole): Promise<MemberAgent>;
  /** A new member of that display name, signed in. */
  memberNamed(displayName: string): Promise<MemberAgent>;
  close(): Promise<void>;
}

/**
 * The whole API on an empty schema of this vitest worker, listening on a free port. Only one at a time: starting a
 * second one empties the tables of the first. `search` makes an empty search index and starts the workers that fill it.
 */
export async function startTestApp(
  options: { rateLimits?: boolean; search?: boolean; clock?: () => Date; logger?: Logger } = {},
): Promise<TestApp> {
  const clock = options.clock ?? (() => new Date());
  const { knex, url: databaseUrl } = await openEmptyDatabase();
  const photoDir = await mkdtemp(join(tmpdir(), 'shimlore-photos-'));
  const server = createServer();
  await new Promise<void>((listening) => server.listen(0, '127.0.0.1', listening));
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const settings = readSettings({
    NODE_ENV: 'test',
    PUBLIC_ADDRESS: url,
    DATABASE_URL: databaseUrl,
    MEILI_HOST: fromSetUp('TEST_MEILI_HOST'),
    MEILI_KEY: fromSetUp('TEST_MEILI_KEY'),
    SMTP_URL: fromSetUp('TEST_SMTP_URL'),
    SEARCH_INDEX: `write-ups-${workerNumber}`,
    PHOTO_DIR: photoDir,
    DUMP_DIR: join(photoDir, 'dump'),
    SESSION_SECRET: 'a session secret for the tests only',
    BOUNCE_SECRET: 'a bounce secret for the tests only',
    LOG_LEVEL: process.env['LOG_LEVEL'] ?? 'silent',
  });
  const search = new Meilisearch({
    host: settings.MEILI_HOST,
    ...(settings.MEILI_KEY ? { apiKey: settings.MEILI_KEY } : {}),
  });
  const mailTransport = createTransport(settings.SMTP_URL);
  const composition = createApp({
    settings,
    knex,
    search,
    mailTransport,
    clock,
    logger: options.logger ?? pino({ level: settings.LOG_LEVEL }),
    rateLimits: options.rateLimits ?? false,
  });
  server.on('request', composition.app);

  const workers = composition.workers.map(startedOnce);
  const startWorkers = () => workers.forEach((worker) => worker.start());
  if (options.search) {
    await search.index(settings.SEARCH_INDEX).delete().waitTask();
    await ensureSearchIndex(search, settings.SEARCH_INDEX);
    startWorkers();
  }
  const visitorCookies = await cookiesOfFirstVisit(url);
  const newMember = async (role: AccountRole, displayName: string): Promise<MemberAgent> =>
    signIn(openAgent(url, visitorCookies), await insertAccount(knex, role, displayName, clock()));

  return {
    app: composition.app,
    knex,
    url,
    workers,
    photoDir,
    mailbox: openMailbox(startWorkers),
    visitor: () => openAgent(url, visitorCookies),
    as: (role) => newMember(role, `Test ${role}`),
    memberNamed: (displayName) => newMember('member', displayName),
    async close() {
      await Promise.all(workers.map((worker) => worker.stop()));
      server.closeAllConnections();
      await new Promise((closed) => server.close(closed));
      mailTransport.close();
      await knex.destroy();
      await rm(photoDir, { recursive: true, force: true });
    },
  };
}

function startedOnce(worker: Worker): Worker {
  let started = false;
  return {
    start() {
      if (!started) worker.start();
      started = true;
    },
    stop: async () => (started ? worker.stop() : undefined),
  };
}
