import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { finalize } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import { Accounts } from '../account/accounts';
import { toApiProblem } from '../core/api-problem';
import { Session } from '../core/session';
import { ProblemNote } from '../ui/problem-note/problem-note';

/** Asks once whether one wants to be told of what changes on the bench; then says how it stands, with the way to change it. */
@Component({
  selector: 'sl-bench-watch-choice',
  imports: [ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (session.account(); as account) {
      @if (account.benchWatch === null) {
        <section class="ask" aria-labelledby="bench-watch">
          <h2 id="bench-watch">Shall we tell you what changes on your parts?</h2>
          <p>
            New write-ups, cautions, revisions and readings for what stands on your bench, in your notices and
            by mail as you choose in your account. You are asked once; it stays off until you say yes.
          </p>
          <p class="ways">
            <button type="button" class="sl-strong-button" [disabled]="busy()" (click)="choose(true)">
              Yes, tell me
            </button>
            <button type="button" class="sl-plain-button" [disabled]="busy()" (click)="choose(false)">
              No
            </button>
          </p>
        </section>
      } @else {
        <p class="stands">
          <span>{{
            account.benchWatch
              ? 'You are told what changes on the parts of your bench.'
              : 'You are not told what changes on the parts of your bench.'
          }}</span>
          <button
            type="button"
            class="sl-bare-button"
            [disabled]="busy()"
            (click)="choose(!account.benchWatch)"
          >
            {{ account.benchWatch ? 'Tell me no longer' : 'Tell me' }}
          </button>
        </p>
      }
      <sl-problem-note [problem]="problem()" />
    }
  `,
  styles: `
    .ask {
      max-inline-size: var(--sl-measure);
      margin-block: 1.5rem;
      padding-block: 0.75rem;
      border-block: 1px solid var(--sl-ink);
    }
    h2 {
      margin: 0 0 0.35rem;
      font-size: 1.25rem;
    }
    .ways {
      display: flex;
      flex-wrap: wrap;
      gap: 0.75rem;
      margin: 0;
    }
    .stands {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 0 0.5rem;
      margin-block: 0.5rem;
      color: var(--sl-quiet);
    }
  `,
})
export class BenchWatchChoice {
  private readonly accounts = inject(Accounts);
  protected readonly session = inject(Session);
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);

  protected choose(benchWatch: boolean): void {
    this.busy.set(true);
    this.problem.set(null);
    this.accounts
      .changeProfile({ benchWatch })
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({ error: (error: unknown) => this.problem.set(toApiProblem(error).problem) });
  }
}
