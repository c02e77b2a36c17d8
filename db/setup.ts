/**
 * Brings a database to where the server can use it: roles, database, migrations and, on request, the demo.
 * Run as `node --import tsx db/setup.ts [--demo]`; the last line of the output is JSON for the launcher.
 */
import { drizzle } from 'drizzle-orm/postgres-js';
import { migrate } from 'drizzle-orm/postgres-js/migrator';
import { readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { argv, env, exit, stderr, stdout } from 'node:process';
import { fileURLToPath } from 'node:url';
import postgres from 'postgres';
import { demoAccounts, seedDemo } from './seed/demo.ts';

export interface DatabaseSecrets {
  readonly ownerPassword: string;
  readonly appPassword: string;
  readonly authPassword: string;
}

export interface DatabaseUrls {
  /** For requests: row-level security holds. */
  readonly appUrl: string;
  /** For sign-in, before an organisation is known. */
  readonly authUrl: string;
  /** For migrations and the seed only. */
  readonly ownerUrl: string;
}

export interface PrepareOptions {
  /** A role that may create roles and databases. */
  readonly adminUrl: string;
  readonly secrets: DatabaseSecrets;
  /** Made where it does not exist. Without it: `lanewright` where the URL names `postgres`, else the URL's own. */
  readonly databaseName?: string;
  readonly say?: (line: string) => void;
}

const DATABASE = 'lanewright';
const ROLES = { owner: 'lanewright_owner', app: 'lanewright_app', auth: 'lanewright_auth' } as const;
const migrationsFolder = join(dirname(fileURLToPath(import.meta.url)), 'migrations');

/** Makes or updates roles and database and applies the migrations that are missing; safe to repeat. */
export async function prepareDatabase({ adminUrl, secrets, databaseName, say = () => undefined }: PrepareOptions): Promise<DatabaseUrls> {
  const database = databaseName ?? databaseOf(adminUrl);
  const admin = connect(adminUrl);
  try {
    say('Roles');
    await makeRole(admin, ROLES.owner, secrets.ownerPassword);
    await makeRole(admin, ROLES.app, secrets.appPassword);
    await makeRole(admin, ROLES.auth, secrets.authPassword);
    await joinOwner(admin);
    say(`Database ${database}`);
    await makeDatabase(admin, database);
  } finally {
    await admin.end();
  }
  await giveToOwner(withDatabase(adminUrl, database), database);
  const urls = urlsOf(adminUrl, database, secrets);
  say('Migrations');
  await migrateAs(urls.ownerUrl);
  return urls;
}

/** The connection URLs of the three roles for a database of this server. */
export const urlsOf = (adminUrl: string, database: string, secrets: DatabaseSecrets): DatabaseUrls => ({
  appUrl: withLogin(withDatabase(adminUrl, database), ROLES.app, secrets.appPassword),
  authUrl: withLogin(withDatabase(adminUrl, database), ROLES.auth, secrets.authPassword),
  ownerUrl: withLogin(withDatabase(adminUrl, database), ROLES.owner, secrets.ownerPassword),
});

const connect = (url: string) => postgres(url, { max: 1, onnotice: () => undefined });

function databaseOf(url: string): string {
  const name = decodeURIComponent(new URL(url).pathname.slice(1));
  return name === '' || name === 'postgres' ? DATABASE : name;
}

function withDatabase(url: string, database: string): string {
  const changed = new URL(url);
  changed.pathname = `/${encodeURIComponent(database)}`;
  return changed.href;
}

function withLogin(url: string, user: string, password: string): string {
  const changed = new URL(url);
  changed.username = user;
  changed.password = encodeURIComponent(password);
  return changed.href;
}

/** Roles belong to the whole server: two installations set up at once must not meet halfway. */
async function makeRole(admin: postgres.Sql, role: string, password: string): Promise<void> {
  await admin.begin(async (sql) => {
    await sql`select pg_advisory_xact_lock(hashtext('lanewright roles'))`;
    const [known] = await sql`select 1 from pg_roles where rolname = ${role}`;
    const [exempt] = await sql`select 1 from pg_roles where rolname = ${role} and (rolsuper or rolbypassrls)`;
    if (exempt) throw new Error(`The role ${role} is exempt from row-level security. Take SUPERUSER and BYPASSRLS from it, then start again.`);
    // PASSWORD takes no parameter; format() quotes it.
    const [row] = await sql<{ statement: string }[]>`
      select format(${`${known ? 'alter' : 'create'} role %I login password %L`}, ${role}::text, ${password}::text) as statement`;
    await sql.unsafe(row?.statement ?? '');
  });
}

/** An administrator that is no superuser must be a member of the owner to give it a database. */
async function joinOwner(admin: postgres.Sql): Promise<void> {
  const [stranger] = await admin`select 1 where not pg_has_role(current_user, ${ROLES.owner}, 'member')`;
  if (stranger) await admin`grant ${admin(ROLES.owner)} to current_user`;
}

async function makeDatabase(admin: postgres.Sql, database: string): Promise<void> {
  const [known] = await admin`select 1 from pg_database where datname = ${database}`;
  if (!known) await admin`create database ${admin(database)} owner ${admin(ROLES.owner)}`;
}

/** Only our roles may enter, and the owner may make tables even where somebody else made the database. */
async function giveToOwner(url: string, database: string): Promise<void> {
  const admin = connect(url);
  try {
    await admin`revoke all on database ${admin(database)} from public`;
    for (const role of Object.values(ROLES)) await admin`grant connect, temporary on database ${admin(database)} to ${admin(role)}`;
    await admin`grant create on database ${admin(database)} to ${admin(ROLES.owner)}`;
    await admin`revoke create on schema public from public`;
    await admin`grant usage, create on schema public to ${admin(ROLES.owner)}`;
  } finally {
    await admin.end();
  }
}

async function migrateAs(ownerUrl: string): Promise<void> {
  const owner = connect(ownerUrl);
  try {
    await migrate(drizzle(owner), { migrationsFolder });
  } finally {
    await owner.end();
  }
}

async function loadDemo(ownerUrl: string, say: (line: string) => void): Promise<void> {
  const owner = connect(ownerUrl);
  try {
    // The owner, too, sees one organisation only; people stand above them.
    const [somebody] = await owner`select 1 from people limit 1`;
    if (somebody) return;
    say('Demo');
    await seedDemo(owner);
  } finally {
    await owner.end();
  }
}

async function main(): Promise<void> {
  const adminUrl = env['DATABASE_ADMIN_URL'];
  const secretsPath = env['LANEWRIGHT_SECRETS'];
  if (!adminUrl || !secretsPath) throw new Error('Set DATABASE_ADMIN_URL and LANEWRIGHT_SECRETS (path of a JSON file with the passwords).');
  const secrets = JSON.parse(readFileSync(secretsPath, 'utf8')) as DatabaseSecrets;
  const say = (line: string) => stderr.write(`${line}\n`);
  const urls = await prepareDatabase({ adminUrl, secrets, say });
  const withDemo = argv.includes('--demo');
  if (withDemo) await loadDemo(urls.ownerUrl, say);
  const accounts = withDemo ? demoAccounts.map(({ role, email, password }) => ({ role, email, password })) : [];
  stdout.write(`${JSON.stringify({ ...urls, accounts })}\n`);
}

if (argv[1] === fileURLToPath(import.meta.url)) {
  await main().catch((error: unknown) => {
    stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    exit(1);
  });
}
