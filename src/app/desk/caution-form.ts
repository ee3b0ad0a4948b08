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
import { FormGroup, ReactiveFormsModule } from '@angular/forms';
import type { Observable } from 'rxjs';
import type { Caution } from '../../../shared/contract/write-ups';
import { formSending } from '../core/form-sending';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { CautionWordsFields, cautionWordsControls } from './caution-words-fields';
import type { CautionWords } from './desk';

/** Words of a caution, to be made fit for this very fix before it is placed. */
@Component({
  selector: 'sl-caution-form',
  imports: [CautionWordsFields, ProblemNote, ReactiveFormsModule],
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
  protected readonly form = new FormGroup(cautionWordsControls());

  constructor() {
    afterNextRender(() => this.host.nativeElement.querySelector<HTMLElement>('textarea')?.focus());
  }

  ngOnInit(): void {
    this.form.setValue({ ...this.words(), hazards: [...this.words().hazards] });
  }

  protected place(): void {
    this.sending.send(
      this.form,
      () => this.send()(this.form.getRawValue()),
      (caution) => this.done.emit(caution),
    );
  }
}
