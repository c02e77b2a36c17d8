import { describe, expect, it } from 'vitest';
import { buildAssignment, buildCircuit, buildDesign, buildGroup, buildLane, buildModule, buildNode } from '#support/design-builder.ts';
import { assess } from './assess.ts';

const names = ['P-01', 'P-02', 'P-03', 'P-04'];
const design = buildDesign({
  lanes: names.map((name) => buildLane(name, { typeId: 'type-2', wiring: 'two-core', nodeId: 'box' })),
  cableNodes: [buildNode()],
  circuits: [buildCircuit({ concurrencyLimit: 2 })],
  modules: [buildModule()],
  moduleGroups: [buildGroup('DO1', 0), buildGroup('DO1', 1)],
  assignments: names.map((name, i) => buildAssignment(name, 'DO1', i)),
});

describe('assess', () => {
  it('gives figures for every lane, group, module, circuit and supply', () => {
    const result = assess(design);
    expect([...result.lanes.keys()]).toEqual(names);
    expect(result.groups.get('DO1/0')?.worstA).toBeCloseTo(0.56, 12);
    expect(result.groups.get('DO1/0')?.allOnA).toBeCloseTo(1.12, 12);
    expect(result.modules.get('DO1')).toMatchObject({ used: 4, free: 12 });
    expect(result.circuits.get('circuit')).toMatchObject({ dispensers: 4, largestPassingK: 4 });
    expect(result.supplies.get('supply')?.demandA).toBeCloseTo(0.7, 12);
    expect(result.lanes.get('P-01')).toMatchObject({ outputAddress: '%QX4.0', outputGroup: 'DO1/0', runLengthM: 50 });
  });

  it('gives the same findings, in the same order, for the same design', () => {
    const findings = assess(design).findings;
    expect(assess(structuredClone(design)).findings).toEqual(findings);
    const rank = findings.map((f) => ['error', 'warning', 'note'].indexOf(f.severity));
    expect(rank).toEqual([...rank].sort());
    expect(new Set(findings.map((f) => f.key)).size).toBe(findings.length);
  });

  it('never throws on a design of blanks', () => {
    const blank = buildLane('P-01', {
      typeId: null, wiring: null, cartridgeUl: null, doseUl: null, controllerId: null, circuitId: null, nodeId: null, cableLengthM: null, crossSectionMm2: null,
    }, { demandWay: null, hoursPerDay: null, zone: null });
    const result = assess(buildDesign({ lanes: [blank] }));
    expect(result.lanes.get('P-01')?.worst).toBeNull();
    expect(result.findings.map((f) => f.code)).toEqual(expect.arrayContaining(['MP-12', 'AR-03']));
  });

  it('never throws on rows that point nowhere', () => {
    const lost = buildLane('P-01', { typeId: 'gone', circuitId: 'gone', nodeId: 'gone', controllerId: 'gone' });
    const torn = buildDesign({
      lanes: [lost],
      supplies: [],
      modules: [buildModule({ typeId: 'gone', controllerId: 'gone' })],
      assignments: [buildAssignment('P-01', 'gone', 3), buildAssignment('gone', 'DO1', 99)],
    });
    expect(() => assess(torn)).not.toThrow();
  });
});
