import { describe, expect, it } from 'vitest';
import { brackwaterSetup } from '#support/brackwater-setup.ts';
import type { FieldKey } from './fields.ts';
import { headingKey, NOTHING_REMEMBERED, textKey, toRemember, type Remembered } from './remembered.ts';
import { importOf } from './testing/plan-of.ts';

const LIST = 'Tag,Foo,Remarks,Wiring,Controller\nA1,x,y,zweidraht,SPS 1\nA2,z,y,vierdraht,SPS 9\n';

/** What the database would give back of what a commit kept. */
function kept(...lists: readonly ReturnType<typeof toRemember>[]): Remembered {
  const headings = new Map<string, FieldKey | null>();
  const texts = new Map<string, Map<string, string | null>>();
  for (const list of lists) {
    for (const { heading, field } of list.headings) headings.set(heading, field);
    for (const { field, text, value } of list.texts) texts.set(field, (texts.get(field) ?? new Map<string, string | null>()).set(text, value));
  }
  return { headings, texts };
}

describe('keys of what is remembered', () => {
  it.each([
    ['  Outside dia. D (mm) ', 'outside dia D mm'],
    ['Ø d mm', 'Ø d mm'],
    ['Straße / Länge', 'strasse lange'],
    ['=', '='],
  ])('of %j is %j', (heading, key) => {
    expect(headingKey(heading)).toBe(key);
  });

  it('tell d from D, fold width and case of texts, and end at 200 characters', () => {
    expect(headingKey('d mm')).not.toBe(headingKey('D mm'));
    expect(textKey(' ＳＰＳ 1')).toBe('sps 1');
    expect([headingKey('x '.repeat(300)).length, textKey('y'.repeat(300)).length]).toEqual([200, 200]);
  });
});

describe('columns and texts of earlier imports', () => {
  it('come back as last time: mapped, left out, and translated', async () => {
    const design = brackwaterSetup();
    const first = await importOf(LIST, design, {
      mapping: { A: 'tag', B: 'description', D: 'wiring', E: 'controller' },
      valueMapping: { wiring: { zweidraht: 'two-core', vierdraht: 'four-core' }, controller: { 'SPS 1': 'PLC1', 'SPS 9': null } },
    });
    const { reading, plan } = await importOf(LIST.toUpperCase(), design, {}, kept(toRemember(first.reading)));
    expect(reading.columns.map(({ field, reason }) => [field, reason])).toEqual([
      ['tag', 'as last time'], ['description', 'as last time'], [null, 'left out last time'], ['wiring', 'as last time'], ['controller', 'as last time'],
    ]);
    expect(reading.values.map(({ text, value, reason }) => [text, value, reason])).toEqual([
      ['ZWEIDRAHT', 'two-core', 'as last time'], ['VIERDRAHT', 'four-core', 'as last time'], ['SPS 1', 'PLC1', 'as last time'], ['SPS 9', null, 'as last time'],
    ]);
    expect(plan.counts).toMatchObject({ toCreate: 2, problems: 0 });
    expect(plan.rows.map(({ values }) => [values.description, values.wiring, values.controller])).toEqual([['X', 'two-core', 'PLC1'], ['Z', 'four-core', null]]);
  });

  it('give way to what a person chooses now', async () => {
    const remembered = { ...NOTHING_REMEMBERED, texts: new Map([['controller', new Map<string, string | null>([['sps 1', 'PLC1'], ['sps 9', 'PLC1']])]]) };
    const { reading } = await importOf(LIST, brackwaterSetup(), { valueMapping: { controller: { 'sps 1': 'PLC2' } } }, remembered);
    expect(reading.settings.valueMapping).toEqual({ controller: { 'sps 1': 'PLC2', 'SPS 9': 'PLC1' } });
  });

  it('count only where the project has that value now', async () => {
    const remembered = { ...NOTHING_REMEMBERED, texts: new Map([['controller', new Map([['sps 1', 'PLC7']])]]) };
    const { reading } = await importOf(LIST, brackwaterSetup(), {}, remembered);
    expect(reading.values.find(({ text }) => text === 'SPS 1')).toMatchObject({ value: null, reason: null });
    expect(reading.settings.valueMapping).toBeUndefined();
  });

  it('do not leave a list without its tags, nor a signal without its type', async () => {
    const remembered = { ...NOTHING_REMEMBERED, headings: new Map<string, FieldKey | null>([['tag', null], ['module', 'module'], ['foo', 'tag']]) };
    const { reading } = await importOf('Tag,Module\nA1,DO1\n', brackwaterSetup(), {}, remembered);
    expect(reading.settings.mapping).toEqual({ A: 'tag' });
    const other = await importOf('Foo,Tag,Remarks\nA1,t,x\n', brackwaterSetup(), {}, remembered);
    expect(other.reading.settings.mapping).toEqual({ A: 'tag', C: 'remarks' });
  });

  it('tell two columns of one heading apart by their order', async () => {
    const list = 'Tag,Text,Text\nA1,x,y\n';
    const { reading } = await importOf(list, brackwaterSetup(), { mapping: { A: 'tag', C: 'remarks' } });
    expect(toRemember(reading).headings).toEqual([{ heading: 'tag', field: 'tag' }, { heading: 'text', field: null }, { heading: 'text 2', field: 'remarks' }]);
    const again = await importOf(list, brackwaterSetup(), {}, kept(toRemember(reading)));
    expect(again.reading.settings.mapping).toEqual({ A: 'tag', C: 'remarks' });
  });
});
