import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  computed,
  effect,
  inject,
  linkedSignal,
  signal,
  viewChild,
} from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { map } from 'rxjs';
import type { Problem } from '../../../../shared/contract/problem';
import { instrumentWords, type Instrument } from '../../../../shared/contract/vocabulary';
import type { WhichOne } from '../../../../shared/contract/which-one';
import { inchToMillimetre } from '../../../../shared/fit/dimension';
import { usualUncertainty } from '../../../../shared/fit/instruments';
import { foundAt, markSlip, whichRevision, type RevisionAnswer } from '../../../../shared/fit/which-revision';
import { BenchStore } from '../../bench/bench-store';
import { toApiProblem } from '../../core/api-problem';
import { loadEach } from '../../core/load';
import { Session } from '../../core/session';
import { ShimloreTitles } from '../../core/titles';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { LoadStateView } from '../../ui/load-state/load-state';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { CanonicalPart } from '../canonical-part';
import { Hardware } from '../hardware';
import { PhotoStrip } from '../../ui/photo/photo-strip';
import { knowledgeOf, percentOf, questionsOf, type Question } from './question';

interface Given {
  readonly question: Question;
  readonly answer: RevisionAnswer;
  readonly words: string;
}

const instruments: readonly Instrument[] = ['caliper', 'micrometer', 'ruler', 'other'];

/** Which revision one holds, found by one question at a time, each the one that narrows most. */
@Component({
  selector: 'sl-which-one-page',
  imports: [Field, Labelled, LoadStateView, ProblemNote, ReactiveFormsModule, PhotoStrip, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './which-one-page.html',
  styleUrl: './which-one-page.scss',
})
export class WhichOnePage {
  private readonly hardware = inject(Hardware);
  private readonly bench = inject(BenchStore);
  private readonly titles = inject(ShimloreTitles);
  private readonly heading = viewChild<ElementRef<HTMLElement>>('asked');

  protected readonly percentOf = percentOf;
  protected readonly slip = percentOf(markSlip);
  protected readonly instruments = instruments.map((value) => ({ value, words: instrumentWords[value] }));
  protected readonly inch = inject(Session).account()?.units === 'in';
  protected readonly loaded = loadEach(
    inject(ActivatedRoute).paramMap.pipe(map((params) => params.get('slug') ?? '')),
    (slug) => this.hardware.whichOne(slug),
  );
  protected readonly told = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  private readonly questions = computed(() => questionsOf(this.told() ?? nothingTold));
  protected readonly given = linkedSignal<WhichOne | null, readonly Given[]>({
    source: this.told,
    computation: () => [],
  });
  protected readonly found = computed(() => {
    const told = this.told();
    if (!told || told.revisions.length === 0) return null;
    const answers = this.given().map(({ answer }) => answer);
    return whichRevision(knowledgeOf(told, this.questions()), answers);
  });
  protected readonly question = computed(
    () => this.questions().find(({ key }) => key === this.found()?.next?.key) ?? null,
  );
  /** The most likely first. */
  protected readonly chances = computed(() => {
    const revisions = this.told()?.revisions ?? [];
    return (this.found()?.chances ?? [])
      .map(({ chance }, at) => ({ revision: revisions[at]!, chance }))
      .sort((a, b) => b.chance - a.chance);
  });
  protected readonly likeliest = computed(() => {
    const [first] = this.chances();
    return first && first.chance >= foundAt ? first : null;
  });
  protected readonly strange = computed(() =>
    this.given().filter(({ question }) => this.found()?.strange.includes(question.key)),
  );
  protected readonly problem = signal<Problem | null>(null);
  protected readonly onBench = computed(() => {
    const told = this.told();
    return (revisionId: number): boolean => !!told && this.bench.has(told.part.id, revisionId);
  });

  protected readonly reading = new FormGroup({
    value: new FormControl<number | null>(null, [Validators.required]),
    unit: new FormControl<'mm' | 'in'>(this.inch ? 'in' : 'mm', { nonNullable: true }),
    instrument: new FormControl<Instrument>('caliper', { nonNullable: true }),
  });

  constructor() {
    const canonical = inject(CanonicalPart);
    effect(() => {
      const now = this.loaded();
      if (now.state === 'failed') this.titles.failed(now.problem);
      if (now.state !== 'ready') return;
      const { part } = now.value;
      canonical.lead(part.slug, '/which-one');
      this.titles.describe({
        title: `Which ${part.name} do I have?`,
        description: `Find out which revision of the ${part.name} by ${part.maker.name} you hold, by what can be seen and read on it.`,
        path: `/parts/${part.slug}/which-one`,
      });
    });
  }

  protected see(question: Question, shows: boolean): void {
    this.give({ question, answer: { key: question.key, shows }, words: shows ? 'yes' : 'no' });
  }

  protected pass(question: Question): void {
    this.give({ question, answer: { key: question.key, cannotTell: true }, words: 'cannot tell' });
  }

  protected read(question: Question & { kind: 'reading' }): void {
    this.reading.markAllAsTouched();
    const { value, unit, instrument } = this.reading.getRawValue();
    if (this.reading.invalid || value === null) return;
    const length = question.spec.unit === 'mm';
    const counted = question.spec.unit === 'count';
    const told = length && unit === 'in' ? inchToMillimetre(value) : value;
    const uncertainty = usualUncertainty(length ? instrument : 'caliper', question.spec.unit);
    const shown = counted ? `${value}` : `${value} ${length ? unit : '°'}`;
    this.give({ question, answer: { key: question.key, value: told, uncertainty }, words: shown });
  }

  /** Takes the last answer back. */
  protected back(): void {
    this.given.update((given) => given.slice(0, -1));
    this.focusQuestion();
  }

  protected again(): void {
    this.given.set([]);
    this.focusQuestion();
  }

  /** An entry of this part whose revision was not known becomes this one; else it is a new one. */
  protected async own(told: WhichOne, revisionId: number): Promise<void> {
    const { part, revisions } = told;
    const unsaid = this.bench.items().find((entry) => entry.part.id === part.id && !entry.revision);
    try {
      this.problem.set(null);
      if (unsaid) await this.bench.choose(unsaid, revisionId);
      else {
        const refs = revisions.map(({ id, partId, label }) => ({ id, partId, label }));
        await this.bench.add({ ...part, about: '', revisions: refs, writeUps: 0 }, revisionId);
      }
    } catch (error) {
      this.problem.set(toApiProblem(error).problem);
    }
  }

  private give(given: Given): void {
    this.given.update((before) => [...before, given]);
    this.reading.controls.value.reset();
    this.focusQuestion();
  }

  /** After the redraw: the next question is where keyboard and screen reader go on. */
  private focusQuestion(): void {
    setTimeout(() => this.heading()?.nativeElement.focus());
  }
}

const nothingTold = { dimensions: [], marks: [] };
