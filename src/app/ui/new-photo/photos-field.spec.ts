import { provideHttpClient } from '@angular/common/http';
import { provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { By } from '@angular/platform-browser';
import type { Photo } from '../../../../shared/contract/photos';
import { NewPhoto } from './new-photo';
import { PhotoChoice } from './photo-choice';
import { PhotosField } from './photos-field';
import { photoIdsIn, photosForm } from './photos-form';

const photo = (id: number, alt: string): Photo => ({
  id,
  hash: String(id).padStart(64, '0'),
  width: 960,
  height: 640,
  widths: [480, 960],
  placeholder: '',
  alt,
});

beforeEach(() => {
  // The browser that runs these has no addresses for files.
  Object.assign(URL, { createObjectURL: () => 'blob:photo', revokeObjectURL: () => undefined });
  TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
});

async function field(inputs: { most: number; captionLabel?: string }) {
  const photos = photosForm();
  const fixture = TestBed.createComponent(PhotosField);
  fixture.componentRef.setInput('photos', photos);
  fixture.componentRef.setInput('most', inputs.most);
  fixture.componentRef.setInput('captionLabel', inputs.captionLabel ?? '');
  await fixture.whenStable();
  const find = (type: typeof PhotoChoice | typeof NewPhoto) => fixture.debugElement.query(By.directive(type));
  const choose = async (): Promise<void> => {
    find(PhotoChoice).triggerEventHandler('chosen', new File(['x'], 'lip.jpg', { type: 'image/jpeg' }));
    await fixture.whenStable();
  };
  const store = async (stored: Photo): Promise<void> => {
    find(NewPhoto).triggerEventHandler('stored', stored);
    await fixture.whenStable();
  };
  return { photos, fixture, page: fixture.nativeElement as HTMLElement, find, choose, store };
}

describe('photos that go with a form', () => {
  it('are those that were stored, up to the most that may be', async () => {
    const { photos, page, find, choose, store } = await field({ most: 2 });
    await choose();
    await store(photo(7, 'The lip from the side'));
    await choose();
    await store(photo(8, 'The recess'));
    expect(photoIdsIn(photos)).toEqual([7, 8]);
    expect(page.textContent).toContain('The lip from the side');
    expect(find(PhotoChoice)).toBeNull();
  });

  it('keep the form from being sent while one is on its way', async () => {
    const { photos, choose, store } = await field({ most: 2 });
    await choose();
    expect(photos.invalid).toBe(true);
    await store(photo(7, 'The lip from the side'));
    expect(photos.valid).toBe(true);
  });

  it('can be taken out again, and the same one is not attached twice', async () => {
    const { photos, page, fixture, choose, store } = await field({ most: 6 });
    await choose();
    await store(photo(7, 'The lip from the side'));
    await choose();
    await store(photo(7, 'The lip from the side'));
    expect(photoIdsIn(photos)).toEqual([7]);
    [...page.querySelectorAll('button')]
      .find((button) => button.textContent.includes('Take it out'))!
      .click();
    await fixture.whenStable();
    expect(photoIdsIn(photos)).toEqual([]);
  });

  it('want words on what to look at where the form asks for them', async () => {
    const { photos, page, fixture, choose, store } = await field({
      most: 3,
      captionLabel: 'What to look at',
    });
    await choose();
    await store(photo(7, 'A grey label'));
    expect(photos.invalid).toBe(true);
    const caption = page.querySelector('input.sl-field') as HTMLInputElement;
    caption.value = 'The label';
    caption.dispatchEvent(new Event('input'));
    await fixture.whenStable();
    expect(photos.valid).toBe(true);
    expect(photos.getRawValue()[0]!.caption).toBe('The label');
  });
});
