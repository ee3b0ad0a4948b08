import { ChangeDetectionStrategy, Component } from '@angular/core';

/** How many readings become one figure, and who says so. */
@Component({
  selector: 'sl-consensus-method',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <details>
      <summary>How readings become a consensus</summary>
      <ul>
        <li>
          Readings off by about 25.4 either way (inch and millimetre confused), or over ten scales from the
          median, are left out; so is what a moderator set aside. They stay on show.
        </li>
        <li>
          The rest go into a mean that allows for differences between parts (random effects; DerSimonian and
          Laird, 1986), with the say of a reading cut where it lies more than 1.5 scales out (Huber's proposal
          2; RSC Analytical Methods Committee, Technical Brief 6, 2001).
        </li>
        <li>
          A whisker is one reading ± 1.96 times its standard uncertainty: the instrument's own error, and the
          scatter of repeats over the root of their count (JCGM 100:2008). The band is the 95 % interval of
          the mean.
        </li>
        <li>
          With three readings or fewer, parts are taken to differ by at least 0.015 mm machined, 0.08 mm
          printed or 0.15 mm cast (common practice, no source). Two or fewer count as thin evidence.
        </li>
        <li>
          A verdict on a fit is about the one part in your hand: it uses the spread to expect of one more
          part, which is wider than the band.
        </li>
      </ul>
      <p class="sl-quiet">The reasons stand in docs/adr/0007-consensus.md of the source.</p>
    </details>
  `,
  styles: `
    details {
      margin-block-start: 1.25rem;
      border-block: 1px solid var(--sl-hair);
      max-inline-size: var(--sl-measure);
    }
    summary {
      padding-block: 0.6rem;
      font-weight: 600;
      cursor: pointer;
    }
    ul {
      padding-inline-start: 1.2rem;
    }
  `,
})
export class ConsensusMethod {}
