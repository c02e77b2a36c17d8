import type { Assignment, Cabinet, CableNode, Circuit, Controller, Dispenser, DispenserType, Module, ModuleGroup, Point, Supply } from '#calc';
import type { Catalogue } from '../brackwater-catalogue.ts';
import type { SeedIds } from '../seed-ids.ts';
import type { Random } from './random.ts';

/** A row that is still being made. */
export type Draft<T> = { -readonly [K in keyof T]: T[K] };

/** A lane before it has its place on the hardware. */
export interface LaneDraft {
  readonly point: Draft<Point>;
  readonly dispenser: Draft<Dispenser>;
  /** As chosen, whatever a seeded fault then blanks. */
  readonly type: DispenserType;
  /** False: left for somebody to map. */
  mapped: boolean;
  /** Its output goes to a group that another circuit feeds. */
  astray: boolean;
}

/** A finding that the generator has seeded on purpose: its code, and the row that it names. */
export interface PlannedFinding {
  readonly code: string;
  /** Id of the dispenser or of the circuit. */
  readonly id: string;
}

/** A part of the plant with a cabinet of its own. */
export interface Area {
  /** Its function and location aspect without sign, for instance R1. */
  readonly code: string;
  readonly name: string;
  /** Combustible dust: zone 22, and 21 where dust gathers. */
  readonly dusty: boolean;
  readonly daysPerWeek: number;
}

/** The project as it grows. */
export interface Site {
  readonly random: Random;
  readonly id: () => string;
  readonly catalogue: Catalogue;
  readonly catalogueId: SeedIds;
  readonly planned: PlannedFinding[];
  /** Machines so far, by class code. */
  readonly machines: Map<string, number>;
  readonly points: Point[];
  readonly dispensers: Dispenser[];
  readonly cabinets: Cabinet[];
  readonly controllers: Controller[];
  readonly modules: Module[];
  readonly moduleGroups: ModuleGroup[];
  readonly supplies: Supply[];
  readonly circuits: Circuit[];
  readonly cableNodes: CableNode[];
  readonly assignments: Assignment[];
}
