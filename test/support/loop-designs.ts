import type { Design } from '#calc';
import { buildAssignment, buildCircuit, buildDesign, buildGroup, buildLane, buildModule, buildNode } from './design-builder.ts';

const modules = [buildModule(), buildModule({ id: 'DI1', name: 'DI1', typeId: 'in-16', baseByte: 8, slot: 2 })];
const groups = [buildGroup('DO1', 0), buildGroup('DO1', 1)];

/** Two boxes in a row: GC1-L01 and -L02 at the far one, -L03 at the near one, -L04 at the cabinet; two run at once. */
export function fourCoreLoopDesign(): Design {
  const place = [{ nodeId: 'far' }, { nodeId: 'far' }, { nodeId: 'near' }, { nodeId: null }];
  return buildDesign({
    lanes: place.map((at, i) => buildLane(`GC1-L0${i + 1}`, at, { function: '=T1.GL1', product: `-GP0${i + 1}`, description: 'Tail pulley, bearing drive side' })),
    circuits: [buildCircuit({ concurrencyLimit: 2 })],
    cableNodes: [buildNode({ id: 'near' }), buildNode({ id: 'far', parentId: 'near', location: '+JB2', cableTag: '-W2', lengthM: 35 }), buildNode({ id: 'side', parentId: 'near', location: '+JB3', cableTag: '-W3' })],
    modules, moduleGroups: groups,
    assignments: [buildAssignment('GC1-L01', 'DO1', 0), buildAssignment('GC1-L01', 'DI1', 0, 'status'), buildAssignment('GC1-L03', 'DO1', 2)],
  });
}

/** The same way with two-core dispensers. */
export function twoCoreLoopDesign(): Design {
  const design = fourCoreLoopDesign();
  return {
    ...design,
    dispensers: design.dispensers.map((d) => ({ ...d, typeId: 'type-2', wiring: 'two-core' })),
    assignments: design.assignments.filter((a) => a.purpose === 'control'),
  };
}
