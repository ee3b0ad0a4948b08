import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { RichText } from '../../../../shared/contract/write-ups';

/** Text that the server has rendered and cleaned; Angular cleans it once more, so that nothing in it can run. */
@Component({
  selector: 'sl-rich-text',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<div class="sl-prose" [innerHTML]="text().html"></div>`,
  styles: `
    :host {
      display: block;
    }
  `,
})
export class RichTextView {
  readonly text = input.required<RichText>();
}
