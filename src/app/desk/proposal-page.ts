import {
  ChangeDetectionStrategy,
  Component,
  type OnInit,
  inject,
  input,
  numberAttribute,
  signal,
} from '@angular/core';
import type { DeskProposal } from '../../../shared/contract/proposals';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { DeskItems } from './desk-items';
import { ItemHead } from './item-head';
import { ItemReading } from './item-page';
import { ItemResult } from './item-result';
import { ProposalPanel, type ProposalDecision } from './proposal-panel';

/** One proposal for the catalogue. */
@Component({
  selector: 'sl-proposal-page',
  imports: [ItemHead, ItemResult, ProblemNote, ProposalPanel],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (decided(); as outcome) {
      <sl-item-result
        [title]="outcome === 'taken' ? 'Taken into the catalogue' : 'Declined'"
        text="Whoever proposed it is told by mail."
      />
    } @else if (reading.item(); as proposal) {
      <sl-item-head
        [overline]="'Hardware proposal by ' + proposal.person.displayName"
        [item]="{ kind: 'proposal', id: proposal.id }"
        [title]="nameOf(proposal)"
        [since]="proposal.createdAt"
        [waiting]="proposal.state === 'waiting'"
        (inHand)="mine.set($event)"
      />
      <section class="decision" aria-label="Decision" data-decision tabindex="-1">
        @if (proposal.state !== 'waiting') {
          <p>
            <span>Decided: {{ proposal.state }}. </span><span>{{ proposal.reason }}</span>
          </p>
        } @else if (!mine()) {
          <p class="sl-quiet">Somebody else has it in hand.</p>
        } @else {
          <sl-proposal-panel [proposal]="proposal" (decided)="settle($event)" />
        }
      </section>
    } @else if (!reading.problem()) {
      <p class="sl-quiet" role="status">Fetching …</p>
    }
    <sl-problem-note [problem]="reading.problem()" [retryable]="true" (retry)="reading.fetch()" />
  `,
  styles: `
    .decision:focus {
      outline: none;
    }
  `,
})
export class ProposalPage implements OnInit {
  readonly id = input.required({ transform: numberAttribute });
  private readonly items = inject(DeskItems);
  protected readonly reading = new ItemReading(() => this.items.proposal(this.id()));
  protected readonly mine = signal(true);
  protected readonly decided = signal<ProposalDecision['kind'] | null>(null);

  ngOnInit(): void {
    this.reading.fetch();
  }

  protected nameOf({ entry, part }: DeskProposal): string {
    if (entry.kind === 'part') return `${entry.name} by ${entry.maker}`;
    const name = entry.kind === 'revision' ? entry.label : entry.name;
    return part ? `${name} of ${part.name}` : name;
  }

  protected settle(decision: ProposalDecision): void {
    this.decided.set(decision.kind);
  }
}
