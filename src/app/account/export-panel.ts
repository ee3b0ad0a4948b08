import { DOCUMENT } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { finalize } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Leaving } from './leaving';

/** Takes away what one wrote and keeps here, as one file. */
@Component({
  selector: 'sl-export-panel',
  imports: [ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p>
      One ZIP file with everything you wrote or keep here, drafts too, and your photos at the largest width
      kept.
    </p>
    <p>
      <button class="sl-plain-button" type="button" [disabled]="busy()" (click)="fetch()">
        {{ busy() ? 'Packing …' : 'Download my data' }}
      </button>
      <span role="status">{{ done() ? 'Downloaded.' : '' }}</span>
    </p>
    @if (problem(); as problem) {
      <sl-problem-note [problem]="problem" />
    }
  `,
  styles: `
    button {
      margin-inline-end: 1rem;
    }
  `,
})
export class ExportPanel {
  private readonly leaving = inject(Leaving);
  private readonly document = inject(DOCUMENT);
  protected readonly busy = signal(false);
  protected readonly done = signal(false);
  protected readonly problem = signal<Problem | null>(null);

  protected fetch(): void {
    this.busy.set(true);
    this.done.set(false);
    this.problem.set(null);
    this.leaving
      .archive()
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: ({ file, name }) => {
          this.keep(file, name);
          this.done.set(true);
        },
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }

  private keep(file: Blob, name: string): void {
    const link = this.document.createElement('a');
    link.href = URL.createObjectURL(file);
    link.download = name;
    link.click();
    // The download has its own hold on the file by then.
    setTimeout(() => URL.revokeObjectURL(link.href), 60_000);
  }
}
