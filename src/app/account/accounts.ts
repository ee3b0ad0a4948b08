import { Injectable, inject } from '@angular/core';
import { tap, type Observable } from 'rxjs';
import type { z } from 'zod';
import {
  accountRoutes,
  type Session as SessionAnswer,
  type SignIn,
  type SignUp,
} from '../../../shared/contract/accounts';
import { Api } from '../core/api';
import { Session } from '../core/session';

type ProfileChange = z.input<typeof accountRoutes.changeProfile.body>;

/** What people do with their own account. Whoever is signed in afterwards is told to the session. */
@Injectable({ providedIn: 'root' })
export class Accounts {
  private readonly api = inject(Api);
  private readonly session = inject(Session);

  signIn(body: z.input<typeof SignIn>): Observable<SessionAnswer> {
    return this.api.call(accountRoutes.signIn, { body }).pipe(this.takeIn());
  }

  signUp(body: z.input<typeof SignUp>): Observable<unknown> {
    return this.api.call(accountRoutes.signUp, { body });
  }

  confirm(token: string): Observable<SessionAnswer> {
    return this.api.call(accountRoutes.confirmEmail, { body: { token } }).pipe(this.takeIn());
  }

  resendConfirmation(email: string): Observable<unknown> {
    return this.api.call(accountRoutes.resendConfirmation, { body: { email } });
  }

  askForReset(email: string): Observable<unknown> {
    return this.api.call(accountRoutes.requestPasswordReset, { body: { email } });
  }

  /** Sets the password; every session of the account ends with it, this one too. */
  resetPassword(token: string, password: string): Observable<unknown> {
    return this.api
      .call(accountRoutes.resetPassword, { body: { token, password } })
      .pipe(tap(() => this.session.take(null)));
  }

  changeProfile(body: ProfileChange): Observable<SessionAnswer> {
    return this.api.call(accountRoutes.changeProfile, { body }).pipe(this.takeIn());
  }

  /** Mails a link by which an address that mail came back from takes mail again. */
  confirmAddressAgain(): Observable<unknown> {
    return this.api.call(accountRoutes.confirmAddressAgain);
  }

  private takeIn() {
    return tap((answer: SessionAnswer) => this.session.take(answer.account));
  }
}
