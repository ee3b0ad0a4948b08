import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import {
  hardwareRoutes,
  type MakerRef,
  type PartPage,
  type PartSummary,
  type RevisionPhoto,
  type Symptom,
} from '../../../shared/contract/hardware';
import type { CallOf } from '../../../shared/contract/route';
import { whichOneRoutes, type WhichOne } from '../../../shared/contract/which-one';
import { Api } from '../core/api';

/** The catalogue: makers, parts, symptoms. Failures are `ApiProblem`s. */
@Injectable({ providedIn: 'root' })
export class Hardware {
  private readonly api = inject(Api);

  parts(
    query: CallOf<typeof hardwareRoutes.listParts>['query'],
  ): Observable<{ items: PartSummary[]; next: string | null }> {
    return this.api.call(hardwareRoutes.listParts, { query });
  }

  part(slug: string): Observable<PartPage> {
    return this.api.call(hardwareRoutes.readPart, { params: { slug } });
  }

  whichOne(slug: string): Observable<WhichOne> {
    return this.api.call(whichOneRoutes.readWhichOne, { params: { slug } });
  }

  /** Shows a photo of mine at how to tell the revision. */
  addRevisionPhoto(
    revisionId: number,
    body: { photoId: number; caption: string },
  ): Observable<RevisionPhoto> {
    return this.api.call(hardwareRoutes.addRevisionPhoto, { params: { id: String(revisionId) }, body });
  }

  removeRevisionPhoto(revisionId: number, photoId: number): Observable<void> {
    return this.api.call(hardwareRoutes.removeRevisionPhoto, {
      params: { id: String(revisionId), photoId: String(photoId) },
    });
  }

  makers(): Observable<{ items: MakerRef[] }> {
    return this.api.call(hardwareRoutes.listMakers);
  }

  symptoms(): Observable<{ items: Symptom[] }> {
    return this.api.call(hardwareRoutes.listSymptoms);
  }
}
