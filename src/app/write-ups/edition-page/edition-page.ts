import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { EditionView } from '../../../../shared/contract/write-ups';

@Component({ selector: 'sl-edition-page', changeDetection: ChangeDetectionStrategy.OnPush, template: '' })
export class EditionPage {
  readonly view = input.required<EditionView>();
}
