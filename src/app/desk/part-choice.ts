import { ChangeDetectionStrategy, Component, inject, input, output, signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { debounceTime, distinctUntilChanged, map, of, switchMap } from 'rxjs';
import type { PartPage, PartSummary } from '../../../shared/contract/hardware';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { loading, statesOf, type LoadState } from '../core/load';
import { Hardware } from '../hardware/hardware';
import { ProblemNote } from '../ui/problem-note/problem-note';

const pauseInTyping = 150;
const offered = 8;

/** A part of the catalogue, found by its name; gives out its page. */
@Component({
  selector: 'sl-part-choice',
  imports: [ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <label
      >{{ label() }}
      <input class="sl-field" type="search" autocomplete="off" maxlength="100" [formControl]="name" />
    </label>
    @if (chosen(); as part) {
      <p class="chosen">
        <b>{{ part.name }}</b> by {{ part.maker.name }} <code>{{ part.slug }}</code>
      </p>
    }
    <sl-problem-note [problem]="problem()" />
    @let now = found();
    @if (now.state === 'ready' && now.value.length) {
      <ul class="sl-plain-list">
        @for (part of now.value; track part.id) {
          <li>
            <button type="button" class="sl-bare-button" (click)="choose(part)">
              {{ part.name }} by {{ part.maker.name }} ({{ part.slug }})
            </button>
          </li>
        }
      </ul>
    }
  `,
  styles: `
    label {
      display: block;
      font-weight: 600;
    }
    .chosen {
      margin: 0.3rem 0;
    }
  `,
})
export class PartChoice {
  readonly label = input.required<string>();
  readonly picked = output<PartPage>();
  private readonly hardware = inject(Hardware);
  protected readonly name = new FormControl('', { nonNullable: true });
  protected readonly chosen = signal<PartPage | null>(null);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly found = toSignal(
    this.name.valueChanges.pipe(
      debounceTime(pauseInTyping),
      distinctUntilChanged(),
      switchMap((q) =>
        q.trim() === ''
          ? of<LoadState<PartSummary[]>>(loading)
          : statesOf(this.hardware.parts({ q: q.trim(), limit: offered }).pipe(map((page) => page.items))),
      ),
    ),
    { initialValue: loading as LoadState<PartSummary[]> },
  );

  protected choose(part: PartSummary): void {
    this.problem.set(null);
    this.hardware.part(part.slug).subscribe({
      next: (page) => {
        this.chosen.set(page);
        this.name.setValue('');
        this.picked.emit(page);
      },
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }
}
