import { ChangeDetectionStrategy, Component, computed, input, linkedSignal, output } from '@angular/core';
import { worksheetVersion, type WorksheetRecord } from '../../../../shared/contract/worksheet';
import { runWorksheet, type WorksheetRun } from '../../../../shared/fit/worksheet';

/** Runs an attached worksheet again with its own figures; where it comes to something else by now, that can be taken. */
@Component({
  selector: 'sl-worksheet-again',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <button type="button" class="sl-bare-button" (click)="again()">Run it again</button>
    <div role="status">
      @if (run(); as run) {
        @if (!run.result) {
          <p>It comes to no result by now: {{ run.problems[0]?.message ?? 'open it to see why' }}</p>
        } @else if (fresh(); as fresh) {
          <p>
            It comes out otherwise by now: <strong>{{ fresh.result.sentence }}</strong>
          </p>
          <button type="button" class="sl-plain-button" (click)="taken.emit(fresh)">
            Take the new result
          </button>
        } @else {
          <p>It comes out the same.</p>
        }
      }
    </div>
  `,
  styles: `
    p {
      margin: 0 0 0.4rem;
    }
  `,
})
export class WorksheetAgain {
  readonly record = input.required<WorksheetRecord>();
  /** The same inputs with what they come to now. */
  readonly taken = output<WorksheetRecord>();
  /** Run only when asked for: a stack of many pieces takes a while. A new record has not been run again. */
  protected readonly run = linkedSignal<WorksheetRecord, WorksheetRun | null>({
    source: this.record,
    computation: () => null,
  });
  protected readonly fresh = computed((): WorksheetRecord | null => {
    const run = this.run();
    const record = this.record();
    const isOld = run?.differs === true || record.version !== worksheetVersion;
    return run?.result && isOld
      ? ({ ...record, version: worksheetVersion, result: run.result } as WorksheetRecord)
      : null;
  });

  protected again(): void {
    this.run.set(runWorksheet(this.record()));
  }
}
