import * as schema from '#schema';
import type { Design } from '#calc';
import type { PgDatabase, PgInsertValue, PgQueryResultHKT, PgTable } from 'drizzle-orm/pg-core';

/** A database or transaction of any driver. The organisation must be set in it where row-level security is forced. */
export type Inserter = Pick<PgDatabase<PgQueryResultHKT>, 'insert'>;

/** Rows of one statement: widest table times this stays under the 65,535 parameters of a statement. */
const ROWS_A_STATEMENT = 1000;

/** Inserts a project with all its rows and the catalogue that it uses; rows must not exist yet. */
export async function insertDesign(tx: Inserter, orgId: string, design: Design): Promise<void> {
  await insertCatalogue(tx, orgId, design);
  await insertProject(tx, orgId, design);
}

/** Inserts an organisation's catalogue entries. */
export async function insertCatalogue(tx: Inserter, orgId: string, design: Design): Promise<void> {
  const insert = inserter(tx, { orgId });
  await insert(schema.dispenserTypes, design.dispenserTypes);
  await insert(schema.moduleTypes, design.moduleTypes);
  await insert(schema.cableTypes, design.cableTypes);
  await insert(schema.supplyTypes, design.supplyTypes);
  await insert(schema.greases, design.greases);
}

/** Inserts a project and everything below it, in the order in which rows refer to each other. */
export async function insertProject(tx: Inserter, orgId: string, design: Design): Promise<void> {
  await inserter(tx, { orgId })(schema.projects, [design.project]);
  const insert = inserter(tx, { orgId, projectId: design.project.id });
  await insert(schema.cabinets, design.cabinets);
  await insert(schema.controllers, design.controllers);
  await insert(schema.supplies, design.supplies);
  await insert(schema.circuits, design.circuits);
  // One statement: its foreign keys are checked at its end, so a box may stand before its parent.
  await insert(schema.cableNodes, design.cableNodes);
  await insert(schema.modules, design.modules);
  await insert(schema.moduleGroups, design.moduleGroups);
  await insert(schema.points, design.points);
  await insert(schema.dispensers, design.dispensers);
  await insert(schema.assignments, design.assignments);
}

function inserter(tx: Inserter, owner: { readonly orgId: string; readonly projectId?: string }) {
  return async <T extends PgTable>(table: T, rows: readonly object[]): Promise<void> => {
    for (let i = 0; i < rows.length; i += ROWS_A_STATEMENT) {
      const values = rows.slice(i, i + ROWS_A_STATEMENT).map((row) => ({ ...row, ...owner }));
      await tx.insert(table).values(values as unknown as PgInsertValue<T>[]);
    }
  };
}
