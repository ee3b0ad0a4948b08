import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import type { CallOf, ResponseOf } from '../../../shared/contract/route';
import {
  writeUpRoutes,
  type EditionComparison,
  type EditionLine,
  type Trial,
  type WriteUpPage,
} from '../../../shared/contract/write-ups';
import { Api } from '../core/api';

/** Published write-ups, their editions and trials. Failures are `ApiProblem`s. */
@Injectable({ providedIn: 'root' })
export class WriteUps {
  private readonly api = inject(Api);

  read(slug: string): Observable<WriteUpPage> {
    return this.api.call(writeUpRoutes.readWriteUp, { params: { slug } });
  }

  editions(slug: string): Observable<{ items: EditionLine[] }> {
    return this.api.call(writeUpRoutes.listEditions, { params: { slug } });
  }

  edition(slug: string, number: number): Observable<ResponseOf<typeof writeUpRoutes.readEdition>> {
    return this.api.call(writeUpRoutes.readEdition, { params: { slug, number } });
  }

  compare(slug: string, from: number, to: number): Observable<EditionComparison> {
    return this.api.call(writeUpRoutes.compareEditions, { params: { slug }, query: { from, to } });
  }

  reportTrial(slug: string, trial: CallOf<typeof writeUpRoutes.reportTrial>['body']): Observable<Trial> {
    return this.api.call(writeUpRoutes.reportTrial, { params: { slug }, body: trial });
  }
}
