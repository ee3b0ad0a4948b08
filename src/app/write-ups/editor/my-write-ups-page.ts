import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import type { Problem } from '../../../../shared/contract/problem';
import { editionStateWords, type EditionState } from '../../../../shared/contract/vocabulary';
import type { MyWriteUp } from '../../../../shared/contract/write-ups';
import { toApiProblem } from '../../core/api-problem';
import { Icon } from '../../ui/icon/icon';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Drafts } from './drafts';
import { ProposedList } from './proposed-list';

/** Everything the member has written, the last touched first. */
@Component({
  selector: 'sl-my-write-ups-page',
  imports: [DatePipe, Icon, ProblemNote, ProposedList, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './my-write-ups-page.html',
  styleUrl: './my-write-ups-page.scss',
})
export class MyWriteUpsPage {
  private readonly drafts = inject(Drafts);
  protected readonly states: { value: EditionState | undefined; label: string }[] = [
    { value: undefined, label: 'all' },
    ...(Object.entries(editionStateWords) as [EditionState, string][]).map(([value, label]) => ({
      value,
      label,
    })),
  ];
  protected readonly words = editionStateWords;
  protected readonly state = signal<EditionState | undefined>(undefined);
  protected readonly items = signal<readonly MyWriteUp[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly busy = signal(true);
  protected readonly problem = signal<Problem | null>(null);

  constructor() {
    this.fetch();
  }

  protected choose(state: EditionState | undefined): void {
    this.state.set(state);
    this.items.set([]);
    this.next.set(null);
    this.fetch();
  }

  protected fetch(): void {
    const state = this.state();
    this.busy.set(true);
    this.problem.set(null);
    this.drafts
      .mine(state, this.next() ?? undefined)
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: (page) => {
          if (state !== this.state()) return;
          this.items.update((items) => [...items, ...page.items]);
          this.next.set(page.next);
        },
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }
}
