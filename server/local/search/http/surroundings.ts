import type { Request, Response } from 'express';
import type { IndexCatalogue, IndexState } from '../storage/index-catalogue.js';
import type { NewTask, TaskStore } from '../tasks/task-store.js';
import type { TaskRunner } from '../tasks/task-runner.js';
import type { Access, Action, Caller } from './access.js';
import { indexNotFound } from './api-error.js';
import { indexUid, param, pathParam } from './input.js';
import type { KeyStore } from './key-store.js';

/** What the routes work with. */
export interface Surroundings {
  readonly catalogue: IndexCatalogue;
  readonly tasks: TaskStore;
  readonly runner: TaskRunner;
  readonly keys: KeyStore;
  readonly access: Access;
  readonly clock: () => Date;
}

/** The index named in the path, after the caller's rights to it were checked. It need not exist. */
export function uidInPath(
  around: Surroundings,
  request: Request,
  action: Action,
): { uid: string; caller: Caller } {
  const caller = around.access.caller(request, action);
  const uid = indexUid(pathParam(request, 'uid'));
  around.access.checkIndex(caller, uid);
  return { uid, caller };
}

/** As uidInPath, for routes that need the index to be there. Throws index_not_found. */
export function indexInPath(
  around: Surroundings,
  request: Request,
  action: Action,
): { index: IndexState; caller: Caller } {
  const { uid, caller } = uidInPath(around, request, action);
  const index = around.catalogue.find(uid);
  if (!index) throw indexNotFound(uid);
  return { index, caller };
}

/** Puts a task in the queue and answers 202 with its summary. */
export function enqueue(around: Surroundings, request: Request, response: Response, task: NewTask): void {
  const metadata = param(request, 'customMetadata');
  const added = around.runner.add(metadata === undefined ? task : { ...task, metadata });
  response.status(202).json({
    taskUid: added.uid,
    indexUid: added.indexUid,
    status: 'enqueued',
    type: added.type,
    enqueuedAt: added.enqueuedAt,
    ...(metadata === undefined ? {} : { customMetadata: metadata }),
  });
}
