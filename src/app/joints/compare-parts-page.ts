import { ChangeDetectionStrategy, Component, computed, effect, inject, linkedSignal } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { of } from 'rxjs';
import type { ComparedPart, FitCheckLine } from '../../../shared/contract/joints';
import { fitVerdictWords } from '../../../shared/contract/joints';
import { afterwardsWords, partKindWords } from '../../../shared/contract/vocabulary';
import { BenchStore } from '../bench/bench-store';
import { loadEach } from '../core/load';
import { ShimloreTitles } from '../core/titles';
import { Hardware } from '../hardware/hardware';
import { Icon } from '../ui/icon/icon';
import { LoadStateView } from '../ui/load-state/load-state';
import { FitMark } from './fit-mark';
import { chanceWords } from './fit-words';
import { fixesForPair } from './fixes-for-pair';
import { Joints } from './joints';
import { PairFixes } from './pair-fixes';
import { PartChooser } from './part-chooser';

const mostParts = 6;
type Compared = { readonly items: ComparedPart[] };

/** Parts that do the same work, for the revisions on the bench. The columns stand in the order chosen; none is called best. */
@Component({
  selector: 'sl-compare-parts-page',
  imports: [FitMark, Icon, LoadStateView, PairFixes, PartChooser, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './compare-parts-page.html',
  styleUrl: './compare-parts-page.scss',
})
export class ComparePartsPage {
  private readonly joints = inject(Joints);
  private readonly hardware = inject(Hardware);
  private readonly route = inject(ActivatedRoute);
  private readonly router = inject(Router);
  protected readonly bench = inject(BenchStore);

  private readonly query = toSignal(this.route.queryParamMap, {
    requireSync: true,
  });
  protected readonly slugs = computed(() => [...new Set(this.query().getAll('part'))].slice(0, mostParts));
  /** Revisions that the address names go before the reader's bench, so that a link shows what its sender saw. */
  private readonly revisions = computed(() => {
    const named = this.query()
      .getAll('revision')
      .map(Number)
      .filter((id) => Number.isSafeInteger(id) && id > 0);
    return named.length > 0
      ? named
      : this.bench.items().flatMap(({ revision }) => (revision ? [revision.id] : []));
  });
  protected readonly named = computed(() => this.query().has('revision'));
  /** The same with the bench in it, for somebody else. */
  protected readonly toSend = computed(() => ({ part: this.slugs(), revision: this.revisions() }));
  private readonly asked = computed(() => ({ parts: this.slugs(), revisions: this.revisions() }), {
    equal: (one, other) => JSON.stringify(one) === JSON.stringify(other),
  });
  protected readonly loaded = loadEach(toObservable(this.asked), ({ parts, revisions }) =>
    parts.length === 0 ? of<Compared>({ items: [] }) : this.joints.compare(parts, revisions),
  );
  protected readonly shown = linkedSignal<Compared | null, Compared | null>({
    source: computed(() => {
      const now = this.loaded();
      return now.state === 'ready' ? now.value : null;
    }),
    computation: (now, before) => now ?? (this.loaded().state === 'failed' ? null : (before?.value ?? null)),
  });
  protected readonly against = computed(() => this.revisions().length);
  protected readonly room = computed(() => this.slugs().length < mostParts);

  private readonly kind = computed(() => this.shown()?.items.at(0)?.part.kind ?? null);
  private readonly alike = loadEach(toObservable(this.kind), (kind) =>
    kind ? this.hardware.parts({ kind, limit: 12 }) : of({ items: [], next: null }),
  );
  /** Parts of the same kind as the first, which are not in the comparison yet. */
  protected readonly suggested = computed(() => {
    const now = this.alike();
    return now.state === 'ready' ? now.value.items.filter(({ slug }) => !this.slugs().includes(slug)) : [];
  });
  protected readonly kindWords = computed(() => {
    const kind = this.kind();
    return kind ? partKindWords[kind] : '';
  });

  protected readonly ways = computed(() =>
    (this.shown()?.items ?? []).map(({ part, about, price, trials, afterwards, lines }) => ({
      part,
      about,
      price,
      lines: lines.map(described),
      trials: [
        trials.held ? `held for ${trials.held}` : '',
        trials.heldForAWhile ? `held for a while for ${trials.heldForAWhile}` : '',
        trials.didNotHelp ? `did not help ${trials.didNotHelp}` : '',
      ]
        .filter(Boolean)
        .join(', '),
      afterwards: afterwards
        .map((item) => afterwardsWords[item as keyof typeof afterwardsWords] ?? item)
        .join(', '),
    })),
  );

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({
        title: 'Side by side',
        description: 'Parts that do the same work, compared for the revisions you have.',
        path: '/compare',
      }),
    );
  }

  protected hasFixes(lines: readonly { fixes: readonly unknown[] }[]): boolean {
    return lines.some(({ fixes }) => fixes.length > 0);
  }

  protected add(slug: string): void {
    this.go([...this.slugs(), slug]);
  }

  protected drop(slug: string): void {
    this.go(this.slugs().filter((other) => other !== slug));
  }

  private go(slugs: readonly string[]): void {
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams: { part: slugs.length > 0 ? [...new Set(slugs)] : null },
      queryParamsHandling: 'merge',
    });
  }
}

function described(line: FitCheckLine) {
  const pair = { a: line.revisionA.id, b: line.revisionB.id };
  return {
    ...line,
    pair,
    key: `${line.joint.id}/${pair.a}/${pair.b}`,
    word: fitVerdictWords[line.verdict],
    chanceWords: chanceWords(line.chance),
    fixes: fixesForPair(line.writeUps, { revisionA: pair.a, revisionB: pair.b }, null),
  };
}
