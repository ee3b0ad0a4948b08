import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import type { z } from 'zod';
import { memberRoutes as routes, type MemberPage, type MemberRow } from '../../../shared/contract/members';
import { Api } from '../core/api';

/** Members as the desk sees them, and the limits it sets. */
@Injectable({ providedIn: 'root' })
export class Members {
  private readonly api = inject(Api);

  list(
    words: string,
    limitedOnly: boolean,
    cursor?: string,
  ): Observable<{ items: MemberRow[]; next: string | null }> {
    return this.api.call(routes.listMembers, {
      query: { q: words || undefined, limited: limitedOnly ? 'true' : undefined, cursor },
    });
  }

  read(id: number): Observable<MemberPage> {
    return this.api.call(routes.readMember, { params: { id } });
  }

  limit(id: number, body: z.input<typeof routes.limitMember.body>): Observable<MemberPage> {
    return this.api.call(routes.limitMember, { params: { id }, body });
  }

  lift(limitId: number, body: z.input<typeof routes.liftLimit.body>): Observable<MemberPage> {
    return this.api.call(routes.liftLimit, { params: { id: limitId }, body });
  }
}
