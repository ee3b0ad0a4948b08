import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import { writeUpRoutes, type Draft, type EditionView } from '../../../../shared/contract/write-ups';
import { proposedEditionRoutes, type MergeGround } from '../../../../shared/contract/proposed-editions';
import type { EditionState } from '../../../../shared/contract/vocabulary';
import type { EditionText } from '../../../../shared/editions/edition-text';
import { Api } from '../../core/api';

/** Drafts of the member who is signed in. */
@Injectable({ providedIn: 'root' })
export class Drafts {
  private readonly api = inject(Api);

  start(title: string): Observable<Draft> {
    return this.api.call(writeUpRoutes.startWriteUp, { body: { title } });
  }

  /** Starts the next edition, or gives back the one that is open already. */
  startEdition(slug: string): Observable<Draft> {
    return this.api.call(writeUpRoutes.startEdition, { params: { slug } });
  }

  read(id: number): Observable<Draft> {
    return this.api.call(writeUpRoutes.readDraft, { params: { id } });
  }

  /** `baseEditionId`: the published edition that the text was merged with since it was saved last. */
  save(id: number, text: EditionText, version: number, baseEditionId?: number): Observable<Draft> {
    const body = { ...text, ...(baseEditionId === undefined ? {} : { baseEditionId }) };
    return this.api.call(writeUpRoutes.saveDraft, { params: { id }, body, ifMatch: version });
  }

  /** What the draft began from, and what is published now. */
  mergeGround(id: number): Observable<MergeGround> {
    return this.api.call(proposedEditionRoutes.readMergeGround, { params: { id } });
  }

  /** Starts the next edition with the text of an earlier one. */
  bringBack(slug: string, number: number): Observable<Draft> {
    return this.api.call(proposedEditionRoutes.bringEditionBack, { params: { slug, number } });
  }

  preview(id: number): Observable<{ view: EditionView }> {
    return this.api.call(writeUpRoutes.previewDraft, { params: { id } });
  }

  submit(id: number, version: number): Observable<Draft> {
    return this.api.call(writeUpRoutes.submitDraft, { params: { id }, ifMatch: version });
  }

  recall(id: number): Observable<Draft> {
    return this.api.call(writeUpRoutes.recallDraft, { params: { id } });
  }

  discard(id: number): Observable<undefined> {
    return this.api.call(writeUpRoutes.discardDraft, { params: { id } });
  }

  restore(id: number): Observable<Draft> {
    return this.api.call(writeUpRoutes.restoreDraft, { params: { id } });
  }

  mine(state: EditionState | undefined, cursor?: string) {
    return this.api.call(writeUpRoutes.listMine, { query: { state, cursor } });
  }
}
