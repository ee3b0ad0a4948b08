import {
  DestroyRef,
  Injectable,
  Injector,
  afterNextRender,
  computed,
  effect,
  inject,
  signal,
  untracked,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { firstValueFrom } from 'rxjs';
import { benchRoutes, type BenchItem, type PartSummary } from '../../../shared/contract/hardware';
import type { Problem } from '../../../shared/contract/problem';
import type { OwnedPart } from '../../../shared/fit/applicability';
import { Api } from '../core/api';
import { ApiProblem, toApiProblem } from '../core/api-problem';
import { Session } from '../core/session';
import { BrowserBench, type BenchEntry } from './browser-bench';

/**
 * What the reader has. A visitor's bench lives in the browser and is read after the first drawing, so that it matches
 * what the server drew; a member's lives on the server. Parts left in the browser when somebody signs in stay in `left`
 * until they are moved over or dropped.
 */
@Injectable({ providedIn: 'root' })
export class BenchStore {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly browser = inject(BrowserBench);
  private readonly destroyed = inject(DestroyRef);
  private readonly local = signal<readonly BenchEntry[]>([]);
  private readonly remote = signal<readonly BenchEntry[]>([]);
  private readonly failure = signal<Problem | null>(null);
  private readonly isMember = computed(() => this.session.account() !== null);
  private readonly accountId = computed(() => this.session.account()?.id ?? null);
  private loadedFor: number | null = null;

  readonly items = computed(() => (this.isMember() ? this.remote() : this.local()));
  readonly size = computed(() => this.items().length);
  /** Why the member's bench could not be read. */
  readonly problem = this.failure.asReadonly();
  /** Parts in this browser that are not yet on the member's bench. */
  readonly left = computed(() => {
    const here = new Set(this.remote().map(keyOf));
    return this.isMember() ? this.local().filter((entry) => !here.has(keyOf(entry))) : [];
  });
  /** What a search call says of a visitor; the server knows a member's bench by itself. */
  readonly revisionIdsToSend = computed(() =>
    this.isMember() ? [] : this.local().flatMap((entry) => (entry.revision ? [entry.revision.id] : [])),
  );
  readonly owned = computed<OwnedPart[]>(() =>
    this.items().map((entry) => ({ partId: entry.part.id, revision: entry.revision })),
  );

  constructor() {
    this.readRemote(untracked(this.accountId));
    effect(() => this.readRemote(this.accountId()));
    afterNextRender(() => this.local.set(this.browser.read()), { injector: inject(Injector) });
  }

  /** Whether this revision of this part (null: not said which) is on the bench. */
  has(partId: number, revisionId: number | null): boolean {
    return this.items().some(
      (entry) => entry.part.id === partId && (entry.revision?.id ?? null) === revisionId,
    );
  }

  /** Rejects with an `ApiProblem`; a part that is there already changes nothing. */
  async add(part: PartSummary, revisionId: number | null): Promise<void> {
    if (this.has(part.id, revisionId)) return;
    if (this.isMember()) {
      const item = await firstValueFrom(
        this.api.call(benchRoutes.addToBench, { body: { partId: part.id, revisionId } }),
      );
      this.remote.update((items) => [...items, item]);
    } else {
      const id = 1 + Math.max(0, ...this.local().map((entry) => entry.id));
      this.keep([...this.local(), { id, part, revision: revisionOf(part, revisionId) }]);
    }
  }

  /** Says which revision an entry is. Rejects with an `ApiProblem`. */
  async choose(entry: BenchEntry, revisionId: number | null): Promise<void> {
    if (this.isMember()) {
      const item = await firstValueFrom(
        this.api.call(benchRoutes.changeBenchItem, { params: { id: entry.id }, body: { revisionId } }),
      );
      this.remote.update((items) => items.map((other) => (other.id === item.id ? item : other)));
    } else {
      this.keep(
        this.local().map((other) =>
          other.id === entry.id ? { ...other, revision: revisionOf(other.part, revisionId) } : other,
        ),
      );
    }
  }

  /** Rejects with an `ApiProblem`. Adding the same part and revision again undoes it. */
  async remove(entry: BenchEntry): Promise<void> {
    if (this.isMember()) {
      await firstValueFrom(this.api.call(benchRoutes.removeFromBench, { params: { id: entry.id } }));
      this.remote.update((items) => items.filter((other) => other.id !== entry.id));
    } else {
      this.keep(this.local().filter((other) => other.id !== entry.id));
    }
  }

  /** Moves what was left in the browser to the member's bench; what cannot be moved stays. Rejects with the first `ApiProblem`. */
  async moveOver(): Promise<void> {
    for (const entry of this.left()) {
      try {
        await this.add(entry.part, entry.revision?.id ?? null);
      } catch (error) {
        if (!(error instanceof ApiProblem && error.is('already-there'))) throw error;
      }
    }
    this.keep([]);
  }

  dropLeft(): void {
    this.keep([]);
  }

  private keep(entries: readonly BenchEntry[]): void {
    this.local.set(entries);
    this.browser.write(entries);
  }

  private readRemote(accountId: number | null): void {
    if (accountId === this.loadedFor) return;
    this.loadedFor = accountId;
    this.remote.set([]);
    this.failure.set(null);
    if (accountId === null) return;
    this.api
      .call(benchRoutes.readBench)
      .pipe(takeUntilDestroyed(this.destroyed))
      .subscribe({
        next: ({ items }: { items: BenchItem[] }) => this.remote.set(items),
        error: (error: unknown) => this.failure.set(toApiProblem(error).problem),
      });
  }
}

function keyOf(entry: BenchEntry): string {
  return `${entry.part.id}/${entry.revision?.id ?? ''}`;
}

function revisionOf(part: PartSummary, revisionId: number | null): BenchEntry['revision'] {
  return part.revisions.find((revision) => revision.id === revisionId) ?? null;
}
