import * as schema from '#schema';
import { eq, sql } from 'drizzle-orm';
import { drizzle } from 'drizzle-orm/postgres-js';
import type postgres from 'postgres';
import type { Design } from '#calc';
import { v7 as newId } from 'uuid';
import { insertCatalogue } from '../insert-design.ts';
import { seedIds } from '../seed-ids.ts';
import { insertProjectFast } from './bulk-insert.ts';
import { generateDesign, type GenerateOptions, projectName } from './generate-design.ts';
import type { Tx } from './transaction.ts';

/** Why a project is not made, as a sentence that says what to do. */
export class SeedRefused extends Error {}

export interface SeededProject {
  readonly id: string;
  readonly name: string;
  readonly lanes: number;
}

/**
 * Makes a generated project in an organisation, with one entry in its history. Catalogue entries that the
 * organisation has by name are used as they are, missing ones added.
 *
 * @param owner a connection as the owner role
 * @throws {SeedRefused} where the name is taken or nobody is a member
 * @throws {RangeError} as `generateDesign`
 */
export async function seedGeneratedProject(owner: postgres.Sql, orgId: string, options: Pick<GenerateOptions, 'lanes' | 'seed' | 'name'>): Promise<SeededProject> {
  const name = options.name ?? projectName(options);
  const project = await drizzle(owner).transaction(async (tx) => {
    await tx.execute(sql`select set_config('lanewright.org_id', ${orgId}, true)`);
    await refuseTaken(tx, name);
    const known = await catalogueIds(tx);
    const fresh = seedIds(`${orgId}: catalogue`);
    const design = generateDesign({ ...options, name, owner: orgId, catalogueId: (entry) => known.get(entry) ?? fresh(entry) });
    await insertCatalogue(tx, orgId, missingOf(design, known));
    await insertProjectFast(tx, orgId, design, 1);
    await recordOrigin(tx, orgId, design, options.lanes);
    return design.project;
  });
  // The planner must know of the rows at once, not at the next automatic round.
  await owner`analyze points, dispensers, assignments, modules, module_groups, circuits, cable_nodes`;
  return { id: project.id, name, lanes: options.lanes };
}

async function refuseTaken(tx: Tx, name: string): Promise<void> {
  const taken = await tx.select({ id: schema.projects.id }).from(schema.projects).where(eq(schema.projects.name, name));
  if (taken.length > 0) throw new SeedRefused(`The organisation has a project “${name}” already. Give this one another name with --name.`);
}

const TYPES = [schema.dispenserTypes, schema.moduleTypes, schema.cableTypes, schema.supplyTypes] as const;

/** Ids of the first versions of the organisation's catalogue entries, by name. */
async function catalogueIds(tx: Tx): Promise<ReadonlyMap<string, string>> {
  const rows = await tx.select({ name: schema.greases.name, id: schema.greases.id }).from(schema.greases);
  for (const table of TYPES) rows.push(...(await tx.select({ name: table.name, id: table.id }).from(table).where(eq(table.typeVersion, 1))));
  return new Map(rows.map(({ name, id }) => [name, id]));
}

function missingOf(design: Design, known: ReadonlyMap<string, string>): Design {
  const missing = <T extends { readonly name: string }>(rows: readonly T[]): T[] => rows.filter(({ name }) => !known.has(name));
  const { dispenserTypes, moduleTypes, cableTypes, supplyTypes, greases } = design;
  return {
    ...design, dispenserTypes: missing(dispenserTypes), moduleTypes: missing(moduleTypes), cableTypes: missing(cableTypes), supplyTypes: missing(supplyTypes),
    greases: missing(greases),
  };
}

/** The one entry of its history: who made it from what. It lists no rows, so there is nothing to undo. */
async function recordOrigin(tx: Tx, orgId: string, { project }: Design, lanes: number): Promise<void> {
  const members = await tx.select({ personId: schema.memberships.personId, roles: schema.memberships.roles }).from(schema.memberships);
  const author = members.find(({ roles }) => roles.includes('engineer')) ?? members[0];
  if (!author) throw new SeedRefused('The organisation has no members. Add an engineer first, who then stands in the history.');
  await tx.insert(schema.changeSets).values({
    id: newId(), orgId, projectId: project.id, sequence: 1, personId: author.personId, summary: `Generated project of ${lanes} lanes`,
  });
}
