import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import type { DeskProposal } from '../../../shared/contract/proposals';
import { toApiProblem } from '../core/api-problem';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Desk } from './desk';
import { DeskTabs } from './desk-tabs';
import { MergeForm } from './merge-form';
import { ProposalPanel, type ProposalDecision } from './proposal-panel';
import { waitTime } from './wait-time';

/** What members propose for the catalogue, and the merging of what is there twice. */
@Component({
  selector: 'sl-hardware-desk-page',
  imports: [DeskTabs, MergeForm, ProblemNote, ProposalPanel, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h1>Desk</h1>
    <sl-desk-tabs />
    <section class="sl-section" aria-labelledby="proposed">
      <h2 id="proposed">Proposed</h2>
      <p role="status" class="told">
        {{ told() }}
        @if (slug(); as slug) {
          <a [routerLink]="['/parts', slug]">See it there</a>
        }
      </p>
      <ul class="sl-plain-list">
        @for (proposal of items(); track proposal.id) {
          <li>
            <details>
              <summary>
                <b>{{ nameOf(proposal) }}</b>
                <span class="sl-quiet">
                  {{ proposal.entry.kind }}{{ proposal.part ? ' of ' + proposal.part.name : '' }}, by
                  {{ proposal.person.displayName }}, waits {{ wait(proposal) }}
                </span>
              </summary>
              <sl-proposal-panel [proposal]="proposal" (decided)="settle(proposal, $event)" />
            </details>
          </li>
        } @empty {
          @if (!busy() && !problem()) {
            <li class="sl-quiet">Nothing waits.</li>
          }
        }
      </ul>
      <sl-problem-note [problem]="problem()" [retryable]="true" (retry)="fetch()" />
      @if (busy()) {
        <p class="sl-quiet" role="status">Fetching …</p>
      } @else if (next()) {
        <button type="button" class="sl-plain-button" (click)="fetch()">Show more</button>
      }
    </section>
    <section class="sl-section" aria-labelledby="twice">
      <h2 id="twice">Merge what is there twice</h2>
      <sl-merge-form />
    </section>
  `,
  styles: `
    li {
      border-block-end: 1px solid var(--sl-hair);
    }
    summary {
      min-block-size: 2.75rem;
      padding-block: 0.6rem;
      cursor: pointer;
    }
    summary b {
      font: 600 1.25rem/1.2 var(--sl-heading);
      margin-inline-end: 0.75rem;
    }
    .told:empty {
      margin: 0;
    }
  `,
})
export class HardwareDeskPage {
  private readonly desk = inject(Desk);
  private readonly now = new Date();
  protected readonly items = signal<readonly DeskProposal[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly busy = signal(true);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly told = signal('');
  protected readonly slug = signal<string | null>(null);

  constructor() {
    this.fetch();
  }

  protected nameOf({ entry }: DeskProposal): string {
    if (entry.kind === 'part') return `${entry.name} by ${entry.maker}`;
    return entry.kind === 'revision' ? entry.label : entry.name;
  }

  protected wait(proposal: DeskProposal): string {
    return waitTime(new Date(proposal.createdAt), this.now);
  }

  protected settle(proposal: DeskProposal, decision: ProposalDecision): void {
    this.items.update((items) => items.filter((item) => item.id !== proposal.id));
    const taken = decision.kind === 'taken';
    this.told.set(
      `${this.nameOf(proposal)} is ${taken ? 'in the catalogue' : 'declined'}; ${proposal.person.displayName} gets a mail.`,
    );
    this.slug.set(taken ? decision.slug : null);
  }

  protected fetch(): void {
    this.busy.set(true);
    this.problem.set(null);
    this.desk
      .proposals(this.next() ?? undefined)
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
