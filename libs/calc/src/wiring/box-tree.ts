import type { CableNode } from '../design.ts';
import { ohmPerMetre } from './conductor.ts';

/**
 * The trunks of a circuit as columns, parents before children. Station 0 is the circuit's terminals in
 * the cabinet; station s > 0 is the junction box `nodes[s - 1]`.
 */
export interface BoxTree {
  readonly nodes: readonly CableNode[];
  readonly stationOf: ReadonlyMap<string, number>;
  /** Station before; −1 for the terminals. */
  readonly parent: Int32Array;
  /** Way from the terminals, m. */
  readonly metres: Float64Array;
  /** Resistance from the terminals of one conductor of the power pair, Ω. */
  readonly powerOhm: Float64Array;
  /** The same of one core of the signal multicore, Ω. */
  readonly signalOhm: Float64Array;
  /** 0 where a trunk on the way has no known resistance. */
  readonly known: Uint8Array;
  readonly problems: readonly BoxProblem[];
  /** By station: the resistances shared with it, once somebody has asked for them. */
  readonly shared: (Float64Array | undefined)[];
}

export interface BoxProblem {
  readonly node: CableNode;
  readonly kind: 'unknown-section' | 'loop';
  readonly message: string;
}

/**
 * Builds the tree of one circuit's boxes. A trunk without a known resistance counts as none for others
 * and marks everything behind it as unknown; boxes that hang in a loop, or on a box of another circuit,
 * are reported and hang on the terminals, unknown.
 *
 * @param nodes the boxes of one circuit, in any order
 * @param temperatureC conductor temperature, °C
 */
export function buildBoxTree(nodes: readonly CableNode[], temperatureC: number): BoxTree {
  const problems: BoxProblem[] = [];
  const ordered = parentsFirst(nodes, problems);
  const looped = new Set(problems.map((problem) => problem.node.id));
  const size = ordered.length + 1;
  const tree = {
    nodes: ordered,
    stationOf: new Map<string, number>(),
    parent: new Int32Array(size).fill(-1),
    metres: new Float64Array(size),
    powerOhm: new Float64Array(size),
    signalOhm: new Float64Array(size),
    known: new Uint8Array(size).fill(1),
    problems,
    shared: new Array<Float64Array | undefined>(size).fill(undefined),
  };
  for (let s = 1; s < size; s++) {
    const node = ordered[s - 1];
    const parent = looped.has(node.id) || node.parentId === null ? 0 : tree.stationOf.get(node.parentId) ?? 0;
    const segment = segmentOhm(node, temperatureC, problems);
    tree.stationOf.set(node.id, s);
    tree.parent[s] = parent;
    tree.metres[s] = tree.metres[parent] + node.lengthM;
    tree.powerOhm[s] = tree.powerOhm[parent] + (segment?.power ?? 0);
    tree.signalOhm[s] = tree.signalOhm[parent] + (segment?.signal ?? 0);
    tree.known[s] = segment && tree.known[parent] && !looped.has(node.id) ? 1 : 0;
  }
  return tree;
}

/**
 * Resistance of one conductor of the power pair that the way to `station` shares with the way to each
 * other station, Ω: one walk, O(stations), then kept.
 */
export function sharedPowerOhm(tree: BoxTree, station: number): Float64Array {
  const kept = tree.shared[station];
  if (kept) return kept;
  const { parent, powerOhm } = tree;
  const ohm = new Float64Array(parent.length).fill(-1);
  for (let s = station; s >= 0; s = parent[s]) ohm[s] = powerOhm[s];
  for (let s = 0; s < parent.length; s++) if (ohm[s] < 0) ohm[s] = ohm[parent[s]];
  tree.shared[station] = ohm;
  return ohm;
}

function segmentOhm(node: CableNode, temperatureC: number, problems: BoxProblem[]): { power: number; signal: number } | null {
  try {
    return {
      power: node.lengthM * ohmPerMetre(node.powerMm2, node.conductorClass, temperatureC),
      signal: node.lengthM * ohmPerMetre(node.signalMm2, node.conductorClass, temperatureC),
    };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    problems.push({ node, kind: 'unknown-section', message: error.message });
    return null;
  }
}

/** Orders parents before children without recursion; what is never reached hangs in a loop. */
function parentsFirst(nodes: readonly CableNode[], problems: BoxProblem[]): CableNode[] {
  const own = new Set(nodes.map((node) => node.id));
  const children = new Map<string | null, CableNode[]>();
  for (const node of nodes) {
    const parent = node.parentId !== null && own.has(node.parentId) ? node.parentId : null;
    const siblings = children.get(parent);
    if (siblings) siblings.push(node);
    else children.set(parent, [node]);
  }
  const ordered = [...(children.get(null) ?? [])];
  for (const node of ordered) for (const child of children.get(node.id) ?? []) ordered.push(child);
  const reached = new Set(ordered);
  for (const node of nodes) {
    if (reached.has(node)) continue;
    problems.push({ node, kind: 'loop', message: `${node.location} hangs on itself` });
    ordered.push(node);
  }
  return ordered;
}
