import { describe, expect, it } from 'vitest';
import {
  buildAssignment, buildCircuit, buildDesign, buildFourCoreType, buildGroup, buildInputType, buildLane, buildModule, buildNode, buildOutputType,
  buildProject, buildSupply, buildSupplyType, buildTwoCoreType, type DesignParts,
} from '#support/design-builder.ts';
import { assess } from '../assess.ts';
import type { Finding } from '../findings.ts';
import { ohmPerMetre } from './conductor.ts';
import { allPositive, largestPositive } from './largest.ts';

const mapped = {
  modules: [buildModule(), buildModule({ id: 'DI1', name: 'DI1', typeId: 'in-16', slot: 2 })],
  moduleGroups: [buildGroup('DO1', 0), buildGroup('DO1', 1)],
  assignments: [buildAssignment('P-01', 'DO1', 0), buildAssignment('P-01', 'DI1', 0, 'status')],
};

function solved(parts: DesignParts) {
  const result = assess(buildDesign(parts));
  return { result, lane: result.lanes.get('P-01')!, find: (code: string): Finding | undefined => result.findings.find((f) => f.code === code) };
}

describe('largestPositive', () => {
  it('takes the largest, the earlier of equal ones, and nothing that does not add', () => {
    const values = Float64Array.of(1, 3, -2, 3, 0, 2);
    expect([...largestPositive(values, 3)]).toEqual([1, 3, 5]);
    expect([...largestPositive(values, 1)]).toEqual([1]);
    expect([...largestPositive(values, 99)]).toEqual([1, 3, 5, 0]);
    expect([...largestPositive(values, 0)]).toEqual([]);
    expect([...allPositive(values)]).toEqual([0, 1, 3, 5]);
  });
});

describe('conductors', () => {
  it('refuse a section that no table holds', () => {
    expect(() => ohmPerMetre(1.2, 5, 20)).toThrow(RangeError);
    expect(() => ohmPerMetre(1.5, 5, NaN)).toThrow(RangeError);
  });
});

describe('voltages of one lane', () => {
  it('count both conductors of a four-core lane, and its pulse on the return', () => {
    const own = 30 * ohmPerMetre(0.75, 5, 40);
    expect(solved({}).lane.worst!.volts).toBeCloseTo(24 * 0.99 - own * (0.25 + 0.255), 12);
    expect(solved({}).lane.idle!.volts).toBeCloseTo(24 * 0.99 - 2 * own * 0.02, 12);
    expect(solved({}).lane.aloneV).toBeCloseTo(24 - own * (0.25 + 0.255), 12);
  });

  it('count the output and the own signal core of a two-core lane', () => {
    const { lane } = solved({ ...mapped, lanes: [buildLane('P-01', { typeId: 'type-2', wiring: 'two-core', nodeId: 'box' })], cableNodes: [buildNode()] });
    const ohm = 20 * (ohmPerMetre(2.5, 5, 40) + ohmPerMetre(1, 5, 40)) + 60 * ohmPerMetre(0.75, 5, 40);
    expect(lane.worst!.volts).toBeCloseTo(24 * 0.99 - 0.5 - 0.28 * ohm, 12);
    expect(lane.idle).toBeNull();
    expect(lane.profile.map((s) => [s.label, s.metres])).toEqual([['Supply -T1', 0], ['Terminals C1', 0], ['+JB1', 20], ['Device', 50]]);
  });

  it('let circuits meet in the resistance of their supply, each with its own k', () => {
    const lanes = [buildLane('P-01'), ...['A', 'B', 'C'].map((name) => buildLane(name, { circuitId: 'second' }))];
    const volts = (k: number | null): number => solved({
      lanes, supplies: [buildSupply({ internalOhm: 0.1 })], circuits: [buildCircuit(), buildCircuit({ id: 'second', name: 'C2', concurrencyLimit: k })],
    }).lane.worst!.volts;
    expect(volts(1) - volts(2)).toBeCloseTo(0.1 * 0.235, 12);
    expect(volts(2) - volts(null)).toBeCloseTo(0.1 * 0.235, 12);
  });

  it('count a lane on its own clock always, beside k', () => {
    const volts = (method: 'timed' | 'pulse'): number => solved({
      lanes: [buildLane('P-01'), buildLane('T', { method })], supplies: [buildSupply({ internalOhm: 0.1 })], circuits: [buildCircuit({ concurrencyLimit: 1 })],
    }).lane.worst!.volts;
    expect(volts('pulse') - volts('timed')).toBeCloseTo(0.1 * 0.23, 12);
  });

  it('are found too low, with the k and the section that would do', () => {
    const lanes = ['P-01', 'P-02', 'P-03'].map((name) => buildLane(name, { nodeId: 'box' }));
    const { find, lane } = solved({ lanes, cableNodes: [buildNode({ lengthM: 120, powerMm2: 1.5 })], supplyTypes: [buildSupplyType({ tolerancePercent: 5 })] });
    expect(find('VD-01')).toMatchObject({ severity: 'error', source: 'type data', remedy: 'Set k to 2 on C1, or lay its own cable in 2.5\u2009mm².' });
    expect(find('VD-01')?.title).toMatch(/^19\.\d\u2009V while 3 run, needs 20\.0\u2009V$/);
    expect(lane.smallestPassingMm2).toBe(2.5);
  });

  it('are unknown behind a blank, an odd section or a loop, with a finding each', () => {
    expect(solved({ lanes: [buildLane('P-01', { cableLengthM: null })] }).find('CB-01')?.title).toBe('The cable has no length');
    const odd = solved({ lanes: [buildLane('P-01', { crossSectionMm2: 1.2 })] });
    expect(odd.find('CB-02')).toBeDefined();
    expect(odd.lane).toMatchObject({ worst: null, collapsed: false });
    const trunk = solved({ lanes: [buildLane('P-01', { nodeId: 'box' })], cableNodes: [buildNode({ powerMm2: 3 })] });
    expect(trunk.find('CB-02')).toMatchObject({ subject: { kind: 'cable', label: '-W1' } });
    const loop = solved({
      lanes: [buildLane('P-01', { nodeId: 'box' })], cableNodes: [buildNode({ parentId: 'b2' }), buildNode({ id: 'b2', parentId: 'box', location: '+JB2', cableTag: '-W2' })],
    });
    expect(loop.find('CB-05')).toBeDefined();
    expect(loop.lane.worst).toBeNull();
    expect(solved({ lanes: [buildLane('P-01', { nodeId: 'elsewhere' })] }).find('CB-04')).toBeDefined();
  });
});

