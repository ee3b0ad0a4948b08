import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { ShimloreTitles } from './titles';

@Component({
  selector: 'sl-nothing-here-page',
  imports: [RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="sl-sheet sl-narrow">
      <h1>Nothing at this address</h1>
      <p>The write-up may have moved, or the address has a slip in it.</p>
      <p>
        <a routerLink="/search">Search for the symptom</a> or <a routerLink="/hardware">look for the part</a>.
      </p>
    </div>
  `,
})
export class NothingHerePage {
  constructor() {
    inject(ShimloreTitles).answerWith(404);
  }
}
