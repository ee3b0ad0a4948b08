import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import type { z } from 'zod';
import {
  noticeRoutes,
  watchRoutes,
  type Notice,
  type NoticeFilter,
  type WatchEntry,
  type WatchSubject,
} from '../../../shared/contract/watches';
import { Api } from '../core/api';

export interface Page<Item> {
  readonly items: Item[];
  readonly next: string | null;
}

/** Watches and notices as the API has them. */
@Injectable({ providedIn: 'root' })
export class Watches {
  private readonly api = inject(Api);

  watch(subject: WatchSubject, id: number): Observable<unknown> {
    return this.api.call(watchRoutes.watch, { params: { subject, id } });
  }

  end(subject: WatchSubject, id: number): Observable<unknown> {
    return this.api.call(watchRoutes.endWatch, { params: { subject, id } });
  }

  keys(): Observable<{ keys: string[] }> {
    return this.api.call(watchRoutes.listMyWatchKeys);
  }

  mine(cursor: string | undefined): Observable<Page<WatchEntry>> {
    return this.api.call(watchRoutes.listMyWatches, { query: { cursor, limit: 50 } });
  }

  notices(query: {
    cursor: string | undefined;
    unread: boolean;
    about: NoticeFilter | undefined;
  }): Observable<Page<Notice>> {
    const { cursor, about } = query;
    return this.api.call(noticeRoutes.listMyNotices, {
      query: { cursor, about, unread: query.unread ? 'true' : undefined, limit: 40 },
    });
  }

  unreadCount(): Observable<{ unread: number }> {
    return this.api.call(noticeRoutes.countMyNotices);
  }

  markRead(which: z.input<typeof noticeRoutes.markNoticesRead.body>): Observable<{ readAt: string }> {
    return this.api.call(noticeRoutes.markNoticesRead, { body: which });
  }

  markUnread(readAt: string): Observable<unknown> {
    return this.api.call(noticeRoutes.markNoticesUnread, { body: { readAt } });
  }
}
