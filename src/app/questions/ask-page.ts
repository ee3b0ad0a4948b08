import { ChangeDetectionStrategy, Component, computed, effect, inject, signal } from '@angular/core';
import { takeUntilDestroyed, toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { catchError, combineLatest, debounceTime, map, of, startWith, switchMap } from 'rxjs';
import type { Symptom } from '../../../shared/contract/hardware';
import { mostQuestionPhotos } from '../../../shared/contract/questions';
import { BenchStore } from '../bench/bench-store';
import { formSending } from '../core/form-sending';
import { ShimloreTitles } from '../core/titles';
import { Hardware } from '../hardware/hardware';
import { Field, Labelled } from '../ui/labelled/labelled';
import { PhotosField } from '../ui/new-photo/photos-field';
import { photoIdsIn } from '../ui/new-photo/photos-form';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { WorksheetField } from '../ui/worksheet/worksheet-field';
import { AlikePanel } from './alike-panel';
import { AlikeSearch, nothingAlike, type Alike } from './alike-search';
import { forgetTyped, keepTyped, questionForm, readingsIn, restoreTyped } from './question-form';
import { Questions } from './questions';
import { ReadingsFields } from './readings-fields';

/** As long as a pause in typing. */
const pause = 400;
const fewestLetters = 4;

/**
 * A new question; it starts from the parts and revisions on the bench, all ticked. While it is written, what may answer
 * it already stands beside it; nothing of that has to come before it can be sent.
 */
@Component({
  selector: 'sl-ask-page',
  imports: [
    AlikePanel,
    Field,
    Labelled,
    PhotosField,
    ProblemNote,
    ReactiveFormsModule,
    ReadingsFields,
    RouterLink,
    WorksheetField,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './ask-page.html',
  styleUrl: './ask-page.scss',
})
export class AskPage {
  private readonly questions = inject(Questions);
  private readonly search = inject(AlikeSearch);
  private readonly router = inject(Router);
  private readonly bench = inject(BenchStore);
  private readonly unticked = signal<ReadonlySet<number>>(new Set());
  protected readonly form = questionForm();
  protected readonly sending = formSending();
  protected readonly mostPhotos = mostQuestionPhotos;
  protected readonly parts = computed(() =>
    this.bench.items().map((entry) => ({ ...entry, ticked: !this.unticked().has(entry.id) })),
  );
  private readonly ticked = computed(() => this.parts().filter((entry) => entry.ticked));
  protected readonly symptoms = toSignal(
    inject(Hardware)
      .symptoms()
      .pipe(
        map(({ items }) => items),
        catchError(() => of<Symptom[]>([])),
      ),
    { initialValue: [] },
  );
  protected readonly alike = toSignal(
    combineLatest([
      this.form.valueChanges.pipe(
        startWith(null),
        map(() => this.written()),
      ),
      toObservable(this.ticked),
    ]).pipe(
      debounceTime(pause),
      switchMap(([words, parts]) =>
        this.search.find({ words, parts }).pipe(catchError(() => of<Alike>(nothingAlike))),
      ),
    ),
    { initialValue: nothingAlike },
  );
  /** How much was found, for a screen on which it does not stand beside the form. */
  protected readonly told = computed(() => {
    const { places, writeUps, questions } = this.alike();
    const counted = [
      counting(places.length, 'joint'),
      counting(writeUps.length, 'write-up'),
      counting(questions.length, 'question'),
    ].filter((words) => words !== '');
    return counted.length === 0 ? '' : `Like it: ${counted.join(', ')}`;
  });

  constructor() {
    restoreTyped(this.form);
    const asked = inject(ActivatedRoute).snapshot.queryParamMap.get('title');
    if (asked) this.form.controls.title.setValue(asked.slice(0, 140));
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

  protected send(): void {
    const { title, text, worksheet, symptoms } = this.form.getRawValue();
    const parts = this.ticked().map((entry) => ({
      partId: entry.part.id,
      revisionId: entry.revision?.id ?? null,
    }));
    this.sending.send(
      this.form,
      () =>
        this.questions.ask({
          title,
          text,
          parts,
          symptoms: [...symptoms],
          readings: readingsIn(this.form.controls.readings),
          worksheet,
          photos: photoIdsIn(this.form.controls.photos),
        }),
      (question) => {
        forgetTyped();
        void this.router.navigate(['/questions', question.slug]);
      },
    );
  }

  /** The words so far; none while there are too few to go by. */
  private written(): string {
    const { title, text } = this.form.getRawValue();
    const words = `${title} ${text}`.trim();
    return words.length < fewestLetters ? '' : words;
  }
}

function counting(count: number, what: string): string {
  if (count === 0) return '';
  return count === 1 ? `one ${what}` : `${count} ${what}s`;
}
