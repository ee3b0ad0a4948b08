import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import { proposalRoutes, type Propose, type Proposal } from '../../../shared/contract/proposals';
import { Api } from '../core/api';

/** What members propose for the catalogue. Failures are `ApiProblem`s. */
@Injectable({ providedIn: 'root' })
export class Proposals {
  private readonly api = inject(Api);

  propose(body: Propose): Observable<Proposal> {
    return this.api.call(proposalRoutes.propose, { body });
  }

  /** The newest first. */
  mine(cursor?: string): Observable<{ items: Proposal[]; next: string | null }> {
    return this.api.call(proposalRoutes.listMyProposals, { query: { cursor } });
  }
}
