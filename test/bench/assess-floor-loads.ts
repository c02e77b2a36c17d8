import type { Design, ModuleType } from '#calc';
import { type FloorCircuit, type FloorLane, solveCircuit } from './assess-floor-circuit.ts';

export interface FloorModule {
  readonly type: ModuleType;
  readonly on: { readonly at: number; readonly channel: number }[];
}

export interface FloorLoad {
  readonly worstA: number;
  readonly allOnA: number;
  readonly ratingA: number;
  readonly worstSet: string[];
  /** Sums of the m largest loads, A. */
  readonly prefix: number[];
}

export interface FloorSupply {
  readonly circuits: readonly FloorCircuit[];
  readonly internalOhm: number;
  readonly lowestV: number;
  readonly standingA: number;
  readonly worstA: number;
  readonly allOnA: number;
  readonly demandA: number;
  readonly ratingA: number;
  readonly mayA: number;
}

/** Solves the circuits of every supply and sums its load. */
export function solveSupplies(design: Design, result: { readonly circuits: readonly FloorCircuit[]; readonly supplies: FloorSupply[] }): FloorSupply[] {
  const { project } = design;
  for (const supply of design.supplies) {
    const type = design.supplyTypes.find(({ id }) => id === supply.typeId)!;
    const circuits = result.circuits.filter(({ circuit }) => circuit.supplyId === supply.id);
    const lowestV = supply.setV * (1 - type.tolerancePercent! / 100);
    let standingA = supply.otherLoadA;
    let worstA = supply.otherLoadA;
    let allOnA = supply.otherLoadA;
    let restA = supply.otherLoadA;
    for (const all of circuits) {
      standingA += all.standingA;
      worstA += all.worstA;
      allOnA += all.allOnA;
      for (const { back } of all.resting) restA += back;
    }
    for (const all of circuits) {
      let ownRestA = 0;
      for (const { back } of all.resting) ownRestA += back;
      solveCircuit(project, all, {
        lowestV, setV: supply.setV, upstreamOhm: supply.internalOhm + all.circuit.protectionOhm, supplyName: supply.name,
        othersV: supply.internalOhm * (worstA - all.worstA), othersAllOnV: supply.internalOhm * (allOnA - all.allOnA), othersAloneV: supply.internalOhm * (restA - ownRestA),
      });
      all.shortA = shortCircuitA(design, all, lowestV, supply.internalOhm, type.shortCircuitA);
    }
    const cabinet = design.cabinets.find(({ id }) => id === supply.cabinetId)!;
    const ratingA = type.ratedA * (1 - (Math.max(0, cabinet.temperatureC - type.deratingFromC) * type.deratingPercentPerK) / 100);
    const margin = 1 + project.supplyMarginPercent / 100;
    result.supplies.push({ circuits, internalOhm: supply.internalOhm, lowestV, standingA, worstA, allOnA, demandA: worstA * margin, ratingA, mayA: ratingA / margin });
  }
  return result.supplies;
}

function shortCircuitA({ project }: Design, all: FloorCircuit, lowestV: number, internalOhm: number, most: number): number {
  const hotter = (1 + 0.00393 * (project.tripTempC - 20)) / (1 + 0.00393 * (project.voltageTempC - 20));
  let least = most;
  for (let i = 0; i < all.lanes.length; i++) {
    const { dispenser, output } = all.lanes[i];
    const four = dispenser.wiring === 'four-core';
    if (!four && output && output.shortCircuitA !== null) continue;
    const s = all.station[i];
    const loopOhm = all.shared[s][s] + (four ? all.shared[s][s] : all.signalOhm[s]) + 2 * all.ownOhm[i];
    const amps = (lowestV - (four ? 0 : (output?.dropV ?? 0))) / (internalOhm + all.circuit.protectionOhm + hotter * loopOhm);
    if (amps < least) least = amps;
  }
  return least;
}

/** Loads of groups and modules, all of whose lanes belong to one circuit; those of each circuit's lanes. */
export function loadModules(
  modules: ReadonlyMap<string, FloorModule>, lanes: readonly FloorLane[], circuits: ReadonlyMap<string, FloorCircuit>,
  result: { readonly groups: FloorLoad[]; readonly modules: FloorLoad[] },
): Map<string, FloorLoad[]> {
  const places = new Map<string, FloorLoad[]>();
  for (const { type, on } of modules.values()) {
    if (type.kind !== 'output' || on.length === 0) continue;
    const circuitId = lanes[on[0].at].dispenser.circuitId!;
    const { k } = circuits.get(circuitId)!;
    const loads: FloorLoad[] = [];
    for (let first = 0; first < type.channels; first += type.channelsPerGroup) {
      const here: FloorLane[] = [];
      for (const { at, channel } of on) if (channel >= first && channel < first + type.channelsPerGroup) here.push(lanes[at]);
      const group = loadOf(here, k, type.groupA!);
      result.groups.push(group);
      loads.push(group);
    }
    const whole = loadOf(on.map(({ at }) => lanes[at]), k, type.moduleA!);
    result.modules.push(whole);
    loads.push(whole);
    const own = places.get(circuitId);
    if (own) own.push(...loads);
    else places.set(circuitId, loads);
  }
  return places;
}

