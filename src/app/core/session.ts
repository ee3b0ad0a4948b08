import {
  Injectable,
  PLATFORM_ID,
  REQUEST,
  TransferState,
  computed,
  inject,
  makeStateKey,
  signal,
} from '@angular/core';
import { isPlatformServer } from '@angular/common';
import { firstValueFrom } from 'rxjs';
import { accountRoutes, type Account } from '../../../shared/contract/accounts';
import type { Role } from '../../../shared/contract/vocabulary';
import { Api } from './api';

const stateKey = makeStateKey<Account | null>('account');

/** Who is signed in. Asked once: by the server where it renders the page, else by the browser. */
@Injectable({ providedIn: 'root' })
export class Session {
  private readonly api = inject(Api);
  private readonly transfer = inject(TransferState);
  private readonly onServer = isPlatformServer(inject(PLATFORM_ID));
  private readonly request = inject(REQUEST, { optional: true });
  private readonly current = signal<Account | null>(null);

  readonly account = this.current.asReadonly();
  readonly role = computed<Role>(() => this.current()?.role ?? 'visitor');
  readonly isModerator = computed(() => this.role() === 'moderator' || this.role() === 'administrator');

  /** Learns who is signed in. Where the API does not answer, the reader is taken for a visitor. */
  async load(): Promise<void> {
    if (this.onServer) {
      const account = this.request?.headers.get('cookie')?.includes('shimlore.sid=')
        ? await this.ask()
        : null;
      this.transfer.set(stateKey, account);
      this.current.set(account);
    } else if (this.transfer.hasKey(stateKey)) {
      this.current.set(this.transfer.get(stateKey, null));
      this.transfer.remove(stateKey);
    } else {
      this.current.set(await this.ask());
    }
  }

  /** After signing in or changing the profile: the account that the API answered with. */
  take(account: Account | null): void {
    this.current.set(account);
  }

  /** Ends the session; rejects with an `ApiProblem` when the API refuses. */
  async signOut(): Promise<void> {
    await firstValueFrom(this.api.call(accountRoutes.signOut));
    this.current.set(null);
  }

  private async ask(): Promise<Account | null> {
    try {
      return (await firstValueFrom(this.api.call(accountRoutes.session))).account;
    } catch {
      return null;
    }
  }
}
