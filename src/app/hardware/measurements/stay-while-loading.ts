import { linkedSignal, type Signal } from '@angular/core';
import type { LoadState } from '../../core/load';

/** What is known, with the last answer left standing while the next one is on its way. */
export function redrawnWhile<T>(loaded: Signal<LoadState<T>>): Signal<LoadState<T>> {
  return linkedSignal<LoadState<T>, LoadState<T>>({
    source: loaded,
    computation: (now, before) =>
      now.state === 'loading' && before?.value.state === 'ready' ? before.value : now,
  });
}
