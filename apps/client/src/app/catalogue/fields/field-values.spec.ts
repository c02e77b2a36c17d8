// eslint-disable-next-line lanewright/import-directions -- holds the forms against the API's own schemas; nothing of it reaches the bundle
import { catalogueResources } from '#contract';
import { Value } from 'typebox/value';
import { type Entry, fieldsOf, type NumberField } from './field';
import { fieldError, formErrors, nameError } from './field-errors';
import { bodyOf, fieldText, formValueOf, typedNumber } from './field-values';
import { KIND_VIEWS, kindView } from './kind-views';
import { serverErrors } from './server-errors';

const dispensers = kindView('dispenserTypes');
const modules = kindView('moduleTypes');
const fourCore: Entry = {
  id: '01900000-0000-7000-8000-000000000001', name: 'Four-core', typeVersion: 3, wiring: 'four-core', cartridgesUl: [80_000, 160_000], residualUl: 5000,
  doseMinUl: 100, doseMaxUl: 2500, doseStepUl: 100, runMsPerStep: 2000, recoveryMs: 20_000, triggerMs: 500, timedMonths: [1, 3, 12], load: 'constant-current',
  runA: 0.35, peakA: 0.8, idleA: 0.02, minV: 18, controlInputA: 0.008, controlOnV: 15, offStateA: 0.0015, controlPolarity: 'sourcing',
  status: { polarity: 'sourcing', maxA: 0.05, dropV: 1.5, leakageA: 0.0002 }, pins: { supply: '1', pulse: '2', zero: '3', status: '4' }, protectionLevels: ['Db'], maxSurfaceC: 85,
};
const relay: Entry = {
  id: fourCore.id, name: 'Relays', typeVersion: 1, kind: 'output', technology: 'relay', polarity: 'sourcing', channels: 8, channelsPerGroup: 8, channelA: 2, groupA: 8, moduleA: null,
  channelPeakA: 4, dropV: 0, leakageA: 0, shortCircuitA: null, minLoadA: 0.01, ratedOperations: 20_000, inputType: null, inputA: null,
};
const inputs: Entry = {
  ...relay, name: 'Inputs', kind: 'input', technology: 'input', polarity: 'sinking', channelA: null, groupA: null, channelPeakA: null, minLoadA: null, ratedOperations: null, inputType: 3, inputA: 0.0026,
};
const coloured: Entry = { id: fourCore.id, name: 'Sensor cable', typeVersion: 1, crossSectionMm2: 1.5, conductorClass: 5, cores: 4, coreMarking: 'coloured', coreColours: ['BN', 'WH', 'BU', 'BK'] };
const supply: Entry = { id: fourCore.id, name: 'Supply', typeVersion: 1, ratedA: 10, deratingFromC: 50, deratingPercentPerK: 2.5, tolerancePercent: null, shortCircuitA: 60, extraLowVoltage: 'PELV' };
const grease: Entry = { id: fourCore.id, name: 'Grease', nlgi: '2', thickener: 'lithium complex', densityGPerCm3: 0.9 };

describe('bodyOf', () => {
  it.each([
    ['dispenserTypes', fourCore], ['moduleTypes', relay], ['moduleTypes', inputs], ['cableTypes', coloured],
    ['cableTypes', { ...coloured, coreMarking: 'numbered', coreColours: [] }], ['supplyTypes', supply], ['greases', grease],
  ] as const)('%s: a form left as it was gives the same data, and the API takes it', (kind, row) => {
    const view = kindView(kind);
    const values = formValueOf(view, row);
    expect([...formErrors(view, values)]).toEqual([]);
    const { typeVersion: _, ...data } = row;
    const body = bodyOf(view, values, row.id);
    expect(body).toEqual(data);
    expect(Value.Check(catalogueResources[kind].New, body)).toBe(true);
  });

  it('scales figures to what is stored', () => {
    const values = { ...formValueOf(dispensers, fourCore), cartridgesUl: '320; 60,5', idleA: '0.3', triggerMs: '0.7', doseMinUl: '0.15' };
    expect(bodyOf(dispensers, values, 'x')).toMatchObject({ cartridgesUl: [60_500, 320_000], idleA: 0.0003, triggerMs: 700, doseMinUl: 150 });
  });

  it('stores null for what a two-core type does not have, and no status where it has none', () => {
    const values = { ...formValueOf(dispensers, fourCore), wiring: 'two-core', hasStatus: 'no' };
    expect(bodyOf(dispensers, values, 'x')).toMatchObject({ triggerMs: null, controlInputA: null, controlOnV: null, status: null });
    expect(bodyOf(dispensers, values, 'x')['pins']).toEqual({ supply: '1', zero: '3' });
  });

  it('clears what belongs to outputs when a module becomes an input', () => {
    const values = { ...formValueOf(modules, relay), kind: 'input' };
    expect(bodyOf(modules, values, 'x')).toMatchObject({ technology: 'input', channelA: null, minLoadA: null, dropV: 0, inputType: 1 });
  });
});

