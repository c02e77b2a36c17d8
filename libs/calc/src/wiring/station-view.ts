import { sharedPowerOhm } from './box-tree.ts';
import type { Currents } from './currents.ts';
import { allPositive, largestPositive } from './largest.ts';
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
  /** What each lane's running adds, V. A buffer that the next view overwrites. */
  readonly addedV: Float64Array;
  /** Shared resistance of one power conductor with each station, Ω. A buffer. */
  readonly sharedOhm: Float64Array;
  /** The lanes that add most, largest first: one more than the limit, so that any one can be left out. Without a limit: all, in no order. */
  readonly top: Int32Array;
  /** prefix[m]: sum of the m largest, V. */
  readonly prefix: Float64Array;
  /** Place of each lane in `top`, −1 outside. A buffer. */
  readonly rank: Int32Array;
}

/** Makes views of one circuit with buffers of its own; a view is good until the next one is made. */
export function stationViewer(network: CircuitNetwork): (
  currents: Currents, station: number, conductors: Conductors, limit: number, upstream: Upstream,
) => StationView {
  const n = network.ids.length;
  const addedV = new Float64Array(n);
  const rank = new Int32Array(n).fill(-1);
  const sharedOhm = new Float64Array(network.tree.parent.length);
  let previous: Int32Array = new Int32Array(0);
  return (currents, station, conductors, limit, upstream) => {
    sharedPowerOhm(network.tree, station, sharedOhm);
    const alwaysV = addUp(network, currents, sharedOhm, conductors, upstream, addedV);
    for (const i of previous) rank[i] = -1;
    const top = limit >= n ? allPositive(addedV) : largestPositive(addedV, limit + 1);
    previous = top;
    const prefix = new Float64Array(top.length + 1);
    top.forEach((lane, place) => {
      rank[lane] = place;
      prefix[place + 1] = prefix[place] + addedV[lane];
    });
    return { station, conductors, alwaysV, addedV, sharedOhm, top, prefix, rank };
  };
}

/** The `count` lanes other than `lane` that add most: their sum, V. */
export function othersV({ top, prefix, rank, addedV }: StationView, lane: number, count: number): number {
  const place = rank[lane];
  if (place >= 0 && place <= count) return prefix[Math.min(count + 1, top.length)] - addedV[lane];
  return prefix[Math.min(count, top.length)];
}

/** The same lanes by index. */
export function othersSet({ top, rank }: StationView, lane: number, count: number): Int32Array {
  const place = rank[lane];
  if (place < 0 || place > count) return top.slice(0, Math.min(count, top.length));
  return top.slice(0, Math.min(count + 1, top.length)).filter((other) => other !== lane);
}

function addUp(
  { station, ids }: CircuitNetwork, currents: Currents, shared: Float64Array, { plus, zero }: Conductors, upstream: Upstream,
  addedV: Float64Array,
): number {
  const { alwaysOut, alwaysReturn, addedOut, addedReturn, addedSupply } = currents;
  let alwaysV = upstream.otherDropV;
  for (let i = 0; i < ids.length; i++) {
    const trunk = shared[station[i]];
    const returnOhm = zero * trunk;
    const outOhm = plus * trunk;
    alwaysV += alwaysReturn[i] * (upstream.sharedOhm + returnOhm) + alwaysOut[i] * outOhm;
    addedV[i] = addedSupply[i] * upstream.sharedOhm + addedReturn[i] * returnOhm + addedOut[i] * outOhm;
  }
  return alwaysV;
}
