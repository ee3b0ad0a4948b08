import { TestBed } from '@angular/core/testing';
import { Subject } from 'rxjs';
import type { Photo } from '../../../../shared/contract/photos';
import { ApiProblem } from '../../core/api-problem';
import { PhotoUpload, type UploadStep } from '../../ui/new-photo/photo-upload';
import { PhotoQueue } from './photo-queue';

const file = (name: string): File => new File(['x'], name, { type: 'image/jpeg' });
const photo = (id: number): Photo => ({
  id,
  hash: 'a'.repeat(64),
  width: 900,
  height: 600,
  widths: [480],
  placeholder: '',
  alt: '',
});
const refused = new ApiProblem({
  type: '/problems/photo-refused',
  title: 'Not taken',
  status: 422,
  detail: 'The photo is damaged.',
  remedy: 'Save it again.',
});

let queue: PhotoQueue;
/** What is being sent now, by file name. */
let sending: Map<string, Subject<UploadStep>>;

beforeEach(() => {
  sending = new Map();
  const send = ({ name }: File): Subject<UploadStep> => {
    const steps = new Subject<UploadStep>();
    sending.set(name, steps);
    return steps;
  };
  TestBed.configureTestingModule({ providers: [{ provide: PhotoUpload, useValue: { send } }] });
  queue = TestBed.inject(PhotoQueue);
});

const kinds = (): string[] => queue.coming().map((one) => one.progress.kind);
const idOf = (name: string): number => queue.coming().find((one) => one.file.name === name)!.id;
function store(name: string, id: number): void {
  sending.get(name)!.next({ kind: 'stored', photo: photo(id) });
  sending.get(name)!.complete();
}

describe('photos on their way', () => {
  it('are sent two at a time in the order they came', () => {
    queue.add(7, [file('a'), file('b'), file('c')], null);
    expect(kinds()).toEqual(['sending', 'sending', 'waiting']);
    store('b', 2);
    expect(kinds()).toEqual(['sending', 'stored', 'sending']);
  });

  it('tell how far each has come', () => {
    queue.add(7, [file('a'), file('b')], null);
    sending.get('a')!.next({ kind: 'sending', share: 0.25 });
    sending.get('b')!.next({ kind: 'sending', share: 0.5 });
    expect(queue.coming().map(({ progress }) => progress)).toEqual([
      { kind: 'sending', share: 0.25 },
      { kind: 'sending', share: 0.5 },
    ]);
  });

  it('that fail keep their place and their reason, let the next one go, and can be sent again', () => {
    queue.add(7, [file('a'), file('b'), file('c')], null);
    sending.get('a')!.error(refused);
    expect(kinds()).toEqual(['failed', 'sending', 'sending']);
    expect(queue.coming()[0]!.progress).toEqual({ kind: 'failed', problem: refused.problem });
    store('b', 2);
    queue.retry(idOf('a'));
    expect(kinds()).toEqual(['sending', 'stored', 'sending']);
  });

  it('that are stopped are sent no further and make room for the next', () => {
    queue.add(7, [file('a'), file('b'), file('c')], null);
    const steps = sending.get('a')!;
    queue.leaveOut(idOf('a'));
    expect(steps.observed).toBe(false);
    expect(queue.coming().map((one) => one.file.name)).toEqual(['b', 'c']);
    expect(kinds()).toEqual(['sending', 'sending']);
  });

  it('larger than what is taken are not sent at all', () => {
    const large = file('large');
    Object.defineProperty(large, 'size', { value: 21 * 1024 * 1024 });
    queue.add(7, [large], null);
    expect(sending.size).toBe(0);
    expect(queue.coming()[0]!.progress).toMatchObject({
      kind: 'failed',
      problem: { detail: expect.stringContaining('21.0 MB'), remedy: expect.stringMatching(/smaller/) },
    });
  });

  it('come to stand in the order they were chosen, whichever is stored first', () => {
    queue.add(7, [file('a'), file('b'), file('c')], null);
    const [first, last] = [{ name: 'first' }, { name: 'last' }];
    store('b', 2);
    queue.take(idOf('b'), first);
    expect(queue.coming().map((one) => [one.file.name, one.behind])).toEqual([
      ['a', null],
      ['c', first],
    ]);
    store('a', 1);
    queue.take(idOf('a'), last);
    expect(queue.coming().map((one) => [one.file.name, one.behind])).toEqual([['c', first]]);
  });

  it('are something to be lost until all are stored', () => {
    queue.add(7, [file('a')], null);
    expect(queue.isBusy()).toBe(true);
    store('a', 1);
    expect(queue.isBusy()).toBe(false);
  });
});
