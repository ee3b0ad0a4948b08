import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Accounts } from './accounts';

/** Where the link at the foot of notice mail leads. A press is asked for, so that a mail scanner that opens links stops nothing. */
@Component({
  selector: 'sl-unsubscribe',
  imports: [ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './account.scss',
  template: `
    <h1>Stop notice mail</h1>
    @if (done()) {
      <p role="status">
        No more notice mail is sent to you. Mail about the account itself, such as a password link, still is.
      </p>
      <p class="beside">You can switch it on again in <a routerLink="/account/profile">your account</a>.</p>
    } @else {
      <p>Shimlore mails you when one of your editions is published or comes back from the desk.</p>
      @if (problem(); as problem) {
        <sl-problem-note [problem]="problem" />
        <p>You can also switch it off in <a routerLink="/account/profile">your account</a>.</p>
      }
      <button class="sl-strong-button" type="button" [disabled]="busy()" (click)="stop()">
        Stop this mail
      </button>
    }
  `,
})
export class Unsubscribe {
  readonly token = input('');
  private readonly accounts = inject(Accounts);
  protected readonly busy = signal(false);
  protected readonly done = signal(false);
  protected readonly problem = signal<Problem | null>(null);

  protected stop(): void {
    this.busy.set(true);
    this.problem.set(null);
    this.accounts
      .unsubscribe(this.token())
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: () => this.done.set(true),
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }
}
