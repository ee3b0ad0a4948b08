import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { redrawWith } from '../../core/redraw-with';
import { Icon } from '../../ui/icon/icon';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { PhotoView } from '../../ui/photo/photo';
import { Undo } from '../../ui/undo/undo';
import { DraftEditing } from './draft-editing';
import { stepForm, type FixForm } from './edition-form';
import { fieldId } from './field-names';
import { newItemKey } from './item-key';
import { ItemTools } from './item-tools';
import { moveItem } from './move-item';
import { PassageField } from './passage-field';

const most = 40;

/** The steps of a fix, in their order, each with a photo if one shows it. */
@Component({
  selector: 'sl-steps-fields',
  imports: [Field, Icon, ItemTools, Labelled, PassageField, PhotoView, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p class="heading">Steps</p>
    <ol>
      @for (step of steps().controls; track step; let index = $index) {
        <li>
          <div class="line">
            <sl-passage-field
              [label]="'Step ' + (index + 1)"
              [control]="step.controls.text"
              [longest]="4000"
              [rows]="2"
              [fieldId]="fieldId(path() + '.' + index + '.text')"
            />
            <sl-item-tools
              [name]="'step ' + (index + 1)"
              [index]="index"
              [length]="steps().length"
              (moved)="move(index, $event)"
              (removed)="remove(index)"
            />
          </div>
          @if (photoChoices().length > 0) {
            <div class="photo">
              @if (photoOf(step.controls.photoId.value); as photo) {
                <sl-photo [photo]="photo" sizes="8rem" />
              }
              <sl-labelled label="Photo of this step" [control]="step.controls.photoId">
                <select slField [formControl]="step.controls.photoId">
                  <option [ngValue]="null">none</option>
                  @for (choice of photoChoices(); track choice.id) {
                    <option [ngValue]="choice.id">{{ choice.name }}</option>
                  }
                </select>
              </sl-labelled>
            </div>
          }
        </li>
      }
    </ol>
    @if (steps().length < most) {
      <button type="button" class="sl-plain-button" [id]="fieldId(path())" (click)="add()">
        <sl-icon name="plus" />Add a step
      </button>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    .heading {
      margin: 0 0 0.35rem;
      font-weight: 600;
    }
    ol {
      display: grid;
      gap: 1rem;
      margin: 0 0 0.75rem;
      padding: 0;
      list-style: none;
    }
    .line {
      display: grid;
      grid-template-columns: minmax(0, 1fr) max-content;
      gap: 0.5rem;
      align-items: start;
    }
    @media (max-width: 40rem) {
      .line {
        grid-template-columns: minmax(0, 1fr);
        gap: 0;
      }
    }
    .photo {
      display: flex;
      flex-wrap: wrap;
      gap: 0.75rem;
      align-items: end;
    }
    .photo sl-photo {
      inline-size: 8rem;
    }
  `,
})
export class StepsFields {
  readonly steps = input.required<FixForm['controls']['steps']>();
  readonly path = input.required<string>();
  private readonly editing = inject(DraftEditing);
  private readonly undo = inject(Undo);
  protected readonly fieldId = fieldId;
  protected readonly most = most;
  protected readonly photoChoices = computed(() =>
    this.editing.content().photos.map((photo, index) => ({
      id: photo.photoId,
      name: `${index + 1}. ${photo.alt || photo.caption || 'photo'}`,
    })),
  );

  constructor() {
    redrawWith(this.steps);
  }

  protected photoOf(id: number | null) {
    return id === null ? undefined : this.editing.photos().get(id);
  }

  protected add(): void {
    this.steps().push(stepForm({ key: newItemKey(), text: '', photoId: null }));
  }

  protected move(index: number, by: -1 | 1): void {
    moveItem(this.steps(), index, by);
  }

  protected remove(index: number): void {
    const steps = this.steps();
    const step = steps.at(index);
    steps.removeAt(index);
    this.undo.offer('Step removed', () => steps.insert(Math.min(index, steps.length), step));
  }
}
