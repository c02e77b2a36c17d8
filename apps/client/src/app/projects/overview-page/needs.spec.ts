import type { Assessment, Design, Finding } from '#calc';
import { needsOf } from './needs';

const finding = (code: string, label: string, severity: Finding['severity'] = 'error'): Finding => ({
  key: `${code}/${label}`, code, severity, subject: { kind: 'dispenser', id: label, label }, title: 'No control output', detail: '',
  source: 'policy', remedy: 'Map it.', compared: [], dispenserIds: [label],
});
const circuit = { id: 'c1', name: 'C1', concurrencyLimit: 4 };
const needs = (findings: readonly Finding[], largestPassingK: number | null) =>
  needsOf({ circuits: [circuit] } as unknown as Design, { findings, circuits: new Map([['c1', { dispensers: 20, largestPassingK }]]) } as unknown as Assessment);

describe('needsOf', () => {
  it('gathers the findings of one code', () => {
    const [need] = needs(['L1', 'L2', 'L3', 'L4', 'L5'].map((l) => finding('MP-01', l, 'warning')), null);
    expect(need).toMatchObject({ title: '5 × MP-01: No control output', detail: 'L1, L2, L3 and 2 more. Map it.', link: ['findings'] });
  });

  it('leads a single finding to its lane', () => {
    expect(needs([finding('VD-01', 'L16')], null)[0]?.link).toEqual(['lanes', 'L16']);
  });

  it('puts a smaller k that passes first, and is silent where the present one passes', () => {
    expect(needs([finding('VD-01', 'L16')], 3)[0]?.title).toBe('Circuit C1 passes with k = 3');
    expect(needs([], 4)).toEqual([]);
  });

  it('leaves notes to the list', () => {
    expect(needs([finding('VD-03', 'L1', 'note')], null)).toEqual([]);
  });
});
