import type { CircuitContext } from './assess-context.ts';
import type { Supply } from './design.ts';
import type { DesignIndex } from './design-index.ts';
import type { LimitOf } from './hardware/load-sum.ts';
import type { MotorCurrents, RatedSum } from './hardware/loads.ts';
import { type LoadedModule, loadModule, type ModuleState, moduleState } from './hardware/module-state.ts';
import { type SupplyState, supplyState } from './hardware/supply-state.ts';
import type { LaneRows } from './lane-rows.ts';
import { largestAllOnRunA, largestRunA } from './wiring/lane-voltages.ts';
import { type CircuitRows, limitOfCircuit, sameSupply, type SolvedSupply, solveSupply, type SupplyRows } from './wiring/supply-network.ts';

/** The electrical side of a design: voltages, loads, circuits, supplies, modules, and what is wrong with them. */
export interface Electrics {
  /** By supply id. */
  readonly supplies: ReadonlyMap<string, SupplyState>;
  /** By module id; only modules whose type is known. */
  readonly modules: ReadonlyMap<string, ModuleState>;
  /** By circuit id; only circuits that a supply feeds. */
  readonly circuits: ReadonlyMap<string, CircuitContext>;
  /** The circuit of each lane, by its place in the design, and its place in the circuit's columns; null and −1: in none. */
  readonly circuitOf: readonly (CircuitContext | null)[];
  readonly columnOf: Int32Array;
}

/** Solves the electrical side of a design, taking over from `previous` what has the same rows. */
export function solveElectrics(index: DesignIndex, rows: LaneRows, previous: Electrics | null): Electrics {
  const limitOf: LimitOf = (id) => limitOfCircuit((id === null ? null : rows.circuits.get(id)?.circuit.concurrencyLimit) ?? null);
  const solved = index.design.supplies.map((supply) => solvedSupply(index, rows, supply, previous));
  const loaded = loadedModules(index, rows, motorCurrents(rows, solved, previous), limitOf, previous);
  const rated = ratedByCircuit(loaded);
  const supplies = new Map<string, SupplyState>();
  const circuits = new Map<string, CircuitContext>();
  for (const one of solved) {
    const { id } = one.rows.supply;
    const state = supplyState(one, rated, limitOf, previous?.supplies.get(id));
    supplies.set(id, state);
    for (const circuit of state.context.circuits) circuits.set(circuit.rows.circuit.id, circuit);
  }
  const modules = new Map<string, ModuleState>();
  for (const one of loaded) {
    const { id } = one.rows.place.module;
    modules.set(id, moduleState(one, circuits, previous?.modules.get(id)));
  }
  return { supplies, modules, circuits, ...lanePlaces(rows, circuits) };
}

function solvedSupply(index: DesignIndex, rows: LaneRows, supply: Supply, previous: Electrics | null): SolvedSupply {
  const own = supplyRows(index, rows, supply);
  const before = previous?.supplies.get(supply.id)?.context.solved;
  return before && sameSupply(before.rows, own) ? before : solveSupply(own);
}

function supplyRows(index: DesignIndex, rows: LaneRows, supply: Supply): SupplyRows {
  const { nodesByCircuit, nodes: allNodes } = index;
  const circuits = (index.circuitsBySupply.get(supply.id) ?? []).map((circuit): CircuitRows => {
    const nodes = nodesByCircuit.get(circuit.id) ?? [];
    return {
      circuit,
      nodes,
      parents: nodes.map(({ parentId }) => (parentId === null ? null : (allNodes.get(parentId) ?? null))),
      lanes: (rows.byCircuit.get(circuit.id) ?? []).map((place) => rows.lanes[place]),
    };
  });
  return { project: index.design.project, supply, type: index.supplyTypes.get(supply.typeId), cabinet: index.cabinets.get(supply.cabinetId), circuits };
}

/** Motor currents of all lanes by their place in the design. */
function motorCurrents(rows: LaneRows, solved: readonly SolvedSupply[], previous: Electrics | null): MotorCurrents {
  const size = rows.lanes.length;
  const currents = { runA: new Float64Array(size).fill(NaN), allOnRunA: new Float64Array(size).fill(NaN), solvedAnew: new Uint8Array(size) };
  for (const one of solved) {
    const anew = previous?.supplies.get(one.rows.supply.id)?.context.solved === one ? 0 : 1;
    for (const solution of one.circuits) {
      const places = rows.byCircuit.get(solution.network.circuit.id) ?? [];
      for (let column = 0; column < places.length; column++) {
        currents.runA[places[column]] = largestRunA(solution, column);
        currents.allOnRunA[places[column]] = largestAllOnRunA(solution, column);
        currents.solvedAnew[places[column]] = anew;
      }
    }
  }
  return currents;
}

function lanePlaces(rows: LaneRows, circuits: ReadonlyMap<string, CircuitContext>): Pick<Electrics, 'circuitOf' | 'columnOf'> {
  const circuitOf = new Array<CircuitContext | null>(rows.lanes.length).fill(null);
  const columnOf = new Int32Array(rows.lanes.length).fill(-1);
  for (const [id, circuit] of circuits) {
    const places = rows.byCircuit.get(id) ?? [];
    for (let column = 0; column < places.length; column++) {
      circuitOf[places[column]] = circuit;
      columnOf[places[column]] = column;
    }
  }
  return { circuitOf, columnOf };
}

function loadedModules(index: DesignIndex, rows: LaneRows, currents: MotorCurrents, limitOf: LimitOf, previous: Electrics | null): LoadedModule[] {
  const { assignmentsByModule } = index;
  const loaded: LoadedModule[] = [];
  for (const module of index.design.modules) {
    const place = rows.modules.get(module.id);
    if (!place?.type) continue;
    loaded.push(loadModule(place, assignmentsByModule.get(module.id) ?? [], rows, currents, limitOf, previous?.modules.get(module.id)));
  }
  return loaded;
}

/** Groups and modules that limit something, by the circuits whose lanes load them. */
function ratedByCircuit(loaded: readonly LoadedModule[]): Map<string, RatedSum[]> {
  const byCircuit = new Map<string, RatedSum[]>();
  for (const { loads } of loaded) {
    for (const rated of loads.rated) {
      for (const { circuitId } of rated.sum.parts) {
        if (circuitId === null) continue;
        const places = byCircuit.get(circuitId);
        if (places) places.push(rated);
        else byCircuit.set(circuitId, [rated]);
      }
    }
  }
  return byCircuit;
}
