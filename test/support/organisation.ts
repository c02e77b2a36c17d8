import { type Role, roles } from '#contract';
import type postgres from 'postgres';
import { v7 as newId } from 'uuid';
import { hashPassword } from '../../apps/server/src/accounts/password.ts';
import { asOrganisation } from './test-database.ts';

export const PASSWORD = 'a long enough password';
let hashed: Promise<string> | null = null;

export interface TestOrganisation {
  readonly id: string;
  readonly name: string;
  /** One person a role. */
  readonly emails: Readonly<Record<Role, string>>;
}

/** An organisation with one person for each role, all with the same password. */
export async function buildOrganisation(owner: postgres.Sql, name: string): Promise<TestOrganisation> {
  hashed ??= hashPassword(PASSWORD);
  const passwordHash = await hashed;
  const id = newId();
  const emails = Object.fromEntries(roles.map((role) => [role, `${role}@${name}.example`])) as Record<Role, string>;
  await asOrganisation(owner, id, async (tx) => {
    await tx`insert into organisations (id, name) values (${id}, ${name})`;
    for (const role of roles) {
      const personId = newId();
      await tx`insert into people (id, email, name, password_hash) values (${personId}, ${emails[role]}, ${`The ${role}`}, ${passwordHash})`;
      await tx`insert into memberships (org_id, person_id, roles) values (${id}, ${personId}, ${[role]})`;
    }
  });
  return { id, name, emails };
}
