import { type Static, type TEnum, type TSchema, Type } from 'typebox';

/** UUIDv7 made by whoever creates the row: a repeated request is then the same row. */
export const Uuid = Type.String({ format: 'uuid' });
export const nullable = <T extends TSchema>(schema: T) => Type.Union([schema, Type.Null()]);
export const oneOf = <const T extends string[]>(values: readonly [...T]): TEnum<T> => Type.Enum<T>(values);

export const Text = (max = 200) => Type.String({ maxLength: max });
export const Name = (max = 200) => Type.String({ minLength: 1, maxLength: max, pattern: '^\\S(.*\\S)?$' });
export const Positive = (max = 1e9) => Type.Number({ exclusiveMinimum: 0, maximum: max });
export const NotNegative = (max = 1e9) => Type.Number({ minimum: 0, maximum: max });
export const Whole = (minimum: number, maximum = Number.MAX_SAFE_INTEGER) => Type.Integer({ minimum, maximum });

/** RFC 9457 problem document. `type` is stable, `title` is for people, `errors` names the fields at fault. */
export const Problem = Type.Object({
  type: Type.String(),
  title: Type.String(),
  status: Type.Integer(),
  detail: Type.Optional(Type.String()),
  errors: Type.Optional(Type.Array(Type.Object({ field: Type.String(), message: Type.String() }))),
  /** With `stale-write`: the row as it is now. */
  current: Type.Optional(Type.Unknown()),
});
export type Problem = Static<typeof Problem>;

/** The stable types of problems, as the last part of `https://lanewright.example/problems/…`. */
export const problemTypes = [
  'bad-request', 'invalid-input', 'not-signed-in', 'sign-in-failed', 'not-allowed', 'not-found', 'stale-write',
  'version-missing', 'conflict', 'still-used', 'too-large', 'unreadable-file', 'undo-refused', 'cancelled', 'internal',
] as const;
export type ProblemType = (typeof problemTypes)[number];
