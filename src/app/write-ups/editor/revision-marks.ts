import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import type { RevisionMark } from '../../../../shared/contract/edition-content';
import { redrawWith } from '../../core/redraw-with';
import type { SideForm } from './edition-form';
import { PartDirectory } from './part-directory';

type Word = 'holds' | 'not' | 'unknown';

/** For each revision of a part: whether the write-up holds for it, as its author found it. */
@Component({
  selector: 'sl-revision-marks',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset tabindex="-1" [id]="fieldId()">
      <legend>For which revisions of {{ partName() }} does it hold?</legend>
      @for (revision of revisions(); track revision.id) {
        <div class="row" role="radiogroup" [attr.aria-label]="'Revision ' + revision.label">
          <span class="label">{{ revision.label }}</span>
          @for (word of words; track word.value) {
            <label [class.on]="markOf(revision.id) === word.value">
              <input
                type="radio"
                [name]="fieldId() + '-' + revision.id"
                [checked]="markOf(revision.id) === word.value"
                (change)="mark(revision.id, word.value)"
              />
              {{ word.label }}
            </label>
          }
        </div>
      } @empty {
        <p class="sl-quiet">The catalogue knows no revision of this part yet.</p>
      }
    </fieldset>
  `,
  styles: `
    fieldset {
      margin: 0;
      padding: 0;
      border: 0;
    }
    legend {
      padding: 0;
      margin-block-end: 0.35rem;
      font-weight: 600;
    }
    .row {
      display: grid;
      grid-template-columns: minmax(2.5rem, 5rem) repeat(3, max-content);
      align-items: center;
      border-block-end: 1px solid var(--sl-hair);
    }
    .label {
      font-family: var(--sl-mono);
    }
    label {
      display: inline-flex;
      align-items: center;
      gap: 0.35rem;
      min-block-size: 2.75rem;
      padding-inline: 0.5rem;
      color: var(--sl-quiet);
      cursor: pointer;
    }
    label.on {
      color: var(--sl-text);
      font-weight: 600;
    }
    @media (max-width: 30rem) {
      .row {
        grid-template-columns: repeat(3, max-content);
        padding-block-start: 0.35rem;
      }
      .label {
        grid-column: 1 / -1;
      }
      label {
        padding-inline: 0 0.6rem;
      }
    }
  `,
})
export class RevisionMarks {
  readonly side = input.required<SideForm>();
  readonly fieldId = input.required<string>();
  private readonly directory = inject(PartDirectory);
  protected readonly words: { value: Word; label: string }[] = [
    { value: 'holds', label: 'holds' },
    { value: 'not', label: 'does not hold' },
    { value: 'unknown', label: 'not known' },
  ];

  constructor() {
    redrawWith(this.side);
  }

  protected revisions() {
    return this.directory.part(this.side().controls.partId.value)?.revisions ?? [];
  }

  protected partName(): string {
    return this.directory.partName(this.side().controls.partId.value);
  }

  protected markOf(revisionId: number): Word {
    const mark = this.side().controls.revisions.value.find((one) => one.revisionId === revisionId);
    return mark === undefined ? 'unknown' : mark.holds ? 'holds' : 'not';
  }

  protected mark(revisionId: number, word: Word): void {
    const others = this.side().controls.revisions.value.filter((one) => one.revisionId !== revisionId);
    const marks: RevisionMark[] =
      word === 'unknown' ? others : [...others, { revisionId, holds: word === 'holds' }];
    this.side().controls.revisions.setValue(marks);
  }
}
