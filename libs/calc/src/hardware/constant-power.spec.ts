import { describe, expect, it } from 'vitest';
import {
  buildAssignment, buildCircuit, buildDesign, buildFourCoreType, buildGroup, buildLane, buildModule, buildNode, buildOutputType, buildSupply, buildTwoCoreType,
  type DesignParts,
} from '#support/design-builder.ts';
import { assess } from '../assess.ts';
import type { Finding } from '../findings.ts';

/** Six two-core lanes of constant power at the end of a long trunk. */
function far(k: number | null, runA = 0.28, parts: DesignParts = {}) {
  const lanes = Array.from({ length: 6 }, (_, i) => buildLane(`P-${i}`, { typeId: 'type-2', wiring: 'two-core', nodeId: 'box' }));
  const result = assess(buildDesign({
    lanes,
    dispenserTypes: [buildTwoCoreType({ load: 'constant-power', runA })],
    cableNodes: [buildNode({ lengthM: 100 })],
    modules: [buildModule()],
    moduleGroups: [buildGroup('DO1', 0)],
    assignments: lanes.map((_, i) => buildAssignment(`P-${i}`, 'DO1', i)),
    circuits: [buildCircuit({ concurrencyLimit: k })],
    ...parts,
  }));
  return { result, find: (code: string): Finding | undefined => result.findings.find((f) => f.code === code) };
}

describe('loads with all on, constant power', () => {
  it('are those at the voltages with all on, whatever k is', () => {
    const [limited, all] = [far(2).result, far(null).result];
    expect(limited.circuits.get('circuit')!.allOnA).toBeCloseTo(all.circuits.get('circuit')!.worstA, 9);
    expect(limited.supplies.get('supply')!.allOnA).toBeCloseTo(all.supplies.get('supply')!.worstA, 9);
    expect(limited.groups.get('DO1/0')!.allOnA).toBeCloseTo(all.groups.get('DO1/0')!.worstA, 9);
    expect(limited.modules.get('DO1')!.allOnA).toBeCloseTo(all.modules.get('DO1')!.worstA, 9);
  });
});

describe('a circuit that collapses', () => {
  const { result, find } = far(null, 1.4);

  it('has no load check that passes silently', () => {
    expect(find('VD-04')?.detail).toContain('too low');
    expect(find('PR-08')).toMatchObject({ severity: 'warning', subject: { label: 'C1' } });
    expect(find('SU-03')).toMatchObject({ severity: 'warning', subject: { label: '+K1-T1' } });
    expect(result.supplies.get('supply')!.headroomDispensers).toBeNull();
    expect(result.lanes.get('P-0')!.channelA).toBeNull();
  });

  it('says so where only all on collapses it', () => {
    const limited = far(1, 0.8, { circuits: [buildCircuit({ concurrencyLimit: 1, protectionA: 6 })] });
    expect(limited.result.lanes.get('P-0')).toMatchObject({ collapsed: false, allOn: null });
    expect(limited.find('PR-08')).toBeUndefined();
    expect(limited.find('PR-05')?.title).toContain('At least');
  });
});

describe('the least load of a relay contact', () => {
  it('is compared with the smallest current of a constant-power load', () => {
    const relay = buildOutputType({ technology: 'relay', minLoadA: 0.28, ratedOperations: 10_000_000, dropV: 0, leakageA: 0 });
    const { find } = far(1, 0.28, { moduleTypes: [relay], supplies: [buildSupply({ setV: 26 })] });
    expect(find('SG-08')?.compared[0].value).toBeCloseTo((0.28 * 24) / (26 * 1.01), 12);
    const constant = buildTwoCoreType({ runA: 0.28 });
    expect(far(1, 0.28, { moduleTypes: [relay], dispenserTypes: [constant], supplies: [buildSupply({ setV: 26 })] }).find('SG-08')).toBeUndefined();
  });
});

describe('a lane whose voltage falls to nothing with constant current', () => {
  it('is said to have none left, not to lack a working point', () => {
    const lanes = [buildLane('P-0', { cableLengthM: 2000, crossSectionMm2: 0.5 })];
    const { find } = far(null, 0.28, { lanes, assignments: [], dispenserTypes: [buildFourCoreType({ runA: 0.4 })] });
    expect(find('VD-04')?.title).toContain('No voltage is left');
    expect(find('VD-04')?.detail).not.toContain('working point');
    expect(find('PR-08')).toBeUndefined();
  });
});
