import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { Router, RouterLink } from '@angular/router';
import { Subject, combineLatest, startWith } from 'rxjs';
import type { Feature, RevisionRef } from '../../../../shared/contract/hardware';
import type { DimensionConsensus } from '../../../../shared/contract/measurements';
import type { DimensionSpec } from '../../../../shared/fit/feature-dimensions';
import { BenchStore } from '../../bench/bench-store';
import { loadEach } from '../../core/load';
import { redrawnWhile } from './stay-while-loading';
import { Session } from '../../core/session';
import { LoadStateView } from '../../ui/load-state/load-state';
import { DotPlot } from './dot-plot';
import { Measurements } from './measurements';
import { ReadingTable } from './reading-table';
import { consensusText, countText, shownUnit } from './reading-text';
import { RecordForm } from './record-form';

/** All readings of one dimension, revision by revision, and a form for one more. */
@Component({
  selector: 'sl-dimension-panel',
  imports: [DotPlot, LoadStateView, ReadingTable, RecordForm, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './dimension-panel.html',
  styleUrl: './dimension-panel.scss',
})
export class DimensionPanel {
  readonly slug = input.required<string>();
  readonly feature = input.required<Feature>();
  readonly spec = input.required<DimensionSpec>();
  readonly revisions = input.required<readonly RevisionRef[]>();
  readonly wish = input.required<'mm' | 'in'>();
  /** A consensus has changed; the table around it has to follow. */
  readonly changed = output();

  private readonly measurements = inject(Measurements);
  private readonly bench = inject(BenchStore);
  private readonly again = new Subject<void>();
  protected readonly session = inject(Session);
  protected readonly address = inject(Router).url;
  private readonly loaded = loadEach(
    combineLatest([
      toObservable(this.slug),
      toObservable(this.feature),
      toObservable(this.spec),
      this.again.pipe(startWith(undefined)),
    ]),
    ([slug, feature, spec]) => this.measurements.readings(slug, feature.slug, spec.name),
  );
  /** Loading anew leaves what is on screen where it is. */
  protected readonly state = redrawnWhile(this.loaded);
  protected readonly unit = computed(() => shownUnit(this.spec(), this.wish()));
  protected readonly groups = computed(() => {
    const now = this.state();
    if (now.state !== 'ready') return [];
    return now.value.revisions
      .filter((entry) => entry.readings.length > 0)
      .map((entry) => ({
        ...entry,
        of: `${this.spec().label} of ${entry.revision.label}`,
        words: this.wordsOf(entry.consensus),
      }))
      .reverse();
  });
  protected readonly isEmpty = computed(() => this.state().state === 'ready' && this.groups().length === 0);
  /** Of the revisions on the bench, else the newest. */
  protected readonly likely = computed(() => {
    const owned = new Set(this.bench.owned().map((item) => item.revision?.id));
    return this.revisions().find((revision) => owned.has(revision.id))?.id ?? null;
  });

  protected refresh(): void {
    this.again.next();
    this.changed.emit();
  }

  private wordsOf(consensus: DimensionConsensus | null): string {
    if (!consensus) return 'no consensus: every reading is set aside';
    const thin = consensus.thin ? ', thin evidence' : '';
    return `${consensusText(consensus, this.unit())} from ${countText(consensus.count)}${thin}`;
  }
}
