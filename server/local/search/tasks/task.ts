import type { ErrorBody } from '../http/api-error.js';

export type TaskStatus = 'enqueued' | 'processing' | 'succeeded' | 'failed' | 'canceled';

export const taskStatuses: readonly TaskStatus[] = [
  'enqueued',
  'processing',
  'succeeded',
  'failed',
  'canceled',
];

export const taskTypes = [
  'documentAdditionOrUpdate',
  'documentEdition',
  'documentDeletion',
  'settingsUpdate',
  'indexCreation',
  'indexDeletion',
  'indexUpdate',
  'indexSwap',
  'taskCancelation',
  'taskDeletion',
  'dumpCreation',
  'snapshotCreation',
  'upgradeDatabase',
  'indexCompaction',
] as const;
export type TaskType = (typeof taskTypes)[number];

export type Details = Readonly<Record<string, unknown>>;

/** What a task is to do; kept with it, so that it can be done after a crash. */
export type TaskWork =
  | {
      readonly kind: 'putDocuments';
      readonly merge: boolean;
      readonly skipCreation: boolean;
      readonly primaryKey: string | null;
      readonly documents: readonly Readonly<Record<string, unknown>>[];
    }
  | { readonly kind: 'removeDocuments'; readonly ids: readonly string[] }
  | { readonly kind: 'removeFiltered'; readonly filter: unknown }
  | { readonly kind: 'removeAllDocuments' }
  | {
      readonly kind: 'changeSettings';
      readonly change: Readonly<Record<string, unknown>>;
      readonly mayCreate: boolean;
    }
  | { readonly kind: 'createIndex'; readonly primaryKey: string | null }
  | { readonly kind: 'updateIndex'; readonly primaryKey?: string | null; readonly newUid?: string }
  | { readonly kind: 'deleteIndex' }
  | {
      readonly kind: 'swapIndexes';
      readonly swaps: readonly { readonly indexes: readonly [string, string]; readonly rename?: boolean }[];
    }
  | { readonly kind: 'compactIndex' }
  | { readonly kind: 'cancelTasks' | 'deleteTasks'; readonly uids: readonly number[] };

/** How a task ended. */
export interface Outcome {
  readonly details?: Details;
  readonly error?: ErrorBody;
}

export interface Task {
  readonly uid: number;
  readonly batchUid: number | null;
  readonly indexUid: string | null;
  readonly status: TaskStatus;
  readonly type: TaskType;
  readonly canceledBy: number | null;
  readonly details: Details;
  readonly error: ErrorBody | null;
  /** ISO 8601 duration, "PT0.012S". */
  readonly duration: string | null;
  readonly enqueuedAt: string;
  readonly startedAt: string | null;
  readonly finishedAt: string | null;
  readonly customMetadata?: string;
}
