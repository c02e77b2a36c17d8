import { fieldValue } from './field-words';

describe('fieldValue', () => {
  it('adds the unit that the name carries', () => {
    expect(fieldValue('doseUl', 200)).toBe('0.2\u2009cm³');
    expect(fieldValue('crossSectionMm2', 0.75)).toBe('0.75\u2009mm²');
    expect(fieldValue('cableLengthM', 34)).toBe('34\u2009m');
  });

  it('shows nothing as a dash, and words as they are', () => {
    expect(fieldValue('zone', null)).toBe('–');
    expect(fieldValue('tag', 'GC1-L11')).toBe('GC1-L11');
  });
});
