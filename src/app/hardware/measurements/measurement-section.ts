import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { Subject, combineLatest, startWith } from 'rxjs';
import type { DimensionConsensus, PartMeasurements } from '../../../../shared/contract/measurements';
import { featureSpecs, type DimensionSpec } from '../../../../shared/fit/feature-dimensions';
import { loadEach } from '../../core/load';
import { Session } from '../../core/session';
import { LoadStateView } from '../../ui/load-state/load-state';
import { ConsensusMethod } from './consensus-method';
import { DimensionPanel } from './dimension-panel';
import { Measurements } from './measurements';
import { consensusText, shownUnit } from './reading-text';
import { redrawnWhile } from './stay-while-loading';

type MeasuredFeature = PartMeasurements['features'][number];

/** What has been measured on a part: dimensions by revisions for each feature, and the readings behind each figure. */
@Component({
  selector: 'sl-measurement-section',
  imports: [ConsensusMethod, DimensionPanel, LoadStateView],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './measurement-section.html',
  styleUrl: './measurement-section.scss',
})
export class MeasurementSection {
  readonly slug = input.required<string>();

  private readonly measurements = inject(Measurements);
  private readonly session = inject(Session);
  private readonly again = new Subject<void>();
  protected readonly wish = linkedSignal(() => this.session.account()?.units ?? 'mm');
  /** `feature/dimension` of the readings that are open. */
  protected readonly open = signal<string | null>(null);
  protected readonly state = redrawnWhile(
    loadEach(combineLatest([toObservable(this.slug), this.again.pipe(startWith(undefined))]), ([slug]) =>
      this.measurements.ofPart(slug),
    ),
  );
  protected readonly features = computed(() => {
    const now = this.state();
    return now.state === 'ready' ? now.value.features.map((feature) => this.tableOf(feature)) : [];
  });

  protected toggle(key: string): void {
    this.open.update((before) => (before === key ? null : key));
  }

  protected refresh(): void {
    this.again.next();
  }

  private tableOf(feature: MeasuredFeature) {
    const columns = [...feature.revisions].reverse();
    return {
      feature,
      kind: featureSpecs[feature.kind].label,
      revisions: feature.revisions.map((entry) => entry.revision),
      columns: columns.map((entry) => entry.revision),
      attributes: featureSpecs[feature.kind].attributes.map((attribute) => ({
        ...attribute,
        values: columns.map((entry) => entry.attributes[attribute.name] ?? ''),
      })),
      rows: featureSpecs[feature.kind].dimensions.map((spec) => {
        const cells = columns.map((entry) =>
          this.cellOf(spec, entry.dimensions.find((dimension) => dimension.name === spec.name)?.consensus),
        );
        return {
          key: `${feature.slug}/${spec.name}`,
          spec,
          cells,
          isUnread: cells.every((cell) => cell === null),
        };
      }),
    };
  }

  private cellOf(spec: DimensionSpec, consensus: DimensionConsensus | undefined) {
    if (!consensus) return null;
    return {
      text: consensusText(consensus, shownUnit(spec, this.wish())),
      count: consensus.count,
      thin: consensus.thin,
      unitSlips: consensus.unitSlips,
    };
  }
}
