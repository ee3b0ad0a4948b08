import { Injectable, inject } from '@angular/core';
import { Subject, catchError, concat, defer, exhaustMap, map, of, startWith, type Observable } from 'rxjs';
import { searchRoutes, type SearchResults } from '../../../shared/contract/search';
import { Api } from '../core/api';
import { toApiProblem } from '../core/api-problem';
import { loading, type LoadState } from '../core/load';
import type { SearchState } from './search-state';

/** Asks for what matches; one stream for each question, growing by a page whenever `more` says so. */
@Injectable({ providedIn: 'root' })
export class Search {
  private readonly api = inject(Api);

  /**
   * Pages of one question as they come, each state holding all lines so far. A failed further page keeps the lines that
   * are shown and is asked for again at the next `more`.
   */
  pages(
    state: SearchState,
    mine: readonly number[],
    more: Subject<void>,
    limit = 20,
  ): Observable<LoadState<SearchResults>> {
    return defer(() => {
      let sofar: SearchResults | undefined;
      const page = (): Observable<LoadState<SearchResults>> =>
        this.api
          .call(searchRoutes.search, {
            query: { ...state, mine: [...mine], cursor: sofar?.next ?? undefined, limit },
          })
          .pipe(
            map((results): LoadState<SearchResults> => {
              sofar = { ...results, items: [...(sofar?.items ?? []), ...results.items] };
              return { state: 'ready', value: sofar };
            }),
            catchError((error: unknown) =>
              of<LoadState<SearchResults>>({ state: 'failed', problem: toApiProblem(error).problem }),
            ),
          );
      return concat(of<LoadState<SearchResults>>(loading), more.pipe(startWith(undefined), exhaustMap(page)));
    });
  }
}
