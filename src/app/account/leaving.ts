import { HttpClient, HttpErrorResponse, type HttpResponse } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { catchError, from, map, switchMap, tap, throwError, type Observable } from 'rxjs';
import {
  deletionRoutes,
  type AskForDeletion,
  type Deletion,
  type OfferedHandOver,
} from '../../../shared/contract/deletion';
import { exportRoutes } from '../../../shared/contract/export';
import { Api } from '../core/api';
import { toApiProblem } from '../core/api-problem';
import { Session } from '../core/session';

/** Taking one's data away, leaving for good, and looking after what others leave. Failures are `ApiProblem`s. */
@Injectable({ providedIn: 'root' })
export class Leaving {
  private readonly api = inject(Api);
  private readonly http = inject(HttpClient);
  private readonly session = inject(Session);

  read(): Observable<Deletion> {
    return this.api.call(deletionRoutes.readDeletion);
  }

  ask(body: AskForDeletion): Observable<Deletion> {
    return this.api.call(deletionRoutes.askForDeletion, { body }).pipe(this.tellSession());
  }

  callOff(): Observable<Deletion> {
    return this.api.call(deletionRoutes.callDeletionOff).pipe(this.tellSession());
  }

  offers(): Observable<OfferedHandOver[]> {
    return this.api.call(deletionRoutes.listHandOvers).pipe(map(({ items }) => items));
  }

  take(id: number): Observable<OfferedHandOver[]> {
    return this.api.call(deletionRoutes.takeHandOver, { params: { id } }).pipe(map(({ items }) => items));
  }

  decline(id: number): Observable<OfferedHandOver[]> {
    return this.api.call(deletionRoutes.declineHandOver, { params: { id } }).pipe(map(({ items }) => items));
  }

  /** The archive with the name it is to be kept under. */
  archive(): Observable<{ file: Blob; name: string }> {
    return this.http.get(exportRoutes.exportOwnData.path, { responseType: 'blob', observe: 'response' }).pipe(
      map((answer) => ({ file: answer.body ?? new Blob(), name: nameOf(answer) })),
      catchError((error: unknown) =>
        from(readable(error)).pipe(switchMap((read) => throwError(() => toApiProblem(read)))),
      ),
    );
  }

  private tellSession() {
    return tap(({ deletionAt }: Deletion) => {
      const account = this.session.account();
      if (account) this.session.take({ ...account, deletionAt });
    });
  }
}

function nameOf(answer: HttpResponse<Blob>): string {
  return /filename="?([\w.-]+)/.exec(answer.headers.get('content-disposition') ?? '')?.[1] ?? 'shimlore.zip';
}

/** Where a file was asked for, a refusal comes as one too. */
async function readable(error: unknown): Promise<unknown> {
  if (!(error instanceof HttpErrorResponse) || !(error.error instanceof Blob)) return error;
  const { status, statusText, headers } = error;
  return new HttpErrorResponse({ error: await error.error.text(), status, statusText, headers });
}