describe('signals', () => {
  const own = 30 * ohmPerMetre(0.75, 5, 40);

  it('reach device and input with the drops on their own way', () => {
    const { lane } = solved(mapped);
    expect(lane.pulseLevelV).toBeCloseTo(23.76 - 0.5 - 0.005 * own - 0.255 * own, 12);
    expect(lane.statusLevelV).toBeCloseTo(23.76 - 0.25 * own - 1 - 0.0025 * own, 12);
  });

  it.each([
    { code: 'SG-01', type: { controlOnV: 23.2 }, output: {}, input: {} },
    { code: 'SG-02', type: { status: { polarity: 'sourcing' as const, maxA: 0.05, dropV: 13, leakageA: 0 } }, output: {}, input: {} },
    { code: 'SG-03', type: { controlPolarity: 'sinking' as const }, output: {}, input: {} },
    { code: 'SG-04', type: {}, output: {}, input: { polarity: 'sourcing' as const } },
    { code: 'SG-05', type: {}, output: { leakageA: 0.002 }, input: {} },
    { code: 'SG-06', type: { status: { polarity: 'sourcing' as const, maxA: 0.05, dropV: 1, leakageA: 0.0016 } }, output: {}, input: {} },
    { code: 'SG-07', type: {}, output: {}, input: { inputType: 2 as const, inputA: 0.06 } },
  ])('$code is found', ({ code, type, output, input }) => {
    const parts = { ...mapped, dispenserTypes: [buildFourCoreType(type)], moduleTypes: [buildOutputType(output), buildInputType(input)] };
    expect(solved(parts).find(code)).toMatchObject({ severity: 'error', dispenserIds: ['P-01'] });
    expect(solved(mapped).find(code)).toBeUndefined();
  });
});

describe('protection', () => {
  it('does not trip at once at the far end of a thin cable, and the finding names remedies', () => {
    const { find, result } = solved({ lanes: [buildLane('P-01', { cableLengthM: 100 })] });
    const loop = 200 * ohmPerMetre(0.75, 5, 70);
    expect(result.circuits.get('circuit')).toMatchObject({ tripA: 6 * 5 * 1.5, shortCircuitAt: 'P-01' });
    expect(result.circuits.get('circuit')!.shortCircuitA).toBeCloseTo(23.76 / loop, 9);
    expect(find('PR-02')?.remedy).toBe('Choose electronic protection, a smaller rating, or a supply that delivers 45.00\u2009A.');
  });

  it('is limited by what the supply can deliver', () => {
    const { find, result } = solved({ lanes: [buildLane('P-01', { cableLengthM: 1 })] });
    expect(result.circuits.get('circuit')!.shortCircuitA).toBe(15);
    expect(find('PR-06')).toBeDefined();
  });

  it('trips electronically above its rating with margin, and leaves a fuse to its curve', () => {
    const electronic = { lanes: [buildLane('P-01', { cableLengthM: 20 })], circuits: [buildCircuit({ protection: 'electronic', protectionA: 4 })] };
    expect(solved(electronic).result.circuits.get('circuit')!.tripA).toBe(6);
    expect(solved(electronic).find('PR-07')).toBeUndefined();
    expect(solved({ circuits: [buildCircuit({ protection: 'fuse' })] }).find('PR-03')).toMatchObject({ severity: 'note' });
  });

  it('leaves a two-core lane to the output that limits itself', () => {
    const { find, result } = solved({ ...mapped, lanes: [buildLane('P-01', { typeId: 'type-2', wiring: 'two-core' })] });
    expect(find('PR-04')).toMatchObject({ dispenserIds: ['P-01'] });
    expect(result.circuits.get('circuit')!.shortCircuitA).toBeNull();
  });

  it('carries the worst set', () => {
    const lanes = Array.from({ length: 5 }, (_, i) => buildLane(`P-0${i + 1}`, { typeId: 'type-2', wiring: 'two-core', cableLengthM: 1 }));
    const types = { dispenserTypes: [buildTwoCoreType({ runA: 0.5 })], project: buildProject() };
    const at = (k: number | null) => solved({ ...types, lanes, circuits: [buildCircuit({ protectionA: 2, concurrencyLimit: k })] });
    expect(at(null).find('PR-01')?.remedy).toBe('Set k to 4 on C1, or split the circuit.');
    expect(at(4).find('PR-01')).toBeUndefined();
    expect(at(4).find('PR-05')).toMatchObject({ severity: 'note' });
  });
});
