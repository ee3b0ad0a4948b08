import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  type OnInit,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { Subscription, exhaustMap, timer } from 'rxjs';
import type { Claim } from '../../../shared/contract/desk-queue';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { Confirm } from '../ui/confirm/confirm';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { DeskItems, type DeskItemRef } from './desk-items';

/** Shorter than the twenty minutes that a claim lasts, so that one lost answer does not end it. */
const renewEvery = 5 * 60 * 1000;

type Hand =
  | { readonly state: 'asking' }
  | { readonly state: 'mine'; readonly claim: Claim }
  | { readonly state: 'others'; readonly claim: Claim }
  | { readonly state: 'free' };

/**
 * Who has the item in hand. Opening the page takes it in hand and keeps it so while the page is open; it can be given up,
 * and taken over from somebody else after a question.
 */
@Component({
  selector: 'sl-claim-bar',
  imports: [DatePipe, ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="bar" [class.others]="hand().state === 'others'">
      <p role="status">
        @switch (hand().state) {
          @case ('asking') {
            <span>Taking it in hand …</span>
          }
          @case ('mine') {
            <span>You have this in hand until </span
            ><span class="time">{{ claim()?.until | date: 'HH:mm' }}</span
            ><span>, and longer while this page is open.</span>
          }
          @case ('others') {
            <span
              ><strong>{{ claim()?.person?.displayName }}</strong> has this in hand until </span
            ><span class="time">{{ claim()?.until | date: 'HH:mm' }}</span
            ><span>. Read it; the decision is theirs.</span>
          }
          @case ('free') {
            <span>Nobody has this in hand.</span>
          }
        }
      </p>
      @switch (hand().state) {
        @case ('mine') {
          <button type="button" class="sl-bare-button" (click)="giveUp()">Give it up</button>
        }
        @case ('others') {
          <button type="button" class="sl-bare-button" (click)="takeOver()">Take it over</button>
        }
        @case ('free') {
          <button type="button" class="sl-bare-button" (click)="take()">Take it in hand</button>
        }
      }
    </div>
    <sl-problem-note [problem]="problem()" />
  `,
  styles: `
    .bar {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      justify-content: space-between;
      gap: 0 1rem;
      margin-block: 0.5rem 1rem;
      min-block-size: 2.75rem;
      border-block: 1px solid var(--sl-rule);
    }
    .bar.others {
      border-block: 2px solid var(--sl-ink);
    }
    p {
      margin: 0;
      padding-block: 0.35rem;
    }
    .sl-bare-button {
      margin-inline: -0.35rem;
    }
    .time {
      font-family: var(--sl-mono);
      font-variant-numeric: tabular-nums;
    }
  `,
})
export class ClaimBar implements OnInit {
  readonly item = input.required<DeskItemRef>();
  /** Whether the decision is open to the reader. */
  readonly inHand = output<boolean>();
  private readonly items = inject(DeskItems);
  private readonly confirm = inject(Confirm);
  private readonly destroyed = inject(DestroyRef);
  private renewing: Subscription | undefined;
  protected readonly hand = signal<Hand>({ state: 'asking' });
  protected readonly problem = signal<Problem | null>(null);
  protected readonly claim = computed(() => {
    const hand = this.hand();
    return hand.state === 'mine' || hand.state === 'others' ? hand.claim : null;
  });

  ngOnInit(): void {
    this.take();
  }

  /** Takes it, and renews that until it is given up, lost, or the page is left. */
  take(): void {
    this.renewing?.unsubscribe();
    this.renewing = timer(0, renewEvery)
      .pipe(
        exhaustMap(() => this.items.claim(this.item())),
        takeUntilDestroyed(this.destroyed),
      )
      .subscribe({
        next: (claim) => this.become({ state: 'mine', claim }),
        error: (error: unknown) => this.refused(error),
      });
  }

  giveUp(): void {
    if (this.hand().state !== 'mine') return;
    this.renewing?.unsubscribe();
    this.items.giveUp(this.item()).subscribe({
      next: () => this.become({ state: 'free' }),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  protected async takeOver(): Promise<void> {
    const holder = this.claim()?.person;
    if (!holder) return;
    const sure = await this.confirm.ask({
      title: `Take it over from ${holder.displayName}?`,
      text: 'They may be in the middle of it. Their page tells them that you have it now; what they typed stays there.',
      yes: 'Take it over',
    });
    if (!sure) return;
    this.items.claim(this.item(), holder.id).subscribe({
      next: () => this.take(),
      error: (error: unknown) => this.refused(error),
    });
  }

  private become(hand: Hand): void {
    this.problem.set(null);
    this.hand.set(hand);
    this.inHand.emit(hand.state !== 'others');
  }

  /** Somebody else has it: says who. Anything else is shown as it is. */
  private refused(error: unknown): void {
    this.renewing?.unsubscribe();
    const failure = toApiProblem(error);
    if (!failure.is('claimed-by-another')) {
      this.problem.set(failure.problem);
      this.hand.set({ state: 'free' });
      return;
    }
    this.items.claimOf(this.item()).subscribe({
      next: ({ claim }) => this.become(claim ? { state: 'others', claim } : { state: 'free' }),
      error: (again: unknown) => this.problem.set(toApiProblem(again).problem),
    });
  }
}
