import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  numberAttribute,
} from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { EMPTY } from 'rxjs';
import type { LibraryChange } from '../../../shared/contract/caution-library';
import { loadEach } from '../core/load';
import { Icon } from '../ui/icon/icon';
import { LoadStateView } from '../ui/load-state/load-state';
import { Difference } from '../write-ups/difference';
import { CautionLibrary } from './caution-library';

const changeWords: Record<LibraryChange, string> = {
  added: 'added',
  worded: 'worded anew',
  retired: 'retired',
  'put-back': 'offered again',
};

/** Every change of an entry with who, when and why; two versions laid over each other, word by word. */
@Component({
  selector: 'sl-library-history-page',
  imports: [DatePipe, Difference, Icon, LoadStateView, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <nav aria-label="Desk">
      <a class="sl-bare-button" [routerLink]="['/desk/cautions', id()]"><sl-icon name="left" />The entry</a>
    </nav>
    @if (versions(); as versions) {
      <p class="sl-overline">History of</p>
      <h1>{{ versions[0]?.name }}</h1>
      <div class="sl-table-frame" tabindex="0" role="region" aria-label="Versions">
        <table class="sl-table">
          <thead>
            <tr>
              <th scope="col">From</th>
              <th scope="col">To</th>
              <th scope="col">Version</th>
              <th scope="col">When</th>
              <th scope="col">Who</th>
              <th scope="col">Why</th>
            </tr>
          </thead>
          <tbody>
            @for (version of versions; track version.version) {
              <tr>
                <td>
                  <input
                    type="radio"
                    name="from"
                    [attr.aria-label]="'Compare from version ' + version.version"
                    [checked]="from() === version.version"
                    (change)="from.set(version.version)"
                  />
                </td>
                <td>
                  <input
                    type="radio"
                    name="to"
                    [attr.aria-label]="'Compare to version ' + version.version"
                    [checked]="to() === version.version"
                    (change)="to.set(version.version)"
                  />
                </td>
                <th scope="row">{{ version.version }} {{ words[version.change] }}</th>
                <td class="when">{{ version.at | date: 'd MMM y, HH:mm' }}</td>
                <td>{{ version.by?.displayName ?? 'from the beginning' }}</td>
                <td>{{ version.why }}</td>
              </tr>
            }
          </tbody>
        </table>
      </div>
      @if (versions.length > 1) {
        <section class="sl-section" aria-labelledby="changed">
          <h2 id="changed">What changed from version {{ from() }} to {{ to() }}</h2>
          @if (comparison(); as comparison) {
            @for (difference of comparison.changed; track difference.field) {
              <sl-difference [difference]="difference" />
            } @empty {
              <p>The two say the same.</p>
            }
          } @else {
            <sl-load-state [of]="compared()" />
          }
        </section>
      }
    } @else {
      <sl-load-state [of]="loaded()" />
    }
  `,
  styles: `
    th[scope='row'] {
      font-weight: 600;
      white-space: nowrap;
    }
    .when {
      white-space: nowrap;
    }
    input {
      inline-size: 1.5rem;
      block-size: 1.5rem;
    }
  `,
})
export class LibraryHistoryPage {
  readonly id = input.required({ transform: numberAttribute });
  private readonly library = inject(CautionLibrary);
  protected readonly words = changeWords;
  protected readonly loaded = loadEach(toObservable(this.id), (id) => this.library.versions(id));
  protected readonly versions = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  protected readonly to = linkedSignal(() => this.versions()?.[0]?.version ?? 0);
  protected readonly from = linkedSignal(() => this.versions()?.[1]?.version ?? 0);
  private readonly pair = computed(() => ({ id: this.id(), from: this.from(), to: this.to() }));
  protected readonly compared = loadEach(toObservable(this.pair), ({ id, from, to }) =>
    from > 0 && to > 0 ? this.library.compare(id, from, to) : EMPTY,
  );
  protected readonly comparison = computed(() => {
    const now = this.compared();
    return now.state === 'ready' ? now.value : null;
  });
}
