import { Injectable, inject, signal } from '@angular/core';
import { EMPTY, catchError, expand, map, of, takeWhile, tap, type Observable } from 'rxjs';
import {
  hardwareRoutes,
  type PartSummary,
  type RevisionRef,
  type Symptom,
} from '../../../../shared/contract/hardware';
import type { Photo } from '../../../../shared/contract/photos';
import type { ContentNames } from '../../../../shared/text/edition-fields';
import { Api } from '../../core/api';

const pageSize = 100;

/** Names of parts, revisions and symptoms for the editor; what was read once is kept. */
@Injectable({ providedIn: 'root' })
export class PartDirectory {
  private readonly api = inject(Api);
  private readonly known = signal<ReadonlyMap<number, PartSummary>>(new Map());

  part(id: number | null): PartSummary | undefined {
    return id === null ? undefined : this.known().get(id);
  }

  partName(id: number | null): string {
    return this.part(id)?.name ?? (id === null ? 'no part chosen' : `part ${id}`);
  }

  revision(id: number): RevisionRef | undefined {
    for (const part of this.known().values()) {
      const found = part.revisions.find((revision) => revision.id === id);
      if (found) return found;
    }
    return undefined;
  }

  /** "M1 Rev B"; the number where the catalogue does not know it. */
  revisionName(id: number): string {
    const revision = this.revision(id);
    return revision ? `${this.partName(revision.partId)} ${revision.label}` : `revision ${id}`;
  }

  /** Names for all that a text points at. Symptoms go by the words of their address. */
  namesWith(photos: ReadonlyMap<number, Photo>): ContentNames {
    return {
      part: (id) => this.partName(id),
      revision: (id) => this.revisionName(id),
      symptom: (slug) => slug.replaceAll('-', ' '),
      photo: (id) => photos.get(id)?.alt ?? `photo ${id}`,
    };
  }

  /** Parts whose name or maker matches; at most twelve. Null where the catalogue does not answer. */
  find(words: string): Observable<PartSummary[] | null> {
    return this.api.call(hardwareRoutes.listParts, { query: { q: words, limit: 12 } }).pipe(
      map((page) => page.items),
      tap((parts) => this.keep(parts)),
      catchError(() => of(null)),
    );
  }

  /** Reads the catalogue page by page until all these parts are known. Parts that it lacks keep their number for a name. */
  learn(ids: readonly number[]): Observable<unknown> {
    const lacks = () => ids.some((id) => !this.known().has(id));
    if (!lacks()) return EMPTY;
    const page = (cursor?: string) =>
      this.api.call(hardwareRoutes.listParts, { query: { limit: pageSize, cursor } });
    return page().pipe(
      tap(({ items }) => this.keep(items)),
      expand(({ next }) =>
        next === null || !lacks() ? EMPTY : page(next).pipe(tap(({ items }) => this.keep(items))),
      ),
      takeWhile(lacks),
      catchError(() => EMPTY),
    );
  }

  symptoms(): Observable<Symptom[]> {
    return this.api.call(hardwareRoutes.listSymptoms).pipe(map((list) => list.items));
  }

  private keep(parts: readonly PartSummary[]): void {
    this.known.update(
      (known) => new Map([...known, ...parts.map((part): [number, PartSummary] => [part.id, part])]),
    );
  }
}
