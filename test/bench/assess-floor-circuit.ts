import type { CableNode, Circuit, Dispenser, DispenserType, ModuleType, Project } from '#calc';
import { ohmPerMetre, STANDARD_SECTIONS_MM2 } from '#calc';

/** A lane as the plain loop sees it. All that the tests of `assess` for blanks and contradictions ask is taken as given. */
export interface FloorLane {
  readonly id: string;
  readonly dispenser: Dispenser;
  readonly type: DispenserType;
  readonly output: ModuleType | undefined;
  readonly input: ModuleType | undefined;
  demandUl: number;
  intervalMs: number;
  pulses: number;
  lifeDays: number;
  pulsesPerYear: number;
  overPercent: number;
  channelA: number;
  worstV: number;
  worstSet: string[];
  idleV: number;
  idleSet: string[];
  allOnV: number;
  aloneV: number;
  smallestMm2: number | null;
  pulseLevelV: number | null;
  statusLevelV: number | null;
  profile: { label: string; metres: number; worstV: number; aloneV: number }[];
}

export interface FloorCircuit {
  readonly circuit: Circuit;
  readonly k: number;
  readonly lanes: FloorLane[];
  readonly station: number[];
  /** Resistances that the ways to two stations share, Ω. */
  readonly shared: number[][];
  readonly parent: number[];
  readonly metres: number[];
  readonly signalOhm: number[];
  readonly labels: string[];
  readonly ownOhm: number[];
  /** What always flows and what running adds, A: over +24 V, over 0 V, through the supply. */
  readonly always: { out: number; back: number }[];
  readonly resting: { out: number; back: number }[];
  readonly added: { out: number; back: number; supply: number }[];
  readonly restingAdded: { out: number; back: number; supply: number }[];
  standingA: number;
  worstA: number;
  allOnA: number;
  lowestV: number;
  shortA: number;
  largestK: number;
}

export function floorCircuit(project: Project, circuit: Circuit, nodes: readonly CableNode[], lanes: FloorLane[]): FloorCircuit {
  const stationOf = new Map<string, number>();
  const parent = [-1];
  const metres = [0];
  const powerOhm = [0];
  const signalOhm = [0];
  const labels = [`Terminals ${circuit.name}`];
  for (const node of nodes) {
    const up = node.parentId === null ? 0 : stationOf.get(node.parentId)!;
    stationOf.set(node.id, parent.length);
    parent.push(up);
    metres.push(metres[up] + node.lengthM);
    powerOhm.push(powerOhm[up] + node.lengthM * ohmPerMetre(node.powerMm2, node.conductorClass, project.voltageTempC));
    signalOhm.push(signalOhm[up] + node.lengthM * ohmPerMetre(node.signalMm2, node.conductorClass, project.voltageTempC));
    labels.push(node.location);
  }
  const shared = powerOhm.map((_, a) => powerOhm.map((_, b) => sharedOhm(parent, powerOhm, a, b)));
  const all: FloorCircuit = {
    circuit, k: circuit.concurrencyLimit ?? lanes.length, lanes, shared, parent, metres, signalOhm, labels,
    station: [], ownOhm: [], always: [], resting: [], added: [], restingAdded: [],
    standingA: 0, worstA: 0, allOnA: 0, lowestV: Infinity, shortA: Infinity, largestK: 0,
  };
  for (const lane of lanes) addLane(project, all, lane, stationOf);
  const runA = all.added.map((a) => a.supply).sort((a, b) => b - a);
  for (let i = 0; i < runA.length; i++) {
    if (i < all.k) all.worstA += runA[i];
    all.allOnA += runA[i];
  }
  all.worstA += all.standingA;
  all.allOnA += all.standingA;
  return all;
}

function sharedOhm(parent: readonly number[], powerOhm: readonly number[], a: number, b: number): number {
  while (a !== b) {
    if (a > b) a = parent[a];
    else b = parent[b];
  }
  return powerOhm[a];
}

function addLane(project: Project, all: FloorCircuit, { dispenser, type }: FloorLane, stationOf: ReadonlyMap<string, number>): void {
  const four = dispenser.wiring === 'four-core';
  const timed = dispenser.method === 'timed';
  const idleA = four ? type.idleA : 0;
  const pulseA = four && !timed ? (type.controlInputA ?? 0) : 0;
  const back = timed ? Math.max(type.runA, idleA) : idleA;
  const runs = timed ? 0 : type.runA - idleA;
  all.station.push(dispenser.nodeId === null ? 0 : stationOf.get(dispenser.nodeId)!);
  all.ownOhm.push(dispenser.cableLengthM! * ohmPerMetre(dispenser.crossSectionMm2!, dispenser.conductorClass, project.voltageTempC));
  all.always.push({ out: four ? back : 0, back });
  all.added.push({ out: four ? runs : 0, back: runs + pulseA, supply: runs + pulseA });
  all.resting.push({ out: idleA, back: idleA });
  all.restingAdded.push({ out: four ? type.runA - idleA : 0, back: type.runA - idleA + pulseA, supply: type.runA - idleA + pulseA });
  all.standingA += back;
}

