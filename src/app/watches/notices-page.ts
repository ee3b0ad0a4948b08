import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { finalize, firstValueFrom } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import { NoticeFilter, type Notice } from '../../../shared/contract/watches';
import { toApiProblem } from '../core/api-problem';
import { Session } from '../core/session';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { noticeDays, type NoticeGroup } from './notice-days';
import { NoticeReading } from './notice-reading';
import { Watches } from './watches';

const filterWords: Record<NoticeFilter, string> = {
  part: 'parts',
  revision: 'revisions',
  joint: 'joints',
  'write-up': 'write-ups',
  question: 'questions',
  bench: 'my bench',
  person: 'what I asked, tried or wrote',
};

/** What one was told, by day. The address holds what the list is narrowed to. */
@Component({
  selector: 'sl-notices-page',
  imports: [DatePipe, Icon, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './notices-page.html',
  styleUrl: './notices-page.scss',
})
export class NoticesPage {
  private readonly watches = inject(Watches);
  private readonly reading = inject(NoticeReading);
  private readonly undo = inject(Undo);
  private readonly route = inject(ActivatedRoute);
  private readonly router = inject(Router);
  protected readonly session = inject(Session);
  private readonly query = toSignal(this.route.queryParamMap, { requireSync: true });

  protected readonly filters = NoticeFilter.options.map((value) => ({ value, label: filterWords[value] }));
  protected readonly unreadOnly = computed(() => this.query().get('unread') === 'true');
  protected readonly about = computed(() => NoticeFilter.safeParse(this.query().get('about')).data);
  protected readonly items = signal<readonly Notice[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly busy = signal(true);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly days = computed(() => noticeDays(this.items()));
  protected readonly anyUnread = computed(() => this.items().some(({ read }) => !read));
  private turn = 0;

  constructor() {
    this.route.queryParamMap.pipe(takeUntilDestroyed()).subscribe(() => this.startAnew());
  }

  protected narrow(change: { unread?: boolean; about?: string }): void {
    const queryParams = {
      unread: (change.unread ?? this.unreadOnly()) ? 'true' : null,
      about: (change.about ?? this.about()) || null,
    };
    void this.router.navigate([], { relativeTo: this.route, queryParams });
  }

  protected fetch(): void {
    const turn = this.turn;
    this.busy.set(true);
    this.problem.set(null);
    this.watches
      .notices({ cursor: this.next() ?? undefined, unread: this.unreadOnly(), about: this.about() })
      .pipe(finalize(() => turn === this.turn && this.busy.set(false)))
      .subscribe({
        next: (page) => {
          if (turn !== this.turn) return;
          this.items.update((items) => [...items, ...page.items]);
          this.next.set(page.next);
        },
        error: (error: unknown) => turn === this.turn && this.problem.set(toApiProblem(error).problem),
      });
  }

  protected async markRead(group: NoticeGroup): Promise<void> {
    await this.mark({ ids: [...group.unreadIds] }, (id) => group.unreadIds.includes(id));
  }

  /** All that there are, those on further pages too, but none that has come since the list was fetched. */
  protected async markAllRead(): Promise<void> {
    const newest = Math.max(...this.items().map(({ id }) => id));
    const readAt = await this.mark({ through: newest }, () => true);
    if (readAt) this.undo.offer('All notices are marked read.', () => void this.takeBack(readAt));
  }

  private async mark(
    which: Parameters<Watches['markRead']>[0],
    touches: (id: number) => boolean,
  ): Promise<string | null> {
    this.problem.set(null);
    try {
      const { readAt } = await firstValueFrom(this.watches.markRead(which));
      this.items.update((items) =>
        items.map((notice) => (touches(notice.id) ? { ...notice, read: true } : notice)),
      );
      this.reading.changed.next();
      return readAt;
    } catch (error) {
      this.problem.set(toApiProblem(error).problem);
      return null;
    }
  }

  private async takeBack(readAt: string): Promise<void> {
    try {
      await firstValueFrom(this.watches.markUnread(readAt));
      this.reading.changed.next();
      this.startAnew();
    } catch (error) {
      this.problem.set(toApiProblem(error).problem);
    }
  }

  private startAnew(): void {
    this.turn += 1;
    this.items.set([]);
    this.next.set(null);
    this.fetch();
  }
}
