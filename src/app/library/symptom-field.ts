import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  input,
  model,
  output,
  viewChild,
} from '@angular/core';
import { Icon } from '../ui/icon/icon';

/** The one field: what goes wrong, with figures as plain words. Tells every keystroke, and when it is sent. */
@Component({
  selector: 'sl-symptom-field',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form role="search" (submit)="send($event)">
      <label [attr.for]="fieldId()">{{ label() }}</label>
      <div class="line" [class.big]="big()">
        <sl-icon name="search" />
        <input
          #field
          type="search"
          name="q"
          autocomplete="off"
          enterkeyhint="search"
          maxlength="200"
          [id]="fieldId()"
          [value]="words()"
          (input)="words.set(field.value)"
          [placeholder]="example()"
          [attr.aria-describedby]="fieldId() + '-hint'"
        />
        @if (words()) {
          <button type="button" class="clear" aria-label="Empty the field" (click)="clear()">
            <sl-icon name="close" />
          </button>
        }
      </div>
      <p class="hint" [id]="fieldId() + '-hint'"><ng-content /></p>
    </form>
  `,
  styles: `
    label {
      display: block;
      font: 600 1.35rem/1.2 var(--sl-heading);
      color: var(--sl-ink);
      margin-block-end: 0.4rem;
    }
    .line {
      display: flex;
      align-items: center;
      border: 2px solid var(--sl-ink);
      background: var(--sl-paper);
    }
    .line:focus-within {
      outline: 3px solid var(--sl-accent);
      outline-offset: 0;
    }
    .line > sl-icon {
      margin-inline: 0.9rem 0.25rem;
      color: var(--sl-ink);
    }
    input {
      flex: 1;
      min-inline-size: 0;
      min-block-size: 3rem;
      padding: 0.25rem 0.5rem;
      border: 0;
      background: none;
      font-size: 1.125rem;
      color: var(--sl-text);
      appearance: none;
    }
    input:focus {
      outline: none;
    }
    input::placeholder {
      color: var(--sl-quiet);
      opacity: 1;
    }
    input::-webkit-search-cancel-button {
      display: none;
    }
    .big input {
      min-block-size: 4rem;
      font-size: clamp(1.125rem, 0.9rem + 1vw, 1.5rem);
    }
    .clear {
      display: grid;
      place-items: center;
      inline-size: 2.75rem;
      min-block-size: 2.75rem;
      border: 0;
      background: none;
      color: var(--sl-quiet);
      cursor: pointer;
    }
    .hint {
      margin: 0.4rem 0 0;
      color: var(--sl-quiet);
      font-size: var(--sl-small);
    }
    .hint:empty {
      display: none;
    }
  `,
})
export class SymptomField {
  readonly words = model('');
  readonly label = input('What goes wrong?');
  readonly example = input('');
  readonly fieldId = input('symptom');
  readonly big = input(false);
  readonly sent = output();

  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');

  protected send(event: Event): void {
    event.preventDefault();
    this.sent.emit();
  }

  protected clear(): void {
    this.words.set('');
    this.field().nativeElement.focus();
  }
}
