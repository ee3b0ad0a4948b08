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
import { Subject, combineLatest, map, startWith } from 'rxjs';
import type { PartPage as Part, PartSummary, RevisionPhoto } from '../../../shared/contract/hardware';
import type { Problem } from '../../../shared/contract/problem';
import { partKindWords } from '../../../shared/contract/vocabulary';
import { BenchStore } from '../bench/bench-store';
import { toApiProblem } from '../core/api-problem';
import { loadEach } from '../core/load';
import { Session } from '../core/session';
import { ShimloreTitles } from '../core/titles';
import { Icon } from '../ui/icon/icon';
import { LoadStateView } from '../ui/load-state/load-state';
import { PhotoView } from '../ui/photo/photo';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { WatchButton } from '../watches/watch-button';
import { CanonicalPart } from './canonical-part';
import { Hardware } from './hardware';
import { AnnouncedTools } from '../makers/announced-tools';
import { WantedReadings } from '../makers/wanted-readings';
import { MeasurementSection } from './measurements/measurement-section';
import { redrawnWhile } from './measurements/stay-while-loading';
import { RevisionPhotoTools } from './revision-photos/revision-photo-tools';
import { PhotoStrip } from '../ui/photo/photo-strip';
import { RevisionTimeLine } from './revision-time-line';

/** A part: its revisions on a time line, how to tell which one is on the bench, what changed, and what is written about it. */
@Component({
  selector: 'sl-part-page',
  imports: [
    AnnouncedTools,
    Icon,
    LoadStateView,
    MeasurementSection,
    PhotoView,
    ProblemNote,
    RevisionPhotoTools,
    PhotoStrip,
    RevisionTimeLine,
    RouterLink,
    WantedReadings,
    WatchButton,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './part-page.html',
  styleUrl: './part-page.scss',
})
export class PartPage {
  private readonly hardware = inject(Hardware);
  private readonly titles = inject(ShimloreTitles);
  private readonly undo = inject(Undo);
  protected readonly bench = inject(BenchStore);
  protected readonly session = inject(Session);

  protected readonly kinds = partKindWords;
  protected readonly now = new Date();
  protected readonly problem = signal<Problem | null>(null);
  /** Fetches the page anew. */
  protected readonly again = new Subject<void>();
  protected readonly loaded = redrawnWhile(
    loadEach(
      combineLatest([
        inject(ActivatedRoute).paramMap.pipe(map((params) => params.get('slug') ?? '')),
        this.again.pipe(startWith(undefined)),
      ]),
      ([slug]) => this.hardware.part(slug),
    ),
  );
  /** As loaded, with what a moderator has changed since. */
  protected readonly part = linkedSignal<Part | null>(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  /** Newest first: what is sold today is what most people hold in hand. */
  protected readonly newestFirst = computed(() => [...(this.part()?.revisions ?? [])].reverse());

  /** Whoever might speak for the maker; the server knows who does. */
  protected readonly maySpeak = computed(() => this.session.role() === 'maker' || this.session.isModerator());
  protected readonly wantsReadings = computed(() =>
    (this.part()?.revisions ?? []).some((revision) => revision.announcedAt !== null),
  );

  constructor() {
    const canonical = inject(CanonicalPart);
    effect(() => {
      const now = this.loaded();
      if (now.state === 'failed') this.titles.failed(now.problem);
      if (now.state !== 'ready') return;
      canonical.lead(now.value.slug);
      this.describe(now.value);
    });
  }

  protected async own(part: Part, revisionId: number | null): Promise<void> {
    try {
      this.problem.set(null);
      await this.bench.add(summaryOf(part), revisionId);
      const entry = this.bench
        .items()
        .find((item) => item.part.id === part.id && (item.revision?.id ?? null) === revisionId);
      if (entry) this.undo.offer(`${part.name} is on your bench.`, () => void this.bench.remove(entry));
    } catch (error) {
      this.problem.set(toApiProblem(error).problem);
    }
  }

  protected photosChanged(revisionId: number, photos: RevisionPhoto[]): void {
    this.part.update(
      (part) =>
        part && {
          ...part,
          revisions: part.revisions.map((revision) =>
            revision.id === revisionId ? { ...revision, photos } : revision,
          ),
        },
    );
  }

  private describe(part: Part): void {
    const path = `/parts/${part.slug}`;
    this.titles.describe({
      title: `${part.name} by ${part.maker.name}`,
      description: part.about || `Revisions of the ${part.name} and how to tell which one you have.`,
      path,
      feeds: [{ title: `What is new about the ${part.name}`, path: `/feeds/parts/${part.slug}.atom` }],
      data: {
        '@context': 'https://schema.org',
        '@type': 'Product',
        name: part.name,
        description: part.about,
        category: partKindWords[part.kind],
        url: this.titles.addressOf(path),
        manufacturer: { '@type': 'Organization', name: part.maker.name },
        hasVariant: part.revisions.map((revision) => ({
          '@type': 'ProductModel',
          name: `${part.name} ${revision.label}`,
          releaseDate: revision.soldFrom ?? undefined,
        })),
      },
    });
  }
}

function summaryOf(part: Part): PartSummary {
  const { id, slug, name, kind, maker, about, revisions, writeUps } = part;
  return {
    id,
    slug,
    name,
    kind,
    maker,
    about,
    revisions: revisions.map(({ id: revisionId, partId, label }) => ({ id: revisionId, partId, label })),
    writeUps: writeUps.length,
  };
}
