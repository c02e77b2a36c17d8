import { type SQL, sql } from 'drizzle-orm';
import type { PgTable } from 'drizzle-orm/pg-core';
import type { TObject } from 'typebox';
import { columnsOf } from './rows.ts';

/** A sub-select that gives the rows as one JSON array in the shape of the contract, in the order of creation. */
export function jsonRows(table: PgTable, schema: TObject, where: SQL): SQL {
  return sql`(select coalesce(json_agg(r order by r.id), '[]'::json) from (${contractRows(table, schema, where)}) r)`;
}

/** The same rows as one JSON text, without the brackets around them: much faster than `json_agg` where they are many. */
export function jsonRowTexts(table: PgTable, schema: TObject, where: SQL): SQL {
  return sql`(select coalesce(string_agg(row_to_json(r)::text, ','), '') from (${contractRows(table, schema, where)} order by id) r)`;
}

/** The rows with the contract's field names. */
function contractRows(table: PgTable, schema: TObject, where: SQL): SQL {
  const fields = Object.entries(columnsOf(table, schema)).map(([field, column]) => sql`${sql.identifier(column.name)} as ${sql.identifier(field)}`);
  return sql`select ${sql.join(fields, sql`, `)} from ${table} where ${where}`;
}

/** A JSON object of sub-selects. */
export const jsonObject = (parts: Readonly<Record<string, SQL>>): SQL =>
  sql`json_build_object(${sql.join(Object.entries(parts).map(([name, part]) => sql`${name}::text, ${part}`), sql`, `)})`;
