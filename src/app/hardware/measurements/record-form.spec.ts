import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { By } from '@angular/platform-browser';
import type { DimensionConsensus } from '../../../../shared/contract/measurements';
import { dimensionSpec } from '../../../../shared/fit/feature-dimensions';
import { NewPhoto } from '../../ui/new-photo/new-photo';
import { PhotoChoice } from '../../ui/new-photo/photo-choice';
import { RecordForm } from './record-form';

const consensus: DimensionConsensus = {
  count: 4,
  mean: 19.51,
  uncertainty: 0.01,
  predictionSpread: 0.03,
  low: 19.49,
  high: 19.53,
  thin: false,
  unitSlips: 0,
};

async function opened() {
  const fixture = TestBed.createComponent(RecordForm);
  const recorded: unknown[] = [];
  fixture.componentRef.setInput('feature', { id: 7, name: 'seat' });
  fixture.componentRef.setInput('spec', dimensionSpec('recess', 'diameter'));
  fixture.componentRef.setInput('revisions', [
    { id: 1, partId: 1, label: 'Rev A' },
    { id: 2, partId: 1, label: 'Rev B' },
  ]);
  fixture.componentInstance.recorded.subscribe((event) => recorded.push(event));
  await fixture.whenStable();
  const page = fixture.nativeElement as HTMLElement;
  const field = (name: string): HTMLInputElement =>
    page.querySelector<HTMLInputElement>(`[formControlName=${name}]`)!;
  const type = async (name: string, text: string): Promise<void> => {
    field(name).value = text;
    field(name).dispatchEvent(new Event(field(name).tagName === 'SELECT' ? 'change' : 'input'));
    await fixture.whenStable();
  };
  const send = async (): Promise<void> => {
    page.querySelector('form')!.dispatchEvent(new Event('submit'));
    await fixture.whenStable();
  };
  return { fixture, page, field, type, send, recorded };
}

const api = () => TestBed.inject(HttpTestingController);

describe('recording a reading', () => {
  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
  });

  it('sends repeats, and null for the instrument’s usual uncertainty', async () => {
    const { type, send } = await opened();
    await type('values', '19,48 19.50; 19.52');
    await send();
    expect(api().expectOne('/api/measurements').request.body).toEqual({
      featureId: 7,
      revisionId: 2,
      dimension: 'diameter',
      values: [19.48, 19.5, 19.52],
      unit: 'mm',
      instrument: 'caliper',
      uncertainty: null,
      photoId: null,
    });
  });

  it('shows the usual uncertainty of the instrument in the unit chosen, for the reader to change', async () => {
    const { field, type, send } = await opened();
    expect(field('uncertainty').value).toBe('0.0173');
    await type('instrument', 'micrometer');
    expect(field('uncertainty').value).toBe('0.00231');
    await type('unit', 'in');
    expect(Number(field('uncertainty').value)).toBeCloseTo(0.00231 / 25.4, 6);
    await type('uncertainty', '0.001');
    await type('values', '0.768');
    await send();
    expect(api().expectOne('/api/measurements').request.body).toMatchObject({
      unit: 'in',
      uncertainty: 0.001,
    });
  });

  it('keeps what was typed when the server refuses it, and says at the field why', async () => {
    const { fixture, page, field, type, send, recorded } = await opened();
    await type('values', '195000 19.5');
    await send();
    api()
      .expectOne('/api/measurements')
      .flush(
        {
          type: '/problems/not-valid',
          title: 'Some fields cannot be taken',
          status: 422,
          detail: 'One field has to be changed.',
          remedy: 'Change it and send again.',
          fields: [{ path: 'values.0', message: 'is at most 100000', remedy: 'Check the figure' }],
        },
        { status: 422, statusText: 'Unprocessable Content' },
      );
    await fixture.whenStable();
    expect(field('values').value).toBe('195000 19.5');
    expect(field('values').getAttribute('aria-invalid')).toBe('true');
    expect(page.textContent).toContain('Is at most 100000. Check the figure.');
    expect(recorded).toEqual([]);
  });

  it('refuses what is no figure without asking the server', async () => {
    const { page, type, send } = await opened();
    await type('values', 'about 19');
    await send();
    api().expectNone('/api/measurements');
    expect(page.textContent).toContain('Takes figures, with spaces between repeats.');
  });

  it('sends the photo of the reading once it is stored, and waits for one that is chosen', async () => {
    Object.assign(URL, { createObjectURL: () => 'blob:photo', revokeObjectURL: () => undefined });
    const { fixture, page, type, send } = await opened();
    const { debugElement } = fixture;
    await type('values', '19.52');
    debugElement.query(By.directive(PhotoChoice)).triggerEventHandler('chosen', new File(['x'], 'jaws.jpg'));
    await fixture.whenStable();
    await send();
    api().expectNone('/api/measurements');
    expect(page.textContent).toContain('Store the photo first, or leave it out.');
    const photo = { id: 3, hash: '0'.repeat(64), width: 480, height: 320, widths: [480], placeholder: '' };
    debugElement
      .query(By.directive(NewPhoto))
      .triggerEventHandler('stored', { ...photo, alt: 'Jaws in the recess' });
    await fixture.whenStable();
    await send();
    expect(api().expectOne('/api/measurements').request.body).toMatchObject({ photoId: 3 });
  });

  it('tells the new consensus at once', async () => {
    const { fixture, page, type, send, recorded } = await opened();
    await type('values', '19.52');
    await send();
    api()
      .expectOne('/api/measurements')
      .flush({ measurement: {}, consensus }, { status: 201, statusText: 'Created' });
    await fixture.whenStable();
    expect(page.querySelector('[role=status]')?.textContent).toContain(
      'now 19.510 ± 0.020 mm from 4 readings',
    );
    expect(recorded).toEqual([{ revisionId: 2, consensus }]);
  });
});
