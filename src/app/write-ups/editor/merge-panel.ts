import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  afterNextRender,
  computed,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import type { EditionText } from '../../../../shared/editions/edition-text';
import {
  choiceOf,
  mergeEditions,
  type Choice,
  type MergeRow,
  type Side,
} from '../../../../shared/editions/merge-editions';
import { wordDifference } from '../../../../shared/text/word-difference';
import type { DifferencePiece } from '../../../../shared/contract/write-ups';
import { MarkedWords } from './marked-words';
import type { Merging } from './merging';
import { nameOfPiece, waysToWrite, wordsOfPiece } from './merge-words';
import { PartDirectory } from './part-directory';
import type { SetAside } from './set-aside';

export interface MergeResult {
  text: EditionText;
  /** What was not taken. */
  setAside: SetAside[];
}

/**
 * Shows what both sides changed beside each other, word by word against the text that both began from, and has one of each
 * chosen, or one made of both by hand. What only one side changed is taken by itself and listed. What is not taken is set
 * aside by whoever listens, so that nothing is lost either way.
 */
@Component({
  selector: 'sl-merge-panel',
  imports: [DatePipe, MarkedWords],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './merge-panel.html',
  styleUrl: './merge-panel.scss',
})
export class MergePanel {
  readonly merging = input.required<Merging>();
  readonly finished = output<MergeResult>();
  private readonly directory = inject(PartDirectory);
  private readonly heading = viewChild.required<ElementRef<HTMLElement>>('heading');
  private readonly choices = signal<ReadonlyMap<string, Choice>>(new Map());
  protected readonly sides: readonly Side[] = ['mine', 'theirs'];

  protected readonly whose = computed((): Record<Side, string> => {
    const { with: other } = this.merging();
    return other.kind === 'edition'
      ? { mine: 'Your edition', theirs: `Edition ${other.edition.number}` }
      : { mine: 'What you typed here', theirs: 'What was saved elsewhere' };
  });
  private readonly rows = computed(() => {
    const { base, mine, theirs } = this.merging();
    return mergeEditions(base, mine, theirs).rows;
  });
  protected readonly disputed = computed(() =>
    this.rows()
      .filter((row) => row.changedBy === 'both')
      .map((row) => this.pieceOf(row)),
  );
  protected readonly taken = computed(() =>
    this.rows()
      .filter((row) => row.changedBy !== 'both')
      .map((row) => ({ ...this.pieceOf(row), by: row.changedBy as Side })),
  );

  constructor() {
    afterNextRender(() => this.heading().nativeElement.focus());
  }

  protected chosen(row: MergeRow): Choice['take'] {
    return choiceOf(row, this.choices()).take;
  }

  protected choose(row: MergeRow, side: Side): void {
    this.choices.update((choices) => new Map(choices).set(row.id, { take: side }));
  }

  protected writeOwn(row: MergeRow, value: string): void {
    this.choices.update((choices) => new Map(choices).set(row.id, { take: 'own', value }));
  }

  protected own(row: MergeRow): string | null {
    const choice = choiceOf(row, this.choices());
    return choice.take === 'own' ? String(choice.value) : null;
  }

  /** Begins a text of both with the two, one below the other; a line begins with mine. */
  protected beginOwn(row: MergeRow): void {
    if (this.own(row) !== null) return;
    const both = `${String(row.mine)}\n\n${String(row.theirs)}`;
    this.writeOwn(row, waysToWrite(row) === 'line' ? both.replace(/\s*\n\s*/g, ' ') : both);
  }

  protected finish(): void {
    const { base, mine, theirs } = this.merging();
    const setAside = this.disputed().flatMap(({ row, name, words }) =>
      this.sides.flatMap((side) =>
        this.chosen(row) === side || !words[side]
          ? []
          : [{ name, whose: this.whose()[side], words: words[side] }],
      ),
    );
    this.finished.emit({ text: mergeEditions(base, mine, theirs, this.choices()).text, setAside });
  }

  private pieceOf(row: MergeRow) {
    const { base, mine, theirs, photos } = this.merging();
    const texts = [mine, theirs, base];
    const names = this.directory.namesWith(photos);
    const words = (value: unknown): string | null => wordsOfPiece(row.path, value, texts, names);
    const said = { base: words(row.base), mine: words(row.mine), theirs: words(row.theirs) };
    return {
      row,
      name: nameOfPiece(row.path, texts, names),
      write: waysToWrite(row),
      words: { mine: said.mine, theirs: said.theirs },
      marked: {
        mine: marked(said.base, said.mine, said.theirs),
        theirs: marked(said.base, said.theirs, said.mine),
      },
    };
  }
}

/** What one side made of the base; where there is none, what it has that the other has not. Null where it has nothing. */
function marked(base: string | null, words: string | null, other: string | null): DifferencePiece[] | null {
  if (words === null) return null;
  if (base !== null) return wordDifference(base, words);
  return wordDifference(other ?? '', words).filter((piece) => piece.kind !== 'removed');
}
