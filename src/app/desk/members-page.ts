import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { Subject, debounceTime, merge, startWith, switchMap } from 'rxjs';
import type { MemberRow } from '../../../shared/contract/members';
import { statesOf } from '../core/load';
import type { Problem } from '../../../shared/contract/problem';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { toApiProblem } from '../core/api-problem';
import { DeskTabs } from './desk-tabs';
import { limitWords } from './limit-words';
import { Members } from './members';

/** Members by name, the newest first, with what holds on each. */
@Component({
  selector: 'sl-members-page',
  imports: [DatePipe, DeskTabs, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h1>Members</h1>
    <sl-desk-tabs />
    <form [formGroup]="asked" role="search" (submit)="$event.preventDefault()">
      <label for="member-words">Name</label>
      <input id="member-words" class="sl-field" type="search" maxlength="100" formControlName="words" />
      <label class="check">
        <input type="checkbox" formControlName="limited" />
        <span>only those on whom a limit holds</span>
      </label>
    </form>
    <ul class="sl-plain-list" aria-label="Members">
      @for (row of rows(); track row.id) {
        <li>
          <a [routerLink]="['/desk/members', row.id]">{{ row.displayName }}</a>
          <span class="sl-quiet">{{ row.role }} since {{ row.createdAt | date: 'd MMM y' }}</span>
          @if (row.limit; as limit) {
            <span class="limit">{{ words(limit) }}</span>
          }
        </li>
      } @empty {
        @if (!busy() && !problem()) {
          <li class="sl-quiet">Nobody like that.</li>
        }
      }
    </ul>
    @if (problem(); as problem) {
      <sl-problem-note [problem]="problem" [retryable]="true" (retry)="again.next()" />
    }
    @if (busy()) {
      <p class="sl-quiet" role="status">Fetching …</p>
    } @else if (next()) {
      <button type="button" class="sl-plain-button" (click)="more()">Show more</button>
    }
  `,
  styles: `
    form {
      display: grid;
      gap: 0.2rem;
      max-inline-size: 24rem;
      margin-block-end: 1.25rem;
    }
    form > label:first-child {
      font-weight: 600;
    }
    .check {
      display: flex;
      align-items: center;
      gap: 0.6rem;
      min-block-size: 2.75rem;
      cursor: pointer;
    }
    ul {
      border-block-start: 1px solid var(--sl-ink);
      margin-block-end: 1rem;
    }
    li {
      display: flex;
      flex-wrap: wrap;
      align-items: baseline;
      gap: 0.1rem 1.5rem;
      padding-block: 0.6rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    li a {
      font-weight: 600;
    }
    .limit {
      color: var(--sl-danger);
      font-weight: 600;
    }
    @media (min-width: 60rem) {
      li {
        display: grid;
        grid-template-columns: minmax(0, 20rem) 16rem minmax(0, 1fr);
      }
    }
  `,
})
export class MembersPage {
  private readonly members = inject(Members);
  protected readonly words = limitWords;
  protected readonly asked = new FormGroup({
    words: new FormControl('', { nonNullable: true }),
    limited: new FormControl(false, { nonNullable: true }),
  });
  protected readonly rows = signal<readonly MemberRow[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly busy = signal(true);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly again = new Subject<void>();

  constructor() {
    merge(this.asked.valueChanges.pipe(debounceTime(200)), this.again)
      .pipe(
        startWith(null),
        switchMap(() => statesOf(this.page())),
        takeUntilDestroyed(),
      )
      .subscribe((now) => {
        this.busy.set(now.state === 'loading');
        this.problem.set(now.state === 'failed' ? now.problem : null);
        if (now.state !== 'ready') return;
        this.rows.set(now.value.items);
        this.next.set(now.value.next);
      });
  }

  protected more(): void {
    this.busy.set(true);
    this.problem.set(null);
    this.page(this.next() ?? undefined).subscribe({
      next: ({ items, next }) => {
        this.busy.set(false);
        this.rows.update((rows) => [...rows, ...items]);
        this.next.set(next);
      },
      error: (error: unknown) => {
        this.busy.set(false);
        this.problem.set(toApiProblem(error).problem);
      },
    });
  }

  private page(cursor?: string) {
    const { words, limited } = this.asked.getRawValue();
    return this.members.list(words.trim(), limited, cursor);
  }
}
