import type { CableNode, Design } from '#calc';
import type { LoopBox } from '../shared/lane/loop-view';
import type { LaneRows } from './lane-rows';

/** The boxes from the cabinet to the one where the lane's own cable begins, each with who else hangs there. */
export function boxesOf(design: Design, { dispenser }: LaneRows): readonly LoopBox[] {
  const way = wayTo(design.cableNodes, dispenser.nodeId);
  return way.map((node, i) => ({
    location: node.location, cableTag: node.cableTag, lengthM: node.lengthM, powerMm2: node.powerMm2, signalMm2: node.signalMm2,
    others: design.dispensers.filter((d) => d.nodeId === node.id && d.id !== dispenser.id).length,
    onTo: design.cableNodes.filter((n) => n.parentId === node.id && n.id !== way[i + 1]?.id).map((n) => n.location),
  }));
}

/** Other lanes of the circuit whose own cable begins at the cabinet's terminals. */
export const othersAtCabinet = (design: Design, { dispenser, circuit }: LaneRows): number =>
  circuit === null ? 0 : design.dispensers.filter((d) => d.circuitId === circuit.id && d.nodeId === null && d.id !== dispenser.id).length;

/** Rows from the cabinet on; a tree that runs in a loop ends where every box has been met. */
function wayTo(nodes: readonly CableNode[], nodeId: string | null): readonly CableNode[] {
  const byId = new Map(nodes.map((n) => [n.id, n]));
  const way: CableNode[] = [];
  for (let node = byId.get(nodeId ?? ''); node && way.length < nodes.length; node = byId.get(node.parentId ?? '')) way.unshift(node);
  return way;
}
