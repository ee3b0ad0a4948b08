import { Signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { catchError, map, of, startWith, switchMap, type Observable } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from './api-problem';

/** What is known of something that comes from the API. */
export type LoadState<T> =
  | { readonly state: 'loading' }
  | { readonly state: 'ready'; readonly value: T }
  | { readonly state: 'failed'; readonly problem: Problem };

export const loading: LoadState<never> = { state: 'loading' };

/** One call as a stream of states. */
export function statesOf<T>(call: Observable<T>): Observable<LoadState<T>> {
  return call.pipe(
    map((value): LoadState<T> => ({ state: 'ready', value })),
    catchError((error: unknown) =>
      of<LoadState<T>>({ state: 'failed', problem: toApiProblem(error).problem }),
    ),
    startWith<LoadState<T>>(loading),
  );
}

/**
 * Loads anew for each value of the source and forgets what it supersedes. Subscribes at once: where the server has
 * rendered the page, the first state in the browser is `ready` already and nothing flickers. Call it while constructing.
 */
export function loadEach<P, T>(
  source: Observable<P>,
  load: (value: P) => Observable<T>,
): Signal<LoadState<T>> {
  return toSignal(source.pipe(switchMap((value) => statesOf(load(value)))), {
    initialValue: loading as LoadState<T>,
  });
}
