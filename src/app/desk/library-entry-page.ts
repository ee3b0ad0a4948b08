import {
  ChangeDetectionStrategy,
  Component,
  type OnInit,
  inject,
  input,
  numberAttribute,
  signal,
} from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { tap, type Observable } from 'rxjs';
import type { LibraryEntry, LibraryWords } from '../../../shared/contract/caution-library';
import type { Problem } from '../../../shared/contract/problem';
import type { Caution } from '../../../shared/contract/write-ups';
import { ApiProblem, toApiProblem } from '../core/api-problem';
import { formSending } from '../core/form-sending';
import { ShimloreTitles } from '../core/titles';
import { CautionBox } from '../ui/caution-box/caution-box';
import { Icon } from '../ui/icon/icon';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { CautionLibrary } from './caution-library';
import { LibraryForm } from './library-form';
import { LibraryUses } from './library-uses';

/** One entry of the library: how it stands, its words to be changed, and the write-ups that carry it. */
@Component({
  selector: 'sl-library-entry-page',
  imports: [
    CautionBox,
    Field,
    Icon,
    Labelled,
    LibraryForm,
    LibraryUses,
    ProblemNote,
    ReactiveFormsModule,
    RouterLink,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './library-entry-page.html',
  styleUrl: './library-entry-page.scss',
})
export class LibraryEntryPage implements OnInit {
  readonly id = input.required({ transform: numberAttribute });
  private readonly library = inject(CautionLibrary);
  private readonly undo = inject(Undo);
  private readonly titles = inject(ShimloreTitles);
  protected readonly entry = signal<LibraryEntry | null>(null);
  protected readonly problem = signal<Problem | null>(null);
  /** What somebody else saved in the meantime; what was typed stays in the form. */
  protected readonly elsewhere = signal<LibraryEntry | null>(null);
  /** Grows with each change, so that what hangs on the entry is read anew. */
  protected readonly round = signal(0);
  protected readonly sendingWhy = formSending();
  protected readonly retiring = new FormGroup({
    why: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(3)],
    }),
  });

  protected readonly save = (words: LibraryWords): Observable<LibraryEntry> =>
    this.library
      .change(this.id(), this.versionRead(), words)
      .pipe(tap({ error: (error: unknown) => this.lookElsewhere(error) }));

  ngOnInit(): void {
    this.fetch();
  }

  protected fetch(): void {
    this.problem.set(null);
    this.library.entry(this.id()).subscribe({
      next: (entry) => this.take(entry),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  protected saved(entry: LibraryEntry): void {
    this.take(entry);
    this.undo.tell('Saved as version ' + entry.version);
  }

  /** Shows what stands there now; the next save goes on top of it. */
  protected takeTheirs(entry: LibraryEntry): void {
    this.take(entry);
  }

  protected retireOrPutBack(entry: LibraryEntry): void {
    const why = this.retiring.controls.why.value;
    const call = entry.retired
      ? () => this.library.putBack(entry.id, entry.version, why)
      : () => this.library.retire(entry.id, entry.version, why);
    this.sendingWhy.send(this.retiring, call, (changed) => {
      this.retiring.reset();
      this.take(changed);
      this.undo.tell(changed.retired ? 'Retired' : 'Offered again');
    });
  }

  protected asCaution(entry: LibraryEntry): Caution {
    return { ...entry, fixKey: null, stepKey: null };
  }

  private take(entry: LibraryEntry): void {
    this.elsewhere.set(null);
    this.entry.set(entry);
    this.round.update((round) => round + 1);
    this.titles.describe({ title: entry.name });
  }

  private versionRead(): number {
    return this.elsewhere()?.version ?? this.entry()?.version ?? 0;
  }

  private lookElsewhere(error: unknown): void {
    if (error instanceof ApiProblem && error.is('moved-on') && error.problem.current)
      this.elsewhere.set(error.problem.current as LibraryEntry);
  }
}
