import type { DesignDocument, RowChange } from '#contract';
import { describe, expect, it } from 'vitest';
import { editSummary } from './edit-summary';

const document = {
  project: { id: 'project' },
  points: [{ id: 'p1', tag: 'GC1-L01' }, { id: 'p2', tag: 'GC1-L02' }],
  dispensers: [{ id: 'd1', pointId: 'p1' }, { id: 'd2', pointId: 'p2' }],
  modules: [{ id: 'm1', name: 'DO1' }], moduleGroups: [{ id: 'g1', moduleId: 'm1', groupIndex: 1 }],
  circuits: [{ id: 'c1', name: 'C1' }], cableNodes: [{ id: 'n1', location: '+JB1' }], cabinets: [{ id: 'k1', location: '+K1' }],
} as unknown as DesignDocument;
const update = (collection: RowChange['collection'], id: string, ...fields: string[]): RowChange =>
  ({ collection, op: 'update', id, values: Object.fromEntries(fields.map((field) => [field, 1])) });

describe('an edit in words', () => {
  it.each([
    [[update('dispensers', 'd1', 'doseUl')], 'Dose of GC1-L01'],
    [[update('points', 'p1', 'description')], 'Description of GC1-L01'],
    [[update('dispensers', 'd1', 'typeId', 'wiring')], 'Type and wiring of GC1-L01'],
    [[update('dispensers', 'd1', 'typeId', 'wiring', 'doseUl', 'cartridgeUl')], 'Type, wiring and 2 more of GC1-L01'],
    [[update('dispensers', 'd1', 'doseUl'), update('dispensers', 'd2', 'doseUl')], 'Dose of 2 points'],
    [[update('points', 'p1', 'hoursPerDay'), update('dispensers', 'd1', 'doseUl')], 'Hours per day and dose of GC1-L01'],
    [[update('circuits', 'c1', 'concurrencyLimit')], 'Concurrency limit k of circuit C1'],
    [[update('moduleGroups', 'g1', 'circuitId')], 'Circuit of group 2 of module DO1'],
    [[update('cableNodes', 'n1', 'lengthM')], 'Length of box +JB1'],
    [[update('cabinets', 'k1', 'location')], 'Location of cabinet +K1'],
    [[update('projects', 'project', 'sparePercent')], 'Spare of the project'],
  ])('%#: %s', (changes, words) => {
    expect(editSummary(document, changes)).toBe(words);
  });
});
