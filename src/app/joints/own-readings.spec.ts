import { convertToParamMap } from '@angular/router';
import { addressOfOwn, ownReadingsIn, readFigure, type OwnReadings } from './own-readings';

describe('own readings in an address', () => {
  it('come back as they were typed', () => {
    const own: OwnReadings = {
      a: { diameter: '0.886', form: 'flat' },
      b: { diameter: '19,48' },
      instrument: 'micrometer',
      unit: 'in',
    };
    const address = addressOfOwn(own);
    expect(address.own).toEqual(['a.diameter:0.886', 'a.form:flat', 'b.diameter:19,48']);
    expect(ownReadingsIn(convertToParamMap(address), 'mm')).toEqual(own);
  });

  it('leave nothing behind once the fields are empty but the unit', () => {
    const address = addressOfOwn({
      a: { diameter: ' ' },
      b: {},
      instrument: 'ruler',
      unit: 'mm',
    });
    expect(address).toEqual({ own: null, with: null, unit: 'mm' });
  });

  it('are left out where the address cannot be read', () => {
    const params = convertToParamMap({
      own: ['c.diameter:1', 'a.__proto__:1', 'a.diameter', '<b>', 'b.depth:2.0'],
      with: 'guess',
      unit: 'cubit',
    });
    expect(ownReadingsIn(params, 'in')).toEqual({
      a: {},
      b: { depth: '2.0' },
      instrument: 'caliper',
      unit: 'in',
    });
  });

  it('are figures with point or comma, and nothing else', () => {
    expect(['19.5', '19,5', ' -2 ', '−2', '.5'].map(readFigure)).toEqual([19.5, 19.5, -2, -2, 0.5]);
    expect(['', 'about 3', '1e3', '1.2.3', '0x10'].map(readFigure)).toEqual([null, null, null, null, null]);
  });
});
