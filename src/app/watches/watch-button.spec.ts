import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { NEVER, of, throwError } from 'rxjs';
import { ApiProblem } from '../core/api-problem';
import { Session } from '../core/session';
import { WatchButton } from './watch-button';
import { Watches } from './watches';

async function draw(signedIn: boolean, watches: object) {
  TestBed.configureTestingModule({
    providers: [
      provideRouter([]),
      { provide: Session, useValue: { account: signal(signedIn ? { id: 7 } : null) } },
      { provide: Watches, useValue: watches },
    ],
  });
  const fixture = TestBed.createComponent(WatchButton);
  fixture.componentRef.setInput('subject', 'part');
  fixture.componentRef.setInput('subjectId', 12);
  fixture.componentRef.setInput('name', 'Motor M');
  await fixture.whenStable();
  const host = fixture.nativeElement as HTMLElement;
  return {
    host,
    button: () => host.querySelector('button')!,
    async press() {
      host.querySelector('button')!.click();
      await fixture.whenStable();
    },
  };
}

describe('the button to watch', () => {
  it('leads a visitor to sign in, with the way back', async () => {
    const { host } = await draw(false, {});
    expect(host.querySelector('a')?.getAttribute('href')).toContain('/account/sign-in?back=');
    expect(host.textContent).toContain('Sign in to watch Motor M');
  });

  it('waits until it is known what is watched', async () => {
    const { button } = await draw(true, { keys: () => NEVER });
    expect(button().disabled).toBe(true);
  });

  it('begins a watch and ends it', async () => {
    const ended: unknown[] = [];
    const { button, press } = await draw(true, {
      keys: () => of({ keys: [] }),
      watch: () => of(null),
      end: (...what: unknown[]) => {
        ended.push(what);
        return of(null);
      },
    });
    expect(button().getAttribute('aria-pressed')).toBe('false');
    await press();
    expect(button().getAttribute('aria-pressed')).toBe('true');
    await press();
    expect(button().getAttribute('aria-pressed')).toBe('false');
    expect(ended).toEqual([['part', 12]]);
  });

  it('says why a watch was refused and stays as it was', async () => {
    const problem = {
      type: '/problems/not-valid',
      title: 'Not valid',
      status: 422,
      detail: 'One watch too many.',
    };
    const { host, button, press } = await draw(true, {
      keys: () => of({ keys: [] }),
      watch: () => throwError(() => new ApiProblem(problem)),
    });
    await press();
    expect(host.textContent).toContain('One watch too many.');
    expect(button().getAttribute('aria-pressed')).toBe('false');
  });
});
