import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { formSending } from '../core/form-sending';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Accounts } from './accounts';
import { EmailField } from './email-field';

@Component({
  selector: 'sl-ask-reset',
  imports: [EmailField, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './account.scss',
  template: `
    <h1>Forgotten password</h1>
    @if (mailedTo(); as email) {
      <p role="status">
        If there is an account for <strong>{{ email }}</strong>, a link to set a new password is on its way to
        it.
      </p>
      <div class="actions">
        <button class="sl-plain-button" type="button" (click)="mailedTo.set(null)">
          Use another address, or ask again
        </button>
        <a class="sl-bare-button" routerLink="/account/sign-in">Sign in</a>
      </div>
    } @else {
      <p>A link to set a new one is mailed to you. The old password stays until then.</p>
      <form [formGroup]="form" novalidate (ngSubmit)="ask()">
        <sl-email-field [control]="form.controls.email" />
        @if (sending.problem(); as problem) {
          <sl-problem-note [problem]="problem" />
        }
        <div class="actions">
          <button class="sl-strong-button" type="submit" [disabled]="sending.busy()">Mail the link</button>
          <a class="sl-bare-button" routerLink="/account/sign-in">Back to signing in</a>
        </div>
      </form>
    }
  `,
})
export class AskReset {
  private readonly accounts = inject(Accounts);
  protected readonly sending = formSending();
  protected readonly mailedTo = signal<string | null>(null);
  protected readonly form = new FormGroup({
    email: new FormControl('', { nonNullable: true, validators: [Validators.required, Validators.email] }),
  });

  protected ask(): void {
    this.sending.send(
      this.form,
      () => this.accounts.askForReset(this.form.controls.email.value),
      () => this.mailedTo.set(this.form.controls.email.value.trim()),
    );
  }
}
