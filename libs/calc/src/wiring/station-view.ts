import { sharedPowerOhm } from './box-tree.ts';
import type { Currents } from './currents.ts';
import { selectLargest } from './largest.ts';
import type { CircuitNetwork } from './network.ts';

/** Which shared conductors of the trunk count for a drop: +24 V, 0 V or both. */
export interface Conductors {
  readonly plus: 0 | 1;
  readonly zero: 0 | 1;
}
export const BOTH: Conductors = { plus: 1, zero: 1 };
export const ZERO_ONLY: Conductors = { plus: 0, zero: 1 };
export const PLUS_ONLY: Conductors = { plus: 1, zero: 0 };

/** What lies before the circuit's terminals. */
export interface Upstream {
  /** Supply and protection, shared by the whole circuit, Ω. */
  readonly sharedOhm: number;
  /** Drop that others on the same supply make in its internal resistance, V. */
  readonly otherDropV: number;
}

/** The drop at one station: what always flows, and what each lane adds when it runs. */
export interface StationView {
  readonly station: number;
  readonly conductors: Conductors;
  /** Drop by everything that always flows, V. */
  readonly alwaysV: number;
  /** What each lane's running adds, V. */
  readonly addedV: Float64Array;
  /** Shared resistance of one power conductor with each station, Ω. */
  readonly sharedOhm: Float64Array;
  /** No limit binds: all may run at once. */
  readonly everyone: boolean;
  /** What all of them add that add anything, V; only where `everyone`. */
  readonly everyoneV: number;
  /** The `found` lanes that add most, largest first: one more than the limit, so that any one can be left out. Empty where `everyone`. */
  readonly top: Int32Array;
  readonly found: number;
  /** prefix[m]: sum of the m largest, V. */
  readonly prefix: Float64Array;
  /** Place of each lane in `top`, −1 outside. */
  readonly rank: Int32Array;
}

/** One view with its buffers serves all: it is good until the next one is made. */
const view = {
  station: 0, conductors: BOTH, alwaysV: 0, sharedOhm: new Float64Array(0) as Float64Array, everyone: false, everyoneV: 0, found: 0,
  addedV: new Float64Array(0), top: new Int32Array(0), prefix: new Float64Array(1), rank: new Int32Array(0),
};

/** Looks at a circuit from one station. The view is overwritten by the next one. */
export function viewStation(
  network: CircuitNetwork, currents: Currents, station: number, conductors: Conductors, limit: number, upstream: Upstream,
): StationView {
  const size = network.ids.length;
  for (let place = 0; place < view.found; place++) view.rank[view.top[place]] = -1;
  if (view.addedV.length < size) growBuffers(size);
  view.station = station;
  view.conductors = conductors;
  view.sharedOhm = sharedPowerOhm(network.tree, station);
  view.everyone = limit >= size;
  view.found = 0;
  view.everyoneV = 0;
  addUp(network, currents, conductors, upstream);
  if (!view.everyone && limit > 0) rankLargest(size, limit + 1);
  return view;
}

function growBuffers(size: number): void {
  view.addedV = new Float64Array(size);
  view.top = new Int32Array(size);
  view.prefix = new Float64Array(size + 1);
  view.rank = new Int32Array(size).fill(-1);
}

function rankLargest(size: number, count: number): void {
  const { addedV, top, prefix, rank } = view;
  view.found = selectLargest(addedV, size, count, top);
  for (let place = 0; place < view.found; place++) {
    rank[top[place]] = place;
    prefix[place + 1] = prefix[place] + addedV[top[place]];
  }
}

/** The `count` lanes other than `lane` that add most: their sum, V. */
export function othersV({ everyone, everyoneV, found, prefix, rank, addedV }: StationView, lane: number, count: number): number {
  if (everyone) return everyoneV - Math.max(0, addedV[lane]);
  const place = rank[lane];
  if (place >= 0 && place <= count) return prefix[Math.min(count + 1, found)] - addedV[lane];
  return prefix[Math.min(count, found)];
}

/** The same lanes by index; only where a limit binds. */
export function othersSet({ top, found, rank }: StationView, lane: number, count: number): number[] {
  const place = rank[lane];
  const taken = Math.min(place < 0 || place > count ? count : count + 1, found);
  const others: number[] = [];
  for (let i = 0; i < taken; i++) if (top[i] !== lane) others.push(top[i]);
  return others;
}

/** Fills what each lane adds at the station in view, and sums what always flows. */
function addUp(
  { station, ids }: CircuitNetwork, { alwaysOut, alwaysReturn, addedOut, addedReturn, addedSupply }: Currents, { plus, zero }: Conductors,
  { sharedOhm: upstreamOhm, otherDropV }: Upstream,
): void {
  const { addedV, sharedOhm } = view;
  let alwaysV = otherDropV;
  let everyoneV = 0;
  for (let i = 0; i < ids.length; i++) {
    const trunk = sharedOhm[station[i]];
    const returnOhm = zero * trunk;
    const outOhm = plus * trunk;
    alwaysV += alwaysReturn[i] * (upstreamOhm + returnOhm) + alwaysOut[i] * outOhm;
    const added = addedSupply[i] * upstreamOhm + addedReturn[i] * returnOhm + addedOut[i] * outOhm;
    addedV[i] = added;
    if (added > 0) everyoneV += added;
  }
  view.alwaysV = alwaysV;
  view.everyoneV = everyoneV;
}
