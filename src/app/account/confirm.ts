import { ChangeDetectionStrategy, Component, afterNextRender, inject, input, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { RouterLink } from '@angular/router';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { formSending } from '../core/form-sending';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Accounts } from './accounts';
import { EmailField } from './email-field';

/** Where the link of the confirmation mail leads. The browser, not the rendering server, uses the token up. */
@Component({
  selector: 'sl-confirm',
  imports: [EmailField, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './account.scss',
  template: `
    @if (name(); as name) {
      <h1>Welcome, {{ name }}</h1>
      <p role="status">Your address is confirmed and you are signed in.</p>
      <div class="actions">
        <a class="sl-strong-button" routerLink="/bench">Put your parts on the bench</a>
        <a class="sl-bare-button" routerLink="/write-ups/new">Write up what helped</a>
      </div>
    } @else if (problem(); as problem) {
      <h1>The address is not confirmed</h1>
      <sl-problem-note [problem]="problem" />
      @if (mailed()) {
        <p role="status">
          If there is an account with this address that is not confirmed yet, a new link is on its way to it.
        </p>
      } @else {
        <form [formGroup]="form" novalidate (ngSubmit)="resend()">
          <sl-email-field [control]="form.controls.email" />
          @if (sending.problem(); as problem) {
            <sl-problem-note [problem]="problem" />
          }
          <div class="actions">
            <button class="sl-strong-button" type="submit" [disabled]="sending.busy()">
              Mail a new link
            </button>
            <a class="sl-bare-button" routerLink="/account/sign-in">Sign in</a>
          </div>
        </form>
      }
    } @else {
      <h1>Confirm your address</h1>
      <p role="status">The link is being checked …</p>
    }
  `,
})
export class Confirm {
  readonly token = input('');
  private readonly accounts = inject(Accounts);
  protected readonly sending = formSending();
  protected readonly name = signal<string | null>(null);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly mailed = signal(false);
  protected readonly form = new FormGroup({
    email: new FormControl('', { nonNullable: true, validators: [Validators.required, Validators.email] }),
  });

  constructor() {
    afterNextRender(() => {
      this.accounts.confirm(this.token()).subscribe({
        next: ({ account }) => this.name.set(account?.displayName ?? ''),
        error: (error: unknown) => this.problem.set(withoutFields(toApiProblem(error).problem)),
      });
    });
  }

  protected resend(): void {
    this.sending.send(
      this.form,
      () => this.accounts.resendConfirmation(this.form.controls.email.value),
      () => this.mailed.set(true),
    );
  }
}

/** A token cut short is answered as a field; to the reader it is a link that does not work. */
function withoutFields(problem: Problem): Problem {
  if (problem.fields === undefined) return problem;
  return {
    ...problem,
    title: 'The link is not complete',
    detail: 'The link is not complete.',
    remedy: 'Open it from the mail again, or ask for a new one.',
    fields: undefined,
  };
}
