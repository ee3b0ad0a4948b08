import { ChangeDetectionStrategy, Component, OnInit, inject, input, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { PartRef, Revision } from '../../../shared/contract/hardware';
import type { AnnounceRevision } from '../../../shared/contract/makers';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Makers } from './makers';

/** A revision that the maker announces, or what is said of one that is not sold yet. */
@Component({
  selector: 'sl-announce-form',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="form" novalidate aria-label="Announce a revision" (ngSubmit)="send()">
      @if (!revision()) {
        <sl-labelled label="Which part" [control]="form.controls.part">
          <select slField formControlName="part">
            @for (part of parts(); track part.id) {
              <option [value]="part.slug">{{ part.name }}</option>
            }
          </select>
        </sl-labelled>
      }
      <sl-labelled
        class="short"
        label="Its label"
        hint="As owners will read it: Rev E"
        [control]="form.controls.label"
      >
        <input slField maxlength="60" formControlName="label" />
      </sl-labelled>
      <sl-labelled class="short" label="Sold from" optional [control]="form.controls.soldFrom">
        <input slField type="date" formControlName="soldFrom" />
      </sl-labelled>
      <sl-labelled label="What changes" [control]="form.controls.whatChanges">
        <textarea slField rows="4" maxlength="2000" formControlName="whatChanges"></textarea>
      </sl-labelled>
      <sl-labelled
        label="How to tell it from those before"
        hint="What one sees or measures with the part in hand"
        [control]="form.controls.howToTell"
      >
        <textarea slField rows="3" maxlength="2000" formControlName="howToTell"></textarea>
      </sl-labelled>
      <sl-problem-note [problem]="sending.problem()" />
      <div class="ways">
        <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">
          {{ revision() ? 'Save what is said of it' : 'Announce it' }}
        </button>
        <button type="button" class="sl-bare-button" (click)="left.emit()">Leave it</button>
      </div>
    </form>
  `,
  styleUrl: './maker-form.scss',
})
export class AnnounceForm implements OnInit {
  /** The maker's own parts, to choose from. */
  readonly parts = input<readonly PartRef[]>([]);
  /** The announced revision to change; null announces a new one. */
  readonly revision = input<Revision | null>(null);
  readonly done = output<{ slug: string; revision: Revision }>();
  readonly left = output();

  private readonly makers = inject(Makers);
  protected readonly sending = formSending();
  protected readonly form = new FormGroup({
    part: new FormControl('', { nonNullable: true }),
    label: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
    soldFrom: new FormControl('', { nonNullable: true }),
    whatChanges: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(10)],
    }),
    howToTell: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(10)],
    }),
  });

  ngOnInit(): void {
    this.form.controls.part.setValue(this.parts()[0]?.slug ?? '');
    const revision = this.revision();
    if (!revision) return;
    this.form.patchValue({
      label: revision.label,
      soldFrom: revision.soldFrom ?? '',
      whatChanges: revision.whatChanged,
      howToTell: revision.howToTell,
    });
  }

  protected send(): void {
    const { part, soldFrom, ...words } = this.form.getRawValue();
    const body: AnnounceRevision = { ...words, soldFrom: soldFrom === '' ? null : soldFrom };
    const before = this.revision();
    this.sending.send(
      this.form,
      () => (before ? this.makers.changeAnnounced(before.id, body) : this.makers.announce(part, body)),
      (revision) => this.done.emit({ slug: part, revision }),
    );
  }
}
