import { Type, type Static, type TObject, type TProperties } from 'typebox';
import { Uuid } from './common.ts';

/**
 * A collection of rows that people edit: what a row looks like, what a new one must and may hold, and what a
 * change may touch. Fields that a new row leaves out take the database's default.
 */
export interface Resource {
  /** Name in the design and in events, for instance `moduleGroups`. */
  readonly collection: string;
  /** Last part of its address, for instance `module-groups`. */
  readonly path: string;
  readonly Row: TObject;
  readonly New: TObject;
  readonly Change: TObject;
}

export function resource<F extends TProperties, R extends readonly (keyof F & string)[]>(
  collection: string, path: string, fields: F, required: R,
) {
  const optional = Object.fromEntries(Object.entries(fields).map(([k, f]) => [k, required.includes(k) ? f : Type.Optional(f)]));
  const closed = { additionalProperties: false };
  return {
    collection, path,
    Row: Type.Object({ id: Uuid, version: Type.Integer(), ...fields }),
    New: Type.Object({ id: Uuid, ...optional }, closed) as TObject,
    Change: Type.Partial(Type.Object(fields), { ...closed, minProperties: 1 }) as TObject,
  };
}

/** Compiles only where a row of the contract is a row of the calculation's model, field by field. */
export type Fits<Row, Model> = Row extends Model ? (keyof Row extends keyof Model ? true : false) : false;
export const fits = <T extends true>(): T[] => [];
export type RowOf<R extends { Row: TObject }> = Static<R['Row']>;
