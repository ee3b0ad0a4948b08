import type { Connection, SqlValue } from '../storage/connection.js';
import type { Details, Outcome, Task, TaskStatus, TaskType, TaskWork } from './task.js';

interface TaskRow {
  uid: number;
  index_uid: string | null;
  status: TaskStatus;
  type: TaskType;
  canceled_by: number | null;
  details: string;
  error: string | null;
  batch: number | null;
  enqueued_at: string;
  started_at: string | null;
  finished_at: string | null;
  metadata: string | null;
}

/** Which tasks are meant; an absent list means any. Times are ISO texts. */
export interface TaskSelection {
  readonly uids?: readonly number[];
  readonly batchUids?: readonly number[];
  readonly statuses?: readonly string[];
  readonly types?: readonly string[];
  readonly indexUids?: readonly string[];
  readonly canceledBy?: readonly number[];
  readonly times?: readonly {
    readonly column: 'enqueued_at' | 'started_at' | 'finished_at';
    readonly after: boolean;
    readonly at: string;
  }[];
  /** Tasks on other indexes are out of sight of the caller. */
  readonly visibleIndexes?: readonly string[];
}

export interface NewTask {
  readonly indexUid: string | null;
  readonly type: TaskType;
  readonly work: TaskWork;
  readonly details: Details;
  readonly metadata?: string;
}

const columns =
  'uid, index_uid, status, type, canceled_by, details, error, batch, enqueued_at, started_at, finished_at, metadata';

/** The queue on disk: a task that was added is there after any crash. */
export class TaskStore {
  constructor(private readonly connection: Connection) {
    connection.exec(`
      CREATE TABLE IF NOT EXISTS tasks (
        uid INTEGER PRIMARY KEY AUTOINCREMENT, index_uid TEXT, status TEXT NOT NULL, type TEXT NOT NULL,
        canceled_by INTEGER, details TEXT NOT NULL, error TEXT, work TEXT, batch INTEGER, enqueued_at TEXT NOT NULL,
        started_at TEXT, finished_at TEXT, metadata TEXT);
      CREATE INDEX IF NOT EXISTS tasks_status ON tasks (status, uid);
    `);
  }

  add(task: NewTask, now: string): number {
    const { lastRow } = this.connection.run(
      `INSERT INTO tasks (index_uid, status, type, details, work, enqueued_at, metadata)
       VALUES (?, 'enqueued', ?, ?, ?, ?, ?)`,
      [
        task.indexUid,
        task.type,
        JSON.stringify(task.details),
        JSON.stringify(task.work),
        now,
        task.metadata ?? null,
      ],
    );
    return lastRow;
  }

  /** The task to do next: cancelations first, then in the order of arrival. */
  next(): { task: Task; work: TaskWork } | undefined {
    const row = this.connection.first<TaskRow & { work: string }>(
      `SELECT ${columns}, work FROM tasks WHERE status IN ('enqueued', 'processing')
       ORDER BY type = 'taskCancelation' DESC, uid LIMIT 1`,
    );
    return row && { task: taskOf(row), work: JSON.parse(row.work) as TaskWork };
  }

  start(uid: number, now: string): void {
    this.connection.run(
      `UPDATE tasks SET status = 'processing', started_at = ?,
         batch = coalesce(batch, (SELECT coalesce(max(batch), -1) + 1 FROM tasks)) WHERE uid = ?`,
      [now, uid],
    );
  }

  /** Closes a task. What it was to do is let go, it can be large. */
  finish(uid: number, outcome: Outcome, now: string): void {
    const { error = null } = outcome;
    this.connection.run(
      `UPDATE tasks SET status = ?, error = ?, details = json_patch(details, ?), finished_at = ?, work = NULL
       WHERE uid = ?`,
      [
        error ? 'failed' : 'succeeded',
        error && JSON.stringify(error),
        JSON.stringify(outcome.details ?? {}),
        now,
        uid,
      ],
    );
  }

  find(uid: number): Task | undefined {
    const row = this.connection.first<TaskRow>(`SELECT ${columns} FROM tasks WHERE uid = ?`, [uid]);
    return row && taskOf(row);
  }

