import { wayBack } from './way-back';

describe('the way back after signing in', () => {
  it.each([
    ['/drafts/7?at=cause', '/drafts/7?at=cause'],
    ['/write-ups/new', '/write-ups/new'],
    [undefined, '/'],
    ['https://elsewhere.test/', '/'],
    ['//elsewhere.test/', '/'],
    ['/\\elsewhere.test', '/'],
    ['/account/sign-in?back=/', '/'],
  ])('when %s was asked for, then it leads to %s', (asked, expected) => {
    expect(wayBack(asked)).toBe(expected);
  });
});
