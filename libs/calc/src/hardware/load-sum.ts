/** Loads that meet in one place (a group, a module, a supply), by the circuit whose limit k governs them. */
export interface LoadSum {
  readonly parts: readonly CircuitLoad[];
}

/** The loads that one circuit brings to a place. */
export interface CircuitLoad {
  readonly circuitId: string | null;
  /** Dispenser ids, largest load first. */
  readonly ids: readonly string[];
  /** prefix[m]: sum of the m largest, A. */
  readonly prefix: readonly number[];
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
  if (loads.length === 0) return NO_LOADS;
  const [{ circuitId }] = loads;
  if (loads.every((load) => load.circuitId === circuitId)) return { parts: [circuitLoad(circuitId, loads.slice())] };
  const byCircuit = new Map<string | null, Load[]>();
  for (const load of loads) {
    const own = byCircuit.get(load.circuitId);
    if (own) own.push(load);
    else byCircuit.set(load.circuitId, [load]);
  }
  return { parts: Array.from(byCircuit, ([id, own]) => circuitLoad(id, own)) };
}

const NO_LOADS: LoadSum = { parts: [] };

/** Up to so many, sorting each into its place is quicker than a general sort; most lists arrive in order. */
const FEW = 48;

function circuitLoad(circuitId: string | null, loads: Load[]): CircuitLoad {
  if (loads.length > FEW) loads.sort((a, b) => (lighter(a, b) ? 1 : -1));
  else sortFew(loads);
  const prefix = [0];
  const ids: string[] = [];
  for (let i = 0; i < loads.length; i++) {
    ids.push(loads[i].id);
    prefix.push(prefix[i] + Math.max(0, loads[i].amps));
  }
  return { circuitId, ids, prefix };
}

function sortFew(loads: Load[]): void {
  for (let i = 1; i < loads.length; i++) {
    const load = loads[i];
    let at = i;
    for (; at > 0 && lighter(loads[at - 1], load); at--) loads[at] = loads[at - 1];
    loads[at] = load;
  }
}

/** Whether a comes after b: lighter, or as heavy and later by id. */
function lighter(a: Load, b: Load): boolean {
  return a.amps < b.amps || (a.amps === b.amps && a.id > b.id);
}

/** Worst sum under the limits: for each circuit its k largest, A. */
export function worstSum({ parts }: LoadSum, limitOf: LimitOf): number {
  let sum = 0;
  for (const { circuitId, prefix } of parts) sum += prefix[Math.min(limitOf(circuitId), prefix.length - 1)];
  return sum;
}

/** The dispensers in that set. */
export function worstSetOf({ parts }: LoadSum, limitOf: LimitOf): string[] {
  const set: string[] = [];
  for (const { circuitId, ids } of parts) {
    const count = Math.min(limitOf(circuitId), ids.length);
    for (let i = 0; i < count; i++) set.push(ids[i]);
  }
  return set;
}
