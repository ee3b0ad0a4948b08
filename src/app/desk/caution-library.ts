import { Injectable, inject } from '@angular/core';
import { map, type Observable } from 'rxjs';
import type { z } from 'zod';
import {
  cautionLibraryRoutes as routes,
  type LibraryEntry,
  type LibraryUse,
  type LibraryVersion,
  type LibraryWords,
} from '../../../shared/contract/caution-library';
import type { ResponseOf } from '../../../shared/contract/route';
import { Api } from '../core/api';

/** The library of cautions and its history. A change names the version that was read. */
@Injectable({ providedIn: 'root' })
export class CautionLibrary {
  private readonly api = inject(Api);

  entries(): Observable<LibraryEntry[]> {
    return this.api.call(routes.readCautionLibrary).pipe(map((list) => list.items));
  }

  entry(id: number): Observable<LibraryEntry> {
    return this.api.call(routes.readLibraryEntry, { params: { id } });
  }

  add(body: z.input<typeof LibraryWords>): Observable<LibraryEntry> {
    return this.api.call(routes.addLibraryEntry, { body });
  }

  change(id: number, version: number, body: z.input<typeof LibraryWords>): Observable<LibraryEntry> {
    return this.api.call(routes.changeLibraryEntry, { params: { id }, ifMatch: version, body });
  }

  retire(id: number, version: number, why: string): Observable<LibraryEntry> {
    return this.api.call(routes.retireLibraryEntry, { params: { id }, ifMatch: version, body: { why } });
  }

  putBack(id: number, version: number, why: string): Observable<LibraryEntry> {
    return this.api.call(routes.putBackLibraryEntry, { params: { id }, ifMatch: version, body: { why } });
  }

  order(ids: number[]): Observable<LibraryEntry[]> {
    return this.api.call(routes.orderCautionLibrary, { body: { ids } }).pipe(map((list) => list.items));
  }

  versions(id: number): Observable<LibraryVersion[]> {
    return this.api.call(routes.listLibraryVersions, { params: { id } }).pipe(map((list) => list.items));
  }

  compare(
    id: number,
    from: number,
    to: number,
  ): Observable<ResponseOf<typeof routes.compareLibraryVersions>> {
    return this.api.call(routes.compareLibraryVersions, { params: { id }, query: { from, to } });
  }

  uses(id: number): Observable<LibraryUse[]> {
    return this.api.call(routes.listLibraryUses, { params: { id } }).pipe(map((list) => list.items));
  }

  apply(id: number, version: number, cautionIds: number[]): Observable<LibraryUse[]> {
    return this.api
      .call(routes.applyLibraryEntry, { params: { id }, ifMatch: version, body: { cautionIds } })
      .pipe(map((list) => list.items));
  }
}
