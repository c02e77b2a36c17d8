import { describe, expect, it } from 'vitest';
import type { Design } from '#calc';
import { brackwaterSetup, countingIds } from '#support/brackwater-setup.ts';
import { changesOf, DesignIndex, FIELDS, type ChosenSettings } from './index.ts';
import { importOf, planOf, problemsOf } from './testing/plan-of.ts';
import { withChanges } from './testing/with-changes.ts';

/** The design after the import of a file. */
async function after(file: string | Uint8Array, design: Design, ids = countingIds()): Promise<Design> {
  return withChanges(design, changesOf(await planOf(file, design), design, ids));
}

const HEAD =
  'Tag,Description,Bore d mm,Outside dia. D mm,Demand cm³/100 h,Dispenser type,Wiring,Controller,Output address,Status address,Cable length m';

describe('an update', async () => {
  const first = `${HEAD}\nA1,Old text,60,110,,,four-core,PLC1,%QX4.0,%IX4.0,12\nA2,Other,60,110,,,four-core,PLC1,%QX4.1,,\n`;
  const design = await after(first, brackwaterSetup());

  it('shows old and new, and leaves alone what the file leaves blank', async () => {
    const plan = await planOf(`${HEAD}\nA1,New text,,,,,,,,,12.5\nA3,Third,,,,,,,,,\n`, design);
    expect(plan.rows.map(({ action, changes }) => [action, changes])).toEqual([
      [
        'update',
        [
          { field: 'description', from: 'Old text', to: 'New text' },
          { field: 'cableLengthM', from: 12, to: 12.5 },
        ],
      ],
      ['create', []],
    ]);
    expect(plan.counts).toMatchObject({ toUpdate: 1, toCreate: 1, pointsAfter: 3 });
    const changes = changesOf(plan, design, countingIds('00000002'));
    expect(changes.points.update).toEqual([{ id: design.points[0].id, fields: { description: 'New text' } }]);
    expect(changes.dispensers.update).toEqual([{ id: design.dispensers[0].id, fields: { cableLengthM: 12.5 } }]);
    expect(changes.assignments).toEqual({ create: [], remove: [] });
  });

  it('moves an output, and exchanges two', async () => {
    const moved = await planOf(`Tag,Output address\nA1,%QX4.1\nA2,%QX4.0\n`, design);
    expect(problemsOf(moved)).toEqual([]);
    const changed = withChanges(design, changesOf(moved, design, countingIds('00000003')));
    const index = new DesignIndex(changed);
    expect(changed.points.map((point) => index.valuesOf(point).outputAddress)).toEqual(['%QX4.1', '%QX4.0']);
    expect(changed.assignments).toHaveLength(3);
  });

  it('does not take a channel that another point of the project keeps', async () => {
    const plan = await planOf('Tag,Controller,Output address\nA3,PLC1,%QX4.1\nA1,,%QX4.1\n', design);
    expect(problemsOf(plan)).toEqual([
      [2, 'output', 'output-taken'],
      [3, 'output', 'output-taken'],
    ]);
    expect(plan.rows[0].problems[0].message).toContain('point A2 of the project');
  });

  it('does not give away a channel whose point cannot move after all', async () => {
    // A1 wants a channel that does not become free, so it keeps %QX4.0, which A3 then cannot have
    const plan = await planOf('Tag,Controller,Output address\nA3,PLC1,%QX4.0\nA1,,%QX4.1\n', design);
    expect(problemsOf(plan)).toEqual([
      [2, 'output', 'output-taken'],
      [3, 'output', 'output-taken'],
    ]);
  });

  it('does not part a point from the controller of its channels', async () => {
    const plan = await planOf('Tag,Controller\nA1,PLC2\n', design);
    expect(problemsOf(plan)).toEqual([[2, 'controller', 'controller-contradiction']]);
    expect(plan.rows[0].action).toBe('same');
  });

  it('checks a value against the one that stays', async () => {
    expect(problemsOf(await planOf('Tag,Bore d mm\nA1,120\n', design))).toEqual([[2, 'boreMm', 'outside-not-above-bore']]);
    const type = '"Dispenser, two-core, 80 cm³ family"';
    expect(problemsOf(await planOf(`Tag,Dispenser type\nA1,${type}\n`, design))).toEqual([
      [2, 'dispenserType', 'wiring-contradiction'],
    ]);
  });

  it('sets the way of the demand only where the file says something new', async () => {
    const stated = await planOf('Tag,Demand cm³/100 h\nA1,4.5\n', design);
    const fields = changesOf(stated, design, countingIds()).points.update[0].fields;
    expect(fields).toEqual({ demandWay: 'stated', statedUl: 4500, statedPer: '100h' });
    expect(design.points[0].demandWay).toBe('bearing');
    const changed = withChanges(design, changesOf(stated, design, countingIds()));
    expect(
      changesOf(await planOf('Tag,Bore d mm\nA1,61\n', changed), changed, countingIds()).points.update[0].fields,
    ).toEqual({ boreMm: 61 });
  });
});

