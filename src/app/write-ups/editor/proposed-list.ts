import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import type { Problem } from '../../../../shared/contract/problem';
import type { ProposedEdition } from '../../../../shared/contract/proposed-editions';
import { toApiProblem } from '../../core/api-problem';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { ProposedEditions } from './proposed-editions';

/** Editions on the desk that others propose on the member's write-ups; nothing at all while there are none. */
@Component({
  selector: 'sl-proposed-list',
  imports: [DatePipe, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (items().length > 0) {
      <section aria-labelledby="proposed-heading">
        <h2 id="proposed-heading">Proposed on your write-ups</h2>
        <ul class="sl-plain-list">
          @for (item of items(); track item.editionId) {
            <li>
              <a [routerLink]="['/my/proposed-editions', item.editionId]">{{ item.title }}</a>
              <p class="sl-quiet sl-small">
                by {{ item.author.displayName }}, {{ item.submittedAt | date: 'd MMM y, HH:mm' }}: “{{
                  item.changeNote
                }}”
              </p>
              <p class="sl-small">
                @if (item.myOpinion; as said) {
                  <span
                    >You {{ said.agrees ? 'agree' : 'do not agree'
                    }}{{ said.beforeHandingIn ? ', but it was handed in again since' : '' }}.</span
                  >
                } @else {
                  <strong>The desk has no word of yours on it yet.</strong>
                }
              </p>
            </li>
          }
        </ul>
        @if (next()) {
          <button type="button" class="sl-plain-button" [disabled]="busy()" (click)="fetch()">
            Show more of these
          </button>
        }
      </section>
    }
    @if (problem(); as problem) {
      <sl-problem-note [problem]="problem" [retryable]="true" (retry)="fetch()" />
    }
  `,
  styles: `
    section {
      border-block: 2px solid var(--sl-ink);
      padding-block: 0.75rem;
      margin-block-end: 1.5rem;
    }
    h2 {
      margin: 0;
    }
    li {
      padding-block: 0.6rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    li:last-child {
      border-block-end: 0;
    }
    a {
      font: 600 1.2rem/1.25 var(--sl-heading);
    }
    p {
      margin: 0.2rem 0 0;
    }
  `,
})
export class ProposedList {
  private readonly proposed = inject(ProposedEditions);
  protected readonly items = signal<readonly ProposedEdition[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);

  constructor() {
    this.fetch();
  }

  protected fetch(): void {
    this.busy.set(true);
    this.problem.set(null);
    this.proposed
      .list(this.next() ?? undefined)
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
