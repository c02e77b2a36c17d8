import { takenAfter } from './sheet-list';

const sheet = (name: string, taken: boolean, alike: boolean) => ({ name, rows: 10, taken, alike });

describe('takenAfter', () => {
  const sheets = [sheet('GC1', true, true), sheet('GC2', false, true), sheet('Legend', false, false)];

  it('takes a sheet with like headings together with the others', () => {
    expect(takenAfter(sheets, sheets[1])).toEqual(['GC1', 'GC2']);
  });

  it('takes a sheet with other headings alone', () => {
    expect(takenAfter(sheets, sheets[2])).toEqual(['Legend']);
  });

  it('gives one of several back, and never the last', () => {
    const both = [sheet('GC1', true, true), sheet('GC2', true, true)];
    expect(takenAfter(both, both[0])).toEqual(['GC2']);
    expect(takenAfter(sheets, sheets[0])).toEqual(['GC1']);
  });
});
