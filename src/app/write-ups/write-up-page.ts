import { DOCUMENT } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, inject, linkedSignal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { Subject, catchError, combineLatest, map, of, startWith, switchMap } from 'rxjs';
import { WithdrawalNotice } from '../../../shared/contract/withdrawal';
import type { Trial } from '../../../shared/contract/write-ups';
import { jointOfWriteUp } from '../../../shared/fit/joint-of-write-up';
import { loadEach } from '../core/load';
import { Session } from '../core/session';
import { ShimloreTitles } from '../core/titles';
import { redrawnWhile } from '../hardware/measurements/stay-while-loading';
import { Joints } from '../joints/joints';
import { MakerSide } from '../makers/maker-side';
import { CoveredQuestions } from '../questions/covered-questions';
import { Icon } from '../ui/icon/icon';
import { LoadStateView } from '../ui/load-state/load-state';
import { WatchButton } from '../watches/watch-button';
import { EditionPage } from './edition-page/edition-page';
import { JointHead } from './joint-head';
import { writeUpData } from './structured-data';
import { TitleBlock } from './title-block';
import { TrialForm } from './trial-form';
import { TellTheDesk } from '../ui/tell-the-desk/tell-the-desk';
import { TrialList } from './trial-list';
import { Verdict } from './verdict';
import { WithdrawnNotice } from './withdrawn-notice';
import { WriteUps } from './write-ups';

/** A write-up: the verdict for the reader's bench first, then the edition, then what others found. */
@Component({
  selector: 'sl-write-up-page',
  imports: [
    CoveredQuestions,
    EditionPage,
    Icon,
    JointHead,
    LoadStateView,
    MakerSide,
    RouterLink,
    TitleBlock,
    TrialForm,
    TellTheDesk,
    TrialList,
    Verdict,
    WatchButton,
    WithdrawnNotice,
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

  private readonly route = inject(ActivatedRoute);
  private readonly joints = inject(Joints);
  protected readonly slug = toSignal(this.route.paramMap.pipe(map((params) => params.get('slug') ?? '')), {
    initialValue: '',
  });
  /** Fetches the page anew. */
  protected readonly again = new Subject<void>();
  /** The write-up with the known joint between its parts; a page is worth reading without one too. */
  protected readonly loaded = redrawnWhile(
    loadEach(
      combineLatest([
        this.route.paramMap.pipe(map((params) => params.get('slug') ?? '')),
        this.again.pipe(startWith(undefined)),
      ]),
      ([slug]) =>
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
    ),
  );
  protected readonly page = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  /** What stands here where the desk has withdrawn the write-up. */
  protected readonly withdrawn = computed(() => {
    const now = this.loaded();
    if (now.state !== 'failed') return null;
    return WithdrawalNotice.safeParse(now.problem.withdrawal).data ?? null;
  });
  protected readonly joint = computed(() => this.page()?.joint ?? null);
  protected readonly trials = linkedSignal<readonly Trial[]>(() => this.page()?.trials ?? []);
  protected readonly fixTitles = computed(
    () => this.page()?.view.fixes.map(({ key, title }) => ({ key, title })) ?? [],
  );

  constructor() {
    effect(() => {
      const now = this.loaded();
      const withdrawn = this.withdrawn();
      if (now.state === 'failed') this.titles.failed(now.problem);
      if (withdrawn) this.titles.describe({ title: `Withdrawn: ${withdrawn.title}`, kept: false });
      if (now.state === 'ready') {
        const path = `/write-ups/${now.value.slug}`;
        const { title, summary } = now.value.view;
        this.titles.describe({
          title,
          description: summary,
          path,
          feeds: [{ title: 'Write-ups', path: '/feeds/write-ups.atom' }],
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
