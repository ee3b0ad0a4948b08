import { setImmediate } from 'node:timers/promises';
import { ApiError } from '../http/api-error.js';
import type { Connection } from '../storage/connection.js';
import type { IndexCatalogue } from '../storage/index-catalogue.js';
import { performDocumentWork } from './document-tasks.js';
import { performIndexWork } from './index-tasks.js';
import type { Outcome, Task, TaskWork } from './task.js';
import type { NewTask, TaskStore } from './task-store.js';

/** What a task changed in the words held in memory; applied when its transaction is on the disk. */
export type AfterCommit = () => void;

export interface Done {
  readonly outcome: Outcome;
  readonly afterCommit?: AfterCommit;
}

/** Outcomes stay this long, since closing a task in the queue's own file may reach the disk later. */
const keptOutcomes = 1000;

/**
 * Does tasks one after another. A task's effect and its outcome are one transaction in the indexes' file; a task
 * that a crash left open is closed with that outcome, or done from the start if there is none.
 */
export class TaskRunner {
  private working: Promise<void> | undefined;
  private stopping = false;

  constructor(
    private readonly store: TaskStore,
    private readonly control: Connection,
    private readonly catalogue: IndexCatalogue,
    private readonly clock: () => Date,
  ) {
    this.closeWhatWasDone();
    this.wake();
  }

  /** Puts a task on the disk and sees that it gets done. */
  add(task: NewTask): Task {
    const uid = this.store.add(task, this.now());
    this.wake();
    const added = this.store.find(uid);
    if (!added) throw new Error(`Task ${uid} was not kept`);
    return added;
  }

  /** Resolves when the task in hand is done; waiting ones stay for the next start. */
  async stop(): Promise<void> {
    this.stopping = true;
    await this.working;
  }

  private wake(): void {
    if (this.working || this.stopping) return;
    this.working = this.workThrough().finally(() => {
      this.working = undefined;
    });
  }

  private async workThrough(): Promise<void> {
    await setImmediate();
    for (let next = this.store.next(); next && !this.stopping; next = this.store.next()) {
      await this.perform(next.task, next.work);
      await setImmediate();
    }
  }

  private async perform(task: Task, work: TaskWork): Promise<void> {
    this.store.start(task.uid, this.now());
    if (work.kind === 'cancelTasks' || work.kind === 'deleteTasks') {
      this.control.transaction(() => this.changeTasks(task.uid, work.kind, work.uids));
      return;
    }
    const { outcome, afterCommit } = await this.performOnIndexes(task, work);
    afterCommit?.();
    this.store.finish(task.uid, outcome, this.now());
  }

  private async performOnIndexes(task: Task, work: TaskWork): Promise<Done> {
    const { writer } = this.catalogue;
    try {
      return await writer.longTransaction(async () => {
        const around = { catalogue: this.catalogue, uid: task.indexUid ?? '', now: this.now() };
        const done = (await performDocumentWork(work, around)) ?? (await performIndexWork(work, around));
        if (!done) throw new Error(`Nobody does ${work.kind}`);
        writer.run('DELETE FROM outcomes WHERE task < ?', [task.uid - keptOutcomes]);
        writer.run('INSERT INTO outcomes VALUES (?, ?)', [task.uid, JSON.stringify(done.outcome)]);
        return done;
      });
    } catch (error) {
      const known =
        error instanceof ApiError
          ? error
          : new ApiError('internal', `The task could not be done: ${String(error)}`);
      return { outcome: { error: known.body } };
    }
  }

  private changeTasks(uid: number, kind: 'cancelTasks' | 'deleteTasks', uids: readonly number[]): void {
    const details =
      kind === 'cancelTasks'
        ? { canceledTasks: this.store.cancel(uids, uid, this.now()) }
        : { deletedTasks: this.store.remove(uids) };
    this.store.finish(uid, { details }, this.now());
  }

  private closeWhatWasDone(): void {
    const rows = this.catalogue.writer.all<{ task: number; outcome: string }>(
      'SELECT task, outcome FROM outcomes',
    );
    for (const { task, outcome } of rows) {
      const open = this.store.find(task);
      if (open?.status !== 'processing' && open?.status !== 'enqueued') continue;
      this.store.finish(task, JSON.parse(outcome) as Outcome, this.now());
    }
  }

  private now(): string {
    return this.clock().toISOString();
  }
}
