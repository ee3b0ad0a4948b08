import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  ElementRef,
  computed,
  effect,
  inject,
  linkedSignal,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed, toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import {
  Subject,
  combineLatest,
  debounceTime,
  distinctUntilChanged,
  map,
  skip,
  startWith,
  switchMap,
} from 'rxjs';
import type { SearchResults } from '../../../shared/contract/search';
import { BenchStore } from '../bench/bench-store';
import { loading, type LoadState } from '../core/load';
import { ShimloreTitles } from '../core/titles';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { FilterPanel } from './filter-panel';
import { ResultLine } from './result-line';
import { Search } from './search';
import {
  addressOfSearch,
  chosenCount,
  emptySearch,
  searchStateOf,
  toggled,
  type FilterName,
  type SearchState,
} from './search-state';
import { SymptomField } from './symptom-field';

const pauseInTyping = 150;

/** Results as one types. The address holds all that is asked; the bench decides what comes first. */
@Component({
  selector: 'sl-search-page',
  imports: [FilterPanel, Icon, ProblemNote, ResultLine, RouterLink, SymptomField],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './search-page.html',
  styleUrl: './search-page.scss',
})
export class SearchPage {
  private readonly bench = inject(BenchStore);
  private readonly route = inject(ActivatedRoute);
  private readonly router = inject(Router);
  private readonly search = inject(Search);
  private readonly typing = new Subject<string>();
  private readonly wantMore = new Subject<void>();
  private readonly asked = new Subject<void>();
  private readonly sheet = viewChild.required<ElementRef<HTMLDialogElement>>('sheet');

  protected readonly asking = toSignal(this.route.queryParamMap.pipe(map(searchStateOf)), {
    initialValue: emptySearch,
  });
  private readonly mine = toObservable(this.bench.revisionIdsToSend).pipe(
    skip(1),
    startWith(this.bench.revisionIdsToSend()),
  );

  protected readonly results = toSignal(
    combineLatest([
      this.route.queryParamMap.pipe(map(searchStateOf), distinctUntilChanged(sameSearch)),
      this.mine.pipe(distinctUntilChanged((one, other) => one.join() === other.join())),
      this.asked.pipe(startWith(undefined)),
    ]).pipe(switchMap(([state, mine]) => this.search.pages(state, mine, this.wantMore))),
    { initialValue: loading as LoadState<SearchResults> },
  );
  /** The last answer stays on screen, faint, until the next one is there. */
  protected readonly shown = linkedSignal<LoadState<SearchResults>, SearchResults | undefined>({
    source: this.results,
    computation: (now, before) => (now.state === 'ready' ? now.value : before?.value),
  });
  protected readonly waiting = computed(() => this.results().state === 'loading');
  protected readonly problem = computed(() => {
    const now = this.results();
    return now.state === 'failed' ? now.problem : null;
  });
  protected readonly words = linkedSignal(() => this.asking().q);
  protected readonly filters = computed(() => chosenCount(this.asking()));
  /** Where the lines that hold for the bench end. */
  protected readonly groups = computed(() => groupsOf(this.shown()));

  constructor() {
    this.typing
      .pipe(debounceTime(pauseInTyping), distinctUntilChanged(), takeUntilDestroyed(inject(DestroyRef)))
      .subscribe((q) => this.go({ ...this.asking(), q }, true));
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({
        title: 'Search',
        description: 'Search fit problems by symptom, part, revision and fix.',
        path: '/search',
      }),
    );
  }

  protected type(words: string): void {
    this.words.set(words);
    this.typing.next(words);
  }

  protected toggle(change: { name: FilterName; value: string }): void {
    this.go(toggled(this.asking(), change.name, change.value), false);
  }

  protected clearFilters(): void {
    this.go({ ...emptySearch, q: this.asking().q }, false);
  }

  protected more(): void {
    this.wantMore.next();
  }

  protected again(): void {
    this.asked.next();
  }

  protected openSheet(): void {
    this.sheet().nativeElement.showModal();
  }

  protected closeSheet(): void {
    this.sheet().nativeElement.close();
  }

  private go(state: SearchState, replaceUrl: boolean): void {
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams: addressOfSearch(state),
      replaceUrl,
    });
  }
}

function sameSearch(one: SearchState, other: SearchState): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}

const groupTitles = {
  holds: 'Holds for your bench',
  'not-known': 'Not known for your bench',
  'written-for-others': 'Written for other revisions than yours',
  'not-yours': 'About parts that are not on your bench',
} as const;

/** Lines under the heading that says why they stand there; a reader without a bench gets one list without headings. */
function groupsOf(results: SearchResults | undefined): { title: string; hits: SearchResults['items'] }[] {
  if (!results) return [];
  const groups = (Object.keys(groupTitles) as (keyof typeof groupTitles)[])
    .map((verdict) => ({
      verdict,
      title: groupTitles[verdict] as string,
      hits: results.items.filter((hit) => hit.applicability.verdict === verdict),
    }))
    .filter((group) => group.hits.length > 0);
  return groups.length === 1 && groups[0]?.verdict === 'not-yours'
    ? [{ title: '', hits: groups[0].hits }]
    : groups;
}
