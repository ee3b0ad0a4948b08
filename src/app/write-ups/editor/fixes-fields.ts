import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { redrawWith } from '../../core/redraw-with';
import { Icon } from '../../ui/icon/icon';
import { Undo } from '../../ui/undo/undo';
import { fixForm, type EditionForm } from './edition-form';
import { fieldId } from './field-names';
import { FixFields } from './fix-fields';
import { newItemKey } from './item-key';
import { ItemTools } from './item-tools';
import { moveItem } from './move-item';

const most = 12;

/** The remedies; reversible ones before permanent ones is for the author to arrange. */
@Component({
  selector: 'sl-fixes-fields',
  imports: [FixFields, Icon, ItemTools],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (fix of fixes().controls; track fix; let index = $index) {
      <div class="item" role="group" [attr.aria-label]="'Fix ' + (index + 1)">
        <div class="bar">
          <h3>Fix {{ index + 1 }}{{ fix.controls.title.value ? ': ' + fix.controls.title.value : '' }}</h3>
          <sl-item-tools
            [name]="'fix ' + (index + 1)"
            [index]="index"
            [length]="fixes().length"
            (moved)="move(index, $event)"
            (removed)="remove(index)"
          />
        </div>
        <sl-fix-fields [fix]="fix" [path]="'fixes.' + index" />
      </div>
    }
    @if (fixes().length < most) {
      <button type="button" class="sl-plain-button" [id]="fieldId('fixes')" (click)="add()">
        <sl-icon name="plus" />Add a fix
      </button>
    }
  `,
  styles: `
    .bar {
      display: flex;
      align-items: center;
      justify-content: space-between;
      gap: 1rem;
    }
    h3 {
      margin: 0;
      min-inline-size: 0;
    }
  `,
  styleUrl: './item-fields.scss',
})
export class FixesFields {
  readonly fixes = input.required<EditionForm['controls']['fixes']>();
  private readonly undo = inject(Undo);
  protected readonly fieldId = fieldId;
  protected readonly most = most;

  constructor() {
    redrawWith(this.fixes);
  }

  protected add(): void {
    this.fixes().push(
      fixForm({
        key: newItemKey(),
        title: '',
        kind: null,
        permanence: null,
        why: '',
        tools: [],
        materials: [],
        steps: [{ key: newItemKey(), text: '', photoId: null }],
        revisionIds: [],
        afterwards: [],
        afterwardsNote: '',
        acceptance: null,
        worksheet: null,
      }),
    );
  }

  protected move(index: number, by: -1 | 1): void {
    moveItem(this.fixes(), index, by);
  }

  protected remove(index: number): void {
    const fixes = this.fixes();
    const fix = fixes.at(index);
    fixes.removeAt(index);
    this.undo.offer('Fix removed', () => fixes.insert(Math.min(index, fixes.length), fix));
  }
}
