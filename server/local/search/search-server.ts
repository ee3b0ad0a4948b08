import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import express, { type ErrorRequestHandler, type Express } from 'express';
import { Access } from './http/access.js';
import { ApiError } from './http/api-error.js';
import { documentRoutes } from './http/documents.routes.js';
import { indexRoutes } from './http/indexes.routes.js';
import { KeyStore } from './http/key-store.js';
import { keyRoutes } from './http/keys.routes.js';
import { searchRoutes } from './http/search.routes.js';
import { settingsRoutes } from './http/settings.routes.js';
import { systemRoutes } from './http/system.routes.js';
import { taskRoutes } from './http/tasks.routes.js';
import { Connection } from './storage/connection.js';
import { IndexCatalogue } from './storage/index-catalogue.js';
import { TaskRunner } from './tasks/task-runner.js';
import { TaskStore } from './tasks/task-store.js';

export interface SearchServerSettings {
  /** Folder of the two database files; made where it is missing. One server at a time per folder. */
  readonly dataDir: string;
  /** Without one, everybody may do everything. */
  readonly masterKey?: string | undefined;
  readonly clock?: () => Date;
  /** Told of errors that were answered with 500. */
  readonly onError?: (error: unknown) => void;
}

export interface SearchServer {
  readonly app: Express;
  /** Lets the task in hand finish and closes the files. Close the listening socket first. */
  close(): Promise<void>;
}

const largestBody = '200mb';

/** A server that answers the REST calls of the `meilisearch` SDK that the product uses, with SQLite behind it. */
export function createSearchServer(settings: SearchServerSettings): SearchServer {
  const { dataDir, clock = () => new Date() } = settings;
  const masterKey = settings.masterKey === '' ? undefined : settings.masterKey;
  mkdirSync(dataDir, { recursive: true });
  const control = new Connection(join(dataDir, 'control.db'));
  const catalogue = new IndexCatalogue(dataDir);
  const tasks = new TaskStore(control);
  const keys = new KeyStore(control, masterKey, clock);
  const access = new Access(keys, masterKey, clock);
  const runner = new TaskRunner(tasks, control, catalogue, clock);
  const around = { catalogue, tasks, runner, keys, access, clock };

  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.use(express.raw({ type: () => true, limit: largestBody }));
  app.use(systemRoutes(around), indexRoutes(around), settingsRoutes(around), documentRoutes(around));
  app.use(searchRoutes(around), taskRoutes(around), keyRoutes(around));
  app.use((request) => {
    throw new ApiError(
      'not_found',
      `The local search server has no ${request.method} ${request.path.slice(0, 200)}.`,
    );
  });
  app.use(answerErrors(settings.onError ?? (() => undefined)));
  return {
    app,
    async close() {
      await runner.stop();
      catalogue.close();
      control.close();
    },
  };
}

function answerErrors(onError: (error: unknown) => void): ErrorRequestHandler {
  return (error: unknown, _request, response, next) => {
    if (response.headersSent) {
      next(error);
      return;
    }
    const known = error instanceof ApiError ? error : refusedByExpress(error);
    if (!known) onError(error);
    const answer = known ?? new ApiError('internal', 'The local search server failed. Its output says why.');
    response.status(answer.status).json(answer.body);
  };
}

/** Bodies too large or cut off, and paths that cannot be decoded, are refused before they reach a route. */
function refusedByExpress(error: unknown): ApiError | undefined {
  const status = typeof error === 'object' && error !== null && 'status' in error ? error.status : undefined;
  if (status === 413)
    return new ApiError(
      'payload_too_large',
      `The provided payload reached the size limit of ${largestBody}.`,
    );
  if (typeof status !== 'number' || status < 400 || status > 499) return undefined;
  return new ApiError(
    'bad_request',
    error instanceof Error ? error.message.slice(0, 200) : 'The request cannot be read.',
  );
}
