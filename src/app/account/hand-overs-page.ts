import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { finalize, of, type Observable } from 'rxjs';
import type { OfferedHandOver } from '../../../shared/contract/deletion';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { loadEach } from '../core/load';
import { LoadStateView } from '../ui/load-state/load-state';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Leaving } from './leaving';

/** Write-ups of people who leave, offered to the reader to look after. */
@Component({
  selector: 'sl-hand-overs-page',
  imports: [DatePipe, LoadStateView, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h1>Write-ups to look after</h1>
    <p class="intro">
      Whoever leaves can ask another member to look after their write-ups: to write the next editions and to
      hear of trials and cautions. What is published so far stays under “a former member”.
    </p>
    <sl-load-state [of]="loaded()" />
    @if (problem(); as problem) {
      <sl-problem-note [problem]="problem" />
    }
    @if (offers(); as offers) {
      <ul class="sl-plain-list">
        @for (offer of offers; track offer.id) {
          <li>
            <h2>{{ offer.from }} is leaving</h2>
            <ul>
              @for (writeUp of offer.writeUps; track writeUp.slug) {
                <li>
                  <a [routerLink]="['/write-ups', writeUp.slug]">{{ writeUp.title }}</a>
                </li>
              }
            </ul>
            @if (offer.state === 'taken') {
              <p role="status">You look after them once the account is deleted.</p>
            } @else {
              <p class="sl-quiet">Open until {{ offer.endsAt | date: 'yyyy-MM-dd' : 'UTC' }}.</p>
              <p class="actions">
                <button class="sl-strong-button" type="button" [disabled]="busy()" (click)="take(offer)">
                  Look after them
                </button>
                <button class="sl-plain-button" type="button" [disabled]="busy()" (click)="decline(offer)">
                  Decline
                </button>
              </p>
            }
          </li>
        } @empty {
          <li class="sl-quiet">Nothing is offered to you.</li>
        }
      </ul>
    }
  `,
  styles: `
    .intro {
      max-inline-size: var(--sl-measure);
    }
    .sl-plain-list > li {
      padding-block: 0.75rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    h2 {
      margin: 0;
      font-size: 1.25rem;
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      gap: 0.5rem 1rem;
    }
  `,
})
export class HandOversPage {
  private readonly leaving = inject(Leaving);
  protected readonly loaded = loadEach(of(null), () => this.leaving.offers());
  private readonly changed = signal<readonly OfferedHandOver[] | null>(null);
  protected readonly offers = computed(() => {
    const now = this.loaded();
    return this.changed() ?? (now.state === 'ready' ? now.value : null);
  });
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);

  protected take(offer: OfferedHandOver): void {
    this.decide(this.leaving.take(offer.id));
  }

  protected decline(offer: OfferedHandOver): void {
    this.decide(this.leaving.decline(offer.id));
  }

  private decide(call: Observable<OfferedHandOver[]>): void {
    this.busy.set(true);
    this.problem.set(null);
    call.pipe(finalize(() => this.busy.set(false))).subscribe({
      next: (offers) => this.changed.set(offers),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }
}
