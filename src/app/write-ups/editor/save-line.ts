import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { SaveState } from './autosave';
import { fieldId, fieldName } from './field-names';

/** Where the text stands: saved at a time, saving, or not saved and why. */
@Component({
  selector: 'sl-save-line',
  imports: [DatePipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'status' },
  template: `
    @let now = state();
    @switch (now.kind) {
      @case ('saved') {
        Saved {{ now.at | date: 'HH:mm' }}
      }
      @case ('waiting') {
        Not saved yet …
      }
      @case ('saving') {
        Saving …
      }
      @case ('moved-on') {
        <strong>Not saved: the draft was changed elsewhere</strong>
      }
      @case ('partly-saved') {
        <span>Saved {{ now.at | date: 'HH:mm' }}, all but:</span>
        @for (field of now.heldBack; track field.path) {
          <a [href]="'#' + fieldId(field.path)" (click)="go($event, field.path)"
            >{{ fieldName(field.path) }} {{ field.message }}</a
          >
        }
        @if (kept()) {
          <span>That is kept in this browser.</span>
        }
      }
      @case ('not-saved') {
        <strong
          >{{ now.triesAgain ? 'Not saved, trying again: ' : 'Not saved: ' }}{{ now.why.detail }}</strong
        >
        @if (kept()) {
          <span>What you typed is kept in this browser.</span>
        }
        @for (field of now.why.fields; track field.path) {
          <a [href]="'#' + fieldId(field.path)" (click)="go($event, field.path)"
            >{{ fieldName(field.path) }} {{ field.message }}</a
          >
        }
        @if (now.triesAgain) {
          <button type="button" class="sl-bare-button" (click)="tryNow.emit()">Try now</button>
        }
      }
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      align-items: baseline;
      gap: 0.1rem 0.75rem;
      min-inline-size: 0;
      color: var(--sl-quiet);
    }
    strong {
      color: var(--sl-danger);
    }
  `,
})
export class SaveLine {
  readonly state = input.required<SaveState>();
  /** Whether what is not saved is kept in this browser. */
  readonly kept = input(false);
  readonly tryNow = output();
  /** Path of a field that somebody wants to see. */
  readonly wanted = output<string>();
  protected readonly fieldId = fieldId;
  protected readonly fieldName = fieldName;

  protected go(event: Event, path: string): void {
    event.preventDefault();
    this.wanted.emit(path);
  }
}
