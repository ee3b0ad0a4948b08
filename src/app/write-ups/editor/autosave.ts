import { signal } from '@angular/core';
import {
  EMPTY,
  Subject,
  catchError,
  concatMap,
  debounceTime,
  defer,
  finalize,
  map,
  merge,
  tap,
  type Observable,
  type Subscription,
} from 'rxjs';
import type { FieldProblem, Problem } from '../../../../shared/contract/problem';
import type { Draft } from '../../../../shared/contract/write-ups';
import type { EditionText } from '../../../../shared/editions/edition-text';

export type SaveState =
  | { kind: 'saved'; at: Date }
  | { kind: 'waiting' }
  | { kind: 'saving' }
  /** All but what is named, which cannot be saved as it is. */
  | { kind: 'partly-saved'; at: Date; heldBack: readonly FieldProblem[] }
  | { kind: 'not-saved'; why: Problem; triesAgain: boolean }
  /** Somebody else, or another tab, saved in the meantime; nothing is sent until `continueFrom`. */
  | { kind: 'moved-on'; theirs: Draft };

/** What a save came to, with what was left out of it. */
export interface Saved {
  draft: Draft;
  heldBack: readonly FieldProblem[];
}

export interface AutosaveOptions {
  /** Sends the text with the version that it was built on. Errors carry a `problem`. */
  save(text: EditionText, version: number): Observable<Saved>;
  problemOf(error: unknown): Problem;
  saved?(draft: Draft): void;
}

/** Pause in typing after which a save starts, in milliseconds. */
export const savePause = 800;
const firstRetry = 5_000;
const longestRetry = 60_000;

/**
 * Saves a text as it is typed: after a pause, one save at a time, always the latest text, each built on the version the
 * one before it made. A save that failed for a reason that may pass is tried again after 5 s, 10 s … 60 s.
 */
export class Autosave {
  readonly state;
  private readonly changes = new Subject<void>();
  private readonly calls = new Subject<() => void>();
  private readonly running: Subscription;
  private pending: EditionText | null = null;
  private version: number;
  private retryWait = firstRetry;
  private retry: ReturnType<typeof setTimeout> | undefined;

  constructor(
    private readonly options: AutosaveOptions,
    opened: { version: number; at: Date },
  ) {
    this.version = opened.version;
    this.state = signal<SaveState>({ kind: 'saved', at: opened.at });
    const pauses = this.changes.pipe(
      debounceTime(savePause),
      map(() => () => undefined),
    );
    this.running = merge(pauses, this.calls)
      .pipe(concatMap((done) => this.saveLatest().pipe(finalize(done))))
      .subscribe();
  }

  /** Takes the text as it stands now. */
  note(text: EditionText): void {
    this.pending = text;
    if (this.state().kind === 'moved-on') return;
    if (this.state().kind !== 'saving') this.state.set({ kind: 'waiting' });
    this.changes.next();
  }

  /** Saves at once what waits. Resolves to whether everything that was typed is on the server. */
  flush(): Promise<boolean> {
    return new Promise((resolve) => {
      this.calls.next(() => resolve(this.isSettled()));
    });
  }

  isSettled(): boolean {
    return this.pending === null && this.state().kind === 'saved';
  }

  /** The version that the server has, as far as is known here. */
  currentVersion(): number {
    return this.version;
  }

  /** Goes on with a text that was merged with what is on the server at `version`. */
  continueFrom(version: number, text: EditionText): void {
    this.version = version;
    this.state.set({ kind: 'waiting' });
    this.note(text);
  }

  /** Takes a version that another call than a save has made, such as a recall from the desk. */
  adopt(draft: Draft): void {
    this.version = draft.version;
  }

  stop(): void {
    clearTimeout(this.retry);
    this.running.unsubscribe();
  }

  private saveLatest(): Observable<unknown> {
    return defer(() => {
      const text = this.pending;
      if (text === null || this.state().kind === 'moved-on') return EMPTY;
      clearTimeout(this.retry);
      this.pending = null;
      this.state.set({ kind: 'saving' });
      return this.options.save(text, this.version).pipe(
        tap((saved) => this.arrived(saved)),
        catchError((error: unknown) => {
          this.failed(this.options.problemOf(error), text);
          return EMPTY;
        }),
      );
    });
  }

  private arrived({ draft, heldBack }: Saved): void {
    this.version = draft.version;
    this.retryWait = firstRetry;
    const at = new Date(draft.updatedAt);
    if (this.pending !== null) this.state.set({ kind: 'waiting' });
    else this.state.set(heldBack.length > 0 ? { kind: 'partly-saved', at, heldBack } : { kind: 'saved', at });
    this.options.saved?.(draft);
  }

  private failed(problem: Problem, text: EditionText): void {
    this.pending ??= text;
    if (problem.type.endsWith('/edition-moved-on') && problem.status === 412) {
      this.state.set({ kind: 'moved-on', theirs: problem.current as Draft });
      return;
    }
    const triesAgain = mayPass(problem.status);
    this.state.set({ kind: 'not-saved', why: problem, triesAgain });
    if (!triesAgain) return;
    this.retry = setTimeout(() => this.calls.next(() => undefined), this.retryWait);
    this.retryWait = Math.min(this.retryWait * 2, longestRetry);
  }
}

/** No answer, too many requests, or the server's own trouble. */
function mayPass(status: number): boolean {
  return status === 0 || status === 429 || status >= 500;
}
