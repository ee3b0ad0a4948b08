import { HttpClient, HttpParams } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { catchError, throwError, type Observable } from 'rxjs';
import type { CallOf, ResponseOf, RouteDefinition } from '../../../shared/contract/route';
import { toApiProblem } from './api-problem';

/** What goes with a call: only the parts that its route declares. */
export type CallParts<R extends RouteDefinition> = {
  readonly [K in keyof CallOf<R> as CallOf<R>[K] extends undefined ? never : K]?: CallOf<R>[K];
} & {
  /** Version that was read, on routes with `ifMatch`. */
  readonly ifMatch?: number;
  /** The file, on multipart routes. */
  readonly file?: Blob;
};

/** Calls the API by its declared routes. Every failure is an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class Api {
  private readonly http = inject(HttpClient);

  call<R extends RouteDefinition>(route: R, parts: CallParts<R> = {}): Observable<ResponseOf<R>> {
    const { params, query, body, ifMatch, file } = parts as LooseParts;
    return this.http
      .request(route.method, addressOf(route.path, params), {
        params: queryOf(query),
        body: file ? formOf(body, file) : body,
        headers: ifMatch === undefined ? {} : { 'If-Match': `"${ifMatch}"` },
        responseType: 'json',
      })
      .pipe(catchError((error: unknown) => throwError(() => toApiProblem(error)))) as Observable<
      ResponseOf<R>
    >;
  }
}

interface LooseParts {
  params?: Record<string, unknown>;
  query?: Record<string, unknown>;
  body?: unknown;
  ifMatch?: number;
  file?: Blob;
}

function addressOf(path: string, params: Record<string, unknown> = {}): string {
  return path.replace(/:([a-zA-Z]+)/g, (_, name: string) => encodeURIComponent(String(params[name])));
}

/** Absent and empty values leave no trace in the address; lists name their field once for each value. */
function queryOf(query: Record<string, unknown> = {}): HttpParams {
  let params = new HttpParams();
  for (const [name, value] of Object.entries(query)) {
    for (const one of Array.isArray(value) ? value : [value]) {
      if (one !== undefined && one !== null && one !== '') params = params.append(name, String(one));
    }
  }
  return params;
}

function formOf(body: unknown, file: Blob): FormData {
  const form = new FormData();
  for (const [name, value] of Object.entries((body ?? {}) as Record<string, unknown>))
    form.append(name, String(value));
  form.append('file', file);
  return form;
}
