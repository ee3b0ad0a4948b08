import { ChangeDetectionStrategy, Component, computed, effect, inject, signal } from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { catchError, debounceTime, map, of, switchMap } from 'rxjs';
import type { Symptom } from '../../../shared/contract/hardware';
import {
  Instrument,
  ReadingUnit,
  instrumentWords,
  readingUnitSymbols,
} from '../../../shared/contract/vocabulary';
import { BenchStore } from '../bench/bench-store';
import { formSending } from '../core/form-sending';
import { ShimloreTitles } from '../core/titles';
import { Hardware } from '../hardware/hardware';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { WorksheetField } from '../ui/worksheet/worksheet-field';
import { forgetTyped, keepTyped, questionForm, readingForm, restoreTyped } from './question-form';
import { Questions } from './questions';

const mostReadings = 20;
/** As long as a pause in typing. */
const pause = 300;
const fewestLetters = 4;

/** A new question; it starts from the parts and revisions on the bench, all ticked. */
@Component({
  selector: 'sl-ask-page',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule, RouterLink, WorksheetField],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './ask-page.html',
  styleUrl: './ask-page.scss',
})
export class AskPage {
  private readonly questions = inject(Questions);
  private readonly router = inject(Router);
  private readonly bench = inject(BenchStore);
  private readonly unticked = signal<ReadonlySet<number>>(new Set());
  protected readonly form = questionForm();
  protected readonly sending = formSending();
  protected readonly mostReadings = mostReadings;
  protected readonly units = ReadingUnit.options.map((value) => ({
    value,
    words: readingUnitSymbols[value],
  }));
  protected readonly instruments = Instrument.options.map((value) => ({
    value,
    words: instrumentWords[value],
  }));
  protected readonly parts = computed(() =>
    this.bench.items().map((entry) => ({ ...entry, ticked: !this.unticked().has(entry.id) })),
  );
  protected readonly symptoms = toSignal(
    inject(Hardware)
      .symptoms()
      .pipe(
        map(({ items }) => items),
        catchError(() => of<Symptom[]>([])),
      ),
    { initialValue: [] },
  );
  /** Published write-ups that may answer it already. */
  protected readonly alike = toSignal(
    this.form.controls.title.valueChanges.pipe(
      debounceTime(pause),
      switchMap((title) =>
        title.trim().length < fewestLetters
          ? of([])
          : this.questions.writeUpsLike(title).pipe(catchError(() => of([]))),
      ),
    ),
    { initialValue: [] },
  );

  constructor() {
    restoreTyped(this.form);
    this.form.valueChanges.pipe(takeUntilDestroyed()).subscribe(() => keepTyped(this.form));
    const titles = inject(ShimloreTitles);
    effect(() => titles.describe({ title: 'Ask' }));
  }

  protected tick(id: number): void {
    this.unticked.update((before) => {
      const after = new Set(before);
      if (!after.delete(id)) after.add(id);
      return after;
    });
  }

  protected toggleSymptom(slug: string): void {
    const field = this.form.controls.symptoms;
    const before = field.value;
    field.setValue(before.includes(slug) ? before.filter((other) => other !== slug) : [...before, slug]);
  }

  protected addReading(): void {
    this.form.controls.readings.push(readingForm());
  }

  protected send(): void {
    const { title, text, worksheet, readings, symptoms } = this.form.getRawValue();
    const parts = this.parts()
      .filter((entry) => entry.ticked)
      .map((entry) => ({ partId: entry.part.id, revisionId: entry.revision?.id ?? null }));
    this.sending.send(
      this.form,
      () =>
        this.questions.ask({
          title,
          text,
          parts,
          symptoms: [...symptoms],
          readings: readings.map((reading) => ({ ...reading, value: reading.value! })),
          worksheet,
        }),
      (question) => {
        forgetTyped();
        void this.router.navigate(['/questions', question.slug]);
      },
    );
  }
}
