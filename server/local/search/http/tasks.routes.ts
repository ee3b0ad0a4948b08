import { Router, type Request } from 'express';
import type { Task } from '../tasks/task.js';
import type { Caller } from './access.js';
import { ApiError } from './api-error.js';
import { countParam, onlyParams, param, pathParam } from './input.js';
import { enqueue, type Surroundings } from './surroundings.js';
import { pageParams, selectionFrom, selectionParams, visibleTo } from './task-selection.js';

/** Tasks and batches: listing, one by one, cancelling, deleting. A batch holds exactly one task here. */
export function taskRoutes(around: Surroundings): Router {
  const router = Router();
  const { access, tasks } = around;

  const listed = (request: Request) => {
    const caller = access.caller(request, 'tasks.get');
    onlyParams(request, [...selectionParams, ...pageParams]);
    const selection = { ...selectionFrom(request), ...visibleTo(around, caller) };
    const limit = countParam(request, 'limit', 'invalid_task_limit', 20);
    const from =
      param(request, 'from') === undefined ? undefined : countParam(request, 'from', 'invalid_task_from', 0);
    const reverse = param(request, 'reverse') === 'true';
    const found = tasks.list(selection, {
      limit: limit + 1,
      reverse,
      ...(from === undefined ? {} : { from }),
    });
    const results = found.slice(0, limit);
    const next = found[limit]?.uid ?? null;
    return { results, total: tasks.count(selection), limit, from: results[0]?.uid ?? null, next };
  };

  router.get('/tasks', (request, response) => {
    response.json(listed(request));
  });

  router.get('/tasks/:id', (request, response) => {
    response.json(oneTask(around, access.caller(request, 'tasks.get'), pathParam(request, 'id')));
  });

  router.get('/batches', (request, response) => {
    const { results, ...paging } = listed(request);
    response.json({ ...paging, results: results.filter(({ batchUid }) => batchUid !== null).map(batchOf) });
  });

  router.get('/batches/:id', (request, response) => {
    const caller = access.caller(request, 'tasks.get');
    const id = pathParam(request, 'id');
    if (!/^\d{1,15}$/.test(id))
      throw new ApiError('invalid_batch_uid', `Invalid batch uid \`${id}\`: expected a positive integer`);
    const [task] = tasks.list(
      { batchUids: [Number(id)], ...visibleTo(around, caller) },
      { limit: 1, reverse: false },
    );
    if (!task) throw new ApiError('batch_not_found', `Batch \`${id}\` not found.`);
    response.json(batchOf(task));
  });

  const changing = (action: 'tasks.cancel' | 'tasks.delete') => (request: Request) => {
    const caller = access.caller(request, action);
    onlyParams(request, selectionParams);
    if (Object.keys(request.query).length === 0) {
      const names = selectionParams.map((name) => `\`${name}\``).join(', ');
      throw new ApiError(
        'missing_task_filters',
        `Query parameters to filter the tasks are missing. Available query parameters are: ${names}.`,
      );
    }
    const uids = tasks.uidsOf({ ...selectionFrom(request), ...visibleTo(around, caller) });
    const originalFilter = request.originalUrl.slice(request.originalUrl.indexOf('?'));
    return { uids, details: { matchedTasks: uids.length, originalFilter } };
  };

  router.post('/tasks/cancel', (request, response) => {
    const { uids, details } = changing('tasks.cancel')(request);
    enqueue(around, request, response, {
      indexUid: null,
      type: 'taskCancelation',
      work: { kind: 'cancelTasks', uids },
      details: { ...details, canceledTasks: null },
    });
  });

  router.delete('/tasks', (request, response) => {
    const { uids, details } = changing('tasks.delete')(request);
    enqueue(around, request, response, {
      indexUid: null,
      type: 'taskDeletion',
      work: { kind: 'deleteTasks', uids },
      details: { ...details, deletedTasks: null },
    });
  });

  return router;
}

function oneTask(around: Surroundings, caller: Caller, id: string): Task {
  if (!/^\d{1,15}$/.test(id))
    throw new ApiError('invalid_task_uid', `Invalid task uid \`${id}\`: expected a positive integer`);
  const [task] = around.tasks.list(
    { uids: [Number(id)], ...visibleTo(around, caller) },
    { limit: 1, reverse: false },
  );
  if (!task) throw new ApiError('task_not_found', `Task \`${id}\` not found.`);
  return task;
}

function batchOf(task: Task) {
  const isOpen = task.finishedAt === null;
  return {
    uid: task.batchUid,
    progress: isOpen
      ? { steps: [{ currentStep: 'processing tasks', finished: 0, total: 1 }], percentage: 0 }
      : null,
    details: task.details,
    stats: {
      totalNbTasks: 1,
      status: { [task.status]: 1 },
      types: { [task.type]: 1 },
      indexUids: task.indexUid === null ? {} : { [task.indexUid]: 1 },
    },
    duration: task.duration,
    startedAt: task.startedAt,
    finishedAt: task.finishedAt,
    batchStrategy: 'every batch holds one task',
  };
}
