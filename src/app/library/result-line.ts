import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { DatePipe } from '@angular/common';
import { RouterLink } from '@angular/router';
import type { SearchHit } from '../../../shared/contract/search';
import { fixKindWords } from '../../../shared/contract/vocabulary';
import { ApplicabilityLabel } from '../ui/applicability-label/applicability-label';
import { PermanenceLabel } from '../ui/permanence-label/permanence-label';
import { PhotoView } from '../ui/photo/photo';
import { RevisionList } from '../bench/revision-list';
import { StandingLabel } from '../ui/standing-label/standing-label';
import { TextRuns } from '../ui/text-runs/text-runs';

/** One write-up among the results: whether it holds for the reader first, then what it is about and what it offers. */
@Component({
  selector: 'sl-result-line',
  imports: [
    ApplicabilityLabel,
    DatePipe,
    PermanenceLabel,
    PhotoView,
    RevisionList,
    RouterLink,
    StandingLabel,
    TextRuns,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './result-line.html',
  styleUrl: './result-line.scss',
})
export class ResultLine {
  readonly hit = input.required<SearchHit>();
  protected readonly kinds = fixKindWords;
}
