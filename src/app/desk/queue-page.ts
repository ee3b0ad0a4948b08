import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
  computed,
  inject,
  signal,
  viewChildren,
} from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router } from '@angular/router';
import { Subscription, finalize, map } from 'rxjs';
import { deskItemKinds, type DeskItem, type DeskQueue } from '../../../shared/contract/desk-queue';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { DeskItems, type QueueWish } from './desk-items';
import { deskKeys } from './desk-keys';
import { DeskTabs } from './desk-tabs';
import { keyList } from './key-list';
import { QueueFilter } from './queue-filter';
import { QueueLine } from './queue-line';

/** All that waits at the desk, the longest wait first. */
@Component({
  selector: 'sl-queue-page',
  imports: [DeskTabs, ProblemNote, QueueFilter, QueueLine],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="head">
      <h1>Desk</h1>
      <button type="button" class="sl-bare-button" (click)="showKeys()">Keys</button>
    </div>
    <sl-desk-tabs />
    <sl-queue-filter [wish]="wish()" [counts]="counts()" />
    <ul class="sl-plain-list">
      @for (item of items(); track item.kind + item.id) {
        <li>
          <sl-queue-line [item]="item" [now]="now()" (take)="take(item)" (giveUp)="giveUp(item)" />
        </li>
      } @empty {
        @if (!busy() && !problem()) {
          <li class="sl-quiet nothing">
            {{ kept() ? 'Nothing of that kind waits.' : 'Nothing waits.' }}
          </li>
        }
      }
    </ul>
    <sl-problem-note [problem]="problem()" [retryable]="items().length === 0" (retry)="fetch()" />
    <p class="sl-quiet" role="status">{{ busy() ? 'Fetching …' : told() }}</p>
    @if (!busy() && next()) {
      <button type="button" class="sl-plain-button" (click)="more()">Show more</button>
    }
  `,
  styles: `
    .head {
      display: flex;
      align-items: baseline;
      justify-content: space-between;
    }
    ul {
      border-block-start: 1px solid var(--sl-ink);
      margin-block-end: 1rem;
    }
    .nothing {
      padding-block: 1rem;
    }
  `,
})
export class QueuePage {
  private readonly desk = inject(DeskItems);
  private readonly document = inject(DOCUMENT);
  private readonly lines = viewChildren(QueueLine);
  private fetching: Subscription | undefined;
  protected readonly showKeys = keyList();
  protected readonly wish = toSignal(
    inject(ActivatedRoute).queryParamMap.pipe(
      map((query) => wishIn(query.get('kind'), query.get('claim'), query.get('words'))),
    ),
    { requireSync: true },
  );
  protected readonly kept = computed(() => Object.values(this.wish()).some((value) => value !== undefined));
  protected readonly now = signal(new Date());
  protected readonly items = signal<readonly DeskItem[]>([]);
  protected readonly counts = signal<DeskQueue['counts'] | null>(null);
  protected readonly next = signal<string | null>(null);
  protected readonly busy = signal(true);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly told = signal('');

  constructor() {
    inject(ActivatedRoute)
      .queryParamMap.pipe(takeUntilDestroyed())
      .subscribe(() => this.fetch());
    const router = inject(Router);
    deskKeys([
      { key: 'ArrowDown', does: 'to the next line', run: () => this.step(1) },
      { key: 'ArrowUp', does: 'to the line before', run: () => this.step(-1) },
      { key: 'c', does: 'take the line in hand', run: () => this.onLine((item) => this.take(item)) },
      { key: 'u', does: 'give the line up', run: () => this.onLine((item) => this.giveUp(item)) },
      { key: 'm', does: 'only what is in my hand, or all again', run: () => this.onlyMine(router) },
      { key: 'r', does: 'read the queue anew', run: () => this.fetch() },
      { key: '?', does: 'show these keys', run: this.showKeys },
    ]);
  }

  /** Reads the queue from its beginning. */
  protected fetch(): void {
    this.load(undefined);
  }

  protected more(): void {
    this.load(this.next() ?? undefined);
  }

  protected take(item: DeskItem): void {
    this.problem.set(null);
    this.desk.claim(item).subscribe({
      next: (claim) => {
        this.replace({ ...item, claim, mine: true });
        this.told.set(`“${item.title}” is in your hand.`);
      },
      error: (error: unknown) => {
        const failure = toApiProblem(error);
        this.problem.set(failure.problem);
        if (failure.is('claimed-by-another')) this.lookAgain(item);
      },
    });
  }

  protected giveUp(item: DeskItem): void {
    if (!item.mine) return;
    this.problem.set(null);
    this.desk.giveUp(item).subscribe({
      next: () => {
        this.replace({ ...item, claim: null, mine: false });
        this.told.set(`“${item.title}” is in nobody's hand.`);
      },
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  private load(cursor: string | undefined): void {
    this.fetching?.unsubscribe();
    this.busy.set(true);
    this.problem.set(null);
    this.fetching = this.desk
      .queue(this.wish(), cursor)
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: (page) => {
          this.now.set(new Date());
          this.items.update((items) => (cursor === undefined ? page.items : [...items, ...page.items]));
          this.counts.set(page.counts);
          this.next.set(page.next);
        },
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }

  /** Somebody was faster: shows who. */
  private lookAgain(item: DeskItem): void {
    this.desk.claimOf(item).subscribe({
      next: ({ claim }) => this.replace({ ...item, claim, mine: false }),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  private replace(changed: DeskItem): void {
    this.items.update((items) =>
      items.map((item) => (item.kind === changed.kind && item.id === changed.id ? changed : item)),
    );
  }

  /** The line that has the focus, −1 where none has. */
  private place(): number {
    const line = this.document.activeElement?.closest('sl-queue-line');
    return line ? [...this.document.querySelectorAll('sl-queue-line')].indexOf(line) : -1;
  }

  private step(by: 1 | -1): void {
    const lines = this.lines();
    const from = this.place();
    const to = from === -1 ? (by === 1 ? 0 : lines.length - 1) : from + by;
    lines[Math.min(Math.max(to, 0), lines.length - 1)]?.focus();
  }

  private onLine(act: (item: DeskItem) => void): void {
    const item = this.items()[this.place()];
    if (item) act(item);
    else this.told.set('Go to a line first, with the arrow keys.');
  }

  private onlyMine(router: Router): void {
    const claim = this.wish().claim === 'mine' ? null : 'mine';
    void router.navigate([], { queryParams: { claim }, queryParamsHandling: 'merge' });
  }
}

/** What the address asks for; anything it cannot mean is left out. */
function wishIn(kind: string | null, claim: string | null, words: string | null): QueueWish {
  return {
    kind: deskItemKinds.find((each) => each === kind),
    claim: claim === 'free' || claim === 'mine' ? claim : undefined,
    words: words?.trim().slice(0, 100) || undefined,
  };
}
