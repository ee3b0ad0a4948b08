import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { BenchStore } from './bench-store';

/** The bench beside something else: what is on it, and the way to it. */
@Component({
  selector: 'sl-bench-glance',
  imports: [RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h2>On your bench</h2>
    @if (bench.size()) {
      <ul class="sl-plain-list">
        @for (entry of bench.items(); track entry.id) {
          <li>
            <a [routerLink]="['/parts', entry.part.slug]">{{ entry.part.name }}</a>
            @if (entry.revision) {
              <span class="revision">{{ entry.revision.label }}</span>
            } @else {
              <span class="revision unknown">which?</span>
            }
          </li>
        }
      </ul>
      <p><a routerLink="/bench">Change the bench</a></p>
    } @else {
      <p>
        Whether a fix holds depends on which revision of each part you have. Put your parts here once, and
        every result says so.
      </p>
      <p><a class="sl-plain-button" routerLink="/bench">Lay out your parts</a></p>
    }
  `,
  styles: `
    :host {
      display: block;
      border: 1px solid var(--sl-ink);
      padding: 1rem 1.25rem;
    }
    h2 {
      font-size: 1.35rem;
      margin-block: 0 0.5rem;
    }
    li {
      display: flex;
      justify-content: space-between;
      gap: 1rem;
      align-items: center;
      min-block-size: 2.5rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    .revision {
      font: 600 1.1rem/1 var(--sl-heading);
    }
    .unknown {
      color: var(--sl-quiet);
      font-weight: 400;
    }
    p {
      margin: 0.75rem 0 0;
    }
  `,
})
export class BenchGlance {
  protected readonly bench = inject(BenchStore);
}