describe('limits', () => {
  interface Limits { type?: string; minimum?: number; maximum?: number; exclusiveMinimum?: number; anyOf?: Limits[]; items?: Limits; properties?: Record<string, Limits> }

  it.each(KIND_VIEWS.flatMap((view) => fieldsOf(view).filter((f): f is NumberField => f.kind === 'number').map((field) => [view.kind, field.key, field] as const)))(
    '%s %s: those of the API', (kind, key, field) => {
      const limits = key.split('.').reduce<Limits>((at, part) => {
        const next = at.properties?.[part] ?? {};
        const inner = next.anyOf?.find((one) => one.type !== 'null') ?? next;
        return inner.items ?? inner;
      }, catalogueResources[kind].New as unknown as Limits);
      const scaled = (figure: number | undefined) => (figure === undefined ? undefined : Number((figure * (field.scale ?? 1)).toPrecision(12)));
      expect(field.max === Number.MAX_SAFE_INTEGER ? limits.maximum : scaled(field.max)).toBe(limits.maximum);
      expect(scaled(field.above)).toBe(limits.exclusiveMinimum);
      expect(scaled(field.min)).toBe(limits.minimum);
      expect(field.whole ?? false).toBe(limits.type === 'integer');
    });
});

describe('errors in words', () => {
  const field = (key: string) => fieldsOf(dispensers).find((one) => one.key === key)!;

  it.each([
    ['runA', '', 'Fill this in.'], ['runA', 'much', 'This is not a number.'], ['runA', '0', 'More than 0 A.'], ['runA', '101', 'At most 100 A.'],
    ['cartridgesUl', '', 'Fill this in.'], ['cartridgesUl', '80; x', 'This is not a number.'], ['doseMinUl', '0.0015', 'At most three decimals.'],
    ['maxSurfaceC', '', null], ['timedMonths', '', null], ['timedMonths', '1; 2.5', 'A whole number.'], ['pins.supply', '123456789012345678901', 'At most 20 characters.'],
  ])('%s "%s"', (key, text, words) => {
    expect(fieldError(field(key), text)).toBe(words);
  });

  it('names the field of two that do not agree', () => {
    const errors = formErrors(dispensers, { ...formValueOf(dispensers, fourCore), peakA: '0.2', doseMaxUl: '0.05' });
    expect([...errors.keys()]).toEqual(['doseMaxUl', 'peakA']);
  });

  it('keeps a new type from becoming a version of another by its name', () => {
    expect(nameError(' Four-core ', new Set(['Four-core']), true)).toContain('exists');
    expect(nameError('Other', new Set(['Four-core']), true)).toBeNull();
  });

  it('puts the words of the server at their fields, however it writes them', () => {
    const problem = { type: 'invalid-input', title: 'Some values are not possible', status: 422, errors: [
      { field: '/status/maxA', message: 'too much' }, { field: 'cartridgesUl.0', message: 'too small' }, { field: 'other', message: 'unknown' },
    ] };
    const { fields, rest } = serverErrors(dispensers, problem);
    expect([...fields]).toEqual([['status.maxA', 'too much'], ['cartridgesUl', 'too small']]);
    expect(rest).toBe('Some values are not possible. other: unknown');
  });
});

describe('figures', () => {
  it.each([['0,75', 0.75], ['−40', -40], ['.5', 0.5], ['1e3', null], ['', null], ['1.2.3', null]])('reads "%s"', (text, figure) => {
    expect(typedNumber(text)).toBe(figure);
  });

  it.each([['cartridgesUl', '80, 160\u2009cm³'], ['idleA', '20\u2009mA'], ['triggerMs', '0.5\u2009s'], ['status.leakageA', '0.2\u2009mA'], ['hasStatus', 'yes'], ['controlPolarity', 'sourcing, switches +24 V']])(
    'writes %s in its unit', (key, text) => {
      expect(fieldText(fieldsOf(dispensers).find((one) => one.key === key)!, fourCore)).toBe(text);
    });
});
