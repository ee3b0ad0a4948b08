import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { of } from 'rxjs';
import { loadEach } from '../core/load';
import { FitCheckLines } from '../joints/fit-check-lines';
import { Joints, type FitCheck } from '../joints/joints';
import { LoadStateView } from '../ui/load-state/load-state';
import { BenchStore } from './bench-store';

/** What meets on the bench, and the way to the same as a page that can be sent. */
@Component({
  selector: 'sl-bench-fit-check',
  imports: [FitCheckLines, LoadStateView, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h2 id="fit-check">Fit check</h2>
    @if (check(); as check) {
      @if (check.items.length) {
        <sl-fit-check-lines [lines]="check.items" />
      } @else {
        <p>No joint between the parts on your bench is known yet.</p>
      }
    } @else {
      <sl-load-state [of]="loaded()" waitingText="Checking what meets …" />
    }
    <p class="ways">
      <a class="sl-plain-button" routerLink="/bench/check" [queryParams]="{ revision: ids() }"
        >Try parts not bought yet, or send this check</a
      >
    </p>
  `,
  styles: `
    :host {
      display: block;
    }
    .ways {
      margin-block-start: 1.25rem;
    }
  `,
})
export class BenchFitCheck {
  private readonly joints = inject(Joints);
  private readonly bench = inject(BenchStore);

  protected readonly ids = computed(
    () => this.bench.items().flatMap(({ revision }) => (revision ? [revision.id] : [])),
    { equal: (one, other) => one.join() === other.join() },
  );
  protected readonly loaded = loadEach(toObservable(this.ids), (ids) =>
    ids.length === 0 ? of<FitCheck>({ items: [], stands: [] }) : this.joints.check(ids),
  );
  protected readonly check = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
}
