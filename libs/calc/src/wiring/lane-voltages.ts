import type { LaneFigures, VoltageFigure } from '../assessment.ts';
import type { ConductorClass } from '../design.ts';
import { sharedPowerOhm } from './box-tree.ts';
import { motorRunA } from './currents.ts';
import { ohmPerMetre, STANDARD_SECTIONS_MM2 } from './conductor.ts';
import type { CircuitNetwork, StationGroup } from './network.ts';
import { BOTH, type Conductors, othersSet, othersV, PLUS_ONLY, type StationView, viewStation, ZERO_ONLY } from './station-view.ts';
import { type CircuitVoltages, othersBeside, runningDropV } from './worst-case.ts';

/** What a solved circuit says of its lanes, as columns in the order of its network. */
export interface LaneColumns {
  readonly worst: readonly (VoltageFigure | null)[];
  readonly idle: readonly (VoltageFigure | null)[];
  readonly allOn: readonly (VoltageFigure | null)[];
  readonly profile: readonly LaneFigures['profile'][];
  /** Largest rise of the device's own 0 V over the supply's, V, and largest drop on its +24 V (four-core). */
  readonly zeroRiseV: Float64Array;
  readonly plusDropV: Float64Array;
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
export function laneColumns(solution: CircuitSolution): LaneColumns {
  const { network, worst, limit } = solution;
  const size = network.ids.length;
  const columns = {
    worst: new Array<VoltageFigure | null>(size).fill(null),
    idle: new Array<VoltageFigure | null>(size).fill(null),
    allOn: new Array<VoltageFigure | null>(size).fill(null),
    profile: new Array<LaneFigures['profile']>(size).fill(NO_PROFILE),
    zeroRiseV: new Float64Array(size),
    plusDropV: new Float64Array(size),
  };
  const profiles = { two: profileDrops(solution, ZERO_ONLY), four: profileDrops(solution, BOTH) };
  for (const group of network.groups) {
    if (group.fourCore) addRises(solution, group, columns);
    const at = viewStation(network, worst.currents, group.station, group.fourCore ? BOTH : ZERO_ONLY, limit, worst.upstream);
    readGroup(solution, at, group, group.fourCore ? profiles.four : profiles.two, columns);
  }
  return columns;
}

/** No working point at all, with the worst set or only with all on: then no current is known either. */
export function noWorkingPoint({ worst, allOn }: CircuitSolution): 'worst' | 'all-on' | null {
  return worst.collapsed ? 'worst' : allOn.collapsed ? 'all-on' : null;
}

/** Largest current through the motor of a lane while it runs, A. */
export function largestRunA({ network, worst }: CircuitSolution, lane: number): number {
  return motorRunA(network, worst.currents, lane);
}

/** The same with all on; where that has no working point the largest that is known. */
export function largestAllOnRunA({ network, worst, allOn }: CircuitSolution, lane: number): number {
  return Math.max(motorRunA(network, worst.currents, lane), motorRunA(network, allOn.currents, lane));
}

/** Running alone, supply at its set voltage, V; null: no figure. */
export function aloneVoltage({ network, alone }: CircuitSolution, lane: number): number | null {
  return isFigure(network, alone, lane, alone.runV[lane]) ? alone.runV[lane] : null;
}

/** What a lane's own cable has to do with its voltages. */
export interface OwnCable {
  readonly lengthM: number;
  readonly sectionMm2: number;
  readonly conductorClass: ConductorClass;
  readonly temperatureC: number;
}

/**
 * Smallest standard cross-section of the lane's own cable with which its worst voltages pass, mm². With
 * constant power the present current is kept, which a larger section only lowers; a smaller one is then
 * not looked for.
 *
 * @param cable with a section that the tables hold
 * @returns null where no section passes
 */
export function smallestPassingSection(solution: CircuitSolution, { worst, idle }: LaneColumns, lane: number, cable: OwnCable): number | null {
  const { network, worst: { currents } } = solution;
  const { fourCore, loads, minV } = network;
  const runs = worst[lane];
  if (!runs) return null;
  const nowOhm = cable.lengthM * ohmPerMetre(cable.sectionMm2, cable.conductorClass, cable.temperatureC);
  const amps = fourCore[lane] ? 2 * largestRunA(solution, lane) + loads.controlA[lane] : 2 * largestRunA(solution, lane);
  const least = minV[lane] - 1e-9;
  for (const section of STANDARD_SECTIONS_MM2) {
    if (loads.constantPower[lane] && section < cable.sectionMm2) continue;
    const lessOhm = nowOhm - cable.lengthM * ohmPerMetre(section, cable.conductorClass, cable.temperatureC);
    const idles = idle[lane];
    const idlePasses = !idles || idles.volts + 2 * currents.alwaysReturn[lane] * lessOhm >= least;
    if (runs.volts + amps * lessOhm >= least && idlePasses) return section;
  }
  return null;
}

const NO_PROFILE: LaneFigures['profile'] = [];

type Filling = { -readonly [Column in keyof LaneColumns]: LaneColumns[Column] extends readonly (infer T)[] ? T[] : LaneColumns[Column] };

/** Adds what running does to the potentials of both supply conductors at the devices of a station: over the trunk, then over their own cables. */
function addRises({ network, worst, limit }: CircuitSolution, { station, lanes }: StationGroup, { zeroRiseV, plusDropV }: Filling): void {
  const { alwaysReturn, addedReturn, alwaysOut, addedOut } = worst.currents;
  const zero = viewStation(network, worst.currents, station, ZERO_ONLY, limit, worst.upstream);
  for (const t of lanes) zeroRiseV[t] = sharedDropV(network, zero, t, limit) + network.ownOhm[t] * (alwaysReturn[t] + Math.max(0, addedReturn[t]));
  const plus = viewStation(network, worst.currents, station, PLUS_ONLY, limit, worst.upstream);
  for (const t of lanes) plusDropV[t] = sharedDropV(network, plus, t, limit) + network.ownOhm[t] * (alwaysOut[t] + Math.max(0, addedOut[t]));
}

/** Worst drop at the station whether the lane runs or idles, V. */
function sharedDropV(network: CircuitNetwork, at: StationView, t: number, limit: number): number {
  return Math.max(at.alwaysV + othersV(at, t, limit), runningDropV(network, at, t, limit));
}

function readGroup(solution: CircuitSolution, at: StationView, { fourCore, lanes }: StationGroup, drops: ProfileDrops, into: Filling): void {
  const { network, worst, allOn, limit } = solution;
  const { loads, ids } = network;
  // Those outside the largest k share one set while they idle.
  let idleNames: readonly string[] | null = null;
  for (const t of lanes) {
    const others = at.everyone ? null : othersSet(at, t, othersBeside(loads.timed[t] === 1, limit));
    into.worst[t] = figure(network, worst, t, worst.runV[t], others ? namesOf(ids, others, t) : ids);
    into.allOn[t] = figure(network, allOn, t, allOn.runV[t], ids);
    if (fourCore && !loads.timed[t]) {
      const inTop = at.rank[t] >= 0 && at.rank[t] <= limit;
      const set = at.everyone ? ids : inTop ? namesOf(ids, othersSet(at, t, limit)) : (idleNames ??= namesOf(ids, othersSet(at, t, limit)));
      into.idle[t] = figure(network, worst, t, worst.idleV[t], set);
    }
    if (into.worst[t]) into.profile[t] = profileOf(solution, at, t, others, drops);
  }
}

function isFigure({ known }: CircuitNetwork, { collapsed }: CircuitVoltages, t: number, volts: number): boolean {
  return known[t] === 1 && !collapsed && volts > 0;
}

function figure(network: CircuitNetwork, solved: CircuitVoltages, t: number, volts: number, worstSet: readonly string[]): VoltageFigure | null {
  if (!isFigure(network, solved, t, volts)) return null;
  return solved.exact ? { volts, worstSet } : { volts, worstSet, bound: true };
}

/** Names of lanes; the one given first. */
function namesOf(ids: readonly string[], lanes: readonly number[], first = -1): string[] {
  const names = first < 0 ? [] : [ids[first]];
  for (const lane of lanes) names.push(ids[lane]);
  return names;
}

/** What the profiles of a circuit's lanes have in common, by the conductors that count. */
interface ProfileDrops {
  readonly conductors: Conductors;
  readonly supply: LaneFigures['profile'][number];
  /** By station. */
  readonly labels: readonly string[];
  readonly ways: readonly (readonly number[])[];
  /** Drop with what always flows, worst case and each alone, V. */
  readonly alwaysV: Float64Array;
  readonly idleV: Float64Array;
  /** What everybody adds, V; null where a limit binds. */
  readonly everybodyV: Float64Array | null;
}

function profileDrops({ network, worst, alone, lowestV, setV, supplyName, limit }: CircuitSolution, conductors: Conductors): ProfileDrops {
  const { tree } = network;
  return {
    conductors,
    supply: { label: `Supply ${supplyName}`, metres: 0, worstV: lowestV, aloneV: setV },
    labels: [`Terminals ${network.circuit.name}`, ...tree.nodes.map((node) => node.location)],
    ways: Array.from(tree.parent, (_, station) => wayTo(network, station)),
    alwaysV: alwaysDrops(network, worst, conductors),
    idleV: alwaysDrops(network, alone, conductors),
    everybodyV: limit >= network.ids.length ? everybodysDrops(network, worst, conductors) : null,
  };
}

/** From the supply's terminals to the device, with the others of its worst set; null: everybody. */
function profileOf(solution: CircuitSolution, at: StationView, t: number, others: readonly number[] | null, drops: ProfileDrops): LaneFigures['profile'] {
  const { network, worst, alone, lowestV, setV } = solution;
  const { tree } = network;
  const profile: LaneFigures['profile'][number][] = [drops.supply];
  for (const station of drops.ways[at.station]) {
    const trunkOhm = tree.powerOhm[station];
    const added = others ? setDropV(network, worst, at, trunkOhm, t, others) : drops.everybodyV![station];
    profile.push({
      label: drops.labels[station],
      metres: tree.metres[station],
      worstV: lowestV - (drops.alwaysV[station] + added) - ownWayV(network, worst, station, t),
      aloneV: setV - (drops.idleV[station] + addedBy(alone, drops.conductors, trunkOhm, t)) - ownWayV(network, alone, station, t),
    });
  }
  profile.push({ label: 'Device', metres: tree.metres[at.station] + network.ownMetres[t], worstV: worst.runV[t], aloneV: alone.runV[t] });
  return profile;
}

/** Drop at every station by everything that always flows, V. */
function alwaysDrops({ tree, station }: CircuitNetwork, { currents, upstream }: CircuitVoltages, { plus, zero }: Conductors): Float64Array {
  const drops = new Float64Array(tree.parent.length).fill(upstream.otherDropV);
  const amps = new Float64Array(drops.length);
  let allA = 0;
  for (let i = 0; i < station.length; i++) {
    amps[station[i]] += currents.alwaysReturn[i] * zero + currents.alwaysOut[i] * plus;
    allA += currents.alwaysReturn[i];
  }
  for (let s = 0; s < drops.length; s++) {
    const shared = sharedPowerOhm(tree, s);
    drops[s] += allA * upstream.sharedOhm;
    for (let other = 0; other < drops.length; other++) drops[s] += amps[other] * shared[other];
  }
  return drops;
}

/** What all lanes together add at every station, V. */
function everybodysDrops({ tree, station }: CircuitNetwork, solved: CircuitVoltages, conductors: Conductors): Float64Array {
  return Float64Array.from(tree.parent, (_, s) => {
    const shared = sharedPowerOhm(tree, s);
    let drop = 0;
    for (let i = 0; i < station.length; i++) drop += Math.max(0, addedBy(solved, conductors, shared[station[i]], i));
    return drop;
  });
}

function wayTo({ tree }: CircuitNetwork, station: number): number[] {
  const way: number[] = [];
  for (let s = station; s >= 0; s = tree.parent[s]) way.push(s);
  return way.reverse();
}

/** Drop that the lane and the others of its worst set add at a station on the lane's way, V. */
function setDropV(network: CircuitNetwork, solved: CircuitVoltages, at: StationView, trunkOhm: number, t: number, others: readonly number[]): number {
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
