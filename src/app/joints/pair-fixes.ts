import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { JointWriteUp } from '../../../shared/contract/joints';
import { afterwardsWords, fixKindWords, type Afterwards } from '../../../shared/contract/vocabulary';
import { CautionBox } from '../ui/caution-box/caution-box';
import { PermanenceLabel } from '../ui/permanence-label/permanence-label';
import { StandingLabel } from '../ui/standing-label/standing-label';

/** Fixes for a pair of revisions under their write-ups. Cautions stand above what they warn of and are never folded away. */
@Component({
  selector: 'sl-pair-fixes',
  imports: [CautionBox, PermanenceLabel, RouterLink, StandingLabel],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (writeUp of writeUps(); track writeUp.slug) {
      <section [attr.aria-label]="'Fixes from: ' + writeUp.title">
        <p class="from">
          <a [routerLink]="['/write-ups', writeUp.slug]">{{ writeUp.title }}</a>
        </p>
        @for (caution of writeUp.cautions; track caution.id) {
          <sl-caution-box [caution]="caution" />
        }
        <ul class="sl-plain-list">
          @for (fix of writeUp.fixes; track fix.key) {
            <li>
              <p class="fix">
                <a [routerLink]="['/write-ups', writeUp.slug]" [fragment]="'fix-' + fix.key">{{
                  fix.title
                }}</a>
              </p>
              <p class="facts">
                @if (fix.kind) {
                  <span>{{ kinds[fix.kind].label }}</span>
                }
                @if (fix.permanence) {
                  <sl-permanence-label [permanence]="fix.permanence" />
                }
                <sl-standing-label [standing]="fix.standing" />
                @if (fix.revisionIds.length) {
                  <span>only for the revisions named there</span>
                }
                @if (fix.afterwards.length) {
                  <span>afterwards do again: {{ again(fix.afterwards) }}</span>
                }
              </p>
              @for (caution of fix.cautions; track caution.id) {
                <sl-caution-box [caution]="caution" />
              }
            </li>
          }
        </ul>
      </section>
    } @empty {
      <p class="sl-quiet"><ng-content /></p>
    }
  `,
  styles: `
    p {
      margin: 0;
    }
    section + section {
      margin-block-start: 1rem;
    }
    .from {
      font: 600 1.25rem/1.25 var(--sl-heading);
    }
    .from a {
      display: inline-block;
      padding-block: 0.35rem;
    }
    li {
      padding-block: 0.4rem;
      border-block-start: 1px solid var(--sl-hair);
    }
    .fix a {
      display: inline-block;
      padding-block: 0.3rem;
      font-weight: 600;
    }
    .facts {
      display: flex;
      flex-wrap: wrap;
      gap: 0.1rem 1rem;
      font-size: var(--sl-small);
      color: var(--sl-quiet);
    }
  `,
})
export class PairFixes {
  readonly writeUps = input.required<readonly JointWriteUp[]>();
  protected readonly kinds = fixKindWords;

  protected again(items: readonly Afterwards[]): string {
    return items.map((item) => afterwardsWords[item]).join(', ');
  }
}
