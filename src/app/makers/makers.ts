import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import type { Revision } from '../../../shared/contract/hardware';
import {
  makerRoutes as routes,
  type AnnounceRevision,
  type AskToSpeak,
  type DeskMakerRequest,
  type MakerAnswer,
  type MakerLetter,
  type MakerPage,
  type MakerRequest,
  type MakerSide,
  type WantedReadings,
} from '../../../shared/contract/makers';
import type { ResponseOf } from '../../../shared/contract/route';
import { Api } from '../core/api';

/** Makers: their pages, who speaks for them, what they say on write-ups and announce. Failures are `ApiProblem`s. */
@Injectable({ providedIn: 'root' })
export class Makers {
  private readonly api = inject(Api);

  read(slug: string): Observable<MakerPage> {
    return this.api.call(routes.readMaker, { params: { slug } });
  }

  ask(slug: string, body: AskToSpeak): Observable<MakerRequest> {
    return this.api.call(routes.askToSpeak, { params: { slug }, body });
  }

  prove(token: string): Observable<ResponseOf<typeof routes.proveByMail>> {
    return this.api.call(routes.proveByMail, { body: { token } });
  }

  stopSpeaking(slug: string): Observable<unknown> {
    return this.api.call(routes.stopSpeaking, { params: { slug } });
  }

  request(id: string): Observable<DeskMakerRequest> {
    return this.api.call(routes.readMakerRequest, { params: { id } });
  }

  decide(id: number, body: { granted: boolean; reason: string }): Observable<unknown> {
    return this.api.call(routes.decideMakerRequest, { params: { id: String(id) }, body });
  }

  endSpeaking(slug: string, body: { accountId: number; reason: string }): Observable<unknown> {
    return this.api.call(routes.endSpeaking, { params: { slug }, body });
  }

  changeAddresses(
    slug: string,
    body: { mailDomain: string | null; contactAddress: string | null },
  ): Observable<unknown> {
    return this.api.call(routes.changeMakerAddresses, { params: { slug }, body });
  }

  /** What the makers of its parts say on a write-up. */
  side(slug: string): Observable<MakerSide> {
    return this.api.call(routes.readMakerSide, { params: { slug } });
  }

  answer(slug: string, maker: string, text: string): Observable<MakerAnswer> {
    return this.api.call(routes.putMakerAnswer, { params: { slug, maker }, body: { text } });
  }

  takeBackAnswer(slug: string, maker: string, reason: string): Observable<unknown> {
    return this.api.call(routes.takeBackMakerAnswer, { params: { slug, maker }, body: { reason } });
  }

  /** `fixKeys` null: every fix of the write-up. */
  markMadeRight(
    slug: string,
    body: { revisionId: number; fixKeys: string[] | null },
  ): Observable<{ fixKeys: string[] }> {
    return this.api.call(routes.markMadeRight, { params: { slug }, body });
  }

  unmarkMadeRight(slug: string, fixKeys: string[]): Observable<{ fixKeys: string[] }> {
    return this.api.call(routes.unmarkMadeRight, { params: { slug }, body: { fixKeys } });
  }

  announce(partSlug: string, body: AnnounceRevision): Observable<Revision> {
    return this.api.call(routes.announceRevision, { params: { slug: partSlug }, body });
  }

  changeAnnounced(id: number, body: AnnounceRevision): Observable<Revision> {
    return this.api.call(routes.changeAnnounced, { params: { id: String(id) }, body });
  }

  sell(id: number, soldFrom: string): Observable<Revision> {
    return this.api.call(routes.sellRevision, { params: { id: String(id) }, body: { soldFrom } });
  }

  withdrawAnnounced(id: number): Observable<unknown> {
    return this.api.call(routes.withdrawAnnounced, { params: { id: String(id) } });
  }

  wantedReadings(partSlug: string): Observable<{ items: WantedReadings[] }> {
    return this.api.call(routes.listWantedReadings, { params: { slug: partSlug } });
  }

  letter(slug: string, maker: string): Observable<MakerLetter> {
    return this.api.call(routes.readMakerLetter, { params: { slug, maker } });
  }

  sendLetter(slug: string, maker: string, note: string): Observable<MakerLetter> {
    return this.api.call(routes.sendMakerLetter, { params: { slug, maker }, body: { note } });
  }
}
