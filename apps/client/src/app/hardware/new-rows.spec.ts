import type { Circuit, Controller, Design } from '#calc';
import { readAll } from './add-row/new-row';
import { newBox, newCabinet, newModule } from './new-rows';

const design = {
  cabinets: [{ id: 'k1', location: '+K1' }],
  moduleTypes: [
    { id: 'q16-old', name: 'Output module', typeVersion: 1, kind: 'output', technology: 'transistor', channels: 16 },
    { id: 'q16', name: 'Output module', typeVersion: 2, kind: 'output', technology: 'transistor', channels: 16 },
    { id: 'i16', name: 'Input module', typeVersion: 1, kind: 'input', technology: 'input', channels: 16 },
  ],
  modules: [{ id: 'a', controllerId: 'c1', typeId: 'q16-old', name: '-KF4', baseByte: 4, slot: 0 }],
  cableNodes: [{ id: 'b1', circuitId: 'c', location: '+JB1', cableTag: '-W1', powerMm2: 4, signalMm2: 1.5 }],
} as unknown as Design;
const controller = { id: 'c1', name: 'PLC1' } as Controller;

describe('a new row', () => {
  it('suggests the next name and refuses one that is taken', () => {
    const row = newCabinet(design);
    expect(row.fields[0].suggest({})).toBe('+K2');
    expect(row.fields[0].read('+K1')).toEqual({ ok: false, reason: '+K1 is taken already.' });
  });

  it('offers the latest versions of module types and a name and a free byte that follow the one chosen', () => {
    const row = newModule(design, controller);
    const [type, name, base] = row.fields;
    expect(type.choices?.map((choice) => choice.value)).toEqual(['i16', 'q16']);
    expect([name.suggest({ typeId: 'q16' }), name.suggest({ typeId: 'i16' }), name.suggest({ typeId: '' })]).toEqual(['-KF5', 'DI1', '']);
    expect([base.suggest({ typeId: 'q16' }), base.suggest({ typeId: 'i16' }), base.suggest({ typeId: '' })]).toEqual(['6', '0', '']);
    expect(row.fixed).toEqual({ controllerId: 'c1', slot: 1 });
  });

  it('hangs a box behind another with the sections of the trunk before it, sent as numbers', () => {
    const row = newBox(design, { id: 'c', name: 'C1' } as Circuit, design.cableNodes[0]);
    const typed = Object.fromEntries(row.fields.map(({ field, suggest }) => [field, suggest({})]));
    expect(readAll(row.fields, { ...typed, lengthM: '12,5' }).values).toEqual({ location: '+JB2', cableTag: '-W2', lengthM: 12.5, powerMm2: 4, signalMm2: 1.5 });
    expect(readAll(row.fields, typed).reasons).toEqual({ lengthM: 'Enter a number.' });
    expect(row.fixed).toEqual({ circuitId: 'c', parentId: 'b1' });
  });
});
