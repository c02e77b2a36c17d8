import type { Cabinet, CableNode, Circuit, Controller, Supply } from '#calc';
import { SUPPLY_10 } from '../brackwater-catalogue.ts';
import { circuitSettings, spoilLane } from './faults.ts';
import type { LaneDraft, Site } from './site.ts';

/** A circuit with the lanes behind it, which have their boxes and cables. */
export interface BuiltCircuit {
  readonly circuit: Circuit;
  readonly lanes: readonly LaneDraft[];
}

const CIRCUITS_A_SUPPLY = 2;
const BOX = [5, 12] as const;
const LONGEST_CHAIN = 3;

/** Adds a circuit with its supply, trunks and boxes, and hangs the lanes on them. @param place of the circuit in its cabinet */
export function buildCircuit(site: Site, cabinet: Cabinet, controller: Controller, lanes: readonly LaneDraft[], place: number): BuiltCircuit {
  if (place % CIRCUITS_A_SUPPLY === 0) site.supplies.push(supplyOf(site, cabinet, place / CIRCUITS_A_SUPPLY));
  const circuit = circuitOf(site, site.supplies.at(-1)!, lanes.length);
  site.circuits.push(circuit);
  const boxes = boxesOf(site, circuit, lanes.length);
  lanes.forEach((lane, i) => {
    const ordinal = site.points.length;
    Object.assign(lane.dispenser, { controllerId: controller.id, circuitId: circuit.id, nodeId: boxes[i].id, cableTag: `-W${ordinal + 1}` });
    spoilLane(site.planned, lane, lanes[i - 1], ordinal);
    site.points.push(lane.point);
    site.dispensers.push(lane.dispenser);
  });
  return { circuit, lanes };
}

function supplyOf({ random, id, catalogueId }: Site, cabinet: Cabinet, number: number): Supply {
  return {
    id: id(), cabinetId: cabinet.id, typeId: catalogueId(SUPPLY_10), name: `-T${number + 1}`, setV: random.pick([24, 24, 24.5]), internalOhm: 0.05,
    otherLoadA: random.whole(0, 5) / 10, redundant: random.next() < 0.1,
  };
}

function circuitOf(site: Site, supply: Supply, lanes: number): Circuit {
  const ordinal = site.circuits.length;
  const { breaker, limit, tooMany } = circuitSettings(site, ordinal, lanes);
  const id = site.id();
  if (breaker) site.planned.push({ code: 'PR-02', id });
  if (tooMany) site.planned.push({ code: 'PR-01', id });
  return {
    id, supplyId: supply.id, name: `C${ordinal + 1}`, protection: breaker ? 'breaker-B' : 'electronic', protectionA: breaker ? 6 : 4, protectionOhm: 0.05,
    concurrencyLimit: limit,
  };
}

/** Boxes in short chains from the cabinet. @returns the box of each lane in turn */
function boxesOf(site: Site, circuit: Circuit, lanes: number): CableNode[] {
  const { random, id, cableNodes } = site;
  const chain: CableNode[] = [];
  return boxSizes(site, lanes).flatMap((size) => {
    if (chain.length === LONGEST_CHAIN || random.next() < 0.3) chain.length = 0;
    const number = cableNodes.length + 1;
    const box: CableNode = {
      id: id(), circuitId: circuit.id, parentId: chain.at(-1)?.id ?? null, location: `+JB${number}`, cableTag: `-WT${number}`,
      lengthM: chain.length === 0 ? random.whole(10, 35) : random.whole(6, 18), powerMm2: 4, signalMm2: 1, conductorClass: 5,
    };
    cableNodes.push(box);
    chain.push(box);
    return Array.from({ length: size }, () => box);
  });
}

/** Parts the lanes into boxes of 5 to 12. */
function boxSizes({ random }: Site, lanes: number): number[] {
  const sizes: number[] = [];
  let left = lanes;
  while (left > BOX[1]) {
    const size = random.whole(BOX[0], Math.min(BOX[1], left - BOX[0]));
    sizes.push(size);
    left -= size;
  }
  return [...sizes, left];
}
