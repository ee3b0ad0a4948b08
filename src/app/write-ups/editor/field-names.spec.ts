import { fieldId, fieldName } from './field-names';

describe('the name of a field', () => {
  it.each([
    ['title', 'Title'],
    ['fixes.0.kind', 'Fix 1, kind'],
    ['joints.1.b.partId', 'Joint 2, second part, choice of part'],
    ['photos.2.alt', 'Photo 3, alternative text'],
  ])('when its path is %s, then people read %s', (path, expected) => {
    expect(fieldName(path)).toBe(expected);
  });

  it('when its path has steps, then its element id has hyphens', () => {
    expect(fieldId('fixes.0.title')).toBe('field-fixes-0-title');
  });
});
