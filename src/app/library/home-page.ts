import { ChangeDetectionStrategy, Component, computed, effect, inject, signal } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { Router, RouterLink } from '@angular/router';
import {
  Subject,
  combineLatest,
  debounceTime,
  distinctUntilChanged,
  map,
  of,
  skip,
  startWith,
  switchMap,
} from 'rxjs';
import { BenchGlance } from '../bench/bench-glance';
import { BenchStore } from '../bench/bench-store';
import { loading } from '../core/load';
import { ShimloreTitles } from '../core/titles';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { ResultLine } from './result-line';
import { Search } from './search';
import { addressOfSearch, emptySearch } from './search-state';
import { SymptomField } from './symptom-field';

const shownAtOnce = 6;

/** One field for the symptom, what matches while it is typed, the bench beside it, and what was published last. */
@Component({
  selector: 'sl-home-page',
  imports: [BenchGlance, ProblemNote, ResultLine, RouterLink, SymptomField],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './home-page.html',
  styleUrl: './home-page.scss',
})
export class HomePage {
  private readonly bench = inject(BenchStore);
  private readonly router = inject(Router);
  private readonly search = inject(Search);
  private readonly noMore = new Subject<void>();

  protected readonly words = signal('');
  private readonly mine = toObservable(this.bench.revisionIdsToSend).pipe(
    skip(1),
    startWith(this.bench.revisionIdsToSend()),
  );

  protected readonly recent = toSignal(
    this.mine.pipe(switchMap((mine) => this.search.pages(emptySearch, mine, this.noMore, shownAtOnce))),
    { initialValue: loading },
  );
  protected readonly found = toSignal(
    combineLatest([
      toObservable(this.words).pipe(
        map((words) => words.trim()),
        debounceTime(150),
        distinctUntilChanged(),
      ),
      this.mine,
    ]).pipe(
      switchMap(([q, mine]) =>
        q === '' ? of(loading) : this.search.pages({ ...emptySearch, q }, mine, this.noMore, shownAtOnce),
      ),
    ),
    { initialValue: loading },
  );
  protected readonly typed = computed(() => this.words().trim() !== '');
  protected readonly state = computed(() => (this.typed() ? this.found() : this.recent()));
  protected readonly address = computed(() => addressOfSearch({ ...emptySearch, q: this.words() }));
  protected readonly examples = [
    'bracket rocks on a raised lip',
    '22.5 lip 19.5 recess',
    'belt slips when cold',
    'gear grinds at one spot',
  ];

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({
        title: 'It fits, for your revisions',
        description:
          'Fit problems between imaging telescopes and the parts bolted to them: symptoms, causes and fixes, each for the revisions it holds for.',
        path: '/',
      }),
    );
  }

  protected openAll(): void {
    void this.router.navigate(['/search'], { queryParams: this.address() });
  }
}
