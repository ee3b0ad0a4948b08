import {
  FetchBackend,
  HttpBackend,
  HttpResponse,
  type HttpEvent,
  type HttpRequest,
} from '@angular/common/http';
import { Injectable, REQUEST, inject } from '@angular/core';
import { map, type Observable } from 'rxjs';

/**
 * Where rendering on the server sends its calls: to the API on this machine instead of the public address, in the name of
 * the reader whose cookie came with the request. It stands behind every interceptor, so that the transfer cache keys calls
 * by the same relative address as in the browser; response headers that would keep an answer out of that cache (the
 * anti-forgery cookie, `private`) are dropped, since the answer travels in this reader's own page.
 */
@Injectable()
export class InternalBackend implements HttpBackend {
  private readonly fetchBackend = inject(FetchBackend);
  private readonly request = inject(REQUEST, { optional: true });
  private readonly address = process.env['SHIMLORE_INTERNAL_ADDRESS'] ?? 'http://127.0.0.1:4310';

  handle(call: HttpRequest<unknown>): Observable<HttpEvent<unknown>> {
    const { pathname, search } = new URL(call.url, this.address);
    const cookie = this.request?.headers.get('cookie');
    const inward = call.clone({
      url: this.address + pathname + search,
      ...(cookie ? { setHeaders: { cookie } } : {}),
    });
    return this.fetchBackend
      .handle(inward)
      .pipe(map((event) => (event instanceof HttpResponse ? forThisReader(event) : event)));
  }
}

function forThisReader(response: HttpResponse<unknown>): HttpResponse<unknown> {
  return response.clone({ headers: response.headers.delete('set-cookie').delete('cache-control') });
}
