import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { catchError, map, of } from 'rxjs';
import type { PartSummary } from '../../../shared/contract/hardware';
import type { QuestionLine } from '../../../shared/contract/questions';
import { loadEach } from '../core/load';
import { ShimloreTitles } from '../core/titles';
import { Hardware } from '../hardware/hardware';
import { LoadStateView } from '../ui/load-state/load-state';
import { Questions } from './questions';

/** Questions, the newest first. The address holds what is asked for and the place in the list. */
@Component({
  selector: 'sl-questions-page',
  imports: [DatePipe, LoadStateView, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './questions-page.html',
  styleUrl: './questions-page.scss',
})
export class QuestionsPage {
  private readonly questions = inject(Questions);
  private readonly route = inject(ActivatedRoute);
  private readonly router = inject(Router);
  private readonly query = toSignal(this.route.queryParamMap, { requireSync: true });

  protected readonly part = computed(() => this.query().get('part'));
  protected readonly words = computed(() => this.query().get('q') ?? '');
  protected readonly open = computed(() => openIn(this.query().get('open')));
  protected readonly loaded = loadEach(
    this.route.queryParamMap.pipe(
      map((params) => ({
        part: params.get('part') ?? undefined,
        q: params.get('q')?.trim().slice(0, 200) || undefined,
        open: openIn(params.get('open')),
        cursor: params.get('cursor') ?? undefined,
      })),
    ),
    (query) => this.questions.list(query),
  );
  protected readonly page = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  /** Every part of the catalogue that the list can be narrowed to; while they are not known, the one of the address. */
  private readonly parts = toSignal(
    inject(Hardware)
      .parts({ limit: 100 })
      .pipe(
        map(({ items }) => items),
        catchError(() => of<PartSummary[]>([])),
      ),
    { initialValue: [] },
  );
  protected readonly choices = computed(() => {
    const parts = this.parts().map(({ slug, name, maker }) => ({ slug, name: `${name}, ${maker.name}` }));
    const asked = this.part();
    if (asked === null || parts.some(({ slug }) => slug === asked)) return parts;
    return [{ slug: asked, name: asked }, ...parts];
  });

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({
        title: 'Questions',
        description: 'Open problems of owners with their parts, revisions and readings.',
        path: '/questions',
      }),
    );
  }

  protected ask(change: { q?: string; part?: string; open?: string }): void {
    const queryParams = Object.fromEntries(
      Object.entries({ ...change, cursor: '' }).map(([name, value]) => [name, value || null]),
    );
    void this.router.navigate([], { relativeTo: this.route, queryParams, queryParamsHandling: 'merge' });
  }

  protected repliesOf({ replyCount }: QuestionLine): string {
    if (replyCount === 0) return 'Nobody has replied yet.';
    return replyCount === 1 ? 'One reply.' : `${replyCount} replies.`;
  }

  protected partsOf(item: QuestionLine): string {
    return item.parts
      .map(({ part, revision }) => `${part.name}, ${revision?.label ?? 'revision not known'}`)
      .join(' · ');
  }
}

function openIn(value: string | null): 'true' | 'false' | undefined {
  return value === 'true' || value === 'false' ? value : undefined;
}
