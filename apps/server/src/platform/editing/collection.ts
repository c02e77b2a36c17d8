import type { Resource } from '#contract';
import type { PgColumn, PgTable } from 'drizzle-orm/pg-core';
import type { Tx } from '../database.ts';
import type { CollectionName } from './collection-name.ts';
import type { Plan } from './plan.ts';

export type { CollectionName };

/** A row in the shape of the contract. */
export type Row = Readonly<Record<string, unknown>> & { readonly id: string; readonly version: number };


/** A table whose rows people edit; its columns have the names of the contract's fields. */
export type RowTable = PgTable & { readonly id: PgColumn; readonly orgId: PgColumn; readonly version: PgColumn };

/** One project in one transaction. */
export interface Scope {
  readonly tx: Tx;
  readonly orgId: string;
  readonly projectId: string;
  /** Told how many rows have just been written, to their table or to the history. */
  readonly written?: ((rows: number) => void) | undefined;
}

/** The rows that a change set has made or altered, by collection. */
export type Touched = (collection: CollectionName) => readonly string[];

/** Looks at the rows as they are after all writes of a set. @throws a problem in words */
export type Rule = (scope: Scope, touched: Touched) => Promise<void>;

/** How a feature tells the editing engine about one of its collections. */
export interface Collection {
  readonly name: CollectionName;
  readonly resource: Resource;
  readonly table: RowTable;
  /** What people call one row, for instance "junction box". */
  readonly noun: string;
  /** What people call this row: its tag, name or location. */
  readonly labelOf: (row: Row) => string;
  /** Adds what a change brings with it: a module its groups, the deletion of a point that of its dispenser. */
  readonly expand?: (scope: Scope, plan: Plan) => Promise<void>;
  readonly rules?: readonly Rule[];
}
