/** Loads that meet in one place (a group, a module, a supply), by the circuit whose limit k governs them. */
export interface LoadSum {
  readonly byCircuit: ReadonlyMap<string | null, CircuitLoad>;
}

export interface CircuitLoad {
  /** Dispenser ids, largest load first. */
  readonly ids: readonly string[];
  /** prefix[m]: sum of the m largest, A. */
  readonly prefix: Float64Array;
}

/** A load with the circuit that governs it; without a circuit no limit holds. */
export interface Load {
  readonly id: string;
  readonly circuitId: string | null;
  readonly amps: number;
}

/** The limit k of a circuit, Infinity for none. */
export type LimitOf = (circuitId: string | null) => number;

/** Sorts the loads of one place, so that the worst sum under any limits is a look-up. O(n log n). */
export function sumLoads(loads: readonly Load[]): LoadSum {
  const grouped = new Map<string | null, Load[]>();
  for (const load of loads) {
    const group = grouped.get(load.circuitId);
    if (group) group.push(load);
    else grouped.set(load.circuitId, [load]);
  }
  const byCircuit = new Map<string | null, CircuitLoad>();
  for (const [circuitId, group] of grouped) {
    group.sort((a, b) => b.amps - a.amps || (a.id < b.id ? -1 : 1));
    const prefix = new Float64Array(group.length + 1);
    group.forEach((load, i) => (prefix[i + 1] = prefix[i] + Math.max(0, load.amps)));
    byCircuit.set(circuitId, { ids: group.map((load) => load.id), prefix });
  }
  return { byCircuit };
}

/** Worst sum under the limits: for each circuit its k largest, A. */
export function worstSum({ byCircuit }: LoadSum, limitOf: LimitOf): number {
  let sum = 0;
  for (const [circuitId, { prefix }] of byCircuit) sum += prefix[Math.min(limitOf(circuitId), prefix.length - 1)];
  return sum;
}

/** The dispensers in that set. */
export function worstSetOf({ byCircuit }: LoadSum, limitOf: LimitOf): string[] {
  const set: string[] = [];
  for (const [circuitId, { ids }] of byCircuit) {
    const count = Math.min(limitOf(circuitId), ids.length);
    for (let i = 0; i < count; i++) set.push(ids[i]);
  }
  return set;
}
