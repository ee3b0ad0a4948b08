import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { Session } from '../core/session';
import { JointPageView } from './joint-page';
import { lipJoint } from './lip-joint.fixture';

async function open(address: string, joint = lipJoint()) {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([{ path: 'joints/:slug', component: JointPageView }]),
    ],
  });
  const harness = await RouterTestingHarness.create();
  await harness.navigateByUrl(address);
  TestBed.inject(HttpTestingController).expectOne('/api/joints/lip-in-m1').flush(joint);
  await harness.fixture.whenStable();
  const root = harness.routeNativeElement!;
  const type = async (id: string, text: string): Promise<void> => {
    const field = root.querySelector<HTMLInputElement>(`#${id}`)!;
    field.value = text;
    field.dispatchEvent(new Event('input'));
    await harness.fixture.whenStable();
  };
  const word = (): string => root.querySelector('.answer .word')?.textContent?.trim() ?? '';
  const drawn = (): string => root.querySelector('sl-joint-drawing svg desc')?.textContent ?? '';
  const query = (): Record<string, unknown> => {
    const router = TestBed.inject(Router);
    return router.parseUrl(router.url).queryParams;
  };
  return { root, harness, type, word, drawn, query };
}

const untilWritten = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 400));

describe('the page of a joint', () => {
  beforeEach(() => localStorage.clear());

  it('shows the pair that the address names, with the shim worksheet for its gap', async () => {
    const { root, word, drawn } = await open('/joints/lip-in-m1?a=11&b=22');
    expect(word()).toBe('will not seat');
    expect(drawn()).toContain('apart');
    const link = root.querySelector<HTMLAnchorElement>('a[href^="/worksheets/shim"]')!;
    expect(new URL(link.href).searchParams.get('gap')).toBe('1.5');
    expect(Number(new URL(link.href).searchParams.get('u'))).toBeGreaterThan(0);
  });

  it('draws and judges anew when own readings are typed, and puts them into the address', async () => {
    const { type, word, drawn, query, root } = await open('/joints/lip-in-m1?a=11&b=22');
    const before = drawn();
    await type('own-a-diameter', '19,41');
    expect(word()).toBe('seats snugly');
    expect(drawn()).not.toBe(before);
    expect(root.querySelector('figcaption')?.textContent).toContain('your own readings');
    await untilWritten();
    expect(query()).toMatchObject({
      a: '11',
      b: '22',
      own: 'a.diameter:19,41',
    });
  });

  it('opens with the readings that the address holds', async () => {
    const { root, word } = await open('/joints/lip-in-m1?a=11&b=22&own=a.diameter:0.764&unit=in');
    expect(root.querySelector<HTMLInputElement>('#own-a-diameter')?.value).toBe('0.764');
    expect(word()).toBe('seats snugly');
  });

  it('says what cannot be right without losing what was typed', async () => {
    const { root, type } = await open('/joints/lip-in-m1?a=11&b=22');
    await type('own-a-diameter', 'about 20');
    expect(root.querySelector('#own-a-diameter-how')?.textContent).toContain('not a figure');
    await type('own-a-diameter', '-4');
    expect(root.textContent).toContain('These readings cannot be right together');
    expect(root.querySelector<HTMLInputElement>('#own-a-diameter')?.value).toBe('-4');
  });

  it('ends, for a pair that nobody has read, in what to measure and how', async () => {
    const { root, word } = await open('/joints/lip-in-m1?a=12&b=22');
    expect(word()).toBe('not known');
    expect(root.querySelector('.missing')?.textContent).toContain('outer diameter');
    expect(root.querySelector('.missing')?.textContent).toContain('Caliper across the outside');
    expect(root.querySelector('sl-joint-drawing')).toBeNull();
  });

  it('tells a moderator where to look when reports and readings contradict each other', async () => {
    const joint = lipJoint();
    joint.cells[1]!.contradicts = true;
    const { root, harness } = await open('/joints/lip-in-m1?a=11&b=22', joint);
    expect(root.querySelector('.contradicts')?.textContent).not.toContain('set aside');
    TestBed.inject(Session).take({
      id: 4,
      email: 'm@example.org',
      displayName: 'Mo',
      role: 'moderator',
      noticeMail: true,
      mailRhythm: 'at-once',
      safetyMail: true,
      benchWatch: false,
      mailRefusedAt: null,
      deletionAt: null,
      units: 'mm',
      createdAt: '2026-01-01T00:00:00Z',
    });
    await harness.fixture.whenStable();
    expect(root.querySelector('.contradicts')?.textContent).toContain('set aside');
  });
});
