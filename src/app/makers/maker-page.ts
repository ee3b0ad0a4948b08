import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, inject, signal } from '@angular/core';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { Subject, combineLatest, finalize, map, startWith } from 'rxjs';
import type { RevisionRef } from '../../../shared/contract/hardware';
import type { MakerPage as Maker } from '../../../shared/contract/makers';
import type { Problem } from '../../../shared/contract/problem';
import { partKindWords } from '../../../shared/contract/vocabulary';
import { toApiProblem } from '../core/api-problem';
import { loadEach } from '../core/load';
import { Session } from '../core/session';
import { ShimloreTitles } from '../core/titles';
import { redrawnWhile } from '../hardware/measurements/stay-while-loading';
import { LoadStateView } from '../ui/load-state/load-state';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { AnnounceForm } from './announce-form';
import { AskForm } from './ask-form';
import { MakerDeskTools } from './maker-desk-tools';
import { Makers } from './makers';

/** A maker: its parts, what it announced, answered and made right, and who speaks for it. */
@Component({
  selector: 'sl-maker-page',
  imports: [AnnounceForm, AskForm, DatePipe, LoadStateView, MakerDeskTools, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './maker-page.html',
  styleUrl: './maker-page.scss',
})
export class MakerPage {
  private readonly makers = inject(Makers);
  private readonly router = inject(Router);
  private readonly undo = inject(Undo);
  private readonly again = new Subject<void>();
  protected readonly session = inject(Session);

  protected readonly kinds = partKindWords;
  protected readonly busy = signal(false);
  protected readonly asking = signal(false);
  protected readonly announcing = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly loaded = redrawnWhile(
    loadEach(
      combineLatest([
        inject(ActivatedRoute).paramMap.pipe(map((params) => params.get('slug') ?? '')),
        this.again.pipe(startWith(undefined)),
      ]),
      ([slug]) => this.makers.read(slug),
    ),
  );
  protected readonly maker = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  protected readonly openRequest = computed(() => {
    const request = this.maker()?.myRequest;
    return request?.state === 'waiting' || request?.state === 'waiting-for-mail' ? request : null;
  });

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() => {
      const now = this.loaded();
      if (now.state === 'failed') titles.failed(now.problem);
      if (now.state !== 'ready') return;
      const { name, about, slug } = now.value;
      titles.describe({
        title: name,
        description: about || `Parts by ${name}, what it announced and what it says on write-ups.`,
        path: `/makers/${slug}`,
      });
    });
  }

  protected labelsOf(revisions: readonly RevisionRef[]): string {
    return revisions.map(({ label, announced }) => (announced ? `${label} (announced)` : label)).join(', ');
  }

  protected refresh(): void {
    this.again.next();
  }

  protected took(): void {
    this.asking.set(false);
    this.refresh();
  }

  protected announced(partSlug: string): void {
    this.announcing.set(false);
    this.undo.tell('It stands in the catalogue as announced.');
    void this.router.navigate(['/parts', partSlug]);
  }

  /** Takes a request back, or speaks for the maker no longer. */
  protected stop(maker: Maker): void {
    this.busy.set(true);
    this.problem.set(null);
    this.makers
      .stopSpeaking(maker.slug)
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: () => {
          this.undo.tell(
            maker.iSpeak ? `You no longer speak for ${maker.name}.` : 'Your request is taken back.',
          );
          this.refresh();
        },
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }
}
