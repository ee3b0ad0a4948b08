import { ChangeDetectionStrategy, Component, DOCUMENT, inject, input, signal } from '@angular/core';
import { Router } from '@angular/router';
import { Icon } from '../ui/icon/icon';
import type { AnySheet } from './sheet-state';

/** Hand the sheet on: its address holds every input. Print it, or start anew. */
@Component({
  selector: 'sl-sheet-tools',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'sl-off-paper' },
  template: `
    <button type="button" class="sl-plain-button" (click)="copy()">Copy link</button>
    <button type="button" class="sl-bare-button" (click)="print()"><sl-icon name="print" />Print</button>
    <button type="button" class="sl-bare-button" (click)="sheet().clear()">Empty the sheet</button>
    <p role="status">{{ told() }}</p>
    @if (address(); as address) {
      <input class="sl-field" readonly aria-label="Address of this sheet" [value]="address" />
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 0.25rem 1rem;
      margin-block-start: 1rem;
    }
    p {
      margin: 0;
    }
  `,
})
export class SheetTools {
  readonly sheet = input.required<AnySheet>();
  private readonly router = inject(Router);
  private readonly document = inject(DOCUMENT);
  protected readonly told = signal('');
  /** Shown to be copied by hand where the browser does not let the page do it. */
  protected readonly address = signal('');

  protected async copy(): Promise<void> {
    const { kind, query } = this.sheet();
    const path = this.router.serializeUrl(
      this.router.createUrlTree(['/worksheets', kind], { queryParams: query() }),
    );
    const address = new URL(path, this.document.location.href).href;
    try {
      await this.document.defaultView!.navigator.clipboard.writeText(address);
      this.address.set('');
      this.told.set('The link is copied; it holds all inputs.');
    } catch {
      this.address.set(address);
      this.told.set('Copy it from here; it holds all inputs:');
    }
  }

  protected print(): void {
    this.document.defaultView?.print();
  }
}
