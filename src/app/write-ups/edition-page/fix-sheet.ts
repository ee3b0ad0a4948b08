import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { afterwardsWords, fixKindWords } from '../../../../shared/contract/vocabulary';
import type { FixView } from '../../../../shared/contract/write-ups';
import { CautionBox } from '../../ui/caution-box/caution-box';
import { PermanenceLabel } from '../../ui/permanence-label/permanence-label';
import { PhotoCallouts } from '../../ui/photo-callouts/photo-callouts';
import { RichTextView } from '../../ui/rich-text/rich-text';
import { TellTheDesk } from '../../ui/tell-the-desk/tell-the-desk';
import { StandingLabel } from '../../ui/standing-label/standing-label';
import { AttachedWorksheet } from './attached-worksheet';
import { acceptanceParts } from '../figures';

/** One remedy: its facts, its cautions, then why, what is needed, the steps, and how to know that it worked. */
@Component({
  selector: 'sl-fix-sheet',
  imports: [
    AttachedWorksheet,
    CautionBox,
    PermanenceLabel,
    PhotoCallouts,
    RichTextView,
    StandingLabel,
    TellTheDesk,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './fix-sheet.html',
  styleUrl: './fix-sheet.scss',
})
export class FixSheet {
  readonly fix = input.required<FixView>();
  readonly position = input.required<number>();
  /** The write-up it is published in; null in drafts and at the desk, where nobody is told of it. */
  readonly writeUpId = input<number | null>(null);

  protected readonly kind = computed(() => {
    const { kind } = this.fix();
    return kind ? fixKindWords[kind] : null;
  });
  protected readonly acceptance = computed(() => {
    const { acceptance } = this.fix();
    return acceptance ? acceptanceParts(acceptance) : null;
  });
  protected readonly afterwards = computed(() =>
    this.fix()
      .afterwards.map((item) => afterwardsWords[item])
      .join(', '),
  );
  protected readonly trials = computed(() => {
    const { held, heldForAWhile, didNotHelp } = this.fix().trialCounts;
    const parts = [
      held > 0 ? `held for ${held}` : '',
      heldForAWhile > 0 ? `held for a while for ${heldForAWhile}` : '',
      didNotHelp > 0 ? `did not help ${didNotHelp}` : '',
    ].filter((part) => part !== '');
    return parts.length > 0 ? parts.join(', ') : 'no trial yet';
  });
}
