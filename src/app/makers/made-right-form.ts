import { ChangeDetectionStrategy, Component, OnInit, computed, inject, input, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { ConcernedMaker } from '../../../shared/contract/makers';
import type { FixView } from '../../../shared/contract/write-ups';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { Makers } from './makers';

/** From which revision of its part on the maker has corrected what the fixes mend. */
@Component({
  selector: 'sl-made-right-form',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="form" novalidate aria-label="Made right" (ngSubmit)="send()">
      <sl-labelled label="Made right from" [control]="form.controls.revisionId">
        <select slField formControlName="revisionId">
          <option value="">choose a revision</option>
          @for (part of of().parts; track part.id) {
            <optgroup [label]="part.name">
              @for (revision of part.revisions; track revision.id) {
                <option [value]="revision.id">
                  {{ part.name }} {{ revision.label }}{{ revision.announced ? ' (announced)' : '' }}
                </option>
              }
            </optgroup>
          }
        </select>
      </sl-labelled>
      <fieldset>
        <legend>For which fixes</legend>
        @for (fix of fixes(); track fix.key) {
          <label class="choice">
            <input
              #box
              type="checkbox"
              [checked]="chosen.value.includes(fix.key)"
              (change)="choose(fix.key, box.checked)"
            />
            <span
              >{{ fix.title }}
              @if (fix.madeRightFrom; as from) {
                <span class="sl-quiet">(made right from {{ from.label }})</span>
              }
            </span>
          </label>
        }
      </fieldset>
      <sl-problem-note [problem]="sending.problem()" />
      <div class="ways">
        <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">
          Mark it as made right
        </button>
        @if (marked().length) {
          <button type="button" class="sl-bare-button" [disabled]="sending.busy()" (click)="undoAll()">
            It is not made right after all
          </button>
        }
      </div>
    </form>
  `,
  styleUrl: './maker-form.scss',
  styles: `
    sl-labelled {
      max-inline-size: 24rem;
    }
  `,
})
export class MadeRightForm implements OnInit {
  readonly slug = input.required<string>();
  readonly of = input.required<ConcernedMaker>();
  readonly fixes = input.required<readonly FixView[]>();
  readonly changed = output();

  private readonly makers = inject(Makers);
  private readonly undo = inject(Undo);
  protected readonly sending = formSending();
  protected readonly form = new FormGroup({
    revisionId: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
    fixKeys: new FormControl<string[]>([], { nonNullable: true, validators: [Validators.required] }),
  });
  protected readonly chosen = this.form.controls.fixKeys;
  /** Keys of the fixes that are made right by a revision of this maker. */
  protected readonly marked = computed(() => {
    const own = new Set(this.of().parts.map(({ id }) => id));
    return this.fixes().flatMap(({ key, madeRightFrom }) =>
      madeRightFrom && own.has(madeRightFrom.partId) ? [key] : [],
    );
  });

  ngOnInit(): void {
    this.chosen.setValue(this.fixes().map(({ key }) => key));
  }

  protected choose(key: string, wanted: boolean): void {
    const others = this.chosen.value.filter((other) => other !== key);
    this.chosen.setValue(wanted ? [...others, key] : others);
  }

  protected send(): void {
    const { revisionId, fixKeys } = this.form.getRawValue();
    this.sending.send(
      this.form,
      () => this.makers.markMadeRight(this.slug(), { revisionId: Number(revisionId), fixKeys }),
      () => {
        this.undo.offer('It is marked as made right.', () => this.unmark(fixKeys));
        this.changed.emit();
      },
    );
  }

  protected undoAll(): void {
    this.unmark(this.marked());
  }

  private unmark(fixKeys: string[]): void {
    this.sending.send(
      new FormGroup({}),
      () => this.makers.unmarkMadeRight(this.slug(), fixKeys),
      () => {
        this.undo.tell('It is not marked as made right any more.');
        this.changed.emit();
      },
    );
  }
}
