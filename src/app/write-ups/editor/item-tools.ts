import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  afterNextRender,
  inject,
  input,
  output,
} from '@angular/core';
import { Icon } from '../../ui/icon/icon';

/** Moves an item of a list up and down and takes it off. The focus stays on the item when it moves. */
@Component({
  selector: 'sl-item-tools',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <button
      type="button"
      [attr.aria-label]="'Move ' + name() + ' up'"
      [disabled]="index() === 0"
      (click)="move(-1)"
    >
      <sl-icon name="up" />
    </button>
    <button
      type="button"
      [attr.aria-label]="'Move ' + name() + ' down'"
      [disabled]="index() === length() - 1"
      (click)="move(1)"
    >
      <sl-icon class="down" name="up" />
    </button>
    <button type="button" [attr.aria-label]="'Remove ' + name()" (click)="removed.emit()">
      <sl-icon name="remove" />
    </button>
  `,
  styles: `
    :host {
      display: flex;
    }
    button {
      display: grid;
      place-items: center;
      inline-size: 2.75rem;
      block-size: 2.75rem;
      border: 0;
      background: none;
      color: var(--sl-accent);
      cursor: pointer;
    }
    button:hover:enabled {
      background: var(--sl-accent-wash);
    }
    button:disabled {
      color: var(--sl-rule);
      cursor: default;
    }
    .down {
      transform: rotate(180deg);
    }
  `,
})
export class ItemTools {
  readonly name = input.required<string>();
  readonly index = input.required<number>();
  readonly length = input.required<number>();
  readonly moved = output<-1 | 1>();
  readonly removed = output();
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly injector = inject(Injector);

  protected move(by: -1 | 1): void {
    this.moved.emit(by);
    afterNextRender(
      () => {
        const [up, down] = this.host.nativeElement.querySelectorAll('button');
        const wanted = by === -1 ? up : down;
        (wanted?.disabled ? (by === -1 ? down : up) : wanted)?.focus();
      },
      { injector: this.injector },
    );
  }
}