function loadOf(lanes: FloorLane[], k: number, ratingA: number): FloorLoad {
  lanes.sort((a, b) => b.channelA - a.channelA);
  const prefix = [0];
  const worstSet: string[] = [];
  for (let i = 0; i < lanes.length; i++) {
    prefix.push(prefix[i] + lanes[i].channelA);
    if (i < k) worstSet.push(lanes[i].id);
  }
  return { worstA: prefix[Math.min(k, lanes.length)], allOnA: prefix[lanes.length], ratingA, worstSet, prefix };
}

/** Largest k with which loads and voltages pass, by halving. */
export function largestK(all: FloorCircuit, supply: FloorSupply, places: readonly FloorLoad[]): number {
  const runA = all.added.map((added) => added.supply).sort((a, b) => b - a);
  const prefix = [0];
  for (let i = 0; i < runA.length; i++) prefix.push(prefix[i] + runA[i]);
  const spareV = othersSpareV(all, supply);
  let good = 0;
  let bad = all.lanes.length + 1;
  let k = all.lanes.length;
  while (bad - good > 1) {
    if (loadsPass(all, supply, places, prefix, k, spareV) && voltagesPass(all, supply, k)) good = k;
    else bad = k;
    k = (good + bad) >> 1;
  }
  return good;
}

function othersSpareV(all: FloorCircuit, { circuits, internalOhm }: FloorSupply): number {
  let least = Infinity;
  for (const other of circuits) {
    if (other === all) continue;
    for (const { worstV, idleV, type } of other.lanes) {
      least = Math.min(least, Math.min(worstV, idleV) - type.minV + internalOhm * (all.worstA - all.standingA));
    }
  }
  return least;
}

function loadsPass(all: FloorCircuit, supply: FloorSupply, places: readonly FloorLoad[], prefix: readonly number[], k: number, spareV: number): boolean {
  if (all.standingA + prefix[k] > all.circuit.protectionA + 1e-9) return false;
  if (supply.worstA - all.worstA + all.standingA + prefix[k] > supply.mayA + 1e-9) return false;
  for (const place of places) if (place.prefix[Math.min(k, place.prefix.length - 1)] > place.ratingA + 1e-9) return false;
  return spareV >= supply.internalOhm * prefix[k] - 1e-9;
}

/** Whether every lane keeps its minimum with another k: only the sum over the others changes. */
function voltagesPass(all: FloorCircuit, { lowestV, internalOhm, worstA }: FloorSupply, k: number): boolean {
  const { lanes, station, added, always } = all;
  const upstreamOhm = internalOhm + all.circuit.protectionOhm;
  for (let s = 0; s < all.parent.length; s++) {
    const row = all.shared[s];
    for (let four = 0; four < 2; four++) {
      let sorted: number[] | null = null;
      let values: number[] = [];
      let alwaysV = internalOhm * (worstA - all.worstA);
      for (let t = 0; t < lanes.length; t++) {
        const lane = lanes[t];
        if (station[t] !== s || (lane.dispenser.wiring === 'four-core') !== (four === 1)) continue;
        if (!sorted) {
          values = added.map((a, i) => a.supply * upstreamOhm + (a.back + four * a.out) * row[station[i]]);
          for (let i = 0; i < always.length; i++) alwaysV += always[i].back * (upstreamOhm + row[station[i]]) + four * always[i].out * row[station[i]];
          sorted = values.slice().sort((a, b) => b - a);
        }
        const timed = lane.dispenser.method === 'timed';
        const pulseA = four && !timed ? lane.type.controlInputA! : 0;
        const motorA = always[t].back + added[t].supply - pulseA;
        const own = all.ownOhm[t];
        const ownV = four ? own * (2 * motorA + pulseA) : (lane.output?.dropV ?? 0) + (all.signalOhm[s] + 2 * own) * motorA;
        const runV = alwaysV + values[t] + sumBeside(sorted, values[t], timed ? k : k - 1) + ownV;
        const idleV = four ? alwaysV + sumBeside(sorted, values[t], k) + 2 * own * always[t].back : 0;
        if (lowestV - Math.max(runV, idleV) < lane.type.minV - 1e-9) return false;
      }
    }
  }
  return true;
}

/** Sum of the `count` largest beside one of them. */
function sumBeside(sorted: readonly number[], own: number, count: number): number {
  let sum = 0;
  let left = count;
  let skipped = false;
  for (let i = 0; i < sorted.length && left > 0 && sorted[i] > 0; i++) {
    if (!skipped && sorted[i] === own) skipped = true;
    else {
      sum += sorted[i];
      left--;
    }
  }
  return sum;
}
