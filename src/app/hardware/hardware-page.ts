import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  computed,
  effect,
  inject,
  linkedSignal,
} from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, RouterLink, type ParamMap, type Params } from '@angular/router';
import {
  Subject,
  catchError,
  concat,
  debounceTime,
  defer,
  distinctUntilChanged,
  exhaustMap,
  map,
  of,
  startWith,
  switchMap,
  type Observable,
} from 'rxjs';
import type { PartSummary } from '../../../shared/contract/hardware';
import { PartKind, partKindWords } from '../../../shared/contract/vocabulary';
import { toApiProblem } from '../core/api-problem';
import { loadEach, loading, type LoadState } from '../core/load';
import { ShimloreTitles } from '../core/titles';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Hardware } from './hardware';

interface Asked {
  readonly q: string;
  readonly kind: PartKind | null;
  readonly maker: string | null;
}

interface Found {
  readonly items: readonly PartSummary[];
  readonly next: string | null;
}

const pageSize = 60;
const pauseInTyping = 150;

/** The catalogue: parts under their makers, narrowed by kind, maker and words. The address holds what is asked. */
@Component({
  selector: 'sl-hardware-page',
  imports: [ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './hardware-page.html',
  styleUrl: './hardware-page.scss',
})
export class HardwarePage {
  private readonly hardware = inject(Hardware);
  private readonly route = inject(ActivatedRoute);
  private readonly router = inject(Router);
  private readonly typing = new Subject<string>();
  private readonly wantMore = new Subject<void>();

  protected readonly kinds = PartKind.options.map((value) => ({ value, words: partKindWords[value] }));
  protected readonly kindWords = partKindWords;
  protected readonly asked = toSignal(this.route.queryParamMap.pipe(map(askedIn)), {
    initialValue: { q: '', kind: null, maker: null } as Asked,
  });
  protected readonly words = linkedSignal(() => this.asked().q);
  protected readonly makers = loadEach(of(undefined), () => this.hardware.makers());
  protected readonly makerOptions = computed(() => {
    const now = this.makers();
    return now.state === 'ready' ? now.value.items : [];
  });
  protected readonly state = toSignal(
    this.route.queryParamMap.pipe(
      map(askedIn),
      switchMap((asked) => this.pages(asked)),
    ),
    { initialValue: loading as LoadState<Found> },
  );
  protected readonly shown = linkedSignal<LoadState<Found>, Found | undefined>({
    source: this.state,
    computation: (now, before) => (now.state === 'ready' ? now.value : before?.value),
  });
  protected readonly problem = computed(() => {
    const now = this.state();
    return now.state === 'failed' ? now.problem : null;
  });
  protected readonly narrowed = computed(
    () => this.asked().q !== '' || this.asked().kind !== null || this.asked().maker !== null,
  );

  constructor() {
    this.typing
      .pipe(debounceTime(pauseInTyping), distinctUntilChanged(), takeUntilDestroyed(inject(DestroyRef)))
      .subscribe((q) => this.ask({ q }));
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({
        title: 'Hardware',
        description:
          'Telescopes, focus motors, brackets, gear and belt drives, spacers and clamps, each with its revisions.',
        path: '/hardware',
      }),
    );
  }

  protected type(words: string): void {
    this.words.set(words);
    this.typing.next(words);
  }

  /** Changes some of what is asked; an empty value takes it out of the address. */
  protected ask(change: Partial<Record<keyof Asked, string>>): void {
    const queryParams: Params = Object.fromEntries(
      Object.entries(change).map(([name, value]) => [name, value === '' ? null : value]),
    );
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams,
      queryParamsHandling: 'merge',
      replaceUrl: 'q' in change,
    });
  }

  protected more(): void {
    this.wantMore.next();
  }

  private pages(asked: Asked): Observable<LoadState<Found>> {
    return defer(() => {
      let sofar: Found = { items: [], next: null };
      const page = (): Observable<LoadState<Found>> =>
        this.hardware
          .parts({
            q: asked.q || undefined,
            kind: asked.kind ?? undefined,
            maker: asked.maker ?? undefined,
            cursor: sofar.next ?? undefined,
            limit: pageSize,
          })
          .pipe(
            map(({ items, next }): LoadState<Found> => {
              sofar = { items: [...sofar.items, ...items], next };
              return { state: 'ready', value: sofar };
            }),
            catchError((error: unknown) =>
              of<LoadState<Found>>({ state: 'failed', problem: toApiProblem(error).problem }),
            ),
          );
      return concat(
        of<LoadState<Found>>(loading),
        this.wantMore.pipe(startWith(undefined), exhaustMap(page)),
      );
    });
  }
}

function askedIn(params: ParamMap): Asked {
  const kind = PartKind.safeParse(params.get('kind'));
  return {
    q: (params.get('q') ?? '').slice(0, 100),
    kind: kind.success ? kind.data : null,
    maker: params.get('maker'),
  };
}
