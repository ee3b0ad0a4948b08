import { DOCUMENT } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, inject, linkedSignal } from '@angular/core';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { catchError, map, of, switchMap } from 'rxjs';
import type { Trial } from '../../../shared/contract/write-ups';
import { jointOfWriteUp } from '../../../shared/fit/joint-of-write-up';
import { loadEach } from '../core/load';
import { Session } from '../core/session';
import { ShimloreTitles } from '../core/titles';
import { Joints } from '../joints/joints';
import { Icon } from '../ui/icon/icon';
import { LoadStateView } from '../ui/load-state/load-state';
import { EditionPage } from './edition-page/edition-page';
import { JointHead } from './joint-head';
import { writeUpData } from './structured-data';
import { TitleBlock } from './title-block';
import { TrialForm } from './trial-form';
import { TrialList } from './trial-list';
import { Verdict } from './verdict';
import { WriteUps } from './write-ups';

/** A write-up: the verdict for the reader's bench first, then the edition, then what others found. */
@Component({
  selector: 'sl-write-up-page',
  imports: [
    EditionPage,
    Icon,
    JointHead,
    LoadStateView,
    RouterLink,
    TitleBlock,
    TrialForm,
    TrialList,
    Verdict,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './write-up-page.html',
  styleUrl: './write-up-page.scss',
})
export class WriteUpPageView {
  private readonly titles = inject(ShimloreTitles);
  private readonly writeUps = inject(WriteUps);
  private readonly window = inject(DOCUMENT).defaultView;
  protected readonly session = inject(Session);

  private readonly joints = inject(Joints);
  /** The write-up with the known joint between its parts; a page is worth reading without one too. */
  protected readonly loaded = loadEach(
    inject(ActivatedRoute).paramMap.pipe(map((params) => params.get('slug') ?? '')),
    (slug) =>
      this.writeUps.read(slug).pipe(
        switchMap((page) => {
          const part = page.view.joints[0]?.a.part.slug;
          if (part === undefined) return of({ ...page, joint: null });
          return this.joints.list(part).pipe(
            map(({ items }) => ({ ...page, joint: jointOfWriteUp(items, page.view) })),
            catchError(() => of({ ...page, joint: null })),
          );
        }),
      ),
  );
  protected readonly page = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  protected readonly joint = computed(() => this.page()?.joint ?? null);
  protected readonly trials = linkedSignal<readonly Trial[]>(() => this.page()?.trials ?? []);
  protected readonly fixTitles = computed(
    () => this.page()?.view.fixes.map(({ key, title }) => ({ key, title })) ?? [],
  );

  constructor() {
    effect(() => {
      const now = this.loaded();
      if (now.state === 'failed') this.titles.failed(now.problem);
      if (now.state === 'ready') {
        const path = `/write-ups/${now.value.slug}`;
        const { title, summary } = now.value.view;
        this.titles.describe({
          title,
          description: summary,
          path,
          data: writeUpData(now.value, this.titles.addressOf(path)),
        });
      }
    });
  }

  /** One person has one trial of a fix: theirs replaces the one before. */
  protected take(trial: Trial): void {
    this.trials.update((trials) => [
      trial,
      ...trials.filter(
        (other) =>
          other.id !== trial.id && !(other.person.id === trial.person.id && other.fixKey === trial.fixKey),
      ),
    ]);
  }

  protected print(): void {
    this.window?.print();
  }
}
