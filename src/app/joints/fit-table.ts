import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { fitVerdictWords, type FitCell, type JointPage } from '../../../shared/contract/joints';
import { FitMark } from './fit-mark';
import { countWords, percent } from './fit-words';
import { missingOf } from './on-hand';

interface Cell {
  readonly cell: FitCell;
  readonly words: string;
  readonly chance: string;
  readonly counts: string;
  /** What to measure where nobody knows. */
  readonly measure: string;
}

let drawn = 0;

/** The fit table: revisions of A down, revisions of B across. Every cell chooses its pair. */
@Component({
  selector: 'sl-fit-table',
  imports: [FitMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './fit-table.html',
  styleUrl: './fit-table.scss',
})
export class FitTable {
  readonly joint = input.required<JointPage>();
  readonly chosen = input<FitCell | null>(null);
  /** Revisions on the reader's bench. */
  readonly mine = input<readonly number[]>([]);
  readonly choose = output<FitCell>();

  protected readonly id = `sl-fit-table-${(drawn += 1)}`;
  protected readonly columns = computed(() => this.joint().sideB.revisions);
  protected readonly rows = computed(() => {
    const joint = this.joint();
    return joint.sideA.revisions.map((side) => ({
      ...side,
      cells: joint.cells
        .filter((cell) => cell.revisionA === side.revision.id)
        .map((cell) => this.cellOf(joint, cell)),
    }));
  });
  /** Readings that would settle what the table cannot tell, each once. */
  protected readonly wanted = computed(() => {
    const joint = this.joint();
    const found = new Map<
      string,
      { part: string; label: string; howTo: string; what: string; slug: string }
    >();
    for (const cell of joint.cells.filter(({ verdict }) => verdict === 'not-known')) {
      for (const missing of missingOf(joint, cell.revisionA, cell.revisionB)) {
        const side = missing.side === 'a' ? joint.sideA : joint.sideB;
        const id = missing.side === 'a' ? cell.revisionA : cell.revisionB;
        const label = side.revisions.find(({ revision }) => revision.id === id)?.revision.label ?? '';
        found.set(`${missing.side}/${id}/${missing.name}`, {
          part: side.part.name,
          slug: side.part.slug,
          label,
          what: missing.label,
          howTo: missing.howTo,
        });
      }
    }
    return [...found.values()];
  });

  protected isChosen({ cell }: Cell): boolean {
    const chosen = this.chosen();
    return chosen?.revisionA === cell.revisionA && chosen.revisionB === cell.revisionB;
  }

  protected isMine(id: number): boolean {
    return this.mine().includes(id);
  }

  protected isBare(dimensions: Readonly<Record<string, unknown>>): boolean {
    return Object.keys(dimensions).length === 0;
  }

  private cellOf(joint: JointPage, cell: FitCell): Cell {
    const missing = cell.verdict === 'not-known' ? missingOf(joint, cell.revisionA, cell.revisionB) : [];
    return {
      cell,
      words: fitVerdictWords[cell.verdict],
      chance: cell.chance === null ? '' : percent(cell.chance),
      counts: countWords(cell),
      measure: missing.length > 0 ? `measure ${missing.map(({ label }) => label).join(', ')}` : '',
    };
  }
}