export interface FloorUpstream {
  readonly lowestV: number;
  readonly setV: number;
  readonly upstreamOhm: number;
  /** Drop that the other circuits make in the supply, V: with the worst set, with all on, with each lane alone. */
  readonly othersV: number;
  readonly othersAllOnV: number;
  readonly othersAloneV: number;
  readonly supplyName: string;
}

/** Voltages of all lanes of a circuit, their sets, levels and profiles. */
export function solveCircuit(project: Project, all: FloorCircuit, up: FloorUpstream): void {
  const { lanes, station, added, k } = all;
  const n = lanes.length;
  const addedV = new Array<number>(n).fill(0);
  const zeroV = new Array<number>(n).fill(0);
  const plusV = new Array<number>(n).fill(0);
  const standing = all.shared.map((row) => standingDrops(all, up, row));
  for (let s = 0; s < all.parent.length; s++) {
    for (let four = 0; four < 2; four++) {
      const here: number[] = [];
      for (let t = 0; t < n; t++) if (station[t] === s && (lanes[t].dispenser.wiring === 'four-core') === (four === 1)) here.push(t);
      if (here.length === 0) continue;
      const row = all.shared[s];
      const drops = standing[s];
      const alwaysV = drops.upV + drops.zeroV + four * drops.plusV;
      const restV = drops.restUpV + drops.restZeroV + four * drops.restPlusV;
      const zeroAlwaysV = drops.upV + drops.zeroV;
      const plusAlwaysV = drops.upV + drops.plusV;
      let everyV = 0;
      for (let i = 0; i < n; i++) {
        const ohm = row[station[i]];
        zeroV[i] = added[i].supply * up.upstreamOhm + added[i].back * ohm;
        plusV[i] = added[i].supply * up.upstreamOhm + added[i].out * ohm;
        addedV[i] = zeroV[i] + four * added[i].out * ohm;
        everyV += addedV[i];
      }
      const top = largest(addedV, k + 1);
      const zeroTop = four ? largest(zeroV, k + 1) : [];
      const plusTop = four ? largest(plusV, k + 1) : [];
      for (const t of here) {
        const lane = lanes[t];
        const { dispenser, type } = lane;
        const timed = dispenser.method === 'timed';
        const others = timed ? k : k - 1;
        const own = all.ownOhm[t];
        const motorA = all.always[t].back + added[t].supply - (four && !timed ? (type.controlInputA ?? 0) : 0);
        const pulseA = four && !timed ? (type.controlInputA ?? 0) : 0;
        const dropV = four ? 0 : (lane.output?.dropV ?? 0);
        const ownV = four ? own * (2 * motorA + pulseA) : dropV + (all.signalOhm[s] + 2 * own) * motorA;
        const restMotorA = all.resting[t].back + all.restingAdded[t].supply - pulseA;
        const restOwnV = four ? own * (2 * restMotorA + pulseA) : ownV;
        const restAdded = all.restingAdded[t];
        const restAddedV = restAdded.supply * up.upstreamOhm + (restAdded.back + four * restAdded.out) * row[s];
        lane.worstV = up.lowestV - alwaysV - addedV[t] - sumOthers(addedV, top, t, others) - ownV;
        lane.worstSet = nameOthers(lanes, top, t, others, [lane.id]);
        lane.allOnV = up.lowestV - (alwaysV - up.othersV + up.othersAllOnV) - everyV - ownV;
        lane.aloneV = up.setV - restV - restAddedV - restOwnV;
        lane.idleV = Infinity;
        if (four && !timed) {
          lane.idleV = up.lowestV - alwaysV - sumOthers(addedV, top, t, k) - 2 * own * all.always[t].back;
          lane.idleSet = nameOthers(lanes, top, t, k, []);
        }
        if (four) {
          const zeroRise = zeroAlwaysV + Math.max(sumOthers(zeroV, zeroTop, t, k), zeroV[t] + sumOthers(zeroV, zeroTop, t, others)) + own * (all.always[t].back + added[t].back);
          const plusDrop = plusAlwaysV + Math.max(sumOthers(plusV, plusTop, t, k), plusV[t] + sumOthers(plusV, plusTop, t, others)) + own * (all.always[t].out + added[t].out);
          const coreOhm = all.signalOhm[s] + own;
          lane.pulseLevelV = lane.output && type.controlInputA !== null ? up.lowestV - lane.output.dropV - type.controlInputA * coreOhm - (lane.output.polarity === 'sourcing' ? zeroRise : plusDrop) : null;
          lane.statusLevelV = lane.input && type.status ? up.lowestV - (type.status.polarity === 'sourcing' ? plusDrop : zeroRise) - type.status.dropV - lane.input.inputA! * coreOhm : null;
        }
        lane.channelA = four ? type.controlInputA! : motorA;
        lane.smallestMm2 = smallestSection(project, all, lane, t, motorA, pulseA, four);
        lane.profile = profileOf(all, up, standing, lane, t, s, four, top, others, motorA, dropV);
        if (lane.worstV < all.lowestV) all.lowestV = lane.worstV;
      }
    }
  }
}

