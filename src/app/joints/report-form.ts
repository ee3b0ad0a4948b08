import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { FitCell } from '../../../shared/contract/joints';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { Joints } from './joints';

/** One voice of a member on a pair as delivered. A second one replaces the first, which is also how a slip is taken back. */
@Component({
  selector: 'sl-report-form',
  imports: [ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p>
      Do you have this pair, {{ nameA() }} and {{ nameB() }}? Say how it went as delivered, before any fix.
      You have one voice for a pair; saying it again replaces what you said.
    </p>
    <label for="report-note">Note (if you like)</label>
    <textarea
      #field
      id="report-note"
      class="sl-field"
      rows="2"
      maxlength="1000"
      [value]="note()"
      (input)="note.set(field.value)"
    ></textarea>
    <p class="ways">
      <button type="button" class="sl-plain-button" [disabled]="working()" (click)="say(true)">It sat</button>
      <button type="button" class="sl-plain-button" [disabled]="working()" (click)="say(false)">
        It did not sit
      </button>
    </p>
    <p role="status">
      @if (said() !== null) {
        <span>You said {{ said() ? 'it sat' : 'it did not sit' }}.</span>
      }
    </p>
    <sl-problem-note [problem]="problem()" />
  `,
  styles: `
    :host {
      display: block;
      max-inline-size: var(--sl-measure);
    }
    label {
      font-weight: 600;
    }
    .ways {
      display: flex;
      flex-wrap: wrap;
      gap: 0.75rem;
      margin-block: 0.75rem 0.5rem;
    }
  `,
})
export class ReportForm {
  readonly slug = input.required<string>();
  readonly cell = input.required<FitCell>();
  readonly nameA = input.required<string>();
  readonly nameB = input.required<string>();
  readonly reported = output<FitCell>();

  private readonly joints = inject(Joints);
  private readonly undo = inject(Undo);
  protected readonly working = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  /** Named by its revisions: counts that change leave the note and what was said alone. */
  private readonly pair = computed(() => `${this.cell().revisionA}/${this.cell().revisionB}`);
  protected readonly note = linkedSignal({
    source: this.pair,
    computation: () => '',
  });
  protected readonly said = linkedSignal<string, boolean | null>({
    source: this.pair,
    computation: () => null,
  });

  protected async say(sat: boolean): Promise<void> {
    this.working.set(true);
    this.problem.set(null);
    const { revisionA, revisionB } = this.cell();
    try {
      const cell = await firstValueFrom(
        this.joints.report(this.slug(), {
          revisionA,
          revisionB,
          sat,
          note: this.note(),
        }),
      );
      this.reported.emit(cell);
      const before = this.said();
      this.said.set(sat);
      const noted = `Noted: ${sat ? 'it sat' : 'it did not sit'}.`;
      if (before === null || before === sat) this.undo.tell(`${noted} Saying the other replaces it.`);
      else this.undo.offer(noted, () => void this.say(before));
    } catch (error) {
      this.problem.set(toApiProblem(error).problem);
    } finally {
      this.working.set(false);
    }
  }
}
