import { TestBed } from '@angular/core/testing';
import type { DimensionConsensus, Measurement } from '../../../../shared/contract/measurements';
import { DotPlot } from './dot-plot';

const consensus: DimensionConsensus = {
  count: 3,
  mean: 19.5,
  uncertainty: 0.01,
  predictionSpread: 0.03,
  low: 19.48,
  high: 19.52,
  thin: false,
  unitSlips: 1,
};

function reading(id: number, value: number, change: Partial<Measurement> = {}): Measurement {
  return {
    id,
    revisionId: 1,
    dimension: 'diameter',
    value,
    uncertainty: 0.017,
    repeats: 1,
    entered: { values: [value], unit: 'mm' },
    instrument: 'caliper',
    person: { id: 1, displayName: 'Reader' },
    createdAt: '2026-01-01T00:00:00Z',
    photo: null,
    setAside: null,
    weight: 1,
    unitSlip: false,
    ...change,
  };
}

const aside = { reason: 'chamfer read', by: { id: 2, displayName: 'Desk' }, at: '2026-01-02T00:00:00Z' };

async function render(readings: Measurement[], shown: DimensionConsensus | null = consensus) {
  const fixture = TestBed.createComponent(DotPlot);
  fixture.componentRef.setInput('readings', readings);
  fixture.componentRef.setInput('consensus', shown);
  fixture.componentRef.setInput('unit', 'mm');
  fixture.componentRef.setInput('of', 'inner diameter of Rev B');
  await fixture.whenStable();
  return (fixture.nativeElement as HTMLElement).querySelector('svg')!;
}

describe('the dot plot', () => {
  it('tells in text what it shows', async () => {
    const svg = await render([
      reading(1, 19.48),
      reading(2, 19.51, { setAside: aside, weight: 0 }),
      reading(3, 0.768, { unitSlip: true, weight: 0 }),
    ]);
    const words = svg.getAttribute('aria-label')!;
    expect(words).toContain('3 readings: inner diameter of Rev B.');
    expect(words).toContain('Consensus 19.500 ± 0.020 mm.');
    expect(words).toContain('1 set aside, drawn hollow.');
    expect(words).toContain('1 probably with inch and millimetre confused.');
  });

  it('draws what was set aside hollow, and only that', async () => {
    const svg = await render([reading(1, 19.48), reading(2, 19.51, { setAside: aside, weight: 0 })]);
    expect(svg.querySelectorAll('.dot')).toHaveLength(2);
    expect(svg.querySelectorAll('.dot.hollow')).toHaveLength(1);
    expect(svg.querySelectorAll('.dot.hollow circle')).toHaveLength(1);
  });

  it('flags a slip of the unit at the edge, where it does not squeeze the others', async () => {
    const svg = await render([
      reading(1, 19.48),
      reading(2, 19.52),
      reading(3, 0.768, { unitSlip: true, weight: 0 }),
    ]);
    expect(svg.querySelector('.slip .flag')?.textContent?.trim()).toBe('unit?');
    expect(svg.querySelector('.slip .beyond')).not.toBeNull();
    const [first, second] = [...svg.querySelectorAll('circle')].map((dot) => Number(dot.getAttribute('cx')));
    expect(second! - first!).toBeGreaterThan(80);
  });

  it('draws no band where there is no consensus', async () => {
    const svg = await render([reading(1, 19.5, { setAside: aside, weight: 0 })], null);
    expect(svg.querySelector('.band')).toBeNull();
    expect(svg.querySelectorAll('circle')).toHaveLength(1);
  });
});
