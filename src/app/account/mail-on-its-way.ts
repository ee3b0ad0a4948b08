import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { finalize } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Accounts } from './accounts';

/** Says that the link to confirm an address is on its way, and sends it again. */
@Component({
  selector: 'sl-mail-on-its-way',
  imports: [ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p role="status">
      @if (again()) {
        The mail to <strong>{{ email() }}</strong> went out again.
      } @else if (sent()) {
        A mail is on its way to <strong>{{ email() }}</strong>. Open the link in it to confirm the address. It
        can take a minute; look among unwanted mail too.
      } @else {
        The link to confirm <strong>{{ email() }}</strong> can be mailed again.
      }
    </p>
    @if (problem(); as problem) {
      <sl-problem-note [problem]="problem" />
    }
    <button class="sl-plain-button" type="button" [disabled]="busy()" (click)="resend()">
      Send the mail again
    </button>
  `,
})
export class MailOnItsWay {
  readonly email = input.required<string>();
  /** Whether the first mail has just been sent. */
  readonly sent = input(true);
  private readonly accounts = inject(Accounts);
  protected readonly again = signal(false);
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);

  protected resend(): void {
    this.busy.set(true);
    this.problem.set(null);
    this.again.set(false);
    this.accounts
      .resendConfirmation(this.email())
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: () => this.again.set(true),
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }
}
