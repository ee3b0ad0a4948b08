import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  afterNextRender,
  inject,
  input,
} from '@angular/core';
import { RouterLink } from '@angular/router';

/** What was decided, and the way on. */
@Component({
  selector: 'sl-item-result',
  imports: [RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <section role="status">
      <h1>{{ title() }}</h1>
      <p>{{ text() }}</p>
      <p><a class="sl-strong-button" routerLink="/desk">Back to the queue</a></p>
    </section>
  `,
})
export class ItemResult {
  readonly title = input.required<string>();
  readonly text = input.required<string>();

  constructor() {
    const host = inject<ElementRef<HTMLElement>>(ElementRef);
    // So that a whole shift goes by keyboard: Enter leads on.
    afterNextRender(() => host.nativeElement.querySelector('a')?.focus());
  }
}
