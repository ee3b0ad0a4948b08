import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  afterNextRender,
  inject,
  input,
  viewChild,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatAutocompleteModule, type MatAutocompleteSelectedEvent } from '@angular/material/autocomplete';
import { debounceTime, filter, map, startWith, switchMap } from 'rxjs';
import type { PartSummary } from '../../../../shared/contract/hardware';
import { partKindWords } from '../../../../shared/contract/vocabulary';
import { Undo } from '../../ui/undo/undo';
import { redrawWith } from '../../core/redraw-with';
import type { SideForm } from './edition-form';
import { PartDirectory } from './part-directory';

/** Chooses the part of one side of a joint from the catalogue, searched as one types. */
@Component({
  selector: 'sl-part-picker',
  imports: [MatAutocompleteModule, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (part(); as part) {
      <p class="chosen">
        <span>
          <strong>{{ part.name }}</strong>
          <span class="sl-quiet"> {{ part.maker.name }}, {{ kinds[part.kind] }}</span>
        </span>
        <button #another type="button" class="sl-bare-button" [id]="fieldId()" (click)="forget()">
          Choose another<span class="sl-visually-hidden"> than {{ part.name }} as {{ label() }}</span>
        </button>
      </p>
    } @else {
      <label [attr.for]="fieldId()">{{ label() }}</label>
      <input
        #field
        class="sl-field"
        type="text"
        placeholder="Name or maker"
        autocomplete="off"
        [id]="fieldId()"
        [formControl]="words"
        [matAutocomplete]="found"
      />
      <mat-autocomplete #found="matAutocomplete" [displayWith]="nothing" (optionSelected)="choose($event)">
        @for (part of parts() ?? []; track part.id) {
          <mat-option [value]="part">
            <strong>{{ part.name }}</strong>
            <span class="sl-quiet">{{ part.maker.name }}, {{ kinds[part.kind] }}</span>
          </mat-option>
        } @empty {
          @if (parts() !== undefined) {
            <mat-option disabled>{{
              parts() === null
                ? 'The catalogue does not answer at the moment'
                : 'No part of that name in the catalogue'
            }}</mat-option>
          }
        }
      </mat-autocomplete>
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
    .chosen {
      display: flex;
      flex-wrap: wrap;
      align-items: baseline;
      justify-content: space-between;
      gap: 0 1rem;
      margin: 0;
    }
  `,
})
export class PartPicker {
  readonly label = input.required<string>();
  readonly side = input.required<SideForm>();
  readonly fieldId = input.required<string>();
  private readonly directory = inject(PartDirectory);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  private readonly field = viewChild<ElementRef<HTMLInputElement>>('field');
  private readonly another = viewChild<ElementRef<HTMLButtonElement>>('another');
  protected readonly kinds = partKindWords;
  protected readonly words = new FormControl<string | PartSummary>('', { nonNullable: true });

  protected readonly parts = toSignal(
    this.words.valueChanges.pipe(
      startWith(''),
      filter((words) => typeof words === 'string'),
      map((words) => words.trim()),
      debounceTime(150),
      switchMap((words) => this.directory.find(words)),
    ),
  );

  constructor() {
    redrawWith(this.side);
  }

  protected part(): PartSummary | undefined {
    return this.directory.part(this.side().controls.partId.value);
  }

  protected choose(event: MatAutocompleteSelectedEvent): void {
    this.side().controls.partId.setValue((event.option.value as PartSummary).id);
    this.words.setValue('', { emitEvent: false });
    afterNextRender(() => this.another()?.nativeElement.focus(), { injector: this.injector });
  }

  /** Takes the part off, and with it the marks on its revisions; both come back on undo. */
  protected forget(): void {
    const { partId, revisions } = this.side().controls;
    const before = { partId: partId.value, revisions: revisions.value };
    this.side().patchValue({ partId: null, revisions: [] });
    if (before.revisions.length > 0) {
      this.undo.offer('The part and its marks are taken off', () => this.side().patchValue(before));
    }
    afterNextRender(() => this.field()?.nativeElement.focus(), { injector: this.injector });
  }

  protected nothing(): string {
    return '';
  }
}
