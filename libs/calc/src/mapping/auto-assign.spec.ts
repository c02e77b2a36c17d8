import { describe, expect, it } from 'vitest';
import type { Design } from '../design.ts';
import {
  buildAssignment, buildCircuit, buildDesign, buildFourCoreType, buildGroup, buildInputType, buildLane, buildModule, buildNode, buildOutputType, buildProject, buildTwoCoreType,
  type DesignParts,
} from '#support/design-builder.ts';
import { largeDesign } from '#support/large-design.ts';
import { assess } from '../assess.ts';
import { autoAssign, type Proposed } from './auto-assign.ts';

const names = (count: number): string[] => Array.from({ length: count }, (_, i) => `P-${i + 1}`);
const twoCore = (name: string, rest = {}) => buildLane(name, { typeId: 'type-2', wiring: 'two-core', ...rest });

function cabinet(parts: DesignParts): Design {
  return buildDesign({
    modules: [buildModule(), buildModule({ id: 'DI1', name: 'DI1', typeId: 'in-16', slot: 2 })],
    moduleGroups: [buildGroup('DO1', 0), buildGroup('DO1', 1)],
    ...parts,
  });
}

/** The design as it stands once a proposal is taken over. */
function accepted(design: Design, proposed: readonly Proposed[]): Design {
  const rows = proposed.map((p) => buildAssignment(p.dispenserId, p.moduleId, p.channel, p.purpose));
  return { ...design, assignments: [...design.assignments, ...rows] };
}

