import type { Design } from '#calc';
import { demoCatalogue } from '../brackwater-catalogue.ts';
import { type SeedIds, seedIds } from '../seed-ids.ts';
import { DEFAULT_POLICIES } from '../seed-rows.ts';
import { addCabinet } from './cabinet.ts';
import { randomOf } from './random.ts';
import { rowIds } from './row-ids.ts';
import type { PlannedFinding, Site } from './site.ts';

/** How many lanes a generated project may have. */
export const LANES = { least: 100, most: 50_000 } as const;

export interface GenerateOptions {
  /** Whole, 100 to 50,000. */
  readonly lanes: number;
  readonly seed: number;
  /** Name of the project; left out: one that says how many lanes it has. */
  readonly name?: string;
  /** Tells apart the ids of projects that may meet in one database, for instance an organisation's id. */
  readonly owner?: string;
  /** Ids of the catalogue's entries by name; left out: ids of their own. */
  readonly catalogueId?: SeedIds;
}

export interface GeneratedProject {
  readonly design: Design;
  /** Findings that were seeded on purpose; their consequences come on top. */
  readonly planned: readonly PlannedFinding[];
}

/**
 * An invented plant of any size with machines, points, dispensers, cabinets, cable trees and channels, 95 %
 * mapped, and a few percent of common faults. The same options give the same rows, ids included.
 *
 * @throws {RangeError} lanes that are not a whole number from 100 to 50,000
 */
export function generateProject(options: GenerateOptions): GeneratedProject {
  const { lanes } = options;
  if (!(Number.isInteger(lanes) && lanes >= LANES.least && lanes <= LANES.most)) {
    throw new RangeError(`${lanes} lanes cannot be generated: give a whole number from ${LANES.least} to ${LANES.most}`);
  }
  const name = options.name ?? projectName(options);
  const site = emptySite(options, name);
  const project = { ...DEFAULT_POLICIES, id: site.id(), name, description: `Generated plant with ${lanes} lanes`, timeZone: 'Europe/Amsterdam', slotMs: 60_000 };
  while (site.points.length < lanes) addCabinet(site, lanes - site.points.length);
  const { points, dispensers, cabinets, controllers, modules, moduleGroups, supplies, circuits, cableNodes, assignments } = site;
  const design = { project, ...site.catalogue, points, dispensers, cabinets, controllers, modules, moduleGroups, supplies, circuits, cableNodes, assignments };
  return { design, planned: site.planned };
}

/** The design of `generateProject` alone. @throws {RangeError} as there */
export const generateDesign = (options: GenerateOptions): Design => generateProject(options).design;

/** What a generated project is called unless told otherwise. */
export const projectName = ({ lanes, seed }: Pick<GenerateOptions, 'lanes' | 'seed'>): string => `Generated plant, ${lanes} lanes, seed ${seed}`;

function emptySite({ lanes, seed, owner = '', catalogueId = seedIds('generated: catalogue') }: GenerateOptions, name: string): Site {
  return {
    random: randomOf(`plant ${seed}`), id: rowIds(`${owner}/${name}/${seed}/${lanes}`), catalogue: demoCatalogue(catalogueId), catalogueId,
    planned: [], machines: new Map(), points: [], dispensers: [], cabinets: [], controllers: [], modules: [], moduleGroups: [], supplies: [], circuits: [],
    cableNodes: [], assignments: [],
  };
}
