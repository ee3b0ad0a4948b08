import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  linkedSignal,
  signal,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { of } from 'rxjs';
import type { PartSummary } from '../../../shared/contract/hardware';
import { loadEach } from '../core/load';
import { ShimloreTitles } from '../core/titles';
import { FitCheckLines } from '../joints/fit-check-lines';
import { Joints, type FitCheck } from '../joints/joints';
import { PartChooser } from '../joints/part-chooser';
import { Icon } from '../ui/icon/icon';
import { LoadStateView } from '../ui/load-state/load-state';
import { BenchStore } from './bench-store';

const mostRevisions = 100;

/** The fit check as a page that can be sent: the address names the revisions, those of the bench and those thought of. */
@Component({
  selector: 'sl-fit-check-page',
  imports: [FitCheckLines, Icon, LoadStateView, PartChooser, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './fit-check-page.html',
  styleUrl: './fit-check-page.scss',
})
export class FitCheckPage {
  private readonly joints = inject(Joints);
  private readonly route = inject(ActivatedRoute);
  private readonly router = inject(Router);
  protected readonly bench = inject(BenchStore);

  private readonly query = toSignal(this.route.queryParamMap, { requireSync: true });
  protected readonly inAddress = computed(() => this.query().has('revision'));
  private readonly benchIds = computed(() =>
    this.bench.items().flatMap(({ revision }) => (revision ? [revision.id] : [])),
  );
  /** The revisions checked, each once: those of the address, or the bench where it names none. */
  private readonly ids = computed(
    () => (this.inAddress() ? idsIn(this.query().getAll('revision')) : this.benchIds()),
    { equal: (one, other) => one.join() === other.join() },
  );
  protected readonly loaded = loadEach(toObservable(this.ids), (ids) =>
    ids.length === 0 ? of<FitCheck>({ items: [], stands: [] }) : this.joints.check(ids),
  );
  /** Stays while another revision is being added. */
  protected readonly shown = linkedSignal<FitCheck | null, FitCheck | null>({
    source: computed(() => {
      const now = this.loaded();
      return now.state === 'ready' ? now.value : null;
    }),
    computation: (now, before) => now ?? (this.loaded().state === 'failed' ? null : (before?.value ?? null)),
  });
  protected readonly stands = computed(() => {
    const mine = new Set(this.benchIds());
    return (this.shown()?.stands ?? []).map((entry) => ({ ...entry, mine: mine.has(entry.revision.id) }));
  });
  /** A part thought of, until its revision is said. */
  protected readonly considered = signal<PartSummary | null>(null);

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({
        title: 'Fit check',
        description: 'Every joint between some parts, worst first, with what cures it.',
        path: '/bench/check',
      }),
    );
  }

  protected consider(part: PartSummary): void {
    const [only] = part.revisions;
    if (only && part.revisions.length === 1) this.add(only.id);
    else this.considered.set(part);
  }

  protected add(id: number): void {
    this.considered.set(null);
    this.go([...this.ids(), id]);
  }

  protected drop(id: number): void {
    this.go(this.ids().filter((other) => other !== id));
  }

  private go(ids: readonly number[]): void {
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams: { revision: ids.length > 0 ? [...new Set(ids)] : null },
    });
  }
}

function idsIn(texts: readonly string[]): number[] {
  const ids = texts.map(Number).filter((id) => Number.isSafeInteger(id) && id > 0);
  return [...new Set(ids)].slice(0, mostRevisions);
}
