import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { of } from 'rxjs';
import { deletionWords, graceDays, offerDays, type Deletion } from '../../../shared/contract/deletion';
import { formSending } from '../core/form-sending';
import { loadEach } from '../core/load';
import { Field, Labelled } from '../ui/labelled/labelled';
import { LoadStateView } from '../ui/load-state/load-state';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { ExportPanel } from './export-panel';
import { Leaving } from './leaving';
import { PasswordField } from './password-field';

/** What goes and what stays when somebody leaves, asking for it, and calling it off. */
@Component({
  selector: 'sl-deletion-page',
  imports: [
    DatePipe,
    ExportPanel,
    Field,
    Labelled,
    LoadStateView,
    PasswordField,
    ProblemNote,
    ReactiveFormsModule,
    RouterLink,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './deletion-page.html',
  styleUrl: './account.scss',
})
export class DeletionPage {
  private readonly leaving = inject(Leaving);
  protected readonly sending = formSending();
  protected readonly callingOff = formSending();
  protected readonly words = deletionWords;
  protected readonly graceDays = graceDays;
  protected readonly offerDays = offerDays;
  protected readonly loaded = loadEach(of(null), () => this.leaving.read());
  private readonly changed = signal<Deletion | null>(null);
  protected readonly state = computed(() => {
    const now = this.loaded();
    return this.changed() ?? (now.state === 'ready' ? now.value : null);
  });
  protected readonly keep = new FormControl<'former' | 'other'>('former', { nonNullable: true });
  protected readonly form = new FormGroup({
    handOverTo: new FormControl('', { nonNullable: true }),
    words: new FormControl('', { nonNullable: true, validators: Validators.required }),
    password: new FormControl('', { nonNullable: true, validators: Validators.required }),
  });

  protected ask(): void {
    const { handOverTo, words, password } = this.form.getRawValue();
    this.sending.send(
      this.form,
      () =>
        this.leaving.ask({
          words,
          password,
          handOverTo: this.keep.value === 'other' ? handOverTo.trim() : null,
        }),
      (deletion) => {
        this.changed.set(deletion);
        this.form.reset();
      },
    );
  }

  protected callOff(): void {
    this.callingOff.send(
      new FormGroup({}),
      () => this.leaving.callOff(),
      (deletion) => this.changed.set(deletion),
    );
  }
}
