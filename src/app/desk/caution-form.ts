import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  type OnInit,
  afterNextRender,
  inject,
  input,
  output,
} from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { Observable } from 'rxjs';
import {
  hazardKindWords,
  signalWordMeans,
  type HazardKind,
  type SignalWord,
} from '../../../shared/contract/vocabulary';
import type { Caution } from '../../../shared/contract/write-ups';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import type { CautionWords } from './desk';

/** Words of a caution, to be made fit for this very fix before it is placed. */
@Component({
  selector: 'sl-caution-form',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './caution-form.html',
  styleUrl: './caution-form.scss',
})
export class CautionForm implements OnInit {
  /** The words to begin with. */
  readonly words = input.required<CautionWords>();
  /** Verb on the button: "Place the caution". */
  readonly verb = input.required<string>();
  /** Sends the words; what the server says of them is shown here. */
  readonly send = input.required<(words: CautionWords) => Observable<Caution>>();
  readonly done = output<Caution>();
  readonly cancelled = output();
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  protected readonly sending = formSending();
  protected readonly signalWords = Object.entries(signalWordMeans) as [SignalWord, string][];
  protected readonly hazardKinds = Object.entries(hazardKindWords) as [HazardKind, string][];
  protected readonly form = new FormGroup({
    signalWord: new FormControl<SignalWord>('caution', { nonNullable: true }),
    hazards: new FormControl<HazardKind[]>([], { nonNullable: true }),
    hazard: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(3)],
    }),
    consequence: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(3)],
    }),
    avoidance: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(3)],
    }),
  });

  constructor() {
    afterNextRender(() => this.host.nativeElement.querySelector<HTMLElement>('textarea')?.focus());
  }

  ngOnInit(): void {
    this.form.setValue({ ...this.words(), hazards: [...this.words().hazards] });
  }

  protected toggle(hazard: HazardKind): void {
    const { hazards } = this.form.controls;
    hazards.setValue(
      hazards.value.includes(hazard)
        ? hazards.value.filter((one) => one !== hazard)
        : [...hazards.value, hazard],
    );
  }

  protected place(): void {
    this.sending.send(
      this.form,
      () => this.send()(this.form.getRawValue()),
      (caution) => this.done.emit(caution),
    );
  }
}
