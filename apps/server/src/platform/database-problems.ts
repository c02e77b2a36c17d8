import { Conflict, Invalid, type ProblemError, StillUsed } from './problems.ts';

/** The part of a PostgreSQL error that we read. With row-level security it never quotes values. */
interface PostgresError {
  readonly code: string;
  readonly constraint_name?: string;
  readonly table_name?: string;
  readonly message: string;
}

/** What unique constraints mean, in words; the rules of the features say more where they notice first. */
const taken: Readonly<Record<string, { field: string; message: string }>> = {
  projects_name_uq: { field: 'name', message: 'Another project has this name.' },
  points_tag_uq: { field: 'tag', message: 'Another point of this project has this tag.' },
  dispensers_point_uq: { field: 'pointId', message: 'This point has a dispenser already.' },
  cabinets_location_uq: { field: 'location', message: 'Another cabinet of this project has this location.' },
  controllers_name_uq: { field: 'name', message: 'Another controller of this project has this name.' },
  modules_name_uq: { field: 'name', message: 'Another module of this controller has this name.' },
  module_groups_index_uq: { field: 'groupIndex', message: 'This module has this group already.' },
  supplies_name_uq: { field: 'name', message: 'Another supply of this cabinet has this name.' },
  circuits_name_uq: { field: 'name', message: 'Another circuit of this project has this name.' },
  cable_nodes_location_uq: { field: 'location', message: 'Another box of this circuit has this location.' },
  assignments_channel_uq: { field: 'channel', message: 'This channel is taken by another dispenser.' },
  assignments_purpose_uq: { field: 'purpose', message: 'This dispenser has a channel for this purpose already.' },
  greases_name_uq: { field: 'name', message: 'Another grease has this name.' },
};

const ranges: Readonly<Record<string, { field: string; message: string }>> = {
  points_bearing_ck: { field: 'outsideMm', message: 'The outside diameter must be larger than the bore.' },
  points_tag_ck: { field: 'tag', message: 'A tag has 1 to 200 characters and no space at either end.' },
  cable_nodes_ck: { field: 'parentId', message: 'A box cannot hang on itself, and lengths and sections are larger than 0.' },
  dispenser_types_dose_ck: { field: 'doseMaxUl', message: 'The doses must satisfy step ≤ smallest ≤ largest.' },
  dispenser_types_electric_ck: { field: 'peakA', message: 'The peak current cannot be below the run current.' },
  module_types_channels_ck: { field: 'channelsPerGroup', message: 'A group cannot have more channels than the module.' },
  module_types_input_ck: { field: 'inputType', message: 'An input module states its input type, an output module does not.' },
};

/** Tables whose rows people call otherwise. */
const called: Readonly<Record<string, string>> = {
  cable_nodes: 'junction boxes', module_groups: 'output groups', assignments: 'mapped channels', dispenser_types: 'dispenser types',
};
const words = (table = 'other rows') => called[table] ?? table.replaceAll('_', ' ');

/** Turns a refusal of the database into words, or answers null where it is none. */
export function problemOfDatabase(error: unknown): ProblemError | null {
  const cause = postgresErrorOf(error);
  if (!cause) return null;
  const name = cause.constraint_name ?? '';
  switch (cause.code) {
    case '23505': {
      if (name.endsWith('_pkey')) return new Conflict('This identifier is taken by another row. Make a new one.');
      const known = taken[name];
      return known ? new Conflict(known.message, [known]) : new Conflict(`One of the ${words(cause.table_name)} has this already (${name}).`);
    }
    case '23503': return foreignKeyProblem(cause, name);
    case '23514': return new Invalid([ranges[name] ?? { field: '', message: `A value is outside its range (${name}).` }]);
    case '22P05': case '22021': return new Invalid([{ field: '', message: 'A text holds a character that cannot be stored (NUL).' }]);
    case '22003': return new Invalid([{ field: '', message: 'A number is too large.' }]);
    default: return null;
  }
}

/** Both directions of a reference carry the same code; the message tells them apart. */
function foreignKeyProblem(cause: PostgresError, name: string): ProblemError {
  const deleted = /^update or delete on table "(\w+)"/.exec(cause.message);
  const user = words(cause.table_name);
  if (deleted) return new StillUsed(`Still used by ${user}`, `Move or delete the ${user} that refer to it first.`);
  const field = name.replace(new RegExp(`^${cause.table_name}_`), '').replace(/_fk$/, '');
  return new Invalid([{ field: `${field}Id`, message: `There is no such ${field} here.` }]);
}

/** Drizzle wraps the driver's error. */
function postgresErrorOf(error: unknown): PostgresError | null {
  for (let e = error; e instanceof Error; e = e.cause) {
    if ('code' in e && typeof e.code === 'string' && /^[0-9A-Z]{5}$/.test(e.code) && e.name === 'PostgresError') return e as unknown as PostgresError;
  }
  return null;
}

/** Whether two transactions stood in each other's way, so that the same again will do. */
export function isTransient(error: unknown): boolean {
  const code = postgresErrorOf(error)?.code;
  return code === '40P01' || code === '40001';
}

/** The name of the unique constraint that a write broke, or null. */
export function brokenUnique(error: unknown): string | null {
  const cause = postgresErrorOf(error);
  return cause?.code === '23505' ? (cause.constraint_name ?? null) : null;
}
