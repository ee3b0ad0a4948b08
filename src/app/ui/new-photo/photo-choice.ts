import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { Icon } from '../icon/icon';

/** A button that asks for one photo: chosen, or taken with the phone. */
@Component({
  selector: 'sl-photo-choice',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <label class="sl-plain-button">
      <sl-icon name="photo" /><span>{{ label() }}</span>
      <input class="sl-visually-hidden" type="file" accept="image/*" (change)="take($event)" />
    </label>
  `,
  styles: `
    label:focus-within {
      outline: 3px solid var(--sl-accent);
      outline-offset: 2px;
    }
  `,
})
export class PhotoChoice {
  readonly label = input.required<string>();
  readonly chosen = output<File>();

  protected take(event: Event): void {
    const field = event.target as HTMLInputElement;
    const file = field.files?.[0];
    // The same file can be chosen again after it was left out.
    field.value = '';
    if (file) this.chosen.emit(file);
  }
}