describe('single rows', () => {
  const design = brackwaterSetup();

  it('are skipped when blank, totals or repeated headings, and said to be', async () => {
    const plan = await planOf(
      'List of points,\n,\nTag,Cable length m\nA1,1\n,\nTag,Cable length m\nA2,2\nTotal,3\n,\n,\n',
      design,
    );
    expect(plan.rows.map(({ row, action, why }) => [row, action, why])).toEqual([
      [4, 'create', null],
      [5, 'skip', 'blank'],
      [6, 'skip', 'repeated-heading'],
      [7, 'create', null],
      [8, 'skip', 'totals'],
    ]);
    expect(plan.counts).toMatchObject({ rows: 2, skipped: 3, toCreate: 2 });
  });

  it('are held back when they have more cells than headings', async () => {
    const plan = await planOf('Tag,Description,Remarks\nA1,Pulley, drive side,x\nA2,y\n', design);
    expect(problemsOf(plan)).toEqual([[2, null, 'too-many-cells']]);
    expect(plan.rows.map(({ action }) => action)).toEqual(['hold', 'create']);
  });

  it.each<[string, string, string, string]>([
    ['Output module,Output channel', 'DO1,', 'output', 'channel-missing'],
    ['Output module,Output channel', ',3', 'output', 'module-missing'],
    ['Output module,Output channel', 'DI1,3', 'output', 'address-wrong-kind'],
    ['Output module,Output address', 'DO2,%QX4.1', 'output', 'address-contradiction'],
    ['Output channel,Output address', '2,%QX4.1', 'output', 'address-contradiction'],
    ['Output channel,Output address', '1.5,', 'output', 'module-missing'],
    ['Output module,Output channel', 'DO1,1.5', 'output', 'no-such-channel'],
    ['Output module,Output channel', 'DO1,x', 'outputChannel', 'not-a-number'],
    ['Status address,Remarks', '%QX4.1,', 'status', 'address-wrong-kind'],
    ['Circuit,Remarks', 'C9,', 'circuit', 'circuit-unknown'],
    ['Days per week,Remarks', '8,', 'daysPerWeek', 'out-of-range'],
    ['Demand cm³/100 h,Demand cm³/1000 h', '4,41', 'demandUlPer1000h', 'demand-contradiction'],
    ['Dose cm³,Remarks', '0.00001,', 'doseUl', 'dose-step'],
    ['Cartridge cm³,Remarks', '-80,', 'cartridgeUl', 'not-positive'],
  ])('with %s = %s have the problem %s %s', async (headings, cells, field, code) => {
    const plan = await planOf(`Tag,Controller,${headings}\nA1,PLC1,${cells}\n`, design);
    expect(problemsOf(plan)).toEqual([[2, field, code]]);
    expect(plan.rows[0].problems[0].remedy).not.toBe('');
    expect(plan.rows[0].action).toBe('create');
  });

  it('blame the cell by column and content', async () => {
    const [problem] = (await planOf('Tag,Controller,Output module,Output channel\nA1,PLC1,DO1,17\n', design)).rows[0].problems;
    expect(problem).toMatchObject({ column: 'D', cell: '17', severity: 'warning', field: 'output' });
  });

  it('say once what an unknown controller means for its channels', async () => {
    const plan = await planOf('Tag,Controller,Output address\nA1,PLC9,%QX4.0\n', design);
    expect(problemsOf(plan)).toEqual([[2, 'controller', 'controller-unknown']]);
    expect(problemsOf(await planOf('Tag,Output address\nA1,%QX4.0\n', design))).toEqual([
      [2, 'output', 'controller-missing'],
    ]);
  });

  it('name a cartridge that the type does not have', async () => {
    const plan = await planOf('Tag,Dispenser type,Cartridge cm³\nA1,"Dispenser, two-core, 80 cm³ family",120\n', design);
    expect(problemsOf(plan)).toEqual([[2, 'cartridgeUl', 'no-such-cartridge']]);
  });
});

describe('value mapping', () => {
  const file = 'Tag,Wiring,Controller\nA1,zweidraht,SPS 1\nA2,dreidraht,SPS 1\n';

  it('lists the texts of choice columns with what each would be', async () => {
    const { values } = (await importOf(file, brackwaterSetup())).reading;
    expect(values).toEqual([
      { field: 'wiring', text: 'zweidraht', rows: 1, value: null, reason: null },
      { field: 'wiring', text: 'dreidraht', rows: 1, value: null, reason: null },
      { field: 'controller', text: 'SPS 1', rows: 2, value: null, reason: null },
    ]);
  });

  it('reads a text as a person says, or as blank', async () => {
    const valueMapping = { wiring: { Zweidraht: 'two-core', dreidraht: null }, controller: { 'SPS 1': 'PLC1' } };
    const plan = await planOf(file, brackwaterSetup(), { valueMapping });
    expect(plan.rows.map(({ values }) => [values.wiring, values.controller])).toEqual([
      ['two-core', 'PLC1'],
      [null, 'PLC1'],
    ]);
    expect(plan.counts.problems).toBe(0);
  });

  it('does not take a value that the project does not have', async () => {
    const plan = await planOf(file, brackwaterSetup(), { valueMapping: { controller: { 'SPS 1': 'PLC7' } } });
    expect(problemsOf(plan).filter(([, field]) => field === 'controller')).toHaveLength(2);
  });
});

describe('settings that fit no import', () => {
  it.each<[string, ChosenSettings, RegExp]>([
    ['no tag column', { mapping: { B: 'description' } }, /No column holds the tag/],
    ['a field twice', { mapping: { A: 'tag', B: 'tag' } }, /Two columns/],
    ['a column outside', { mapping: { A: 'tag', ZZ: 'remarks' } }, /no column ZZ/],
    ['a heading row outside', { headerRow: 9 }, /no row 9/],
    ['nothing below the headings', { headerRow: 2 }, /Nothing stands below/],
  ])('are refused: %s', async (_name, chosen, message) => {
    await expect(planOf('Tag,Description\nA1,x\n', brackwaterSetup(), chosen)).rejects.toThrow(message);
  });

  it('keep values typed: every key is there', async () => {
    const signal = ['signalType', 'module', 'channel', 'address'];
    const keys = FIELDS.map(({ value }) => value).filter((value) => !signal.includes(value));
    expect(Object.keys((await planOf('Tag\nA1\n', brackwaterSetup())).rows[0].values).sort()).toEqual(keys.sort());
  });
});
