import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { licence } from '../../../shared/contract/licence';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Accounts } from './accounts';
import { EmailField } from './email-field';
import { MailOnItsWay } from './mail-on-its-way';
import { PasswordField } from './password-field';

@Component({
  selector: 'sl-sign-up',
  imports: [
    Field,
    Labelled,
    EmailField,
    MailOnItsWay,

    PasswordField,
    ProblemNote,
    ReactiveFormsModule,
    RouterLink,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './account.scss',
  template: `
    @if (mailedTo(); as email) {
      <h1>One more step</h1>
      <sl-mail-on-its-way [email]="email" />
      <p class="beside">
        Wrong address?
        <button class="sl-bare-button" type="button" (click)="mailedTo.set(null)">
          Change what you typed
        </button>
      </p>
    } @else {
      <h1>Make an account</h1>
      <p>With an account you keep a bench on every device, write up what helped and report trials.</p>
      <form [formGroup]="form" novalidate (ngSubmit)="signUp()">
        <sl-labelled
          label="Name shown to others"
          [control]="form.controls.displayName"
          hint="Need not be your real one."
        >
          <input
            slField
            name="displayName"
            autocomplete="nickname"
            maxlength="60"
            formControlName="displayName"
          />
        </sl-labelled>
        <sl-email-field [control]="form.controls.email" />
        <sl-password-field [control]="form.controls.password" [fresh]="true" />
        <p class="sl-quiet">
          What you publish here others may use by naming you, under {{ licence.shortName }} (<a
            routerLink="/dump"
            >open data</a
          >).
        </p>
        @if (sending.problem(); as problem) {
          <sl-problem-note [problem]="problem" />
        }
        <div class="actions">
          <button class="sl-strong-button" type="submit" [disabled]="sending.busy()">Make the account</button>
        </div>
      </form>
      <p class="beside">
        Have one already? <a routerLink="/account/sign-in" queryParamsHandling="preserve">Sign in</a>.
      </p>
    }
  `,
})
export class SignUp {
  protected readonly licence = licence;
  private readonly accounts = inject(Accounts);
  protected readonly sending = formSending();
  protected readonly mailedTo = signal<string | null>(null);
  protected readonly form = new FormGroup({
    displayName: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(2)],
    }),
    email: new FormControl('', { nonNullable: true, validators: [Validators.required, Validators.email] }),
    password: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(12)],
    }),
  });

  protected signUp(): void {
    this.sending.send(
      this.form,
      () => this.accounts.signUp(this.form.getRawValue()),
      () => this.mailedTo.set(this.form.controls.email.value.trim()),
    );
  }
}
