import { describe, expect, it } from 'vitest';
import {
  buildAssignment, buildCircuit, buildDesign, buildGroup, buildLane, buildModule, buildNode, buildProject, buildSupply, type DesignParts,
} from '#support/design-builder.ts';
import { assess } from '../assess.ts';
import type { Finding } from '../findings.ts';

const fed = { modules: [buildModule()], moduleGroups: [buildGroup('DO1', 0), buildGroup('DO1', 1)] };
const input = buildModule({ id: 'DI1', name: 'DI1', typeId: 'in-16', slot: 2 });

function found(code: string, parts: DesignParts): Finding | undefined {
  return assess(buildDesign(parts)).findings.find((f) => f.code === code);
}

describe('mapping findings', () => {
  it('warns of a pulsed lane without output and of a four-core lane without status input', () => {
    expect(found('MP-01', {})).toMatchObject({ severity: 'warning', dispenserIds: ['P-01'] });
    expect(found('MP-02', {})).toMatchObject({ severity: 'warning', dispenserIds: ['P-01'] });
  });

  it('asks for neither where the lane cannot have it', () => {
    expect(found('MP-01', { lanes: [buildLane('P-01', { method: 'timed' })] })).toBeUndefined();
    expect(found('MP-02', { lanes: [buildLane('P-01', { typeId: 'type-2', wiring: 'two-core' })] })).toBeUndefined();
  });

  it('finds a control output for a dispenser on its own clock', () => {
    expect(found('MP-09', { ...fed, lanes: [buildLane('P-01', { method: 'timed' })], assignments: [buildAssignment('P-01', 'DO1', 0)] })).toBeDefined();
  });

  it('finds a group that another circuit feeds, and asks for the bond where the supply differs too', () => {
    const parts = {
      modules: [buildModule()],
      moduleGroups: [buildGroup('DO1', 0, 'other')],
      supplies: [buildSupply(), buildSupply({ id: 'second', name: '-T2' })],
      circuits: [buildCircuit(), buildCircuit({ id: 'other', name: 'C2', supplyId: 'second' })],
      assignments: [buildAssignment('P-01', 'DO1', 0)],
    };
    expect(found('MP-03', parts)).toMatchObject({ title: 'Its output group is fed by C2, the lane belongs to C1' });
    expect(found('MP-03', parts)?.detail).toContain('must be bonded');
  });

  it('finds a group in use that nobody feeds', () => {
    expect(found('MP-04', { modules: [buildModule()], assignments: [buildAssignment('P-01', 'DO1', 9)] })).toMatchObject({ subject: { id: 'DO1/1' } });
  });

  it('finds a channel beyond the module, of the wrong kind, used twice, and a signal mapped twice', () => {
    expect(found('MP-05', { ...fed, assignments: [buildAssignment('P-01', 'DO1', 16)] })?.title).toContain('channels 0 to 15');
    expect(found('MP-06', { modules: [input], assignments: [buildAssignment('P-01', 'DI1', 0)] })?.title).toContain('input module');
    const lanes = [buildLane('P-01'), buildLane('P-02')];
    expect(found('MP-07', { ...fed, lanes, assignments: [buildAssignment('P-01', 'DO1', 3), buildAssignment('P-02', 'DO1', 3)] })?.dispenserIds).toEqual(['P-01', 'P-02']);
    const twice = [buildAssignment('P-01', 'DO1', 3), { ...buildAssignment('P-01', 'DO1', 4), id: 'again' }];
    expect(found('MP-08', { ...fed, assignments: twice })).toBeDefined();
  });

  it('finds a module of another controller and a lane without circuit', () => {
    const controllers = ['controller', 'second'].map((id, i) => ({ id, cabinetId: 'cabinet', name: `PLC${i + 1}` }));
    const parts = { ...fed, controllers, lanes: [buildLane('P-01', { controllerId: 'second' })], assignments: [buildAssignment('P-01', 'DO1', 0)] };
    expect(found('MP-10', parts)?.title).toBe('Its control signal is on PLC1 DO1, it belongs to PLC2');
    expect(found('MP-12', { lanes: [buildLane('P-01', { circuitId: null })] })).toBeDefined();
  });

  it('counts spare channels for each cabinet and kind', () => {
    const lanes = Array.from({ length: 13 }, (_, i) => buildLane(`P-${i}`));
    const assignments = lanes.map((lane, i) => buildAssignment(lane.dispenser.id, 'DO1', i));
    expect(found('SP-01', { ...fed, lanes, assignments })).toMatchObject({ title: '3 of 16 output channels free, policy 4', subject: { label: '+K1' } });
    expect(found('SP-01', { ...fed, lanes, assignments, project: buildProject({ sparePercent: 18.75 }) })).toBeUndefined();
  });
});

describe('tags and designations', () => {
  it('finds a cable tag on two cables, trunks included', () => {
    const lanes = [buildLane('P-01', { cableTag: '-W7' }), buildLane('P-02', { cableTag: '-W8' })];
    expect(found('CB-03', { lanes, cableNodes: [buildNode({ cableTag: '-W9' })] })).toBeUndefined();
    expect(found('CB-03', { lanes, cableNodes: [buildNode({ cableTag: '-W8' })] })).toMatchObject({ title: '-W8 is the tag of 2 cables: P-02, trunk to +JB1', dispenserIds: ['P-02'] });
  });

  it('finds a designation used twice, yet lets a function and location be shared', () => {
    const at = (name: string, product: string) => buildLane(name, {}, { function: '=T1', location: '+G1', product });
    expect(found('TG-01', { lanes: [at('P-01', '-GP01'), at('P-02', '-GP01')] })?.title).toContain('=T1+G1-GP01 designates 2 things');
    expect(found('TG-01', { lanes: [at('P-01', '-GP01'), at('P-02', '-GP02')] })).toBeUndefined();
  });
});
