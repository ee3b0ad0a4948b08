import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import {
  Subject,
  catchError,
  debounceTime,
  distinctUntilChanged,
  map,
  merge,
  of,
  startWith,
  switchMap,
  tap,
} from 'rxjs';
import type { AccountRow } from '../../../shared/contract/accounts';
import type { Problem } from '../../../shared/contract/problem';
import { AccountRole } from '../../../shared/contract/vocabulary';
import { toApiProblem } from '../core/api-problem';
import { Session } from '../core/session';
import { Confirm } from '../ui/confirm/confirm';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { AdminTabs } from './admin-tabs';
import { People } from './people';

/** What each role may do, for the question before it is given. */
const roleMeans: Record<AccountRole, string> = {
  member: 'may write, report trials and keep a bench',
  maker: 'may do what members may, and speaks for a maker',
  moderator: 'may place cautions, publish and give back whatever is on the desk',
  administrator: 'may do everything, and give roles',
};

/** Accounts, newest first; roles are changed here. */
@Component({
  selector: 'sl-accounts-page',
  imports: [AdminTabs, DatePipe, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './accounts-page.html',
  styleUrl: './accounts-page.scss',
})
export class AccountsPage {
  private readonly people = inject(People);
  private readonly confirm = inject(Confirm);
  private readonly undo = inject(Undo);
  protected readonly own = inject(Session).account;
  protected readonly roles = AccountRole.options;
  protected readonly words = new FormControl('', { nonNullable: true });
  protected readonly rows = signal<readonly AccountRow[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly busy = signal(true);
  protected readonly problem = signal<Problem | null>(null);
  private readonly again = new Subject<void>();

  constructor() {
    const typed = this.words.valueChanges.pipe(
      debounceTime(200),
      map((words) => words.trim()),
      distinctUntilChanged(),
      startWith(''),
    );
    merge(typed, this.again)
      .pipe(
        tap(() => this.started()),
        switchMap(() => this.page()),
        takeUntilDestroyed(),
      )
      .subscribe((page) => this.rows.set(page));
  }

  protected readAgain(): void {
    this.again.next();
  }

  protected more(): void {
    this.started();
    const words = this.words.value.trim();
    this.people.list(words, this.next() ?? undefined).subscribe({
      next: ({ items, next }) => {
        this.busy.set(false);
        if (words !== this.words.value.trim()) return;
        this.rows.update((rows) => [...rows, ...items]);
        this.next.set(next);
      },
      error: (error: unknown) => this.failed(error),
    });
  }

  protected async giveRole(row: AccountRow, field: HTMLSelectElement): Promise<void> {
    const role = field.value as AccountRole;
    const sure = await this.confirm.ask({
      title: `Make ${row.displayName} ${role}?`,
      text: `Whoever is ${role} ${roleMeans[role]}. ${row.displayName} is ${row.role} now.`,
      yes: `Make ${role}`,
    });
    if (sure) this.change(row, role, field);
    else field.value = row.role;
  }

  private change(row: AccountRow, role: AccountRole, field?: HTMLSelectElement): void {
    this.problem.set(null);
    this.people.changeRole(row.id, role).subscribe({
      next: (changed) => {
        this.rows.update((rows) => rows.map((one) => (one.id === changed.id ? changed : one)));
        if (field) this.undo.offer(`${row.displayName} is ${role} now`, () => this.change(changed, row.role));
        else this.undo.tell(`${row.displayName} is ${role} again`);
      },
      error: (error: unknown) => {
        if (field) field.value = row.role;
        this.failed(error);
      },
    });
  }

  private page() {
    return this.people.list(this.words.value.trim()).pipe(
      map(({ items, next }) => {
        this.busy.set(false);
        this.next.set(next);
        return items;
      }),
      catchError((error: unknown) => {
        this.failed(error);
        return of<AccountRow[]>([]);
      }),
    );
  }

  private started(): void {
    this.busy.set(true);
    this.problem.set(null);
  }

  private failed(error: unknown): void {
    this.busy.set(false);
    this.problem.set(toApiProblem(error).problem);
  }
}
