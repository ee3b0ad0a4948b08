import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { of } from 'rxjs';
import type { JointRef } from '../../../shared/contract/joints';
import { jointKindNames, jointKinds } from '../../../shared/fit/joint-kinds';
import { loadEach } from '../core/load';
import { ShimloreTitles } from '../core/titles';
import { LoadStateView } from '../ui/load-state/load-state';
import { Joints } from './joints';

/** All known joints, narrowed by a part and by kind. The address holds what is asked. */
@Component({
  selector: 'sl-joints-page',
  imports: [LoadStateView, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './joints-page.html',
  styleUrl: './joints-page.scss',
})
export class JointsPage {
  private readonly joints = inject(Joints);
  private readonly route = inject(ActivatedRoute);
  private readonly router = inject(Router);
  private readonly query = toSignal(this.route.queryParamMap, {
    requireSync: true,
  });

  protected readonly kinds = jointKindNames.map((value) => ({
    value,
    words: jointKinds[value].label,
  }));
  protected readonly kindWords = jointKinds;
  protected readonly part = computed(() => this.query().get('part') ?? '');
  protected readonly kind = computed(() => this.query().get('kind') ?? '');
  protected readonly loaded = loadEach(of(undefined), () => this.joints.list());
  protected readonly all = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value.items : null;
  });
  protected readonly parts = computed(() => {
    const parts = new Map(
      (this.all() ?? []).flatMap((joint) => [joint.a, joint.b]).map((part) => [part.slug, part]),
    );
    return [...parts.values()].sort((one, other) => one.name.localeCompare(other.name, 'en'));
  });
  protected readonly shown = computed(() => (this.all() ?? []).filter((joint) => this.isAsked(joint)));

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({
        title: 'Joints',
        description: 'Where parts meet, and which of their revisions fit together.',
        path: '/joints',
      }),
    );
  }

  protected ask(change: { part?: string; kind?: string }): void {
    const queryParams = Object.fromEntries(
      Object.entries(change).map(([name, value]) => [name, value === '' ? null : value]),
    );
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams,
      queryParamsHandling: 'merge',
    });
  }

  private isAsked(joint: JointRef): boolean {
    const [part, kind] = [this.part(), this.kind()];
    return (
      (part === '' || joint.a.slug === part || joint.b.slug === part) && (kind === '' || joint.kind === kind)
    );
  }
}
