import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import type { LibraryEntry } from '../../../shared/contract/caution-library';
import type { Problem } from '../../../shared/contract/problem';
import { hazardKindWords } from '../../../shared/contract/vocabulary';
import { toApiProblem } from '../core/api-problem';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { CautionLibrary } from './caution-library';
import { DeskTabs } from './desk-tabs';
import { LibraryForm } from './library-form';

/** The library of cautions in the order in which the desk offers it; retired entries below. */
@Component({
  selector: 'sl-library-page',
  imports: [DeskTabs, Icon, LibraryForm, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './library-page.html',
  styleUrl: './library-page.scss',
})
export class LibraryPage {
  private readonly library = inject(CautionLibrary);
  private readonly undo = inject(Undo);
  private readonly router = inject(Router);
  protected readonly kinds = hazardKindWords;
  protected readonly entries = signal<readonly LibraryEntry[] | null>(null);
  protected readonly offered = computed(() => this.entries()?.filter((entry) => !entry.retired) ?? []);
  protected readonly retired = computed(() => this.entries()?.filter((entry) => entry.retired) ?? []);
  protected readonly adding = signal(false);
  protected readonly ordering = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly add = this.library.add.bind(this.library);

  constructor() {
    this.fetch();
  }

  protected fetch(): void {
    this.problem.set(null);
    this.library.entries().subscribe({
      next: (entries) => this.entries.set(entries),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  protected hazardsOf(entry: LibraryEntry): string {
    return entry.hazards.map((hazard) => hazardKindWords[hazard]).join(', ') || 'no hazard of the list';
  }

  protected usesOf({ uses }: LibraryEntry): string {
    if (uses === 0) return 'on no write-up';
    return uses === 1 ? 'stands once' : `stands ${uses} times`;
  }

  protected added(entry: LibraryEntry): void {
    void this.router.navigate(['/desk/cautions', entry.id]);
  }

  /** Moves an entry by one place among those that are offered. */
  protected move(entry: LibraryEntry, by: -1 | 1): void {
    const offered = [...this.offered()];
    const from = offered.indexOf(entry);
    offered.splice(from, 1);
    offered.splice(from + by, 0, entry);
    this.order([...offered, ...this.retired()], `“${entry.name}” moved`);
  }

  private order(wanted: readonly LibraryEntry[], done: string | null): void {
    const before = this.entries();
    if (!before || this.ordering()) return;
    this.ordering.set(true);
    this.problem.set(null);
    this.entries.set(wanted);
    this.library.order(wanted.map((entry) => entry.id)).subscribe({
      next: (entries) => {
        this.ordering.set(false);
        this.entries.set(entries);
        if (done) this.undo.offer(done, () => this.order(before, null));
      },
      error: (error: unknown) => {
        this.ordering.set(false);
        this.entries.set(before);
        this.problem.set(toApiProblem(error).problem);
      },
    });
  }
}
