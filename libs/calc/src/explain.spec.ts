import { describe, expect, it } from 'vitest';
import type { Assessment, LaneFigureName, LaneFigures } from './assessment.ts';
import type { Design, Dispenser, Point, Project } from './design.ts';
import { explainLane } from './explain.ts';
import { assessPoint } from './points/lubrication.ts';
import { aBearingPoint, aDispenser, aGrease, aPoint, aProject, aType } from './points/testing/rows.ts';

interface Changes { readonly point?: Point; readonly dispenser?: Partial<Dispenser>; readonly project?: Partial<Project>; readonly lane?: Partial<LaneFigures> }

/** One lane on one circuit; electrical figures are set by hand, since only their telling is tested here. */
function laneOf({ point = aBearingPoint(), dispenser: changes = {}, project: policies = {}, lane = {} }: Changes = {}): [Design, Assessment] {
  const [project, dispenser, type, grease] = [aProject(policies), aDispenser({ circuitId: 'circuit', ...changes }), aType(), aGrease()];
  const { figures, plan, timed, findings } = assessPoint({ project, point, dispenser, type, grease });
  const design: Design = {
    project, dispenserTypes: [type], moduleTypes: [{
      id: 'output', name: 'Output module, 16 × 24 V DC 0.5 A', typeVersion: 2, kind: 'output', technology: 'transistor', polarity: 'sourcing',
      channels: 16, channelsPerGroup: 8, channelA: 0.5, groupA: 1.5, moduleA: null, channelPeakA: null, dropV: 0.5, leakageA: 0, shortCircuitA: null,
      minLoadA: null, ratedOperations: null, inputType: null, inputA: null,
    }],
    cableTypes: [], supplyTypes: [], greases: [grease], points: [point, aPoint({ id: 'other', tag: 'GC1-LP12' })],
    dispensers: [dispenser, aDispenser({ id: 'neighbour', pointId: 'other' })], cabinets: [], controllers: [],
    modules: [{ id: 'module', controllerId: 'plc', typeId: 'output', name: 'DO1', baseByte: 4, slot: 1 }], moduleGroups: [],
    supplies: [{ id: 'supply', cabinetId: 'cabinet', typeId: 'supply-type', name: '-T1', setV: 24.5, internalOhm: 0, otherLoadA: 0, redundant: false }],
    circuits: [{ id: 'circuit', supplyId: 'supply', name: 'C1', protection: 'electronic', protectionA: 4, protectionOhm: 0, concurrencyLimit: 3 }],
    cableNodes: [], assignments: [{ id: 'a', dispenserId: 'dispenser', moduleId: 'module', channel: 0, purpose: 'control' }],
  };
  const set = { volts: 21.37, worstSet: ['dispenser', 'neighbour'] };
  const figuresOfLane: LaneFigures = {
    plan, timed, outputAddress: '%QX4.0', statusAddress: null, outputGroup: 'module/0', channelA: 0.008, runLengthM: 84,
    worst: set, allOn: { ...set, volts: 17.91 }, aloneV: 24.04, idle: { ...set, volts: 22.02 }, minV: 18, collapsed: false,
    smallestPassingMm2: null, pulseLevelV: 22.5, statusLevelV: 21.66,
    profile: [{ label: '-T1', metres: 0, worstV: 24.01, aloneV: 24.5 }, { label: '+JB1', metres: 50, worstV: 22.5, aloneV: 24.2 }], ...lane,
  };
  const load = { worstA: 1.671, allOnA: 2.4, ratingA: 1.5, worstSet: ['dispenser', 'neighbour'], used: 1, channels: 8 };
  return [design, {
    points: new Map([[point.id, figures]]), lanes: new Map([['dispenser', figuresOfLane]]), groups: new Map([['module/0', load]]), modules: new Map(), circuits: new Map(),
    supplies: new Map([['supply', { standingA: 0.6, worstA: 1.2, allOnA: 6, demandA: 1.5, ratingA: 5, headroomA: 3.5, headroomDispensers: 17, lowestV: 24.01 }]]),
    findings, findingsByLane: new Map(),
  }];
}

function explain(figure: LaneFigureName, changes: Changes = {}) {
  return explainLane(...laneOf(changes), 'dispenser', figure);
}

