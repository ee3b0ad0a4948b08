import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  computed,
  effect,
  inject,
  signal,
} from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { debounceTime, distinctUntilChanged, map, of, switchMap } from 'rxjs';
import type { PartSummary } from '../../../shared/contract/hardware';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { loading, statesOf, type LoadState } from '../core/load';
import { Session } from '../core/session';
import { ShimloreTitles } from '../core/titles';
import { Hardware } from '../hardware/hardware';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { BenchWatchChoice } from '../watches/bench-watch-choice';
import { BenchFitCheck } from './bench-fit-check';
import { BenchStore } from './bench-store';
import type { BenchEntry } from './browser-bench';

const pauseInTyping = 150;

/** The parts one has, each with the revision once that is known. Works without an account. */
@Component({
  selector: 'sl-bench-page',
  imports: [BenchFitCheck, BenchWatchChoice, Icon, ProblemNote, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './bench-page.html',
  styleUrl: './bench-page.scss',
})
export class BenchPage {
  private readonly hardware = inject(Hardware);
  private readonly undo = inject(Undo);
  protected readonly bench = inject(BenchStore);
  protected readonly session = inject(Session);

  protected readonly problem = signal<Problem | null>(null);
  protected readonly working = signal(false);
  protected readonly name = new FormControl('', { nonNullable: true });
  protected readonly typed = toSignal(this.name.valueChanges.pipe(map((words) => words.trim())), {
    initialValue: '',
  });
  protected readonly found = toSignal<LoadState<PartSummary[]>, LoadState<PartSummary[]>>(
    this.name.valueChanges.pipe(
      map((words) => words.trim()),
      debounceTime(pauseInTyping),
      distinctUntilChanged(),
      switchMap((q) =>
        q === ''
          ? of(loading)
          : statesOf(this.hardware.parts({ q, limit: 8 }).pipe(map(({ items }) => items))),
      ),
      takeUntilDestroyed(inject(DestroyRef)),
    ),
    { initialValue: loading },
  );
  protected readonly unsaid = computed(
    () => this.bench.items().filter((entry) => entry.revision === null).length,
  );

  protected readonly leftNames = computed(() =>
    this.bench
      .left()
      .map((entry) => `${entry.part.name} ${entry.revision?.label ?? ''}`.trim())
      .join(', '),
  );

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({
        title: 'Bench',
        description: 'The parts you have, and which revision each is.',
        path: '/bench',
      }),
    );
  }

  protected add(part: PartSummary): Promise<void> {
    return this.during(async () => {
      const [only] = part.revisions;
      await this.bench.add(part, part.revisions.length === 1 && only ? only.id : null);
      this.name.setValue('');
    });
  }

  protected choose(entry: BenchEntry, revisionId: string): Promise<void> {
    return this.during(() => this.bench.choose(entry, revisionId === '' ? null : Number(revisionId)));
  }

  protected remove(entry: BenchEntry): Promise<void> {
    return this.during(async () => {
      await this.bench.remove(entry);
      this.undo.offer(
        `${entry.part.name} is off your bench.`,
        () => void this.during(() => this.bench.add(entry.part, entry.revision?.id ?? null)),
      );
    });
  }

  protected moveOver(): Promise<void> {
    return this.during(async () => {
      await this.bench.moveOver();
      this.undo.tell('Your bench is in one place now.');
    });
  }

  private async during(work: () => Promise<void>): Promise<void> {
    this.working.set(true);
    this.problem.set(null);
    try {
      await work();
    } catch (error) {
      this.problem.set(toApiProblem(error).problem);
    } finally {
      this.working.set(false);
    }
  }
}
