import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import { writeUpRoutes, type Draft, type EditionView } from '../../../../shared/contract/write-ups';
import type { EditionState } from '../../../../shared/contract/vocabulary';
import { Api } from '../../core/api';
import type { EditionText } from './edition-form';

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

  save(id: number, text: EditionText, version: number): Observable<Draft> {
    return this.api.call(writeUpRoutes.saveDraft, { params: { id }, body: text, ifMatch: version });
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
