import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  afterNextRender,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  viewChild,
} from '@angular/core';
import type { Draft } from '../../../../shared/contract/write-ups';
import type { MergeRow, Side } from './edition-merge';
import { nameOfPiece, wordsOfPiece } from './merge-words';
import { PartDirectory } from './part-directory';

/**
 * Shows what was typed here beside what was saved elsewhere, field by field, and has one of each chosen. What is not
 * taken is set aside by whoever listens, so that nothing is lost either way.
 */
@Component({
  selector: 'sl-merge-panel',
  imports: [DatePipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './merge-panel.html',
  styleUrl: './merge-panel.scss',
})
export class MergePanel {
  readonly rows = input.required<readonly MergeRow[]>();
  readonly theirs = input.required<Draft>();
  /** The rows with the sides that were chosen. */
  readonly finished = output<MergeRow[]>();
  private readonly names = inject(PartDirectory);
  private readonly heading = viewChild.required<ElementRef<HTMLElement>>('heading');

  private readonly choices = linkedSignal<ReadonlyMap<string, Side>>(
    () => new Map(this.rows().map((row) => [row.id, row.choice])),
  );
  protected readonly sides: { side: Side; verb: string; label: string }[] = [
    { side: 'mine', verb: 'Keep mine', label: 'What you typed here' },
    { side: 'theirs', verb: 'Take theirs', label: 'What was saved elsewhere' },
  ];

  protected readonly pieces = computed(() =>
    this.rows().map((row) => ({
      row,
      name: nameOfPiece(row.field, row.mine, row.theirs),
      words: {
        mine: wordsOfPiece(row.field, row.mine, this.names),
        theirs: wordsOfPiece(row.field, row.theirs, this.names),
      },
    })),
  );

  constructor() {
    afterNextRender(() => this.heading().nativeElement.focus());
  }

  protected choiceOf(row: MergeRow): Side {
    return this.choices().get(row.id) ?? row.choice;
  }

  protected choose(row: MergeRow, side: Side): void {
    this.choices.update((choices) => new Map(choices).set(row.id, side));
  }

  protected finish(): void {
    this.finished.emit(this.rows().map((row) => ({ ...row, choice: this.choiceOf(row) })));
  }
}
