import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import {
  proposedEditionRoutes as routes,
  type Opinion,
  type ProposedEdition,
} from '../../../../shared/contract/proposed-editions';
import type { ResponseOf } from '../../../../shared/contract/route';
import { Api } from '../../core/api';

export type ProposedEditionToRead = ResponseOf<typeof routes.readProposedEdition>;

/** Editions that others propose on write-ups of the member who is signed in. */
@Injectable({ providedIn: 'root' })
export class ProposedEditions {
  private readonly api = inject(Api);

  list(cursor?: string): Observable<{ items: ProposedEdition[]; next: string | null }> {
    return this.api.call(routes.listProposedEditions, { query: { cursor } });
  }

  read(id: number): Observable<ProposedEditionToRead> {
    return this.api.call(routes.readProposedEdition, { params: { id } });
  }

  giveOpinion(id: number, opinion: { agrees: boolean; line: string }): Observable<Opinion> {
    return this.api.call(routes.giveOpinion, { params: { id }, body: opinion });
  }
}
