import { inject } from '@angular/core';
import { Router, type CanActivateFn } from '@angular/router';
import type { AccountRole } from '../../../shared/contract/vocabulary';
import { Session } from './session';

/** Lets members in and sends visitors to sign in, with the way back. */
export const mustSignIn: CanActivateFn = (_route, state) => {
  if (inject(Session).account()) return true;
  return inject(Router).createUrlTree(['/account/sign-in'], { queryParams: { back: state.url } });
};

/** Lets in who has the role; an administrator has every role. Others see that there is nothing for them here. */
export function mustBe(role: AccountRole): CanActivateFn {
  return (_route, state) => {
    const session = inject(Session);
    const router = inject(Router);
    const account = session.account();
    if (!account) return router.createUrlTree(['/account/sign-in'], { queryParams: { back: state.url } });
    return account.role === role || account.role === 'administrator'
      ? true
      : router.createUrlTree(['/not-for-you']);
  };
}
