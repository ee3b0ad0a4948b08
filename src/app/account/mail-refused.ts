import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { finalize } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { Session } from '../core/session';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Accounts } from './accounts';

/** Says that mail to the reader comes back, and lets them try the address again. */
@Component({
  selector: 'sl-mail-refused',
  imports: [DatePipe, Icon, ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (session.account(); as account) {
      @if (account.mailRefusedAt) {
        <section class="back" aria-labelledby="mail-back">
          <h3 id="mail-back"><sl-icon name="warning" />Mail to you comes back</h3>
          <p>
            Since {{ account.mailRefusedAt | date: 'd MMMM y' }} mail to {{ account.email }} is refused, so no
            notices are sent, not even safety notices. They still stand among your notices here.
          </p>
          @if (mailed()) {
            <p role="status">
              A mail is on its way. Follow its link within 24 hours, and mail comes as before.
            </p>
          } @else {
            <button type="button" class="sl-strong-button" [disabled]="busy()" (click)="tryAgain()">
              Try the address again
            </button>
          }
          <sl-problem-note [problem]="problem()" />
        </section>
      }
    }
  `,
  styles: `
    .back {
      margin-block: 1rem;
      padding: 0.75rem 1rem 1rem;
      border: 2px solid var(--sl-ink);
    }
    h3 {
      display: flex;
      align-items: center;
      gap: 0.5rem;
      margin: 0 0 0.35rem;
    }
  `,
})
export class MailRefused {
  private readonly accounts = inject(Accounts);
  protected readonly session = inject(Session);
  protected readonly busy = signal(false);
  protected readonly mailed = signal(false);
  protected readonly problem = signal<Problem | null>(null);

  protected tryAgain(): void {
    this.busy.set(true);
    this.problem.set(null);
    this.accounts
      .confirmAddressAgain()
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: () => this.mailed.set(true),
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }
}
