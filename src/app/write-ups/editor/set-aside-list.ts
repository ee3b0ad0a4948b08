import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { SetAside } from './set-aside';

/** Texts that were not taken when two were merged, to copy from. */
@Component({
  selector: 'sl-set-aside-list',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <section aria-labelledby="set-aside-heading">
      <h2 id="set-aside-heading">Set aside</h2>
      <p class="sl-quiet">
        Texts that were not taken. They are kept in this browser, not in the draft, until you drop them.
      </p>
      @for (text of setAside(); track $index) {
        <div class="text">
          <h3>
            {{ text.name }} <span class="sl-quiet">{{ text.whose }}</span>
          </h3>
          <pre tabindex="0">{{ text.words }}</pre>
        </div>
      }
      <button type="button" class="sl-bare-button" (click)="dismissed.emit()">Drop these texts</button>
    </section>
  `,
  styles: `
    section {
      border-block-start: 1px solid var(--sl-ink);
      padding-block: 0.75rem;
    }
    h2 {
      margin: 0;
    }
    h3 {
      margin-block: 1rem 0.25rem;
    }
    pre {
      margin: 0;
      padding: 0.75rem;
      white-space: pre-wrap;
      overflow-wrap: anywhere;
      font: inherit;
      background: var(--sl-desk);
    }
  `,
})
export class SetAsideList {
  readonly setAside = input.required<readonly SetAside[]>();
  readonly dismissed = output();
}
