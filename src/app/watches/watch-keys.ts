import { Injectable, computed, effect, inject, signal, untracked } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { WatchSubject } from '../../../shared/contract/watches';
import { Session } from '../core/session';
import { Watches } from './watches';

/** Which things the reader watches; asked for once, when the first page wants to know. */
@Injectable({ providedIn: 'root' })
export class WatchKeys {
  private readonly watches = inject(Watches);
  private readonly session = inject(Session);
  private readonly accountId = computed(() => this.session.account()?.id ?? null);
  private readonly keys = signal<ReadonlySet<string> | null>(null);
  private askedFor: number | null = null;

  /** False until it is known what is watched. */
  readonly known = computed(() => this.keys() !== null);

  constructor() {
    effect(() => {
      const accountId = this.accountId();
      untracked(() => this.ask(accountId));
    });
  }

  has(subject: WatchSubject, id: number): boolean {
    return this.keys()?.has(keyOf(subject, id)) ?? false;
  }

  /** Begins or ends a watch. Rejects with an `ApiProblem`. */
  async set(subject: WatchSubject, id: number, watched: boolean): Promise<void> {
    await firstValueFrom(watched ? this.watches.watch(subject, id) : this.watches.end(subject, id));
    this.keys.update((before) => {
      const keys = new Set(before);
      if (watched) keys.add(keyOf(subject, id));
      else keys.delete(keyOf(subject, id));
      return keys;
    });
  }

  private ask(accountId: number | null): void {
    if (accountId === this.askedFor) return;
    this.askedFor = accountId;
    this.keys.set(null);
    if (accountId === null) return;
    this.watches.keys().subscribe({
      next: ({ keys }) => {
        if (this.askedFor === accountId) this.keys.set(new Set(keys));
      },
      // A button that does not know whether it is pressed still works: watching twice is watching once.
      error: () => this.keys.set(new Set()),
    });
  }
}

function keyOf(subject: WatchSubject, id: number): string {
  return `${subject}/${id}`;
}
