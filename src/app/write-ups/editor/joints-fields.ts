import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { redrawWith } from '../../core/redraw-with';
import { Icon } from '../../ui/icon/icon';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { Undo } from '../../ui/undo/undo';
import { jointForm, type EditionForm } from './edition-form';
import { fieldId } from './field-names';
import { PartPicker } from './part-picker';
import { RevisionMarks } from './revision-marks';

const most = 4;

/** The joints: two parts that are meant to mate, and for which of their revisions the write-up holds. */
@Component({
  selector: 'sl-joints-fields',
  imports: [Field, Icon, Labelled, PartPicker, ReactiveFormsModule, RevisionMarks],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (joint of joints().controls; track joint; let index = $index) {
      <div class="joint" role="group" [attr.aria-label]="'Joint ' + (index + 1)">
        <div class="sides">
          @for (name of sides; track name) {
            @let side = joint.controls[name];
            @let path = 'joints.' + index + '.' + name;
            <div class="side">
              <h3>{{ name === 'a' ? 'First part' : 'Second part' }}</h3>
              <sl-part-picker
                [label]="name === 'a' ? 'The part that is fitted to' : 'The part that is fitted'"
                [side]="side"
                [fieldId]="fieldId(path + '.partId')"
              />
              <sl-labelled
                label="Mating feature"
                optional
                [hint]="
                  name === 'a'
                    ? 'Such as: raised lip round the shaft hole'
                    : 'Such as: flat face of the plate'
                "
                [control]="side.controls.feature"
                [fieldId]="fieldId(path + '.feature')"
              >
                <input slField type="text" maxlength="120" [formControl]="side.controls.feature" />
              </sl-labelled>
              @if (side.controls.partId.value !== null) {
                <sl-revision-marks [side]="side" [fieldId]="fieldId(path + '.revisions')" />
              }
            </div>
          }
        </div>
        @if (joints().length > 1) {
          <button type="button" class="sl-bare-button" (click)="remove(index)">
            <sl-icon name="remove" />Take this joint off
          </button>
        }
      </div>
    }
    @if (joints().length < most) {
      <button type="button" class="sl-plain-button" [id]="fieldId('joints')" (click)="add()">
        <sl-icon name="plus" />{{ joints().length === 0 ? 'Name the joint' : 'Name another joint' }}
      </button>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 1.5rem;
      justify-items: start;
    }
    .joint {
      inline-size: 100%;
    }
    .sides {
      display: grid;
      gap: 1.5rem;
    }
    .side {
      display: grid;
      gap: 1rem;
      align-content: start;
    }
    h3 {
      margin: 0;
    }
    @media (min-width: 48rem) {
      .sides {
        grid-template-columns: 1fr 1fr;
        gap: 0;
      }
      .side + .side {
        border-inline-start: 1px solid var(--sl-rule);
        padding-inline-start: 1.5rem;
      }
      .side:first-child {
        padding-inline-end: 1.5rem;
      }
    }
  `,
})
export class JointsFields {
  readonly joints = input.required<EditionForm['controls']['joints']>();
  private readonly undo = inject(Undo);
  protected readonly fieldId = fieldId;
  protected readonly most = most;
  protected readonly sides = ['a', 'b'] as const;

  constructor() {
    redrawWith(this.joints);
  }

  protected add(): void {
    const empty = { partId: null, feature: '', revisions: [] };
    this.joints().push(jointForm({ a: empty, b: empty }));
  }

  protected remove(index: number): void {
    const joints = this.joints();
    const joint = joints.at(index);
    joints.removeAt(index);
    this.undo.offer('Joint taken off', () => joints.insert(Math.min(index, joints.length), joint));
  }
}
