import * as schema from '#schema';
import argon2 from 'argon2';
import { sql as statement } from 'drizzle-orm';
import { drizzle, type PostgresJsDatabase } from 'drizzle-orm/postgres-js';
import type postgres from 'postgres';
import type { Design } from '#calc';
import { brackwaterDesign, quayExtensionDesign } from './brackwater.ts';
import { greenfieldDesign } from './greenfield.ts';
import { insertCatalogue, insertProject } from './insert-design.ts';
import { seedIds } from './seed-ids.ts';

export interface DemoAccount {
  readonly role: 'engineer' | 'electrician' | 'commissioning' | 'technician' | 'administrator' | 'viewer';
  readonly name: string;
  readonly email: string;
  readonly password: string;
  readonly organisation: string;
}

const PASSWORD = 'grease-before-rust';
const BRACKWATER = 'Brackwater Terminal';
const HOLLIN = 'Hollin Quarry';

const account = (role: DemoAccount['role'], name: string, domain: string, organisation: string): DemoAccount => ({
  role, name, email: `${role}@${domain}`, password: PASSWORD, organisation,
});

/** One account a role, and one of another organisation. Invented people; the password is no secret. */
export const demoAccounts: readonly DemoAccount[] = [
  account('engineer', 'Ines Okafor', 'brackwater.example', BRACKWATER),
  account('electrician', 'Tomas Lindqvist', 'brackwater.example', BRACKWATER),
  account('commissioning', 'Maren Dijkstra', 'brackwater.example', BRACKWATER),
  account('technician', 'Paolo Ferri', 'brackwater.example', BRACKWATER),
  account('administrator', 'Ruth Adeyemi', 'brackwater.example', BRACKWATER),
  account('viewer', 'Joan Whitlock', 'brackwater.example', BRACKWATER),
  account('engineer', 'Owen Pryce', 'hollin.example', HOLLIN),
];

/** Id of a demo organisation, by its name. */
export const demoOrgId = (organisation: string): string => seedIds('organisations')(organisation);

/** The demo's projects by organisation; those of one organisation share its catalogue. */
export function demoDesigns(organisation: string): Design[] {
  const catalogue = seedIds(`${organisation}: catalogue`);
  const ids = (project: string) => ({ catalogue, row: seedIds(`${organisation}: ${project}`) });
  return organisation === BRACKWATER ? [brackwaterDesign(ids('terminal')), quayExtensionDesign(ids('quay extension'))] : [greenfieldDesign(ids('quarry'))];
}

/**
 * Fills an empty database with the demo: two organisations, one account a role, the Brackwater story.
 *
 * @param sql a connection as the owner role; row-level security is forced on it, so each organisation has
 *   a transaction of its own
 */
export async function seedDemo(sql: postgres.Sql): Promise<void> {
  const db = drizzle(sql);
  const passwordHash = await argon2.hash(PASSWORD, HASHING);
  for (const organisation of [BRACKWATER, HOLLIN]) await seedOrganisation(db, organisation, passwordHash);
}

/** As the server hashes passwords. */
const HASHING = { type: argon2.argon2id, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

async function seedOrganisation(db: PostgresJsDatabase, organisation: string, passwordHash: string): Promise<void> {
  const orgId = demoOrgId(organisation);
  const accounts = demoAccounts.filter((each) => each.organisation === organisation);
  const personId = seedIds(`${organisation}: people`);
  await db.transaction(async (tx) => {
    await tx.execute(statement`select set_config('lanewright.org_id', ${orgId}, true)`);
    await tx.insert(schema.organisations).values({ id: orgId, name: organisation });
    await tx.insert(schema.people).values(accounts.map(({ email, name }) => ({ id: personId(email), email, name, passwordHash })));
    await tx.insert(schema.memberships).values(accounts.map(({ email, role }) => ({ orgId, personId: personId(email), roles: [role] })));
    const designs = demoDesigns(organisation);
    await insertCatalogue(tx, orgId, designs[0]);
    for (const design of designs) await insertProject(tx, orgId, design);
  });
}
