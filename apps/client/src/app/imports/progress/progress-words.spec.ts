import { amountWords, type ImportProgress, leftWords, percent, spoken } from './progress-words';

const progress = (part: Partial<ImportProgress>): ImportProgress => ({ stage: 'reading', done: 0, total: null, leftMs: null, ...part });

describe('words of the progress', () => {
  it('counts megabytes while sending and rows afterwards', () => {
    expect(amountWords(progress({ stage: 'sending', done: 3_240_000, total: 9_800_000 }))).toBe('3.2 of 9.8 MB');
    expect(amountWords(progress({ done: 1250, total: 50_000 }))).toBe('1,250 of 50,000 rows');
    expect(amountWords(progress({ done: 1250 }))).toBe('1,250 rows');
    expect(amountWords(progress({}))).toBe('');
    expect(amountWords(progress({ stage: 'stopping', done: 4, total: 9 }))).toBe('');
  });

  it.each([
    [null, ''], [400, 'almost done'], [7200, 'about 8 s left'], [12_300, 'about 15 s left'], [50_100, 'about 55 s left'],
    [54_500, 'about 1 min left'], [125_000, 'about 2 min left'],
  ])('tells %s ms left in words', (ms, words) => {
    expect(leftWords(ms)).toBe(words);
  });

  it('keeps 100 per cent for the end', () => {
    expect(percent(progress({ done: 9999, total: 10_000 }))).toBe(99);
    expect(percent(progress({ done: 10_000, total: 10_000 }))).toBe(99);
    expect(percent(progress({ done: 5 }))).toBeNull();
  });

  it('says it all in one sentence', () => {
    expect(spoken(progress({ stage: 'writing', done: 20, total: 60, leftMs: 3000 }))).toBe('Writing to the project, 20 of 60 rows, about 3 s left');
  });
});