describe('autoAssign', () => {
  it('gives four-core lanes an output and an input, in the order of their tags by value', () => {
    const { proposed, unplaced } = autoAssign(cabinet({ lanes: ['P-10', 'P-2', 'P-1'].map((name) => buildLane(name)) }));
    expect(proposed).toEqual([
      { dispenserId: 'P-1', moduleId: 'DO1', channel: 0, purpose: 'control' },
      { dispenserId: 'P-2', moduleId: 'DO1', channel: 1, purpose: 'control' },
      { dispenserId: 'P-10', moduleId: 'DO1', channel: 2, purpose: 'control' },
      { dispenserId: 'P-1', moduleId: 'DI1', channel: 0, purpose: 'status' },
      { dispenserId: 'P-2', moduleId: 'DI1', channel: 1, purpose: 'status' },
      { dispenserId: 'P-10', moduleId: 'DI1', channel: 2, purpose: 'status' },
    ]);
    expect(unplaced).toEqual([]);
  });

  it('never touches what is mapped, and takes only those asked for', () => {
    const design = cabinet({ lanes: names(3).map((name) => twoCore(name)), assignments: [buildAssignment('P-2', 'DO1', 0)] });
    expect(autoAssign(design, ['P-2', 'P-3']).proposed).toEqual([{ dispenserId: 'P-3', moduleId: 'DO1', channel: 1, purpose: 'control' }]);
  });

  it('gives a dispenser on its own clock no output, but an input', () => {
    const { proposed } = autoAssign(cabinet({ lanes: [buildLane('P-1', { method: 'timed', periodMonths: 6 })] }));
    expect(proposed.map((p) => p.purpose)).toEqual(['status']);
  });

  it('keeps the spare channels and says so', () => {
    const { proposed, unplaced } = autoAssign(cabinet({ lanes: names(14).map((name) => twoCore(name)) }));
    expect(proposed).toHaveLength(12);
    expect(unplaced[0].reason).toContain('Only spare channels are left');
  });

  it('stops where a group would be over its rating under the limits', () => {
    const parts = {
      lanes: names(8).map((name) => twoCore(name)),
      moduleTypes: [buildOutputType({ groupA: 0.6 }), buildInputType()],
      project: buildProject({ sparePercent: 0 }),
    };
    expect(autoAssign(cabinet(parts)).proposed).toHaveLength(4);
    expect(autoAssign(cabinet(parts)).unplaced[0].reason).toContain('over its rating');
    expect(autoAssign(cabinet({ ...parts, circuits: [buildCircuit({ concurrencyLimit: 2 })] })).proposed).toHaveLength(8);
  });

  it('keeps to groups that its own circuit feeds', () => {
    const other = buildCircuit({ id: 'other', name: 'C2' });
    const design = cabinet({
      lanes: [twoCore('P-1', { circuitId: 'other' }), twoCore('P-2')],
      circuits: [buildCircuit(), other],
      moduleGroups: [buildGroup('DO1', 0), buildGroup('DO1', 1, 'other')],
    });
    expect(autoAssign(design).proposed.map((p) => [p.dispenserId, p.channel])).toEqual([['P-2', 0], ['P-1', 8]]);
  });

  it('lets the first lane of an unfed group claim it for its circuit', () => {
    const design = cabinet({
      lanes: [twoCore('P-1'), twoCore('P-2', { circuitId: 'other' })],
      circuits: [buildCircuit(), buildCircuit({ id: 'other', name: 'C2' })],
      moduleGroups: [],
    });
    expect(autoAssign(design).proposed.map((p) => p.channel)).toEqual([0, 8]);
  });

  it('takes a relay only where no transistor is left', () => {
    const relay = buildOutputType({ id: 'relay', technology: 'relay', channels: 8, minLoadA: 0.01, ratedOperations: 100_000 });
    const design = cabinet({
      lanes: names(10).map((name) => twoCore(name)),
      project: buildProject({ sparePercent: 0 }),
      moduleTypes: [buildOutputType({ channels: 8 }), relay],
      modules: [buildModule({ id: 'RO1', name: 'RO1', typeId: 'relay', slot: 0 }), buildModule()],
      moduleGroups: [buildGroup('RO1', 0), buildGroup('DO1', 0)],
    });
    expect(autoAssign(design).proposed.map((p) => p.moduleId)).toEqual([...Array<string>(7).fill('DO1'), 'RO1', 'RO1', 'RO1']);
  });

  it('fills a group that has neighbours of the same box first', () => {
    const design = cabinet({
      lanes: [twoCore('P-1', { nodeId: 'box' }), twoCore('P-2', { nodeId: 'far' }), twoCore('P-9', { nodeId: 'far' })],
      cableNodes: [buildNode(), buildNode({ id: 'far', location: '+JB2', cableTag: '-W2' })],
      assignments: [buildAssignment('P-9', 'DO1', 8)],
    });
    expect(autoAssign(design).proposed.map((p) => [p.dispenserId, p.channel])).toEqual([['P-1', 0], ['P-2', 9]]);
  });

  it.each([
    { reason: 'no module of this kind', parts: { modules: [] } },
    { reason: 'polarity', parts: { moduleTypes: [buildOutputType({ polarity: 'sinking' })] } },
    { reason: 'leak more', parts: { moduleTypes: [buildOutputType({ leakageA: 0.002 })] } },
    { reason: 'rated for its load', parts: { moduleTypes: [buildOutputType({ channelA: 0.1 })] } },
    { reason: 'fed by other circuits', parts: { circuits: [buildCircuit(), buildCircuit({ id: 'x' })], moduleGroups: [buildGroup('DO1', 0, 'x'), buildGroup('DO1', 1, 'x')] } },
    { reason: 'type or wiring', parts: { dispenserTypes: [] } },
  ])('says why: $reason', ({ reason, parts }) => {
    const { unplaced } = autoAssign(cabinet({ lanes: [twoCore('P-1')], dispenserTypes: [buildTwoCoreType()], ...parts }));
    expect(unplaced[0].reason).toContain(reason);
  });

  it('takes no input that asks for more than the status output delivers, its type’s least current counted (SG-07)', () => {
    const input = buildInputType({ inputType: 2, inputA: 0.002 });
    const type = buildFourCoreType({ status: { polarity: 'sourcing', maxA: 0.004, dropV: 1, leakageA: 0 } });
    const { unplaced } = autoAssign(cabinet({ lanes: [buildLane('P-1')], dispenserTypes: [type], moduleTypes: [buildOutputType(), input] }));
    expect(unplaced).toMatchObject([{ purpose: 'status', reason: expect.stringContaining('more current than its status output') as string }]);
  });

  it('takes no relay whose least load the smallest current of a constant-power load misses', () => {
    const relay = buildOutputType({ technology: 'relay', minLoadA: 0.28, ratedOperations: 100_000 });
    const type = buildTwoCoreType({ load: 'constant-power' });
    expect(autoAssign(cabinet({ lanes: [twoCore('P-1')], dispenserTypes: [type], moduleTypes: [relay] })).proposed).toEqual([]);
  });

  it('places a thousand lanes so that no mapping or load finding is left, each time alike', () => {
    const design = largeDesign(1000, 64, false);
    const first = autoAssign(design);
    expect(first.unplaced).toEqual([]);
    expect(autoAssign(structuredClone(design))).toEqual(first);
    const codes = assess(accepted(design, first.proposed)).findings.map((f) => f.code);
    expect(codes.filter((code) => /^(MP|IO|SP)/.test(code) && code !== 'IO-04' && code !== 'IO-06')).toEqual([]);
  });
});
