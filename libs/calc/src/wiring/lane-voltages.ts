import type { LaneFigures, VoltageFigure } from '../assessment.ts';
import { motorRunA } from './currents.ts';
import { STANDARD_SECTIONS_MM2 } from './conductor.ts';
import type { CircuitNetwork } from './network.ts';
import { BOTH, type Conductors, othersSet, othersV, PLUS_ONLY, type StationView, stationViewer, ZERO_ONLY } from './station-view.ts';
import { type CircuitVoltages, lanesByStation, othersBeside, runningDropV } from './worst-case.ts';

/** What the solved circuit says of one lane. */
export interface LaneVoltages {
  readonly worst: VoltageFigure | null;
  readonly idle: VoltageFigure | null;
  readonly allOn: VoltageFigure | null;
  readonly aloneV: number | null;
  readonly collapsed: boolean;
  /** No working point at all, with the worst set or only with all on: then no current is known either. */
  readonly noWorkingPoint: 'worst' | 'all-on' | null;
  /** Largest current through the motor while it runs, A, and while it idles. */
  readonly runA: number;
  /** The same with all on; where that has no working point the largest that is known. */
  readonly allOnRunA: number;
  readonly idleA: number;
  /** Largest rise of the device's own 0 V over the supply's, V, and largest drop on its +24 V (four-core). */
  readonly zeroRiseV: number;
  readonly plusDropV: number;
  readonly profile: LaneFigures['profile'];
}

/** The four ways in which a circuit is looked at. */
export interface CircuitSolution {
  readonly network: CircuitNetwork;
  readonly supplyName: string;
  /** Lowest supply voltage, V, and the voltage set. */
  readonly lowestV: number;
  readonly setV: number;
  readonly limit: number;
  readonly worst: CircuitVoltages;
  readonly allOn: CircuitVoltages;
  readonly alone: CircuitVoltages;
}

/**
 * Reads the lanes of a solved circuit: voltages with the sets that cause them, and the profile from the
 * supply to the device. The set with all on is one shared list; a worst set names the lane itself first.
 */
export function laneVoltages(solution: CircuitSolution): LaneVoltages[] {
  const { network } = solution;
  const reader = { solution, everyone: network.ids, profiler: profiler(solution) };
  const result = new Array<LaneVoltages>(network.ids.length);
  const view = stationViewer(network);
  const { worst, limit } = solution;
  for (const [station, lanes] of lanesByStation(network)) {
    const rises = new Map<number, { zero: number; plus: number }>();
    for (const conductors of [ZERO_ONLY, PLUS_ONLY]) {
      if (!lanes.some((t) => network.fourCore[t])) break;
      const at = view(worst.currents, station, conductors, limit, worst.upstream);
      for (const t of lanes) rises.set(t, addRise(rises.get(t), network, worst, at, t, limit));
    }
    for (const conductors of [BOTH, ZERO_ONLY]) {
      const wired = lanes.filter((t) => network.fourCore[t] === conductors.plus);
      if (wired.length === 0) continue;
      const at = view(worst.currents, station, conductors, limit, worst.upstream);
      for (const t of wired) result[t] = readLane(reader, at, t, rises.get(t));
    }
  }
  return result;
}

/**
 * Smallest standard cross-section of the lane's own cable with which its worst voltages pass, mm². With
 * constant power the present current is kept, which a larger section only lowers; a smaller one is then
 * not looked for.
 *
 * @param own section now, and the current of the pulse input, A
 * @param coreOhm resistance of one core of the own cable at a section, Ω
 * @returns null where no section passes
 */
export function smallestPassingSection(
  lane: LaneVoltages, minV: number, fourCore: boolean, own: { readonly sectionMm2: number; readonly constantPower: boolean; readonly controlA: number },
  coreOhm: (sectionMm2: number) => number,
): number | null {
  if (!lane.worst) return null;
  const nowOhm = coreOhm(own.sectionMm2);
  const amps = fourCore ? 2 * lane.runA + own.controlA : 2 * lane.runA;
  for (const section of STANDARD_SECTIONS_MM2) {
    if (own.constantPower && section < own.sectionMm2) continue;
    const lessOhm = nowOhm - coreOhm(section);
    const idlePasses = !lane.idle || lane.idle.volts + 2 * lane.idleA * lessOhm >= minV - 1e-9;
    if (lane.worst.volts + amps * lessOhm >= minV - 1e-9 && idlePasses) return section;
  }
  return null;
}

interface Reader {
  readonly solution: CircuitSolution;
  readonly everyone: readonly string[];
  readonly profiler: ReturnType<typeof profiler>;
}

function addRise(
  sum: { zero: number; plus: number } | undefined, network: CircuitNetwork, { currents }: CircuitVoltages, at: StationView, t: number, limit: number,
): { zero: number; plus: number } {
  const rises = sum ?? { zero: 0, plus: 0 };
  const idle = at.alwaysV + othersV(at, t, limit);
  const shared = Math.max(idle, runningDropV(network, at, t, limit));
  const own = network.ownOhm[t];
  if (at.conductors.zero) rises.zero = shared + own * (currents.alwaysReturn[t] + Math.max(0, currents.addedReturn[t]));
  else rises.plus = shared + own * (currents.alwaysOut[t] + Math.max(0, currents.addedOut[t]));
  return rises;
}

