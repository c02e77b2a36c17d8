import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import {
  buildAssignment, buildCircuit, buildDesign, buildFourCoreType, buildGroup, buildInputType, buildLane, buildModule, buildNode, buildOutputType, buildSupplyType,
  buildTwoCoreType,
} from '#support/design-builder.ts';
import { assess } from './assess.ts';
import type { Finding } from './findings.ts';

/** Designs that between them break most rules. */
const broken: Finding[] = [
  buildDesign(),
  buildDesign({ lanes: [buildLane('A', { typeId: null, wiring: null, circuitId: null, cableLengthM: null, crossSectionMm2: 1.2 }, { zone: null, statedUl: null, hoursPerDay: null })] }),
  buildDesign({
    lanes: [...Array.from({ length: 4 }, (_, i) => buildLane(`P-${i}`, { nodeId: 'box', cableTag: '-W1' }, { zone: '0' })), buildLane('T', { method: 'timed', wiring: 'two-core', periodMonths: 7 })],
    dispenserTypes: [buildFourCoreType({ minV: 23.7, controlOnV: 23.9, offStateA: 0, controlPolarity: 'sinking', maxSurfaceC: null, status: { polarity: 'sourcing', maxA: 0, dropV: 14, leakageA: 0.1 } })],
    moduleTypes: [buildOutputType({ channelA: 0.001, channelPeakA: 0, groupA: 0.001, moduleA: 0.001, technology: 'relay', minLoadA: 1, ratedOperations: 1 }), buildInputType()],
    cableNodes: [buildNode({ lengthM: 100 })],
    supplyTypes: [buildSupplyType({ ratedA: 0.5 })],
    circuits: [buildCircuit({ protectionA: 0.5 })],
    modules: [buildModule(), buildModule({ id: 'DO2', name: 'DO2', slot: 2 }), buildModule({ id: 'DI1', name: 'DI1', typeId: 'in-16', slot: 3 })],
    moduleGroups: [buildGroup('DO1', 0, null)],
    assignments: [
      ...Array.from({ length: 4 }, (_, i) => buildAssignment(`P-${i}`, 'DO1', i)), buildAssignment('T', 'DO1', 3), buildAssignment('P-0', 'DI1', 99, 'status'),
      { ...buildAssignment('P-1', 'DI1', 1, 'status'), id: 'x' }, buildAssignment('P-1', 'DO1', 5, 'status'),
    ],
  }),
  buildDesign({ lanes: Array.from({ length: 3 }, (_, i) => buildLane(`P-${i}`, { cableLengthM: 400 })), dispenserTypes: [buildFourCoreType({ load: 'constant-power', runA: 2 })] }),
  buildDesign({ lanes: [buildLane('P', { typeId: 'type-2', wiring: 'two-core' })], dispenserTypes: [buildTwoCoreType({ minV: 25 })], circuits: [buildCircuit({ protection: 'fuse' })] }),
].flatMap((design) => assess(design).findings);

describe('the texts of findings', () => {
  it('cover many codes here', () => {
    expect(new Set(broken.map((f) => f.code)).size).toBeGreaterThan(30);
  });

  it('end a remedy with one full stop, a title with none, a detail with one where there is any', () => {
    for (const { code, title, remedy, detail } of broken) {
      expect(`${code} ${remedy}`).toMatch(/[^.]\.$/);
      expect(`${code} ${title}`).toMatch(/[^.]$/);
      expect(`${code} ${detail}`).toMatch(/^\S+ $|\.$/);
    }
  });

  it('hold in the source too: no remedy without its full stop', () => {
    const root = new URL('.', import.meta.url);
    const files = readdirSync(root, { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.ts') && !name.endsWith('.spec.ts'));
    const bare = files.flatMap((name) =>
      [...readFileSync(new URL(name, root), 'utf8').matchAll(/remedy: ['`]([^\n]*)['`],?$/gm)].map(([, text]) => text).filter((text) => !text.endsWith('.')));
    expect(bare).toEqual([]);
  });
});
