import type { Cabinet, Controller } from '#calc';
import { areaLanes } from './area-lanes.ts';
import { type BuiltCircuit, buildCircuit } from './circuit.ts';
import { AREAS } from './machines.ts';
import { placeOutputs, placeStatuses } from './racks.ts';
import type { Area, LaneDraft, Site } from './site.ts';

const CIRCUITS = [4, 6] as const;
const LANES_A_CIRCUIT = [19, 25] as const;
/** A box has at least so many dispensers, so a circuit has too. */
const LEAST_LANES = 5;
const CABINETS_AN_AREA = 3;

/** Adds a cabinet with its controller, circuits, lanes and modules. @param wanted lanes that the project still lacks */
export function addCabinet(site: Site, wanted: number): void {
  const { random, id, cabinets, controllers } = site;
  const area = areaOf(site);
  const cabinet: Cabinet = { id: id(), location: `+K${cabinets.length + 1}`, description: `Cabinet, ${area.name.toLowerCase()}`, temperatureC: random.pick([30, 35, 40, 45]) };
  const controller: Controller = { id: id(), cabinetId: cabinet.id, name: `PLC${controllers.length + 1}` };
  cabinets.push(cabinet);
  controllers.push(controller);
  const circuits: BuiltCircuit[] = [];
  const lanes = areaLanes(site, area);
  let left = wanted;
  for (let c = random.whole(...CIRCUITS); c > 0 && left > 0; c--) {
    const drafts = take(lanes, circuitSize(site, left));
    circuits.push(buildCircuit(site, cabinet, controller, drafts, circuits.length));
    left -= drafts.length;
  }
  placeOutputs(site, controller, circuits);
  placeStatuses(site, controller, circuits.flatMap((circuit) => circuit.lanes));
}

function areaOf({ random, cabinets }: Site): Area {
  const number = Math.floor(cabinets.length / CABINETS_AN_AREA);
  const name = AREAS[number % AREAS.length];
  const again = Math.floor(number / AREAS.length);
  return {
    code: `R${number + 1}`, name: again === 0 ? name : `${name} ${again + 1}`, dusty: number % 5 !== 4, daysPerWeek: random.pick([6, 7, 7]),
  };
}

/** Never leaves fewer lanes than the last circuit needs. */
function circuitSize({ random }: Site, left: number): number {
  const size = Math.min(left, random.whole(...LANES_A_CIRCUIT));
  const rest = left - size;
  return rest > 0 && rest < LEAST_LANES ? size - LEAST_LANES : size;
}

function take(lanes: Generator<LaneDraft, never>, count: number): LaneDraft[] {
  return Array.from({ length: count }, () => lanes.next().value);
}
