import { computed, signal } from '@angular/core';
import {
  mostCallouts,
  type Callout,
  type CalloutKind,
  type PhotoPoint,
} from '../../../../shared/contract/callouts';
import { calloutBetween, onPhoto, withEnd, type EndName } from '../../../../shared/drawing/callout-ends';
import { newItemKey } from './item-key';

const ghostKey = 'being-drawn';
const longestHistory = 100;

/** An end that was taken up with a tap and goes where the next tap is. */
export interface CarriedEnd {
  readonly key: string;
  readonly end: EndName;
}

/** What is drawn on one photo while it is being drawn: tools, the place on the photo, and the way back. */
export class CalloutBoard {
  private readonly list;
  private readonly past = signal<readonly (readonly Callout[])[]>([]);
  private readonly future = signal<readonly (readonly Callout[])[]>([]);
  private lastTouched = '';
  readonly callouts;
  readonly tool = signal<CalloutKind | null>(null);
  /** Where the callout that is being drawn begins. */
  readonly started = signal<PhotoPoint | null>(null);
  /** Where the pointer or the cross of the keyboard is. */
  readonly cursor = signal<PhotoPoint>({ x: 0.5, y: 0.5 });
  readonly chosen = signal<string | null>(null);
  readonly carried = signal<CarriedEnd | null>(null);
  readonly canUndo = computed(() => this.past().length > 0);
  readonly canRedo = computed(() => this.future().length > 0);
  readonly isFull = computed(() => this.list().length >= mostCallouts);
  /** The callouts with the one that is being drawn. */
  readonly shown = computed<Callout[]>(() => {
    const tool = this.tool();
    const from = this.started();
    return tool && from
      ? [...this.list(), calloutBetween(tool, ghostKey, from, this.cursor(), this.ratio)]
      : [...this.list()];
  });

  /** `ratio` is the photo's width by its height. */
  constructor(
    initial: readonly Callout[],
    private readonly ratio: number,
  ) {
    this.list = signal<readonly Callout[]>(initial);
    this.callouts = this.list.asReadonly();
  }

  /** Takes up a tool, or puts it away where it is the one in hand. */
  take(tool: CalloutKind | null): void {
    this.started.set(null);
    this.carried.set(null);
    this.tool.update((inHand) => (inHand === tool || this.isFull() ? null : tool));
  }

  point(at: PhotoPoint): void {
    this.cursor.set(onPhoto(at));
  }

  start(at: PhotoPoint): void {
    this.point(at);
    this.started.set(this.cursor());
  }

  /** Ends what is being drawn here and puts the tool away, so that the next touch takes hold of the ends. */
  finish(at: PhotoPoint): void {
    const tool = this.tool();
    const from = this.started();
    if (!tool || !from) return;
    const drawn = calloutBetween(tool, newItemKey(), from, onPhoto(at), this.ratio);
    this.set([...this.list(), drawn]);
    this.chosen.set(drawn.key);
    this.started.set(null);
    this.tool.set(null);
  }

  /** One step back from what is in hand; false where nothing was. */
  giveUp(): boolean {
    const inHand = this.carried() ?? this.started() ?? this.tool();
    if (this.carried()) this.carried.set(null);
    else if (this.started()) this.started.set(null);
    else this.tool.set(null);
    return inHand !== null;
  }

  /** Takes an end up for the next tap, or puts it down again where it is the one in hand. */
  carry(wanted: CarriedEnd): void {
    const inHand = this.carried();
    this.carried.set(inHand?.key === wanted.key && inHand.end === wanted.end ? null : wanted);
  }

  /** Moves an end; the moves of one drag or one row of key strokes are taken back as one. */
  moveEnd({ key, end }: CarriedEnd, to: PhotoPoint): void {
    this.replace(key, `${key} ${end}`, (callout) => withEnd(callout, end, to, this.ratio));
  }

  setLabel(key: string, label: string): void {
    this.replace(key, `${key} label`, (callout) => ({ ...callout, label }));
  }

  /** Value and unit of a dimension. */
  setFigure(
    key: string,
    figure: Partial<Pick<Extract<Callout, { kind: 'dimension' }>, 'value' | 'unit'>>,
  ): void {
    this.replace(key, `${key} ${Object.keys(figure).join()}`, (callout) =>
      callout.kind === 'dimension' ? { ...callout, ...figure } : callout,
    );
  }

  /** Closes the row of changes that are taken back together. */
  settle(): void {
    this.lastTouched = '';
  }

  move(key: string, by: -1 | 1): void {
    const from = this.list().findIndex((callout) => callout.key === key);
    const rest = this.list().filter((callout) => callout.key !== key);
    const moved = this.list()[from];
    if (moved)
      this.set([...rest.slice(0, Math.max(from + by, 0)), moved, ...rest.slice(Math.max(from + by, 0))]);
  }

  /** Takes a callout off and gives back how to put it where it was. */
  remove(key: string): () => void {
    const index = this.list().findIndex((callout) => callout.key === key);
    const removed = this.list()[index];
    this.set(this.list().filter((callout) => callout.key !== key));
    if (this.chosen() === key) this.chosen.set(null);
    return () => {
      if (!removed || this.list().some((callout) => callout.key === key)) return;
      this.set([...this.list().slice(0, index), removed, ...this.list().slice(index)]);
      this.chosen.set(key);
    };
  }

  undo(): void {
    const before = this.past().at(-1);
    if (!before) return;
    this.past.update((past) => past.slice(0, -1));
    this.future.update((future) => [...future, this.list()]);
    this.show(before);
  }

  redo(): void {
    const after = this.future().at(-1);
    if (!after) return;
    this.future.update((future) => future.slice(0, -1));
    this.past.update((past) => [...past, this.list()]);
    this.show(after);
  }

  private show(callouts: readonly Callout[]): void {
    this.settle();
    this.started.set(null);
    this.carried.set(null);
    this.list.set(callouts);
    if (!callouts.some((callout) => callout.key === this.chosen())) this.chosen.set(null);
  }

  private replace(key: string, touched: string, change: (callout: Callout) => Callout): void {
    this.set(
      this.list().map((callout) => (callout.key === key ? change(callout) : callout)),
      touched,
    );
  }

  private set(next: readonly Callout[], touched = ''): void {
    if (touched === '' || touched !== this.lastTouched) {
      this.past.update((past) => [...past, this.list()].slice(-longestHistory));
    }
    this.lastTouched = touched;
    this.future.set([]);
    this.list.set(next);
  }
}
