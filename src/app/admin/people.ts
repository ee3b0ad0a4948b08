import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import { accountRoutes, type AccountRow } from '../../../shared/contract/accounts';
import type { AccountRole } from '../../../shared/contract/vocabulary';
import { Api } from '../core/api';

/** The accounts, for administrators. */
@Injectable({ providedIn: 'root' })
export class People {
  private readonly api = inject(Api);

  list(words: string, cursor?: string): Observable<{ items: AccountRow[]; next: string | null }> {
    return this.api.call(accountRoutes.listAccounts, { query: { q: words || undefined, cursor } });
  }

  changeRole(id: number, role: AccountRole): Observable<AccountRow> {
    return this.api.call(accountRoutes.changeRole, { params: { id }, body: { role } });
  }
}