/** Drop at a station by what always flows, V: before the circuit, over the shared 0 V, over the shared +24 V. */
interface StandingDrops {
  upV: number;
  zeroV: number;
  plusV: number;
  restUpV: number;
  restZeroV: number;
  restPlusV: number;
}

function standingDrops({ always, resting, station }: FloorCircuit, up: FloorUpstream, row: readonly number[]): StandingDrops {
  const drops = { upV: up.othersV, zeroV: 0, plusV: 0, restUpV: up.othersAloneV, restZeroV: 0, restPlusV: 0 };
  for (let i = 0; i < station.length; i++) {
    const ohm = row[station[i]];
    drops.upV += always[i].back * up.upstreamOhm;
    drops.zeroV += always[i].back * ohm;
    drops.plusV += always[i].out * ohm;
    drops.restUpV += resting[i].back * up.upstreamOhm;
    drops.restZeroV += resting[i].back * ohm;
    drops.restPlusV += resting[i].out * ohm;
  }
  return drops;
}

function largest(values: readonly number[], count: number): number[] {
  const top: number[] = [];
  for (let i = 0; i < values.length; i++) {
    if (!(values[i] > 0) || (top.length === count && values[i] <= values[top[count - 1]])) continue;
    let at = top.length < count ? top.length : count - 1;
    for (; at > 0 && values[i] > values[top[at - 1]]; at--) top[at] = top[at - 1];
    top[at] = i;
  }
  return top;
}

function sumOthers(values: readonly number[], top: readonly number[], t: number, count: number): number {
  let sum = 0;
  for (let i = 0; i < top.length && count > 0; i++) {
    if (top[i] === t) continue;
    sum += values[top[i]];
    count--;
  }
  return sum;
}

function nameOthers(lanes: readonly FloorLane[], top: readonly number[], t: number, count: number, names: string[]): string[] {
  for (let i = 0; i < top.length && count > 0; i++) {
    if (top[i] === t) continue;
    names.push(lanes[top[i]].id);
    count--;
  }
  return names;
}

function smallestSection(project: Project, all: FloorCircuit, lane: FloorLane, t: number, motorA: number, pulseA: number, four: number): number | null {
  const { cableLengthM, conductorClass } = lane.dispenser;
  for (const section of STANDARD_SECTIONS_MM2) {
    const lessOhm = all.ownOhm[t] - cableLengthM! * ohmPerMetre(section, conductorClass, project.voltageTempC);
    const idlePasses = lane.idleV + 2 * all.always[t].back * lessOhm >= lane.type.minV - 1e-9;
    if (lane.worstV + (2 * motorA + four * pulseA) * lessOhm >= lane.type.minV - 1e-9 && idlePasses) return section;
  }
  return null;
}

function profileOf(
  all: FloorCircuit, up: FloorUpstream, standing: readonly StandingDrops[], lane: FloorLane, t: number, s: number, four: number, top: readonly number[], others: number, motorA: number, dropV: number,
): FloorLane['profile'] {
  const { added, shared, station } = all;
  const way: number[] = [];
  for (let at = s; at >= 0; at = all.parent[at]) way.push(at);
  const profile = [{ label: `Supply ${up.supplyName}`, metres: 0, worstV: up.lowestV, aloneV: up.setV }];
  for (let w = way.length - 1; w >= 0; w--) {
    const at = way[w];
    const row = shared[at];
    const drops = standing[at];
    let worst = drops.upV + drops.zeroV + four * drops.plusV + added[t].supply * up.upstreamOhm + (added[t].back + four * added[t].out) * row[at];
    const alone = drops.restUpV + drops.restZeroV + four * drops.restPlusV + all.restingAdded[t].supply * up.upstreamOhm + (all.restingAdded[t].back + four * all.restingAdded[t].out) * row[at];
    let left = others;
    for (let i = 0; i < top.length && left > 0; i++) {
      if (top[i] === t) continue;
      const ohm = row[station[top[i]]];
      worst += added[top[i]].supply * up.upstreamOhm + (added[top[i]].back + four * added[top[i]].out) * ohm;
      left--;
    }
    const ownV = four ? 0 : dropV + all.signalOhm[at] * motorA;
    profile.push({ label: all.labels[at], metres: all.metres[at], worstV: up.lowestV - worst - ownV, aloneV: up.setV - alone - ownV });
  }
  profile.push({ label: 'Device', metres: all.metres[s] + lane.dispenser.cableLengthM!, worstV: lane.worstV, aloneV: lane.aloneV });
  return profile;
}
