import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import { deskPostRoutes, type DeskFirstPost, type DeskPhoto } from '../../../shared/contract/desk-posts';
import {
  deskQueueRoutes as routes,
  type Claim,
  type DeskItemKind,
  type DeskQueue,
} from '../../../shared/contract/desk-queue';
import { flagRoutes, type DeskFlag, type FlagOutcome } from '../../../shared/contract/flags';
import { proposalRoutes, type DeskProposal } from '../../../shared/contract/proposals';
import type { TakenDownKind } from '../../../shared/contract/taken-down';
import { Api } from '../core/api';

/** One item of the queue, whatever it is. */
export interface DeskItemRef {
  readonly kind: DeskItemKind;
  readonly id: number;
}

/** What the queue is kept to. */
export interface QueueWish {
  readonly kind?: DeskItemKind | undefined;
  readonly claim?: 'free' | 'mine' | undefined;
  readonly words?: string | undefined;
}

/** The queue of the desk, who has what in hand, and the items that are no editions. */
@Injectable({ providedIn: 'root' })
export class DeskItems {
  private readonly api = inject(Api);

  queue(wish: QueueWish, cursor?: string): Observable<DeskQueue> {
    return this.api.call(routes.readDesk, { query: { ...wish, cursor } });
  }

  claim(params: DeskItemRef, takeOverFrom: number | null = null): Observable<Claim> {
    return this.api.call(routes.claimItem, { params, body: { takeOverFrom } });
  }

  claimOf(params: DeskItemRef): Observable<{ claim: Claim | null }> {
    return this.api.call(routes.readClaim, { params });
  }

  giveUp(params: DeskItemRef): Observable<unknown> {
    return this.api.call(routes.giveUpClaim, { params });
  }

  putBack(kind: TakenDownKind, id: number, reason: string): Observable<unknown> {
    return this.api.call(routes.putBack, { params: { kind, id }, body: { reason } });
  }

  proposal(id: number): Observable<DeskProposal> {
    return this.api.call(proposalRoutes.readDeskProposal, { params: { id } });
  }

  flag(id: number): Observable<DeskFlag> {
    return this.api.call(flagRoutes.readDeskFlag, { params: { id } });
  }

  settleFlag(id: number, outcome: FlagOutcome, reason: string): Observable<unknown> {
    return this.api.call(flagRoutes.settleFlag, { params: { id }, body: { outcome, reason } });
  }

  firstPost(id: number): Observable<DeskFirstPost> {
    return this.api.call(deskPostRoutes.readFirstPost, { params: { id } });
  }

  postIsFine(id: number): Observable<unknown> {
    return this.api.call(deskPostRoutes.findPostFine, { params: { id } });
  }

  takePostDown(id: number, reason: string): Observable<unknown> {
    return this.api.call(deskPostRoutes.takePostDown, { params: { id }, body: { reason } });
  }

  photo(id: number): Observable<DeskPhoto> {
    return this.api.call(deskPostRoutes.readDeskPhoto, { params: { id } });
  }

  photoIsFine(id: number): Observable<unknown> {
    return this.api.call(deskPostRoutes.findPhotoFine, { params: { id } });
  }

  takePhotoDown(id: number, reason: string): Observable<unknown> {
    return this.api.call(deskPostRoutes.takePhotoDown, { params: { id }, body: { reason } });
  }
}
