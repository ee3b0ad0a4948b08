import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { formSending } from '../core/form-sending';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Accounts } from './accounts';
import { PasswordField } from './password-field';

/** Where the link of the reset mail leads. */
@Component({
  selector: 'sl-reset',
  imports: [PasswordField, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './account.scss',
  template: `
    <h1>New password</h1>
    @if (done()) {
      <p role="status">
        The new password holds from now on. Every device that was signed in has been signed out.
      </p>
      <div class="actions"><a class="sl-strong-button" routerLink="/account/sign-in">Sign in</a></div>
    } @else {
      <form [formGroup]="form" novalidate (ngSubmit)="reset()">
        <sl-password-field label="New password" [control]="form.controls.password" [fresh]="true" />
        @if (sending.problem(); as problem) {
          <sl-problem-note [problem]="problem" />
        }
        <div class="actions">
          <button class="sl-strong-button" type="submit" [disabled]="sending.busy()">Set the password</button>
          @if (linkIsSpent()) {
            <a class="sl-bare-button" routerLink="/account/forgotten">Ask for a new link</a>
          }
        </div>
      </form>
    }
  `,
})
export class Reset {
  readonly token = input('');
  private readonly accounts = inject(Accounts);
  protected readonly sending = formSending();
  protected readonly done = signal(false);
  protected readonly linkIsSpent = computed(() => this.sending.problem() !== null);
  protected readonly form = new FormGroup({
    password: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(12)],
    }),
  });

  protected reset(): void {
    this.sending.send(
      this.form,
      () => this.accounts.resetPassword(this.token(), this.form.controls.password.value),
      () => this.done.set(true),
    );
  }
}
