import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import type { Problem } from '../../../../shared/contract/problem';
import { proposalStateWords, type Proposal } from '../../../../shared/contract/proposals';
import { toApiProblem } from '../../core/api-problem';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Proposals } from '../proposals';
import { headOfEntry } from './proposal-words';

/** What one has proposed for the catalogue, and what became of it. */
@Component({
  selector: 'sl-my-proposals-page',
  imports: [DatePipe, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h1>What you proposed</h1>
    <p><a routerLink="/hardware/propose">Propose something for the catalogue</a></p>
    <ul class="sl-plain-list">
      @for (proposal of items(); track proposal.id) {
        <li>
          <h2>
            @if (proposal.state === 'taken' && proposal.part) {
              <a [routerLink]="['/parts', proposal.part.slug]">{{ head(proposal) }}</a>
            } @else {
              {{ head(proposal) }}
            }
          </h2>
          <p>
            <b>{{ words[proposal.state] }}</b>
            <span class="sl-quiet">, proposed {{ proposal.createdAt | date: 'yyyy-MM-dd' }}</span>
          </p>
          @if (proposal.reason) {
            <p class="reason">{{ proposal.reason }}</p>
          }
        </li>
      } @empty {
        @if (!busy() && !problem()) {
          <li class="sl-quiet">Nothing yet.</li>
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
    li {
      padding-block: 0.75rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    h2 {
      margin: 0;
      font-size: 1.25rem;
    }
    p {
      margin: 0.2rem 0;
    }
    .reason {
      max-inline-size: var(--sl-measure);
      white-space: pre-line;
    }
  `,
})
export class MyProposalsPage {
  private readonly proposals = inject(Proposals);
  protected readonly head = headOfEntry;
  protected readonly words = proposalStateWords;
  protected readonly items = signal<readonly Proposal[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly busy = signal(true);
  protected readonly problem = signal<Problem | null>(null);

  constructor() {
    this.fetch();
  }

  protected fetch(): void {
    this.busy.set(true);
    this.problem.set(null);
    this.proposals
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
}
