/**
 * Makes a generated project in a database. Run by `npm run seed` as
 * `node --import tsx db/seed/generate/main.ts LANES SEED ORGANISATION [NAME]` with DATABASE_OWNER_URL and
 * DATABASE_AUTH_URL; the last line of the output is the project as JSON.
 */
import { argv, env, exit, stderr, stdout } from 'node:process';
import postgres from 'postgres';
import { findOrganisation } from './find-organisation.ts';
import { seedGeneratedProject } from './seed-project.ts';

async function main(): Promise<void> {
  const [lanes, seed, organisation, name] = argv.slice(2);
  const [owner, auth] = [connect('DATABASE_OWNER_URL'), connect('DATABASE_AUTH_URL')];
  try {
    const found = await findOrganisation(auth, organisation);
    const project = await seedGeneratedProject(owner, found.id, { lanes: Number(lanes), seed: Number(seed), name });
    stdout.write(`${JSON.stringify({ ...project, organisation: found.name })}\n`);
  } finally {
    await Promise.all([owner.end(), auth.end()]);
  }
}

function connect(variable: string): postgres.Sql {
  const url = env[variable];
  if (!url) throw new Error(`Set ${variable}.`);
  return postgres(url, { max: 1, onnotice: () => undefined });
}

await main().catch((error: unknown) => {
  stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  exit(1);
});