function readLane({ solution, everyone, profiler: profile }: Reader, at: StationView, t: number, rise?: { zero: number; plus: number }): LaneVoltages {
  const { network, worst, allOn, alone, limit } = solution;
  const { known, fourCore, loads } = network;
  const all = limit >= network.ids.length;
  const others = all ? null : othersSet(at, t, othersBeside(loads.timed[t] === 1, limit));
  const set = others ? [network.ids[t], ...namesOf(network, others)] : everyone;
  const figure = (solved: CircuitVoltages, volts: number, worstSet: readonly string[]): VoltageFigure | null =>
    known[t] && !solved.collapsed && volts > 0 ? { volts, worstSet, ...(solved.exact ? {} : { bound: true }) } : null;
  const worstFigure = figure(worst, worst.runV[t], set);
  const idles = fourCore[t] && !loads.timed[t];
  return {
    worst: worstFigure,
    idle: idles ? figure(worst, worst.idleV[t], all ? everyone : namesOf(network, othersSet(at, t, limit))) : null,
    allOn: figure(allOn, allOn.runV[t], everyone),
    aloneV: figure(alone, alone.runV[t], [])?.volts ?? null,
    collapsed: known[t] === 1 && !worstFigure,
    noWorkingPoint: worst.collapsed ? 'worst' : allOn.collapsed ? 'all-on' : null,
    runA: motorRunA(network, worst.currents, t),
    allOnRunA: Math.max(motorRunA(network, worst.currents, t), motorRunA(network, allOn.currents, t)),
    idleA: worst.currents.alwaysReturn[t],
    zeroRiseV: rise?.zero ?? 0,
    plusDropV: rise?.plus ?? 0,
    profile: worstFigure ? profile(at, t, others) : [],
  };
}

function namesOf({ ids }: CircuitNetwork, lanes: Int32Array): string[] {
  const names = new Array<string>(lanes.length);
  for (let i = 0; i < lanes.length; i++) names[i] = ids[lanes[i]];
  return names;
}

/** Drops at each station with what always flows, alone and with everybody, made once and kept. */
function profiler(solution: CircuitSolution) {
  const { network, worst, alone, lowestV, setV, supplyName } = solution;
  const view = stationViewer(network);
  const cache = new Map<number, { readonly always: number; readonly everybody: number; readonly idle: number }>();
  const sumsAt = (station: number, conductors: Conductors) => {
    const key = station * 2 + conductors.plus;
    const kept = cache.get(key);
    if (kept) return kept;
    const idle = view(alone.currents, station, conductors, 0, alone.upstream).alwaysV;
    const at = view(worst.currents, station, conductors, 0, worst.upstream);
    const everybody = at.alwaysV + at.addedV.reduce((sum, v) => sum + Math.max(0, v), 0);
    const sums = { always: at.alwaysV, everybody, idle };
    cache.set(key, sums);
    return sums;
  };
  return (at: StationView, t: number, others: Int32Array | null): LaneFigures['profile'] => {
    const profile = [{ label: `Supply ${supplyName}`, metres: 0, worstV: lowestV, aloneV: setV }];
    for (const station of wayTo(network, at.station)) {
      const sums = sumsAt(station, at.conductors);
      const trunkOhm = network.tree.powerOhm[station];
      const worstDrop = others ? sums.always + setDropV(network, worst, at, trunkOhm, t, others) : sums.everybody;
      const aloneDrop = sums.idle + addedBy(alone, at.conductors, trunkOhm, t);
      profile.push({
        label: station === 0 ? `Terminals ${network.circuit.name}` : network.tree.nodes[station - 1].location,
        metres: network.tree.metres[station],
        worstV: lowestV - worstDrop - ownWayV(network, worst, station, t),
        aloneV: setV - aloneDrop - ownWayV(network, alone, station, t),
      });
    }
    const metres = network.tree.metres[at.station] + network.ownMetres[t];
    profile.push({ label: 'Device', metres, worstV: worst.runV[t], aloneV: alone.runV[t] });
    return profile;
  };
}

function wayTo({ tree }: CircuitNetwork, station: number): number[] {
  const way: number[] = [];
  for (let s = station; s >= 0; s = tree.parent[s]) way.push(s);
  return way.reverse();
}

/** Drop that the lane and the others of its worst set add at a station on the lane's way, V. */
function setDropV(network: CircuitNetwork, solved: CircuitVoltages, at: StationView, trunkOhm: number, t: number, others: Int32Array): number {
  let drop = addedBy(solved, at.conductors, trunkOhm, t);
  for (const i of others) {
    // Shared with the station before: no more than the whole way there.
    const shared = Math.min(trunkOhm, at.sharedOhm[network.station[i]]);
    drop += addedBy(solved, at.conductors, shared, i);
  }
  return drop;
}

function addedBy({ currents, upstream }: CircuitVoltages, { plus, zero }: Conductors, trunkOhm: number, i: number): number {
  return currents.addedSupply[i] * upstream.sharedOhm + currents.addedReturn[i] * zero * trunkOhm + currents.addedOut[i] * plus * trunkOhm;
}

/** What a two-core lane has lost on its own core of the multicore up to a station, and in its output, V. */
function ownWayV(network: CircuitNetwork, { currents }: CircuitVoltages, station: number, t: number): number {
  if (network.fourCore[t]) return 0;
  return network.outputDropV[t] + network.tree.signalOhm[station] * motorRunA(network, currents, t);
}
