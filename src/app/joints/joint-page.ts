import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  computed,
  effect,
  inject,
  linkedSignal,
} from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { Subject, debounceTime, map } from 'rxjs';
import { drawJoint } from '../../../shared/drawing/joint-drawing';
import { jointKinds } from '../../../shared/fit/joint-kinds';
import type { FitCell, JointPage, JointSidePage } from '../../../shared/contract/joints';
import { BenchStore } from '../bench/bench-store';
import { loadEach } from '../core/load';
import { Session } from '../core/session';
import { ShimloreTitles } from '../core/titles';
import { Icon } from '../ui/icon/icon';
import { JointDrawing } from '../ui/joint-drawing/joint-drawing';
import { LoadStateView } from '../ui/load-state/load-state';
import { WatchButton } from '../watches/watch-button';
import { choosePair } from './choose-pair';
import { drawingSource } from './drawing-source';
import { FitTable } from './fit-table';
import { fixesForPair } from './fixes-for-pair';
import { Joints } from './joints';
import { judge, onHand } from './on-hand';
import { addressOfOwn, hasReadings, ownReadingsIn, type OwnReadings } from './own-readings';
import { OwnReadingsPanel } from './own-readings-panel';
import { PairFixes } from './pair-fixes';
import { PairSheet } from './pair-sheet';
import { ReportForm } from './report-form';

const pauseInTyping = 250;

/** A joint: the drawing of the chosen pair, what is known of it, the fit table, fixes, and the reader's own readings. */
@Component({
  selector: 'sl-joint-page',
  imports: [
    FitTable,
    Icon,
    JointDrawing,
    LoadStateView,
    OwnReadingsPanel,
    PairFixes,
    PairSheet,
    ReportForm,
    RouterLink,
    WatchButton,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './joint-page.html',
  styleUrl: './joint-page.scss',
})
export class JointPageView {
  private readonly joints = inject(Joints);
  private readonly titles = inject(ShimloreTitles);
  private readonly bench = inject(BenchStore);
  private readonly route = inject(ActivatedRoute);
  private readonly router = inject(Router);
  protected readonly session = inject(Session);

  protected readonly kinds = jointKinds;
  protected readonly loaded = loadEach(
    this.route.paramMap.pipe(map((params) => params.get('slug') ?? '')),
    (slug) => this.joints.read(slug),
  );
  /** The joint, with what the reader has reported since. */
  protected readonly joint = linkedSignal<JointPage | null>(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  private readonly query = toSignal(this.route.queryParamMap, {
    requireSync: true,
  });
  protected readonly mine = computed(() =>
    this.bench.items().flatMap(({ revision }) => (revision ? [revision.id] : [])),
  );
  protected readonly cell = computed(() => {
    const joint = this.joint();
    const id = (name: string): number | null => Number(this.query().get(name)) || null;
    return joint && choosePair(joint, { a: id('a'), b: id('b'), bench: this.mine() });
  });

  private readonly typing = new Subject<OwnReadings>();
  private readonly inAddress = computed(() =>
    ownReadingsIn(this.query(), this.session.account()?.units ?? 'mm'),
  );
  private lastWritten = '';
  /** What stands in the fields; the address follows a moment later and must not overtake the typing. */
  protected readonly own = linkedSignal<OwnReadings, OwnReadings>({
    source: this.inAddress,
    computation: (address, before) =>
      before && JSON.stringify(addressOfOwn(address)) === this.lastWritten ? before.value : address,
  });
  protected readonly usesOwn = computed(() => hasReadings(this.own()));

  /** The chosen pair judged: by the reader's readings where there are any, else by what the site knows. */
  protected readonly pair = computed(() => {
    const [joint, cell, own] = [this.joint(), this.cell(), this.own()];
    if (!joint || !cell) return null;
    const a = onHand(joint.sideA, cell.revisionA, 'a', own);
    const b = onHand(joint.sideB, cell.revisionB, 'b', own);
    const [nameA, nameB] = [nameOf(joint.sideA, cell.revisionA), nameOf(joint.sideB, cell.revisionB)];
    const judged = judge(joint.kind, a, b);
    return {
      a,
      b,
      nameA,
      nameB,
      judged,
      drawing: judged.verdict && drawJoint({ kind: joint.kind, a, b, nameA, nameB }),
      source: drawingSource(joint, cell, this.usesOwn()),
    };
  });
  protected readonly fixes = computed(() => {
    const [joint, cell] = [this.joint(), this.cell()];
    if (!joint || !cell) return [];
    const ids = (side: JointSidePage): number[] => side.revisions.map(({ revision }) => revision.id);
    return fixesForPair(joint.writeUps, cell, {
      a: ids(joint.sideA),
      b: ids(joint.sideB),
    });
  });
  /** Write-ups about these parts that were found for other revisions. */
  protected readonly others = computed(() => {
    const here = new Set(this.fixes().map(({ slug }) => slug));
    return (this.joint()?.writeUps ?? []).filter(({ slug }) => !here.has(slug));
  });
  /** What the shim worksheet starts from; only a gap between faces can be filled. */
  protected readonly shim = computed(() => {
    const gap = this.pair()?.judged.verdict?.gap;
    if (this.joint()?.kind !== 'boss-recess' || !gap || gap.value <= 0) return null;
    return { gap: rounded(gap.value), u: rounded(gap.uncertainty) };
  });

  constructor() {
    this.typing
      .pipe(debounceTime(pauseInTyping), takeUntilDestroyed(inject(DestroyRef)))
      .subscribe((own) => this.write(own));
    effect(() => {
      const now = this.loaded();
      if (now.state === 'failed') this.titles.failed(now.problem);
      if (now.state === 'ready') {
        const { name, slug, a, b } = now.value;
        this.titles.describe({
          title: name,
          description: `Which revisions of ${a.name} and ${b.name} fit together, predicted from readings and reported by owners.`,
          path: `/joints/${slug}`,
        });
      }
    });
  }

  protected choose(cell: FitCell): void {
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams: { a: cell.revisionA, b: cell.revisionB },
      queryParamsHandling: 'merge',
    });
  }

  protected typed(own: OwnReadings): void {
    this.own.set(own);
    this.typing.next(own);
  }

  protected take(cell: FitCell): void {
    this.joint.update(
      (joint) =>
        joint && {
          ...joint,
          cells: joint.cells.map((other) =>
            other.revisionA === cell.revisionA && other.revisionB === cell.revisionB ? cell : other,
          ),
        },
    );
  }

  /** The pair goes with the readings, so that the address says all that is shown. */
  private write(own: OwnReadings): void {
    const address = addressOfOwn(own);
    const cell = this.cell();
    this.lastWritten = JSON.stringify(address);
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams: {
        ...address,
        ...(cell ? { a: cell.revisionA, b: cell.revisionB } : {}),
      },
      queryParamsHandling: 'merge',
      replaceUrl: true,
    });
  }
}

function nameOf(side: JointSidePage, revisionId: number): string {
  const found = side.revisions.find(({ revision }) => revision.id === revisionId);
  return `${side.part.name} ${found?.revision.label ?? ''}`.trim();
}

/** A micrometre is finer than anything that could be laid under a plate. */
function rounded(millimetres: number): number {
  return Math.round(millimetres * 1000) / 1000;
}
