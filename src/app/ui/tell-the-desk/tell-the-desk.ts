import { ChangeDetectionStrategy, Component, Injector, inject, input } from '@angular/core';
import type { TellDesk } from '../../../../shared/contract/flags';
import { Session } from '../../core/session';

/** What a reader can tell the desk of; of a fix, `id` is its write-up's. */
export type ToldThing = Pick<TellDesk, 'kind' | 'id' | 'fixKey'>;

/** A quiet way to tell the desk of something that should not stand as it does; only for those who are signed in. */
@Component({
  selector: 'sl-tell-the-desk',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (session.account()) {
      <button type="button" class="sl-bare-button sl-small sl-off-paper" (click)="open()">
        Tell the desk<span class="sl-visually-hidden"> of {{ name() }}</span>
      </button>
    }
  `,
  styles: `
    button {
      color: var(--sl-quiet);
      padding: 0;
    }
  `,
})
export class TellTheDesk {
  readonly thing = input.required<ToldThing>();
  /** What it is called: "this trial by Ada". */
  readonly name = input.required<string>();
  protected readonly session = inject(Session);
  private readonly injector = inject(Injector);

  protected async open(): Promise<void> {
    // Asked for seldom, hence fetched when it is.
    const { openTellDialog } = await import('./tell-dialog');
    openTellDialog(this.injector, { thing: this.thing(), name: this.name() });
  }
}