  count(selection: TaskSelection): number {
    const { text, values } = where(selection);
    return (
      this.connection.first<{ n: number }>(`SELECT count(*) AS n FROM tasks WHERE ${text}`, values)?.n ?? 0
    );
  }

  list(selection: TaskSelection, page: { from?: number; limit: number; reverse: boolean }): Task[] {
    const { text, values } = where(selection);
    const [sign, order] = page.reverse ? ['>=', 'ASC'] : ['<=', 'DESC'];
    const from = page.from === undefined ? '' : `AND uid ${sign} ?`;
    return this.connection
      .all<TaskRow>(`SELECT ${columns} FROM tasks WHERE ${text} ${from} ORDER BY uid ${order} LIMIT ?`, [
        ...values,
        ...(page.from === undefined ? [] : [page.from]),
        page.limit,
      ])
      .map(taskOf);
  }

  uidsOf(selection: TaskSelection): number[] {
    const { text, values } = where(selection);
    return this.connection
      .all<{ uid: number }>(`SELECT uid FROM tasks WHERE ${text}`, values)
      .map(({ uid }) => uid);
  }

  /** Cancels those that wait; answers how many. */
  cancel(uids: readonly number[], by: number, now: string): number {
    return this.connection.run(
      `UPDATE tasks SET status = 'canceled', canceled_by = ?, finished_at = ?, work = NULL
       WHERE status = 'enqueued' AND uid <> ? AND uid IN (SELECT value FROM json_each(?))`,
      [by, now, by, JSON.stringify(uids)],
    ).changes;
  }

  /** Takes finished ones out of the list; answers how many. */
  remove(uids: readonly number[]): number {
    return this.connection.run(
      `DELETE FROM tasks WHERE status NOT IN ('enqueued', 'processing') AND uid IN (SELECT value FROM json_each(?))`,
      [JSON.stringify(uids)],
    ).changes;
  }

  /** Names of all indexes that tasks are about. */
  indexUids(): string[] {
    return this.connection
      .all<{ uid: string }>('SELECT DISTINCT index_uid AS uid FROM tasks WHERE index_uid IS NOT NULL')
      .map(({ uid }) => uid);
  }

  lastFinished(): string | null {
    return (
      this.connection.first<{ at: string | null }>('SELECT max(finished_at) AS at FROM tasks')?.at ?? null
    );
  }

  isBusy(indexUid: string): boolean {
    return this.count({ statuses: ['processing'], indexUids: [indexUid] }) > 0;
  }
}

function where(selection: TaskSelection): { text: string; values: SqlValue[] } {
  const tests = ['1'];
  const values: SqlValue[] = [];
  const among = (column: string, list: readonly (string | number)[] | undefined) => {
    if (!list) return;
    tests.push(`${column} IN (SELECT value FROM json_each(?))`);
    values.push(JSON.stringify(list));
  };
  among('uid', selection.uids);
  among('batch', selection.batchUids);
  among('status', selection.statuses);
  among('type', selection.types);
  among('index_uid', selection.indexUids);
  among('canceled_by', selection.canceledBy);
  among('index_uid', selection.visibleIndexes);
  for (const { column, after, at } of selection.times ?? []) {
    tests.push(`${column} ${after ? '>' : '<'} ?`);
    values.push(at);
  }
  return { text: tests.join(' AND '), values };
}

function taskOf(row: TaskRow): Task {
  return {
    uid: row.uid,
    batchUid: row.batch,
    indexUid: row.index_uid,
    status: row.status,
    type: row.type,
    canceledBy: row.canceled_by,
    details: JSON.parse(row.details) as Details,
    error: row.error === null ? null : (JSON.parse(row.error) as Task['error']),
    duration: row.started_at && row.finished_at ? durationBetween(row.started_at, row.finished_at) : null,
    enqueuedAt: row.enqueued_at,
    startedAt: row.started_at,
    finishedAt: row.finished_at,
    ...(row.metadata === null ? {} : { customMetadata: row.metadata }),
  };
}

function durationBetween(start: string, end: string): string {
  return `PT${Math.max(0, (Date.parse(end) - Date.parse(start)) / 1000)}S`;
}