const ALL: readonly LaneFigureName[] = [
  'demand', 'interval', 'pulses', 'life', 'lifeDays', 'changes', 'over', 'worstVoltage', 'allOnVoltage', 'aloneVoltage', 'idleVoltage',
  'channelLoad', 'groupLoad', 'supplyLoad', 'pulseLevel', 'statusLevel',
];

describe('explainLane', () => {
  it.each(ALL)('explains %s with formula, inputs, rounding, source and use', (figure) => {
    const told = explain(figure)!;
    expect(told.inputs.length).toBeGreaterThan(0);
    expect(told.rounding.length).toBeGreaterThan(0);
    expect(told.usedBy.length).toBeGreaterThan(0);
    for (const text of [told.title, told.formula, told.substituted, told.result, told.source]) expect(text).not.toBe('');
    expect(JSON.stringify(told)).not.toMatch(/undefined|NaN|null|Infinity/);
  });

  it('puts the bearing’s numbers into the formula', () => {
    expect(explain('demand')).toMatchObject({
      substituted: 'G = 0.005 × 180 × 46 = 41.40 g; T = 1 × (14·10⁶ ÷ (1000 × √100) − 4 × 100) = 1,000.0 h; demand = 1,000 h × 41.40 g ÷ (0.9 g/cm³ × 1,000.0 h)',
      result: '46.0\u2009cm³/1,000\u00a0h',
    });
  });

  it.each([
    ['100h', '1,000 h × 50.0\u2009cm³ ÷ 100 h'], ['week', '1,000 h × 50.0\u2009cm³ ÷ (7 × 16 h)'],
    ['running-day', '1,000 h × 50.0\u2009cm³ ÷ 16 h'], ['month', '1,000 h × 50.0\u2009cm³ ÷ (30.4375 × 7 ÷ 7 × 16 h)'],
  ] as const)('tells a demand stated per %s', (statedPer, substituted) => {
    expect(explain('demand', { point: aPoint({ statedPer }) })!.substituted).toBe(substituted);
  });

  it('tells a demand from practice', () => {
    const point = aPoint({ demandWay: 'practice', practiceStrokes: 3, practiceGramsPerStroke: 1.2, practiceEveryDays: 14 });
    expect(explain('demand', { point })!.substituted).toContain('3 × 1.2 g');
  });

  it('shows each rounding of the interval, the slot only where there is one', () => {
    expect(explain('interval')!.rounding).toHaveLength(1);
    expect(explain('interval', { project: { slotMs: 120_000 } })!.rounding.map((each) => each.value))
      .toEqual(['4\u2009h 20\u2009min 52.173\u2009s', '4\u2009h 20\u2009min 0\u2009s']);
  });

  it('lists the worst set by tag, the conductor temperature, the lowest supply and the drops', () => {
    const { inputs, result, substituted } = explain('worstVoltage')!;
    const values = new Map(inputs.map((each) => [each.name, each]));
    expect(values.get('worst set')!.value).toBe('GC1-LP11, GC1-LP12');
    expect(values.get('conductor temperature')!.value).toBe('40\u2009°C');
    expect(values.get('lowest supply')!.value).toBe('24.0\u2009V');
    expect(values.get('at once')!.value).toBe('at most 3');
    expect(values.get('+JB1, 50\u2009m')!.source).toBe('drop 1.51\u2009V');
    expect(result).toBe('21.3\u2009V');
    expect(substituted).toBe('24.01\u2009V − 2.64\u2009V = 21.37\u2009V');
  });

  it('explains a dispenser on its own clock, which has no interval', () => {
    const dispenser = { method: 'timed', doseUl: null, periodMonths: 6 } as const;
    expect(explain('lifeDays', { dispenser })!.result).toBe('182\u2009d');
    expect(explain('life', { dispenser })!.substituted).toBe('6 × 730.5 h');
    expect(explain('changes', { dispenser })!.result).toBe('2.0');
    expect(explain('over', { dispenser })!.inputs.map((each) => each.name)).toContain('period');
    expect(explain('interval', { dispenser })).toBeNull();
  });

  it('has nothing to say where the figure is not there', () => {
    const lane = { worst: null, allOn: null, idle: null, aloneV: null, channelA: null, outputGroup: null, pulseLevelV: null, statusLevelV: null };
    const point = aPoint({ statedUl: null });
    expect(ALL.filter((figure) => explain(figure, { point, lane }) !== null)).toEqual(['supplyLoad']);
    expect(explainLane(...laneOf(), 'nobody', 'demand')).toBeNull();
  });
});
