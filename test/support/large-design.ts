import type { Assignment, CableNode, Circuit, Design, Dispenser, Module, ModuleGroup, Point, Supply } from '#calc';
import { buildAssignment, buildCircuit, buildDesign, buildGroup, buildLane, buildModule, buildNode, buildSupply } from './design-builder.ts';

const BOXES_PER_CIRCUIT = 8;

/**
 * A design of any number of lanes: a supply for two circuits, eight boxes in a chain on each, half the
 * lanes two-core, half four-core, `mapped` or still to be mapped.
 */
export function largeDesign(lanes: number, lanesPerCircuit = 64, mapped = true): Design {
  const circuits: Circuit[] = [];
  const supplies: Supply[] = [];
  const cableNodes: CableNode[] = [];
  const modules: Module[] = [];
  const moduleGroups: ModuleGroup[] = [];
  const rows: { dispenser: Dispenser; point: Point }[] = [];
  const assignments: Assignment[] = [];
  for (let c = 0; c * lanesPerCircuit < lanes; c++) {
    const supplyId = `s${c >> 1}`;
    if (c % 2 === 0) supplies.push(buildSupply({ id: supplyId, name: `-T${supplies.length + 1}`, internalOhm: 0.01 }));
    circuits.push(buildCircuit({ id: `c${c}`, name: `C${c + 1}`, supplyId, concurrencyLimit: 4 }));
    for (let b = 0; b < BOXES_PER_CIRCUIT; b++) {
      cableNodes.push(buildNode({
        id: `c${c}b${b}`, circuitId: `c${c}`, parentId: b === 0 ? null : `c${c}b${b - 1}`, location: `+JB${c}.${b}`, cableTag: `-W${c}.${b}`, lengthM: 12,
      }));
    }
    const here = Math.min(lanesPerCircuit, lanes - c * lanesPerCircuit);
    for (let m = 0; m * 12 < here; m++) addModules(c, m, modules, moduleGroups);
    for (let i = 0; i < here; i++) {
      const name = `L${c}-${String(i).padStart(4, '0')}`;
      const four = i % 2 === 0;
      const nodeId = `c${c}b${Math.floor((i * BOXES_PER_CIRCUIT) / here)}`;
      rows.push(buildLane(name, { circuitId: `c${c}`, nodeId, cableLengthM: 3 + (i % 9), typeId: four ? 'type-4' : 'type-2', wiring: four ? 'four-core' : 'two-core' }));
      if (!mapped) continue;
      const module = Math.floor(i / 12);
      assignments.push(buildAssignment(name, `DO${c}.${module}`, i % 12));
      if (four) assignments.push(buildAssignment(name, `DI${c}.${module}`, i % 12, 'status'));
    }
  }
  return buildDesign({ lanes: rows, circuits, supplies, cableNodes, modules, moduleGroups, assignments });
}

function addModules(c: number, m: number, modules: Module[], groups: ModuleGroup[]): void {
  const slot = modules.length;
  modules.push(buildModule({ id: `DO${c}.${m}`, name: `DO${c}.${m}`, slot, baseByte: 2 * slot }));
  modules.push(buildModule({ id: `DI${c}.${m}`, name: `DI${c}.${m}`, typeId: 'in-16', slot: slot + 1, baseByte: 2 * slot }));
  groups.push(buildGroup(`DO${c}.${m}`, 0, `c${c}`), buildGroup(`DO${c}.${m}`, 1, `c${c}`));
}
