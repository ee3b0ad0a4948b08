import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import type { WatchEntry, WatchSubject } from '../../../shared/contract/watches';
import { toApiProblem } from '../core/api-problem';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { BenchWatchChoice } from './bench-watch-choice';
import { WatchKeys } from './watch-keys';
import { Watches } from './watches';

const words: Record<WatchSubject, string> = {
  part: 'part',
  revision: 'revision',
  joint: 'joint',
  'write-up': 'write-up',
  question: 'question',
};

/** What one watches, and the end of it. */
@Component({
  selector: 'sl-my-watches-page',
  imports: [BenchWatchChoice, DatePipe, Icon, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h1>What you watch</h1>
    <p class="intro">
      When something happens on one of these, it stands in your <a routerLink="/notices">notices</a> and comes
      by mail as you chose in <a routerLink="/account/profile" fragment="mail">your account</a>.
    </p>
    <sl-bench-watch-choice />
    <ul class="sl-plain-list">
      @for (entry of items(); track entry.subject + entry.id) {
        <li>
          <div class="what">
            @if (entry.path && entry.name) {
              <a [routerLink]="entry.path">{{ entry.name }}</a>
            } @else {
              <span>No longer there</span>
            }
            <span class="sl-quiet sl-small"
              >{{ words[entry.subject] }}, since {{ entry.createdAt | date: 'yyyy-MM-dd' }}</span
            >
          </div>
          <button type="button" class="sl-bare-button" (click)="end(entry)">
            <sl-icon name="remove" />End<span class="sl-visually-hidden"> the watch on {{ entry.name }}</span>
          </button>
        </li>
      } @empty {
        @if (!busy() && !problem()) {
          <li class="nothing">
            Nothing yet. Open a part, one of its revisions, a joint, a write-up or a question and press
            <b>Watch</b>: you are told when somebody publishes, measures, tries or answers there.
            <a routerLink="/hardware">See all parts</a>
          </li>
        }
      }
    </ul>
    <sl-problem-note [problem]="problem()" [retryable]="true" (retry)="fetch()" />
    @if (busy()) {
      <p class="sl-quiet" role="status">Fetching …</p>
    } @else if (next()) {
      <button type="button" class="sl-plain-button" (click)="fetch()">Show more</button>
    }
  `,
  styles: `
    :host {
      display: block;
      max-inline-size: 48rem;
    }
    .intro {
      max-inline-size: var(--sl-measure);
    }
    ul {
      margin-block: 1rem;
      border-block-start: 1px solid var(--sl-ink);
    }
    li:not(.nothing) {
      display: flex;
      align-items: center;
      gap: 1rem;
      padding-block: 0.35rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    .nothing {
      max-inline-size: var(--sl-measure);
      padding-block: 1rem;
    }
    .what {
      display: grid;
      flex: 1;
      min-inline-size: 0;
    }
  `,
})
export class MyWatchesPage {
  private readonly watches = inject(Watches);
  private readonly keys = inject(WatchKeys);
  private readonly undo = inject(Undo);
  protected readonly words = words;
  protected readonly items = signal<readonly WatchEntry[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly busy = signal(true);
  protected readonly problem = signal<Problem | null>(null);

  constructor() {
    this.fetch();
  }

  protected fetch(): void {
    this.busy.set(true);
    this.problem.set(null);
    this.watches
      .mine(this.next() ?? undefined)
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: (page) => {
          this.items.update((items) => [...items, ...page.items]);
          this.next.set(page.next);
        },
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }

  protected async end(entry: WatchEntry): Promise<void> {
    const place = this.items().indexOf(entry);
    if (!(await this.set(entry, false))) return;
    this.items.update((items) => items.filter((other) => other !== entry));
    if (entry.name)
      this.undo.offer(`${entry.name} is no longer watched.`, () => void this.takeBack(entry, place));
    else this.undo.tell('The watch is ended.');
  }

  private async takeBack(entry: WatchEntry, place: number): Promise<void> {
    if (await this.set(entry, true)) this.items.update((items) => items.toSpliced(place, 0, entry));
  }

  private async set({ subject, id }: WatchEntry, watched: boolean): Promise<boolean> {
    this.problem.set(null);
    try {
      await this.keys.set(subject, id, watched);
      return true;
    } catch (error) {
      this.problem.set(toApiProblem(error).problem);
      return false;
    }
  }
}
