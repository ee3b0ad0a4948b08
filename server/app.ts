import express, { type Express, type RequestHandler } from 'express';
import type { Knex } from 'knex';
import type { Meilisearch } from 'meilisearch';
import type { Transporter } from 'nodemailer';
import type { Logger } from 'pino';
import { routes } from '../shared/contract/routes.js';
import type { RouteDefinition } from '../shared/contract/route.js';
import type { Settings } from './config.js';
import type { RouteBinding } from './http/binding.js';
import { createCsrf } from './http/csrf.js';
import { mountRoutes } from './http/mount.js';
import { nothingHere, problemHandler } from './http/problem-handler.js';
import { requestLog } from './http/request-log.js';
import { securityHeaders } from './http/security-headers.js';
import { createSessions } from './http/session.js';

/** All that comes from outside; tests hand in their own. */
export interface Surroundings {
  readonly settings: Settings;
  readonly knex: Knex;
  readonly logger: Logger;
  readonly search: Meilisearch;
  readonly mailTransport: Transporter;
  readonly clock: () => Date;
  /** Off in tests that are not about them. */
  readonly rateLimits: boolean;
  /** Serves the built client's files and rendered pages; absent where only the API is wanted. */
  readonly pages?: RequestHandler[];
}

/** Something that works beside the requests. */
export interface Worker {
  start(): void;
  /** Resolves when the piece of work in hand is done. */
  stop(): Promise<void>;
}

export interface Composition {
  readonly app: Express;
  readonly workers: readonly Worker[];
}

/** Makes every store, service and router, and hands each what it needs. */
export function createApp(around: Surroundings): Composition {
  const { settings, knex } = around;
  const secure = settings.PUBLIC_ADDRESS.startsWith('https:');
  const csrf = createCsrf({ secret: settings.SESSION_SECRET, secure });

  const bindings: RouteBinding[] = [];
  const workers: Worker[] = [];

  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', settings.TRUST_PROXY);
  app.use(requestLog(around.logger), ...securityHeaders({ secure }));
  return { app, workers };
}
