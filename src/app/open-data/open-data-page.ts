import { DatePipe, DecimalPipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { of } from 'rxjs';
import { dumpRoutes } from '../../../shared/contract/dump';
import { licence } from '../../../shared/contract/licence';
import { Api } from '../core/api';
import { loadEach } from '../core/load';
import { ShimloreTitles } from '../core/titles';
import { LoadStateView } from '../ui/load-state/load-state';

/** Everything published, to take away: what is in it, under which licence, and what its lines look like. */
@Component({
  selector: 'sl-open-data-page',
  imports: [DatePipe, DecimalPipe, LoadStateView],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h1>Open data</h1>
    <p class="measure">
      Everything published here can be taken away as one file and used for anything, by anybody, under
      {{ licence.name }} (SPDX <code>{{ licence.spdx }}</code>, {{ licence.url }}): name the people in
      <code>by</code> and <code>authors</code> and Shimlore, say what you changed, and share what you make of
      it under the same licence. Show the cautions wherever you show a write-up or a fix.
    </p>
    <sl-load-state [of]="loaded()" />
    @if (loaded(); as now) {
      @if (now.state === 'ready') {
        @if (now.value.dump; as dump) {
          <p>
            <a class="sl-strong-button" href="/dump/shimlore.jsonl.gz" download
              >Download, {{ dump.bytes / 1024 | number: '1.0-0' }} kB</a
            >
          </p>
          <p class="sl-quiet">
            Made {{ dump.createdAt | date: "yyyy-MM-dd HH:mm 'UTC'" : 'UTC' }}, made anew each day. JSON Lines
            in UTF-8, gzip: the first line tells version, licence and counts, each further line is one record.
            <a href="/dump/schema.json">JSON Schema of a line</a>.
          </p>
          <h2>What is in it</h2>
          <div class="scroll" tabindex="0" role="region" aria-label="Records by kind">
            <table>
              <thead>
                <tr>
                  <th scope="col">Kind</th>
                  <th scope="col" class="figure">Records</th>
                </tr>
              </thead>
              <tbody>
                @for (line of dump.counts; track line.kind) {
                  <tr>
                    <th scope="row">{{ line.kind }}</th>
                    <td class="figure">{{ line.count | number }}</td>
                  </tr>
                }
              </tbody>
            </table>
          </div>
          <h2>How its lines look</h2>
          @for (sample of dump.samples; track sample.kind) {
            <h3>{{ sample.kind }}</h3>
            <pre tabindex="0" [attr.aria-label]="'A line of kind ' + sample.kind">{{ sample.line }}</pre>
          }
        } @else {
          <p class="sl-quiet">The first file is being made; come back in an hour.</p>
        }
      }
    }
    <h2>Feeds</h2>
    <ul>
      <li><a href="/feeds/write-ups.atom">Write-ups and their new editions</a></li>
      <li><a href="/feeds/cautions.atom">Cautions</a></li>
      <li>each part has its own, named at the foot of its page</li>
    </ul>
  `,
  styles: `
    .measure {
      max-inline-size: var(--sl-measure);
      overflow-wrap: anywhere;
    }
    .scroll {
      overflow-x: auto;
    }
    table {
      border-collapse: collapse;
    }
    th,
    td {
      padding: 0.35rem 1.5rem 0.35rem 0;
      text-align: start;
      border-block-end: 1px solid var(--sl-hair);
    }
    .figure {
      text-align: end;
      font-family: var(--sl-mono);
    }
    h3 {
      margin-block-end: 0.3rem;
    }
    pre {
      margin: 0;
      padding: 0.5rem 0.75rem;
      border: 1px solid var(--sl-rule);
      font: 0.85rem/1.5 var(--sl-mono);
      white-space: pre-wrap;
      overflow-wrap: anywhere;
    }
  `,
})
export class OpenDataPage {
  private readonly api = inject(Api);
  private readonly titles = inject(ShimloreTitles);
  protected readonly licence = licence;
  protected readonly loaded = loadEach(of(null), () => this.api.call(dumpRoutes.readDumpSummary));

  constructor() {
    effect(() =>
      this.titles.describe({
        title: 'Open data',
        description: `Everything published on Shimlore as JSON Lines, under ${licence.shortName}.`,
        path: '/dump',
        feeds: [
          { title: 'Write-ups', path: '/feeds/write-ups.atom' },
          { title: 'Cautions', path: '/feeds/cautions.atom' },
        ],
      }),
    );
  }
}
