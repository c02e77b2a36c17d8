import type { BearingFactors, Design, Dispenser, Module, ModuleGroup, ModuleType, Point, Project } from '#calc';
import type { SeedIds } from './seed-ids.ts';

/** A point with its dispenser, by the names that people use; what is left out is blank. */
export interface SeedLane {
  readonly tag: string;
  readonly point: Partial<Omit<Point, 'id' | 'tag' | 'factors' | 'greaseId'>> & { readonly grease?: string; readonly factors?: Partial<BearingFactors> };
  readonly dispenser: Partial<Omit<Dispenser, 'id' | 'pointId' | 'typeId' | 'controllerId' | 'circuitId' | 'nodeId'>> & {
    readonly type: string;
    readonly controller: string;
    readonly circuit: string;
    readonly box?: string;
  };
  /** Module and channel; left out: unmapped. */
  readonly output?: readonly [module: string, channel: number];
  readonly status?: readonly [module: string, channel: number];
}

/** A module on a rack. */
export interface SeedModule {
  readonly controller: string;
  readonly name: string;
  readonly type: string;
  readonly baseByte: number;
  readonly slot: number;
}

const NO_CORRECTION: BearingFactors = { temperature: 1, contamination: 1, moisture: 1, vibration: 1, position: 1, design: 1 };

/** The policies of a new project, as the database sets them too. */
export const DEFAULT_POLICIES: Omit<Project, 'id' | 'name' | 'description' | 'timeZone'> = {
  voltageTempC: 40, tripTempC: 70, sparePercent: 20, supplyMarginPercent: 25, maxCartridgeDays: 365, minCartridgeDays: 30,
  maxOverGreasingPercent: 5, relayLifeYears: 10, slotMs: null, breakerDcFactor: 1.5, rankBy: 'fewest-changes', demandPer: '1000h',
};

/** Ids of a seed: of the organisation's catalogue and of the project's own rows. */
export interface DesignIds {
  readonly catalogue: SeedIds;
  readonly row: SeedIds;
}

/** Points, dispensers and assignments of lanes that are told by names. */
export function laneRows(lanes: readonly SeedLane[], { catalogue, row }: DesignIds): Pick<Design, 'points' | 'dispensers' | 'assignments'> {
  return {
    points: lanes.map((lane) => pointRow(lane, catalogue, row)),
    dispensers: lanes.map((lane) => dispenserRow(lane, catalogue, row)),
    assignments: lanes.flatMap(({ tag, dispenser: { controller }, output, status }) =>
      (['control', 'status'] as const).flatMap((purpose) => {
        const place = purpose === 'control' ? output : status;
        if (!place) return [];
        const [module, channel] = place;
        return [{ id: row(`${purpose} ${tag}`), dispenserId: row(`dispenser ${tag}`), moduleId: row(`module ${controller} ${module}`), channel, purpose }];
      }),
    ),
  };
}

function pointRow({ tag, point: { grease, factors, ...given } }: SeedLane, catalogue: SeedIds, row: SeedIds): Point {
  return {
    description: null, function: null, location: null, product: null, machine: null, remarks: null, hoursPerDay: null, daysPerWeek: 7,
    demandWay: null, boreMm: null, outsideMm: null, widthMm: null, speedRpm: null, statedUl: null, statedPer: '1000h',
    practiceStrokes: null, practiceGramsPerStroke: null, practiceEveryDays: null, zone: null,
    ...given,
    id: row(`point ${tag}`), tag, factors: { ...NO_CORRECTION, ...factors },
    greaseId: grease === undefined ? null : catalogue(grease),
  };
}

function dispenserRow({ tag, dispenser: { type, controller, circuit, box, ...given } }: SeedLane, catalogue: SeedIds, row: SeedIds): Dispenser {
  return {
    wiring: null, method: 'pulse', cartridgeUl: null, doseUl: null, periodMonths: null, cableTag: null, cableLengthM: null,
    crossSectionMm2: null, conductorClass: 5,
    ...given,
    id: row(`dispenser ${tag}`), pointId: row(`point ${tag}`), typeId: catalogue(type), controllerId: row(`controller ${controller}`),
    circuitId: row(`circuit ${circuit}`), nodeId: box === undefined ? null : row(`box ${box}`),
  };
}

/** Modules, with one row for each output group; `circuitOf` names the circuit that feeds a controller's groups. */
export function moduleRows(
  modules: readonly SeedModule[], types: readonly ModuleType[], circuitOf: (controller: string) => string, { catalogue, row }: DesignIds,
): { readonly modules: Module[]; readonly moduleGroups: ModuleGroup[] } {
  const byId = new Map(types.map((type) => [type.id, type]));
  return {
    modules: modules.map(({ controller, name, type, baseByte, slot }) => ({
      id: row(`module ${controller} ${name}`), controllerId: row(`controller ${controller}`), typeId: catalogue(type), name, baseByte, slot,
    })),
    moduleGroups: modules.flatMap(({ controller, name, type }) =>
      groupsOf(byId.get(catalogue(type))).map((groupIndex) => ({
        id: row(`group ${controller} ${name} ${groupIndex}`), moduleId: row(`module ${controller} ${name}`), groupIndex,
        circuitId: row(`circuit ${circuitOf(controller)}`),
      })),
    ),
  };
}

function groupsOf(type: ModuleType | undefined): number[] {
  if (!type || type.kind === 'input') return [];
  return Array.from({ length: Math.ceil(type.channels / type.channelsPerGroup) }, (_, index) => index);
}
