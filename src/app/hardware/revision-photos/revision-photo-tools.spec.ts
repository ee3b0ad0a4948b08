import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { By } from '@angular/platform-browser';
import type { Photo } from '../../../../shared/contract/photos';
import type { Revision, RevisionPhoto } from '../../../../shared/contract/hardware';
import { NewPhoto } from '../../ui/new-photo/new-photo';
import { PhotoChoice } from '../../ui/new-photo/photo-choice';
import { PhotoStrip } from '../../ui/photo/photo-strip';
import { RevisionPhotoTools } from './revision-photo-tools';

const photo = (id: number, alt: string): Photo => ({
  id,
  hash: String(id).padStart(64, '0'),
  width: 960,
  height: 640,
  widths: [480, 960],
  placeholder: '',
  alt,
});
const revision = (photos: RevisionPhoto[]): Revision => ({
  id: 5,
  partId: 1,
  label: 'Rev B',
  announcedAt: null,
  soldFrom: null,
  soldTo: null,
  howToTell: 'A blue stripe.',
  whatChanged: '',
  photos,
});
const api = () => TestBed.inject(HttpTestingController);

beforeEach(() => {
  // The browser that runs these has no addresses for files.
  Object.assign(URL, { createObjectURL: () => 'blob:photo', revokeObjectURL: () => undefined });
  TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
});

async function toolsOf(photos: RevisionPhoto[]) {
  const fixture = TestBed.createComponent(RevisionPhotoTools);
  const changes: RevisionPhoto[][] = [];
  fixture.componentRef.setInput('revision', revision(photos));
  fixture.componentInstance.changed.subscribe((now) => changes.push(now));
  await fixture.whenStable();
  return { fixture, page: fixture.nativeElement as HTMLElement, changes };
}

describe('the photos of a revision', () => {
  it('stand small with their captions, and each leads to its largest size', async () => {
    const fixture = TestBed.createComponent(PhotoStrip);
    fixture.componentRef.setInput('label', 'How to tell Rev B');
    fixture.componentRef.setInput('photos', [{ photo: photo(7, 'A blue stripe'), caption: 'The stripe' }]);
    await fixture.whenStable();
    const page = fixture.nativeElement as HTMLElement;
    expect(page.querySelector('a')?.getAttribute('href')).toBe(`/photos/${photo(7, '').hash}-960.webp`);
    expect(page.querySelector('img')?.getAttribute('alt')).toBe('A blue stripe');
    expect(page.querySelector('figcaption')?.textContent).toBe('The stripe');
  });
});

describe('the photos of a revision in a moderator’s hands', () => {
  it('get one more once it is stored and said what to look at in it', async () => {
    const first = { photo: photo(7, 'A blue stripe'), caption: 'The stripe' };
    const { fixture, page, changes } = await toolsOf([first]);
    const choice = fixture.debugElement.query(By.directive(PhotoChoice));
    choice.triggerEventHandler('chosen', new File(['x'], 'plug.jpg', { type: 'image/jpeg' }));
    await fixture.whenStable();
    fixture.debugElement
      .query(By.directive(NewPhoto))
      .triggerEventHandler('stored', photo(8, 'The plug at the side'));
    await fixture.whenStable();

    const send = () => page.querySelector('form')!.dispatchEvent(new Event('submit'));
    send();
    api().expectNone('/api/revisions/5/photos');
    const caption = page.querySelector<HTMLInputElement>('[formControlName=caption]')!;
    caption.value = 'The plug';
    caption.dispatchEvent(new Event('input'));
    send();
    const added = { photo: photo(8, 'The plug at the side'), caption: 'The plug' };
    const call = api().expectOne('/api/revisions/5/photos');
    expect(call.request.body).toEqual({ photoId: 8, caption: 'The plug' });
    call.flush(added, { status: 201, statusText: 'Created' });
    expect(changes).toEqual([[first, added]]);
  });

  it('lose the one that is taken away', async () => {
    const [one, other] = [
      { photo: photo(7, 'A blue stripe'), caption: 'The stripe' },
      { photo: photo(8, 'The plug'), caption: 'The plug' },
    ];
    const { page, changes } = await toolsOf([one, other]);
    [...page.querySelectorAll('button')].find((button) => button.textContent.includes('The stripe'))!.click();
    const call = api().expectOne('/api/revisions/5/photos/7');
    expect(call.request.method).toBe('DELETE');
    call.flush(null, { status: 204, statusText: 'No Content' });
    expect(changes).toEqual([[other]]);
  });
});
