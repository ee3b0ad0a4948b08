import { ChangeDetectionStrategy, Component, ElementRef, inject, input, viewChild } from '@angular/core';
import { FormControl } from '@angular/forms';
import { redrawWith } from '../../core/redraw-with';
import { wrongWith } from '../../core/told-fields';
import { Icon } from '../../ui/icon/icon';
import { Undo } from '../../ui/undo/undo';

const most = 30;

/** A list of short entries, such as tools: Enter, a comma or leaving the field adds what is typed. */
@Component({
  selector: 'sl-words-field',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <label [attr.for]="fieldId()">{{ label() }}</label>
    @if (control().value.length > 0) {
      <ul [attr.aria-label]="label()">
        @for (entry of control().value; track entry; let index = $index) {
          <li>
            {{ entry }}
            <button type="button" [attr.aria-label]="'Remove ' + entry" (click)="remove(index)">
              <sl-icon name="close" />
            </button>
          </li>
        }
      </ul>
    }
    <span class="row">
      <input
        #field
        class="sl-field"
        type="text"
        maxlength="80"
        enterkeyhint="enter"
        [id]="fieldId()"
        [attr.aria-describedby]="fieldId() + '-hint'"
        [disabled]="control().value.length >= most"
        (keydown)="onKey($event)"
        (blur)="add()"
      />
      <button type="button" class="sl-plain-button" (click)="add()">
        Add<span class="sl-visually-hidden"> to {{ label() }}</span>
      </button>
    </span>
    <p class="hint" [id]="fieldId() + '-hint'">{{ hint() }} Enter or a comma adds it.</p>
    @if (wrong(); as wrong) {
      <p class="wrong">{{ wrong }}</p>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    label {
      display: block;
      font-weight: 600;
      margin-block-end: 0.2rem;
    }
    ul {
      display: flex;
      flex-wrap: wrap;
      gap: 0.4rem;
      margin: 0 0 0.4rem;
      padding: 0;
      list-style: none;
    }
    li {
      display: inline-flex;
      align-items: center;
      padding-inline-start: 0.6rem;
      border: 1px solid var(--sl-rule);
      overflow-wrap: anywhere;
    }
    li button {
      display: grid;
      place-items: center;
      inline-size: 2.5rem;
      block-size: 2.5rem;
      border: 0;
      background: none;
      color: var(--sl-quiet);
      cursor: pointer;
    }
    .row {
      display: flex;
    }
    .row button {
      border-color: var(--sl-quiet);
      border-inline-start: 0;
    }
    .hint {
      margin: 0.2rem 0 0;
      color: var(--sl-quiet);
      font-size: var(--sl-small);
    }
    .wrong {
      margin: 0.2rem 0 0;
      color: var(--sl-danger);
      font-weight: 600;
    }
  `,
})
export class WordsField {
  readonly label = input.required<string>();
  readonly control = input.required<FormControl<string[]>>();
  readonly fieldId = input.required<string>();
  readonly hint = input('');
  protected readonly most = most;
  private readonly undo = inject(Undo);
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');

  constructor() {
    redrawWith(this.control);
  }

  protected wrong(): string {
    return wrongWith(this.control());
  }

  protected onKey(event: KeyboardEvent): void {
    if (event.key !== 'Enter' && event.key !== ',') return;
    event.preventDefault();
    this.add();
  }

  protected add(): void {
    const { nativeElement } = this.field();
    const typed = nativeElement.value.split(',').map((word) => word.trim());
    nativeElement.value = '';
    const fresh = typed.filter((word) => word !== '' && !this.control().value.includes(word));
    if (fresh.length > 0) this.control().setValue([...this.control().value, ...fresh].slice(0, most));
  }

  protected remove(index: number): void {
    const control = this.control();
    const before = control.value;
    control.setValue(before.filter((_, at) => at !== index));
    this.undo.offer(`“${before[index]}” removed`, () => control.setValue(before));
    this.field().nativeElement.focus();
  }
}
