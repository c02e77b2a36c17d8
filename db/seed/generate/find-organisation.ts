import type postgres from 'postgres';
import { SeedRefused } from './seed-project.ts';

export interface FoundOrganisation {
  readonly id: string;
  readonly name: string;
}

/**
 * The organisation whose name is, or begins with, a text; capitals do not matter.
 *
 * @param auth a connection as the sign-in role, which alone sees all organisations
 * @throws {SeedRefused} where none or several fit, with the names that there are
 */
export async function findOrganisation(auth: postgres.Sql, text: string): Promise<FoundOrganisation> {
  const all = await auth<FoundOrganisation[]>`select id, name from organisations order by name`;
  const wanted = text.trim().toLowerCase();
  const exact = all.filter(({ name }) => name.toLowerCase() === wanted);
  const found = exact.length > 0 ? exact : all.filter(({ name }) => name.toLowerCase().startsWith(wanted));
  if (found.length === 1) return found[0];
  const names = all.map(({ name }) => `“${name}”`).join(', ');
  throw new SeedRefused(`${found.length === 0 ? 'No organisation' : 'More than one organisation'} is named “${text}”. Name one with --org: ${names || 'there is none yet'}.`);
}
