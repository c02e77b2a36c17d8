import { TestBed } from '@angular/core/testing';
import { PrintHeading } from './print-heading';

const property = (name: string): string => document.documentElement.style.getPropertyValue(name);

describe('PrintHeading', () => {
  it('puts project and state where page margins can read them', () => {
    TestBed.inject(PrintHeading).show('Brackwater Terminal', 'Draft, not for construction');
    expect(property('--lw-print-project')).toBe('"Brackwater Terminal"');
    expect(property('--lw-print-state')).toBe('"Draft, not for construction"');
  });

  it('keeps a name with quotes, backslashes and line breaks one string', () => {
    TestBed.inject(PrintHeading).show('Hall "B"\\2\nnorth', '');
    expect(property('--lw-print-project')).toBe('"Hall \\"B\\"\\\\2 north"');
  });

  it('dates the sheet when it is printed', () => {
    TestBed.inject(PrintHeading);
    window.dispatchEvent(new Event('beforeprint'));
    expect(property('--lw-printed')).toMatch(/^"Printed \d{1,2} \w+ \d{4}, \d{2}:\d{2}"$/);
  });
});
