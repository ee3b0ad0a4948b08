import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  linkedSignal,
  signal,
} from '@angular/core';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { map } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import type { QuestionPage, Reply } from '../../../shared/contract/questions';
import { instrumentWords, readingUnitSymbols } from '../../../shared/contract/vocabulary';
import { toApiProblem } from '../core/api-problem';
import { loadEach } from '../core/load';
import { Session } from '../core/session';
import { ShimloreTitles } from '../core/titles';
import { LoadStateView } from '../ui/load-state/load-state';
import { PhotoStrip } from '../ui/photo/photo-strip';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { RichTextView } from '../ui/rich-text/rich-text';
import { TellTheDesk } from '../ui/tell-the-desk/tell-the-desk';
import { TakenDownNote } from '../ui/taken-down-note/taken-down-note';
import { WorksheetNote } from '../ui/worksheet/worksheet-note';
import { WatchButton } from '../watches/watch-button';
import { ChangeQuestion } from './change-question';
import { QuestionParts } from './question-parts';
import { Questions } from './questions';
import { ReplyForm } from './reply-form';
import { ReplyItem } from './reply-item';
import { SettleForm } from './settle-form';

/** One question: its parts and readings first, then the words, then what others say. */
@Component({
  selector: 'sl-question-page',
  imports: [
    ChangeQuestion,
    DatePipe,
    LoadStateView,
    PhotoStrip,
    ProblemNote,
    QuestionParts,
    ReplyForm,
    ReplyItem,
    RichTextView,
    RouterLink,
    SettleForm,
    TakenDownNote,
    WatchButton,
    TellTheDesk,
    WorksheetNote,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './question-page.html',
  styleUrl: './question-page.scss',
})
export class QuestionPageView {
  private readonly questions = inject(Questions);
  protected readonly session = inject(Session);
  protected readonly units = readingUnitSymbols;
  protected readonly instruments = instrumentWords;
  protected readonly problem = signal<Problem | null>(null);
  protected readonly loaded = loadEach(
    inject(ActivatedRoute).paramMap.pipe(map((params) => params.get('slug')!)),
    (slug) => this.questions.read(slug),
  );
  /** As loaded, then as changed on this page. */
  protected readonly question = linkedSignal<QuestionPage | null>(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  protected readonly changing = signal(false);
  protected readonly photos = computed(() =>
    (this.question()?.photos ?? []).map((photo) => ({ photo, caption: '' })),
  );
  /** The address of a question ends in its identity. */
  protected readonly idIn = (slug: string): number => Number(slug.slice(slug.lastIndexOf('-') + 1));
  protected readonly isAsker = computed(
    () => this.question()?.person.id === this.session.account()?.id && this.session.account() !== null,
  );

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() => {
      const now = this.loaded();
      if (now.state === 'failed') titles.failed(now.problem);
      if (now.state === 'ready')
        titles.describe({ title: now.value.title, path: `/questions/${now.value.slug}` });
    });
  }

  protected replied(reply: Reply): void {
    this.question.update((before) => before && { ...before, replies: [...before.replies, reply] });
  }

  protected replyChanged(reply: Reply): void {
    this.question.update(
      (before) =>
        before && {
          ...before,
          replies: before.replies.map((other) => (other.id === reply.id ? reply : other)),
        },
    );
  }

  protected changed(question: QuestionPage): void {
    this.changing.set(false);
    this.question.set(question);
  }

  protected settled(question: QuestionPage): void {
    this.question.set(question);
  }

  protected reopen(slug: string): void {
    this.problem.set(null);
    this.questions.reopen(slug).subscribe({
      next: (question) => this.question.set(question),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }
}
