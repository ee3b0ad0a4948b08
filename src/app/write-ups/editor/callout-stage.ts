import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  computed,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';
import type { PhotoPoint } from '../../../../shared/contract/callouts';
import type { Photo } from '../../../../shared/contract/photos';
import { calloutAt, endsOf, type CalloutEnd } from '../../../../shared/drawing/callout-ends';
import { placeOf } from '../../../../shared/drawing/photo-places';
import { calloutWords } from '../../../../shared/text/callout-words';
import { CalloutOverlay } from '../../ui/photo-callouts/callout-overlay';
import { PhotoView } from '../../ui/photo/photo';
import { Undo } from '../../ui/undo/undo';
import type { CalloutBoard } from './callout-board';
import { endWords, hintFor, placeWords } from './callout-hints';

/** What a press moves before it is a drag and no tap, and how near a tap must come to a line, in pixels. */
const slack = 8;
const reach = 16;
/** How far an arrow key goes, as a share of the photo; with Shift it is for the last bit. */
const stride = 0.01;
const fineStride = 0.002;

const strides: Readonly<Record<string, readonly [number, number]>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};

/** The photo to draw on: by finger, pen and mouse (drag, or tap the two ends), and by keys with a cross. */
@Component({
  selector: 'sl-callout-stage',
  imports: [CalloutOverlay, PhotoView],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './callout-stage.html',
  styleUrl: './callout-stage.scss',
})
export class CalloutStage {
  readonly board = input.required<CalloutBoard>();
  readonly photo = input.required<Photo>();
  readonly alt = input.required<string>();
  private readonly undo = inject(Undo);
  private readonly sheet = viewChild.required<ElementRef<HTMLElement>>('sheet');
  private pressedAt: readonly [number, number] | null = null;
  protected readonly byKeys = signal(false);
  protected readonly ratio = computed(() => this.photo().width / this.photo().height);
  protected readonly chosen = computed(() =>
    this.board()
      .callouts()
      .find((callout) => callout.key === this.board().chosen()),
  );
  protected readonly ends = computed(() => {
    const chosen = this.chosen();
    return chosen && !this.board().tool() ? endsOf(chosen, this.ratio()) : [];
  });
  protected readonly hint = computed(() => hintFor(this.board()));
  /** Where the cross is, for those who cannot see it. */
  protected readonly told = computed(() => (this.byKeys() ? placeWords(this.board().cursor()) : ''));

  protected endName(end: CalloutEnd): string {
    const chosen = this.chosen();
    return chosen ? `${endWords[end.name]} of ${calloutWords(chosen)}` : '';
  }

  protected press(event: PointerEvent): void {
    if (event.button !== 0) return;
    this.byKeys.set(false);
    const board = this.board();
    const at = this.pointAt(event);
    const carried = board.carried();
    if (carried) {
      board.moveEnd(carried, at);
      board.settle();
      board.carried.set(null);
    } else if (board.tool()) {
      this.hold(event);
      if (board.started()) board.point(at);
      else board.start(at);
    } else {
      this.choose(at);
    }
  }

  protected drag(event: PointerEvent): void {
    if (this.pressedAt || this.board().started()) this.board().point(this.pointAt(event));
  }

  protected release(event: PointerEvent): void {
    const board = this.board();
    const pressedAt = this.pressedAt;
    this.pressedAt = null;
    const from = board.started();
    if (!pressedAt || !from) return;
    const size = this.box();
    const at = this.pointAt(event);
    const [x, y] = placeOf(at, size);
    const [startX, startY] = placeOf(from, size);
    if (Math.hypot(x - startX, y - startY) >= slack) board.finish(at);
  }

  protected stop(): void {
    this.pressedAt = null;
    this.board().started.set(null);
  }

  protected key(event: KeyboardEvent): void {
    const board = this.board();
    const step = stepOf(event);
    if (step) {
      const { x, y } = board.cursor();
      board.point({ x: x + step[0], y: y + step[1] });
    } else if (event.key === 'Enter' || event.key === ' ') {
      this.place();
    } else if (event.key !== 'Escape' || !board.giveUp()) {
      return;
    }
    this.byKeys.set(true);
    event.preventDefault();
    event.stopPropagation();
  }

  protected pressEnd(event: PointerEvent): void {
    event.stopPropagation();
    if (event.button !== 0) return;
    this.hold(event);
    this.board().settle();
  }

  protected dragEnd(event: PointerEvent, end: CalloutEnd): void {
    const key = this.board().chosen();
    if (!this.pressedAt || key === null) return;
    event.stopPropagation();
    const moved = Math.hypot(event.clientX - this.pressedAt[0], event.clientY - this.pressedAt[1]);
    if (moved >= slack / 2) this.board().moveEnd({ key, end: end.name }, this.pointAt(event));
  }

  /** A press that moved nothing takes the end up: it goes where the next tap is. */
  protected releaseEnd(event: PointerEvent, end: CalloutEnd): void {
    const key = this.board().chosen();
    const pressedAt = this.pressedAt;
    this.pressedAt = null;
    event.stopPropagation();
    if (!pressedAt || key === null) return;
    const moved = Math.hypot(event.clientX - pressedAt[0], event.clientY - pressedAt[1]);
    if (moved < slack / 2) this.board().carry({ key, end: end.name });
    this.board().settle();
  }

  protected keyOnEnd(event: KeyboardEvent, end: CalloutEnd): void {
    const board = this.board();
    const key = board.chosen();
    const step = stepOf(event);
    // The photo below has keys of its own; only what closes and leaves goes on from here.
    if (event.key !== 'Escape' && event.key !== 'Tab') event.stopPropagation();
    if (key === null) return;
    // Keys can come faster than the page is drawn: what counts is where the end is now.
    const at = this.ends().find(({ name }) => name === end.name)?.at;
    if (step && at) board.moveEnd({ key, end: end.name }, { x: at.x + step[0], y: at.y + step[1] });
    else if (event.key === 'Delete') this.undo.offer('Taken off the photo', board.remove(key));
    else if (event.key !== 'Escape' || !board.giveUp()) return;
    event.preventDefault();
    event.stopPropagation();
  }

  private place(): void {
    const board = this.board();
    const at = board.cursor();
    const carried = board.carried();
    if (carried) {
      board.moveEnd(carried, at);
      board.carried.set(null);
    } else if (board.tool()) {
      if (board.started()) board.finish(at);
      else board.start(at);
    } else {
      this.choose(at);
    }
  }

  private choose(at: PhotoPoint): void {
    const size = this.box();
    const hit = calloutAt(placeOf(at, size), this.board().callouts(), size, reach);
    this.board().chosen.set(hit?.key ?? null);
  }

  private hold(event: PointerEvent): void {
    this.pressedAt = [event.clientX, event.clientY];
    (event.currentTarget as Element).setPointerCapture?.(event.pointerId);
  }

  private pointAt(event: PointerEvent): PhotoPoint {
    const { left, top, width, height } = this.box();
    return { x: (event.clientX - left) / width, y: (event.clientY - top) / height };
  }

  private box(): DOMRect {
    return this.sheet().nativeElement.getBoundingClientRect();
  }
}

function stepOf(event: KeyboardEvent): readonly [number, number] | null {
  const way = event.ctrlKey || event.metaKey || event.altKey ? undefined : strides[event.key];
  const far = event.shiftKey ? fineStride : stride;
  return way ? [way[0] * far, way[1] * far] : null;
}
