import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { formSending } from '../core/form-sending';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Accounts } from './accounts';
import { EmailField } from './email-field';
import { MailOnItsWay } from './mail-on-its-way';
import { PasswordField } from './password-field';
import { wayBack } from './way-back';

@Component({
  selector: 'sl-sign-in',
  imports: [EmailField, MailOnItsWay, PasswordField, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './account.scss',
  template: `
    <h1>Sign in</h1>
    @if (back()) {
      <p>What you asked for needs an account. You come back to it straight after.</p>
    }
    <form [formGroup]="form" novalidate (ngSubmit)="signIn()">
      <sl-email-field [control]="form.controls.email" />
      <sl-password-field [control]="form.controls.password" />
      @if (sending.problem(); as problem) {
        <sl-problem-note [problem]="problem" />
      }
      @if (unconfirmed(); as email) {
        <sl-mail-on-its-way [email]="email" [sent]="false" />
      }
      <div class="actions">
        <button class="sl-strong-button" type="submit" [disabled]="sending.busy()">Sign in</button>
        <a class="sl-bare-button" routerLink="/account/forgotten">Password forgotten</a>
      </div>
    </form>
    <p class="beside">
      No account yet? <a routerLink="/account/sign-up" queryParamsHandling="preserve">Make one</a>. Reading,
      printing and searching need none.
    </p>
  `,
})
export class SignIn {
  /** Where the reader was when an account was asked for. */
  readonly back = input<string>();
  private readonly accounts = inject(Accounts);
  private readonly router = inject(Router);
  protected readonly sending = formSending();
  private readonly triedWith = signal('');
  protected readonly unconfirmed = computed(() =>
    this.sending.problem()?.type.endsWith('/email-not-confirmed') ? this.triedWith() : null,
  );
  protected readonly form = new FormGroup({
    email: new FormControl('', { nonNullable: true, validators: [Validators.required, Validators.email] }),
    password: new FormControl('', { nonNullable: true, validators: Validators.required }),
  });

  protected signIn(): void {
    this.triedWith.set(this.form.controls.email.value);
    this.sending.send(
      this.form,
      () => this.accounts.signIn(this.form.getRawValue()),
      // Whoever is about to leave is asked first whether that still holds.
      ({ account }) =>
        void this.router.navigateByUrl(account?.deletionAt ? '/account/deletion' : wayBack(this.back())),
    );
  }
}
