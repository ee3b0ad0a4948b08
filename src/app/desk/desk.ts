import { Injectable, inject } from '@angular/core';
import { map, type Observable } from 'rxjs';
import type { z } from 'zod';
import {
  deskRoutes,
  type DeskEdition,
  type LibraryCaution,
  PlaceCaution,
} from '../../../shared/contract/moderation';
import {
  proposalRoutes,
  type DeskProposal,
  type Merge,
  type Proposed,
} from '../../../shared/contract/proposals';
import type { Caution } from '../../../shared/contract/write-ups';
import { Api } from '../core/api';

export type CautionWords = z.input<typeof deskRoutes.changeCaution.body>;

/** What moderators read and do. */
@Injectable({ providedIn: 'root' })
export class Desk {
  private readonly api = inject(Api);

  edition(id: number): Observable<DeskEdition> {
    return this.api.call(deskRoutes.readDeskEdition, { params: { id } });
  }

  library(): Observable<LibraryCaution[]> {
    return this.api.call(deskRoutes.listLibraryCautions).pipe(map((list) => list.items));
  }

  place(body: z.input<typeof PlaceCaution>): Observable<Caution> {
    return this.api.call(deskRoutes.placeCaution, { body });
  }

  reword(id: number, body: CautionWords): Observable<Caution> {
    return this.api.call(deskRoutes.changeCaution, { params: { id }, body });
  }

  /** Puts a caution that stands at another place of an edition. */
  move(id: number, body: z.input<typeof deskRoutes.moveCaution.body>): Observable<Caution> {
    return this.api.call(deskRoutes.moveCaution, { params: { id }, body });
  }

  remove(id: number): Observable<unknown> {
    return this.api.call(deskRoutes.removeCaution, { params: { id } });
  }

  publish(id: number, note: string): Observable<{ slug: string; number: number }> {
    return this.api.call(deskRoutes.publishEdition, { params: { id }, body: { note } });
  }

  proposals(cursor?: string): Observable<{ items: DeskProposal[]; next: string | null }> {
    return this.api.call(proposalRoutes.listDeskProposals, { query: { cursor } });
  }

  /** `entry`: what the moderator made of it; null takes it as it is. */
  take(id: number, entry: Proposed | null): Observable<{ slug: string }> {
    return this.api.call(proposalRoutes.takeProposal, { params: { id }, body: { entry } });
  }

  decline(id: number, reason: string): Observable<unknown> {
    return this.api.call(proposalRoutes.declineProposal, { params: { id }, body: { reason } });
  }

  merge(body: Merge): Observable<{ slug: string }> {
    return this.api.call(proposalRoutes.merge, { body });
  }

  giveBack(id: number, reason: string): Observable<unknown> {
    return this.api.call(deskRoutes.returnEdition, { params: { id }, body: { reason } });
  }
}
