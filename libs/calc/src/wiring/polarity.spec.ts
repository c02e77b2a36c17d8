import { describe, expect, it } from 'vitest';
import {
  buildAssignment, buildDesign, buildFourCoreType, buildGroup, buildInputType, buildLane, buildModule, buildNode, buildOutputType, type DesignParts,
} from '#support/design-builder.ts';
import { assess } from '../assess.ts';
import type { StatusOutput } from '../design.ts';
import { ohmPerMetre } from './conductor.ts';

const design = (parts: DesignParts = {}) => buildDesign({
  modules: [buildModule(), buildModule({ id: 'DI1', name: 'DI1', typeId: 'in-16', slot: 2 })],
  moduleGroups: [buildGroup('DO1', 0)],
  assignments: [buildAssignment('P-01', 'DO1', 0), buildAssignment('P-01', 'DI1', 0, 'status')],
  lanes: [buildLane('P-01', { nodeId: 'box' })],
  cableNodes: [buildNode()],
  ...parts,
});
const sinking = { dispenserTypes: [buildFourCoreType({ controlPolarity: 'sinking' })], moduleTypes: [buildOutputType({ polarity: 'sinking' }), buildInputType()] };

describe('the pulse current of a sinking output', () => {
  const trunk = 20 * ohmPerMetre(2.5, 5, 40);
  const own = 30 * ohmPerMetre(0.75, 5, 40);
  const core = 20 * ohmPerMetre(1, 5, 40) + own;
  const lane = (parts: DesignParts) => assess(design(parts)).lanes.get('P-01')!;

  it('flows on the +24 V conductor, not on 0 V', () => {
    expect(lane(sinking).pulseLevelV).toBeCloseTo(23.76 - 0.5 - 0.005 * core - 0.255 * (trunk + own), 12);
    expect(lane(sinking).statusLevelV).toBeCloseTo(23.76 - 0.255 * (trunk + own) - 1 - 0.0025 * core, 12);
    expect(lane({}).pulseLevelV).toBeCloseTo(23.76 - 0.5 - 0.005 * core - 0.255 * (trunk + own), 12);
    expect(lane({}).statusLevelV).toBeCloseTo(23.76 - 0.25 * (trunk + own) - 1 - 0.0025 * core, 12);
  });

  it('leaves the voltage at a lane alone as it was, and loads protection and supply', () => {
    expect(lane(sinking).worst!.volts).toBeCloseTo(lane({}).worst!.volts, 12);
    expect(assess(design(sinking)).circuits.get('circuit')!.worstA).toBeCloseTo(0.255, 12);
  });

  it('drops nothing on the shared 0 V of a two-core neighbour', () => {
    const lanes = [buildLane('P-01', { nodeId: 'box' }), buildLane('Q', { nodeId: 'box', typeId: 'type-2', wiring: 'two-core' })];
    const volts = (parts: DesignParts) => assess(design({ ...parts, lanes })).lanes.get('Q')!.worst!.volts;
    const two = buildDesign().dispenserTypes[1];
    expect(volts({ ...sinking, dispenserTypes: [...sinking.dispenserTypes, two] }) - volts({})).toBeCloseTo(0.005 * trunk, 12);
  });
});

describe('the voltage that status leakage leaves at the input', () => {
  const withLeak = (leakageA: number) => {
    const status: StatusOutput = { polarity: 'sourcing', maxA: 0.05, dropV: 1, leakageA };
    return assess(design({ dispenserTypes: [buildFourCoreType({ status })] })).findings;
  };

  it('must stay below the off limit of the input type (IEC 61131-2)', () => {
    const found = withLeak(0.0006).find((f) => f.code === 'SG-10');
    expect(found).toMatchObject({ severity: 'warning', dispenserIds: ['P-01'], compared: [{ limit: 5, unit: 'V' }] });
    expect(found!.compared[0].value).toBeCloseTo(0.0006 * (24 / 0.0025), 12);
    expect(withLeak(0.0005).some((f) => f.code === 'SG-10')).toBe(false);
  });

  it('adds nothing where the leakage itself is too large already', () => {
    expect(withLeak(0.002).map((f) => f.code)).toContain('SG-06');
    expect(withLeak(0.002).map((f) => f.code)).not.toContain('SG-10');
  });
});
