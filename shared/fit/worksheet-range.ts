import type { LengthUnit } from '../contract/worksheet.js';
import { millimetresPerInch } from './dimension.js';

/** An input that lies outside its range: which one, and what would be needed. */
export interface InputProblem {
  readonly field: string;
  readonly message: string;
}

/** What a sheet came to: a result only where every input lies in its range and none that is needed is missing. */
export interface Outcome<Result> {
  readonly problems: readonly InputProblem[];
  /** Labels of inputs without which nothing can be said. */
  readonly needed: readonly string[];
  readonly result: Result | null;
}

interface Range {
  readonly from: number;
  readonly to: number;
  /** The lower end itself is not allowed. */
  readonly over?: true;
}

/** Ranges of lengths, mm. */
export const ranges = {
  dimension: { from: 0, to: 1000, over: true },
  uncertainty: { from: 0, to: 10 },
  gap: { from: 0, to: 100, over: true },
  tolerance: { from: 0, to: 10 },
  allowance: { from: 0, to: 50 },
} as const satisfies Record<string, Range>;

/** Reads lengths in the sheet's unit to mm and notes those that are out of range or missing. */
export class InputCheck {
  readonly problems: InputProblem[] = [];
  readonly needed: string[] = [];

  constructor(private readonly unit: LengthUnit) {}

  /** The length in mm; null where it is empty or out of range. */
  length(field: string, typed: number | null, range: Range): number | null {
    if (typed === null) return null;
    const value = this.toMillimetres(typed);
    const isIn = (range.over ? value > range.from : value >= range.from) && value <= range.to;
    if (isIn) return value;
    const [from, to] = [this.told(range.from), this.told(range.to)];
    this.problems.push({
      field,
      message: `Out of range: has to lie ${range.over ? `over ${from} and up to` : `from ${from} to`} ${to} ${this.unit}.`,
    });
    return null;
  }

  /** As `length`, and named as needed where it is empty. */
  neededLength(field: string, label: string, typed: number | null, range: Range): number | null {
    if (typed === null) this.needed.push(label);
    return this.length(field, typed, range);
  }

  /** A whole number in a range. */
  count(field: string, label: string, typed: number | null, from: number, to: number): number | null {
    if (typed === null) this.needed.push(label);
    else if (!Number.isInteger(typed) || typed < from || typed > to)
      this.problems.push({ field, message: `Out of range: a whole number from ${from} to ${to}.` });
    else return typed;
    return null;
  }

  tell(field: string, message: string): void {
    this.problems.push({ field, message });
  }

  get isClear(): boolean {
    return this.problems.length === 0 && this.needed.length === 0;
  }

  outcome<Result>(result: Result | null): Outcome<Result> {
    return { problems: this.problems, needed: this.needed, result: this.isClear ? result : null };
  }

  private toMillimetres(typed: number): number {
    return this.unit === 'in' ? typed * millimetresPerInch : typed;
  }

  private told(millimetres: number): string {
    return this.unit === 'in'
      ? String(Math.floor((millimetres / millimetresPerInch) * 100) / 100)
      : String(millimetres);
  }
}
