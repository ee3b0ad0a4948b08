import { RESPONSE_INIT } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { CanonicalPart } from './canonical-part';

describe('the old address of a part that was merged into another', () => {
  const answerAt = async (address: string, slug: string, page?: string): Promise<ResponseInit> => {
    const answer: ResponseInit = {};
    TestBed.configureTestingModule({
      providers: [
        provideRouter([{ path: '**', children: [] }]),
        { provide: RESPONSE_INIT, useValue: answer },
      ],
    });
    await TestBed.inject(Router).navigateByUrl(address);
    TestBed.inject(CanonicalPart).lead(slug, page);
    return answer;
  };

  it('is answered by the server with 308 and the address of the other', async () => {
    expect(await answerAt('/parts/old-name', 'new-name')).toEqual({
      status: 308,
      headers: { Location: '/parts/new-name' },
    });
  });

  it('keeps what comes behind the part', async () => {
    expect(await answerAt('/parts/old-name/which-one', 'new-name', '/which-one')).toMatchObject({
      status: 308,
      headers: { Location: '/parts/new-name/which-one' },
    });
  });

  it('is not made of the address that a part has', async () => {
    expect(await answerAt('/parts/new-name', 'new-name')).toEqual({});
  });
});
