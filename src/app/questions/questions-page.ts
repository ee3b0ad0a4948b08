import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { map } from 'rxjs';
import type { QuestionLine } from '../../../shared/contract/questions';
import { loadEach } from '../core/load';
import { ShimloreTitles } from '../core/titles';
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
  protected readonly open = computed(() => openIn(this.query().get('open')));
  protected readonly loaded = loadEach(
    this.route.queryParamMap.pipe(
      map((params) => ({
        part: params.get('part') ?? undefined,
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
  /** Name of the part that the list is narrowed to. */
  protected readonly partName = computed(() => {
    const parts = (this.page()?.items ?? []).flatMap((item) => item.parts);
    return parts.find((item) => item.part.slug === this.part())?.part.name ?? this.part();
  });
  /** Parts of the questions shown, to narrow the list to. */
  protected readonly choices = computed(() => {
    const parts = (this.page()?.items ?? []).flatMap((item) => item.parts.map(({ part }) => part));
    return [...new Map(parts.map((part) => [part.slug, part])).values()].sort((one, other) =>
      one.name.localeCompare(other.name, 'en'),
    );
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

  protected ask(change: { part?: string; open?: string }): void {
    const queryParams = Object.fromEntries(
      Object.entries({ ...change, cursor: '' }).map(([name, value]) => [name, value || null]),
    );
    void this.router.navigate([], { relativeTo: this.route, queryParams, queryParamsHandling: 'merge' });
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
