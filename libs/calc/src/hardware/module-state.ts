import type { CircuitContext } from '../assess-context.ts';
import type { Assignment } from '../design.ts';
import { groupKey } from '../design-index.ts';
import type { Finding } from '../findings.ts';
import { type Lane, type LaneRows, type ModulePlace, sameItems } from '../lane-rows.ts';
import { moduleMappingFindings } from '../mapping/mapping-findings.ts';
import { loadFindings } from './load-findings.ts';
import type { LimitOf } from './load-sum.ts';
import { type ModuleLoads, moduleLoads, type ModuleRows, type MotorCurrents } from './loads.ts';

/** A module's loads with the rows that they come from. */
export interface LoadedModule {
  readonly rows: ModuleRows;
  readonly loads: ModuleLoads;
  /** Keys of its groups. */
  readonly groupKeys: readonly string[];
  readonly mappingFindings: readonly Finding[];
  /** The places of its lanes in the design, good for the table of places that they were looked up in. */
  readonly places: readonly number[];
  readonly placeOf: LaneRows['placeOf'];
}

/** All that is known of a module. */
export interface ModuleState extends LoadedModule {
  /** The circuits that load it, with their figures. */
  readonly circuits: readonly CircuitContext[];
  readonly loadFindings: readonly Finding[];
}

/** Loads and mapping of a module whose type is known; the state before where rows and currents are the same. */
export function loadModule(
  place: ModulePlace, assignments: readonly Assignment[], { lanes, placeOf }: LaneRows, currents: MotorCurrents, limitOf: LimitOf, before: ModuleState | undefined,
): LoadedModule {
  const sameChannels = before !== undefined && before.placeOf === placeOf && sameItems(before.rows.assignments, assignments);
  const places = sameChannels ? before.places : assignments.map(({ dispenserId }) => placeOf.get(dispenserId) ?? -1);
  const sameRows = sameChannels && before.rows.place === place && sameLanes(before.rows.lanes, lanes, places);
  if (sameRows && !anySolvedAnew(places, currents)) return before;
  const rows = sameRows ? before.rows : { place, assignments, lanes: places.map((at) => (at < 0 ? null : lanes[at])) };
  const loads = moduleLoads(place.type!, rows, places, currents, limitOf);
  const groupKeys = before?.groupKeys.length === loads.groups.length ? before.groupKeys : loads.groups.map((_, g) => groupKey(place.module.id, g));
  return { rows, loads, groupKeys, places, placeOf, mappingFindings: sameRows ? before.mappingFindings : moduleMappingFindings(rows) };
}

function sameLanes(before: readonly (Lane | null)[], lanes: readonly Lane[], places: readonly number[]): boolean {
  for (let i = 0; i < places.length; i++) if (before[i] !== (places[i] < 0 ? null : lanes[places[i]])) return false;
  return true;
}

function anySolvedAnew(places: readonly number[], { solvedAnew }: MotorCurrents): boolean {
  for (const at of places) if (at >= 0 && solvedAnew[at] === 1) return true;
  return false;
}

/** Completes a module once the circuits have their figures, which its findings name; the state before where they are the same. */
export function moduleState(loaded: LoadedModule, contexts: ReadonlyMap<string, CircuitContext>, before: ModuleState | undefined): ModuleState {
  const circuits: CircuitContext[] = [];
  for (const { circuitId } of loaded.loads.loaded) {
    const context = circuitId === null ? undefined : contexts.get(circuitId);
    if (context) circuits.push(context);
  }
  if (before === loaded && sameItems(before.circuits, circuits)) return before;
  const { rows, loads, groupKeys, mappingFindings, places, placeOf } = loaded;
  return { rows, loads, groupKeys, mappingFindings, places, placeOf, circuits, loadFindings: loadFindings(rows, loads, contexts) };
}
