import type { Finding, Severity } from '#calc';
import { codesOf, filtered, runsOf } from './finding-filter';

const finding = (code: string, severity: Severity, label: string): Finding => ({
  key: `${code}/${label}`, code, severity, subject: { kind: 'dispenser', id: label, label }, title: '20.9 V at the dispenser, lowest 21.0 V',
  detail: '', source: 'type data', remedy: 'Choose a larger section.', compared: [], dispenserIds: [label],
});
const all = [finding('PL-04', 'warning', 'GC2-L09'), finding('VD-01', 'error', 'SL1-L16'), finding('VD-01', 'error', 'SL1-L15')];

describe('filtered', () => {
  it('puts errors before warnings and leaves out empty groups', () => {
    expect(filtered(all, { severity: 'all', code: '', text: '' }).map((g) => [g.severity, g.findings.length])).toEqual([['error', 2], ['warning', 1]]);
  });

  it('keeps only what meets severity, code and words together', () => {
    expect(filtered(all, { severity: 'error', code: 'VD-01', text: 'l16' }).flatMap((g) => g.findings).map((f) => f.subject.label)).toEqual(['SL1-L16']);
    expect(filtered(all, { severity: 'warning', code: 'VD-01', text: '' })).toEqual([]);
  });

  it('looks for words in the remedy too', () => {
    expect(filtered(all, { severity: 'all', code: '', text: 'larger SECTION' }).flatMap((g) => g.findings)).toHaveLength(3);
  });
});

it('codesOf names each code once', () => {
  expect(codesOf(all)).toEqual(['PL-04', 'VD-01']);
});

describe('runsOf', () => {
  it('puts findings that say the same into one run, in the order of the first', () => {
    const list = [finding('MP-01', 'warning', 'A'), finding('VD-01', 'error', 'B'), finding('MP-01', 'warning', 'C')];
    expect(runsOf(list).map((run) => run.findings.map((f) => f.subject.label))).toEqual([['A', 'C'], ['B']]);
  });
});
