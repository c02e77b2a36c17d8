import { describe, expect, it } from 'vitest';
import { fieldName } from './field-words.ts';

describe('fieldName', () => {
  it.each([
    ['crossSectionMm2', 'Cross section'], ['doseUl', 'Dose'], ['cableLengthM', 'Cable length'], ['hoursPerDay', 'Hours per day'], ['typeId', 'Type'],
    ['setV', 'Set voltage'], ['nodeId', 'Junction box'], ['tag', 'Tag'], ['concurrencyLimit', 'Concurrency limit k'],
  ])('%s is read "%s"', (field, words) => {
    expect(fieldName(field)).toBe(words);
  });
});
