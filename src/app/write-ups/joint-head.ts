import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { fitVerdictWords } from '../../../shared/contract/joints';
import type { EditionView } from '../../../shared/contract/write-ups';
import { drawJoint } from '../../../shared/drawing/joint-drawing';
import { BenchStore } from '../bench/bench-store';
import { loadEach } from '../core/load';
import { choosePair } from '../joints/choose-pair';
import { drawingSource } from '../joints/drawing-source';
import { FitMark } from '../joints/fit-mark';
import { Joints } from '../joints/joints';
import { judge, onHand } from '../joints/on-hand';
import { JointDrawing } from '../ui/joint-drawing/joint-drawing';
import { shimThickness, trimHeight } from './shim-thickness';

interface DrawableFix {
  readonly key: string;
  readonly title: string;
  /** mm laid in or taken off. */
  readonly figure: number;
  readonly drawn: { readonly shim?: number; readonly trim?: number };
}

/**
 * The drawing that heads a write-up: the reader's own revisions, else a pair the write-up holds for, from the consensus of
 * all readings, with the shim or the trim of a fix where it is chosen.
 */
@Component({
  selector: 'sl-joint-head',
  imports: [FitMark, JointDrawing, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './joint-head.html',
  styleUrl: './joint-head.scss',
})
export class JointHead {
  readonly slug = input.required<string>();
  readonly view = input.required<EditionView>();

  private readonly joints = inject(Joints);
  private readonly bench = inject(BenchStore);
  private readonly loaded = loadEach(toObservable(this.slug), (slug) => this.joints.read(slug));
  protected readonly words = fitVerdictWords;
  protected readonly waiting = computed(() => this.loaded().state === 'loading');
  protected readonly joint = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  private readonly cell = computed(() => {
    const joint = this.joint();
    if (!joint) return null;
    const first = this.view().joints[0];
    const own = this.bench.items().flatMap(({ revision }) => (revision ? [revision.id] : []));
    const held = [first?.a, first?.b].flatMap((side) =>
      (side?.revisions ?? []).filter(({ holds }) => holds).map(({ id }) => id),
    );
    const pick = (side: typeof joint.sideA): number | null => {
      const ids = side.revisions.map(({ revision }) => revision.id);
      return ids.findLast((id) => own.includes(id)) ?? ids.findLast((id) => held.includes(id)) ?? null;
    };
    return choosePair(joint, { a: pick(joint.sideA), b: pick(joint.sideB), bench: [] });
  });
  /** Fixes that lay something in or take something off, and by how much is told; only faces with a boss show it. */
  protected readonly drawable = computed((): DrawableFix[] =>
    this.joint()?.kind === 'boss-recess'
      ? this.view().fixes.flatMap((fix): DrawableFix[] => {
          const shim = shimThickness(this.view(), fix);
          const trim = trimHeight(fix);
          if (shim !== null) return [{ key: fix.key, title: fix.title, figure: shim, drawn: { shim } }];
          return trim === null ? [] : [{ key: fix.key, title: fix.title, figure: trim, drawn: { trim } }];
        })
      : [],
  );
  protected readonly chosenFix = linkedSignal<string, string | null>({
    source: this.slug,
    computation: () => null,
  });
  protected readonly pair = computed(() => {
    const [joint, cell] = [this.joint(), this.cell()];
    if (!joint || !cell) return null;
    const a = onHand(joint.sideA, cell.revisionA, 'a', null);
    const b = onHand(joint.sideB, cell.revisionB, 'b', null);
    const label = (side: typeof joint.sideA, id: number): string =>
      `${side.part.name} ${side.revisions.find(({ revision }) => revision.id === id)?.revision.label ?? ''}`;
    const [nameA, nameB] = [label(joint.sideA, cell.revisionA), label(joint.sideB, cell.revisionB)];
    const judged = judge(joint.kind, a, b);
    const fix = this.drawable().find(({ key }) => key === this.chosenFix())?.drawn ?? {};
    return {
      nameA,
      nameB,
      verdict: judged.verdict?.verdict ?? cell.verdict,
      sentence: judged.verdict?.sentence ?? '',
      drawing: judged.verdict ? drawJoint({ kind: joint.kind, a, b, nameA, nameB, ...fix }) : null,
      source: drawingSource(joint, cell, false),
      address: { a: cell.revisionA, b: cell.revisionB },
    };
  });
}
