import type { Request } from 'express';
import { taskStatuses, taskTypes } from '../tasks/task.js';
import type { TaskSelection } from '../tasks/task-store.js';
import { matchesIndex, type Caller } from './access.js';
import { ApiError } from './api-error.js';
import { indexUid, param } from './input.js';
import type { Surroundings } from './surroundings.js';

const lists = ['uids', 'batchUids', 'statuses', 'types', 'indexUids', 'canceledBy'] as const;
const times = [
  ['afterEnqueuedAt', 'enqueued_at', true],
  ['beforeEnqueuedAt', 'enqueued_at', false],
  ['afterStartedAt', 'started_at', true],
  ['beforeStartedAt', 'started_at', false],
  ['afterFinishedAt', 'finished_at', true],
  ['beforeFinishedAt', 'finished_at', false],
] as const;

export const selectionParams: readonly string[] = [...lists, ...times.map(([name]) => name)];
export const pageParams: readonly string[] = ['limit', 'from', 'reverse'];

const snakeCase = (name: string) => name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);

/** Which tasks the query string names; `*` names all. Throws invalid_task_<name>. */
export function selectionFrom(request: Request): TaskSelection {
  const numbers = (name: (typeof lists)[number]) =>
    listParam(request, name, (text) => (/^\d{1,15}$/.test(text) ? Number(text) : undefined));
  const among = (name: (typeof lists)[number], known: readonly string[]) =>
    listParam(request, name, (text) => known.find((each) => each.toLowerCase() === text.toLowerCase()));
  const chosen = times.flatMap(([name, column, after]) => {
    const text = param(request, name);
    if (text === undefined || text === '*') return [];
    const at = /^\d{4}-\d{2}-\d{2}/.test(text) ? new Date(text) : new Date(NaN);
    if (Number.isNaN(at.getTime())) {
      throw invalid(
        name,
        `\`${text.slice(0, 60)}\` is an invalid date-time. It should follow the YYYY-MM-DD or RFC 3339 date-time format.`,
      );
    }
    return [{ column, after, at: at.toISOString() }];
  });
  return defined({
    uids: numbers('uids'),
    batchUids: numbers('batchUids'),
    canceledBy: numbers('canceledBy'),
    statuses: among('statuses', taskStatuses),
    types: among('types', taskTypes),
    indexUids: listParam(request, 'indexUids', (text) => indexUid(text)),
    times: chosen,
  });
}

function listParam<Value>(
  request: Request,
  name: string,
  read: (text: string) => Value | undefined,
): Value[] | undefined {
  const text = param(request, name);
  if (text === undefined || text === '*') return undefined;
  return text.split(',').map((each) => {
    const value = read(each.trim());
    if (value === undefined) throw invalid(name, `\`${each.slice(0, 60)}\` is not a valid value.`);
    return value;
  });
}

const invalid = (name: string, reason: string) =>
  new ApiError(`invalid_task_${snakeCase(name)}`, `Invalid value in parameter \`${name}\`: ${reason}`);

function defined(selection: {
  [Name in keyof TaskSelection]: TaskSelection[Name] | undefined;
}): TaskSelection {
  return Object.fromEntries(Object.entries(selection).filter(([, value]) => value !== undefined));
}

/** Narrows a selection to indexes the caller may see; tasks without an index are for callers of all indexes. */
export function visibleTo(around: Surroundings, caller: Caller): Pick<TaskSelection, 'visibleIndexes'> {
  if (caller.indexes.includes('*')) return {};
  const met = around.tasks.indexUids();
  return {
    visibleIndexes: met.filter((uid) => caller.indexes.some((pattern) => matchesIndex(pattern, uid))),
  };
}
