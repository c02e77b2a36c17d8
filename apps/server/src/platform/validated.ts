import { Ajv2020, type ErrorObject, type ValidateFunction } from 'ajv/dist/2020.js';
import addFormats from 'ajv-formats';
import type { Static, TSchema } from 'typebox';
import { type FieldError, Invalid } from './problems.ts';

const options = { allErrors: true, strict: true, allowUnionTypes: true } as const;
const bodies = new Ajv2020(options);
/** Query strings are text: numbers in them are read as numbers. */
const queries = new Ajv2020({ ...options, coerceTypes: true, useDefaults: true });
for (const ajv of [bodies, queries]) addFormats(ajv);

const MOST_ERRORS = 50;
const compiled = new Map<Ajv2020, WeakMap<TSchema, ValidateFunction>>([[bodies, new WeakMap()], [queries, new WeakMap()]]);

function validatorOf(ajv: Ajv2020, schema: TSchema): ValidateFunction {
  const known = compiled.get(ajv);
  let validate = known?.get(schema);
  if (!validate) {
    validate = ajv.compile(schema);
    known?.set(schema, validate);
  }
  return validate;
}

/** What is wrong with a value, field by field, in words; empty where nothing is. */
export function faultsOf(schema: TSchema, value: unknown): FieldError[] {
  const validate = validatorOf(bodies, schema);
  return validate(value) ? [] : inWords(validate.errors ?? []);
}

/** @throws {Invalid} naming the fields at fault */
export function validated<S extends TSchema>(schema: S, value: unknown): Static<S> {
  const faults = faultsOf(schema, value);
  if (faults.length > 0) throw new Invalid(faults);
  return value as Static<S>;
}

/** As `validated`, for the text values of a query string. Returns a copy with numbers and defaults in place. */
export function validatedQuery<S extends TSchema>(schema: S, query: object): Static<S> {
  const copy = { ...query };
  const validate = validatorOf(queries, schema);
  if (!validate(copy)) throw new Invalid(inWords(validate.errors ?? []));
  return copy as Static<S>;
}

/** One message a field: of "a number or null" the part about the number. */
function inWords(errors: readonly ErrorObject[]): FieldError[] {
  const byField = new Map<string, string>();
  for (const error of errors) {
    const field = fieldOf(error);
    const said = messageOf(error);
    if (said && !byField.has(field)) byField.set(field, said);
    if (byField.size >= MOST_ERRORS) break;
  }
  if (byField.size === 0) byField.set('', 'The value does not have the right form.');
  return [...byField].map(([field, message]) => ({ field, message }));
}

function fieldOf({ instancePath, keyword, params }: ErrorObject): string {
  const path = instancePath.slice(1).replaceAll('/', '.');
  const inner = keyword === 'required' ? (params['missingProperty'] as string)
    : keyword === 'additionalProperties' ? (params['additionalProperty'] as string) : '';
  return [path, inner].filter(Boolean).join('.');
}

function messageOf({ keyword, params, schemaPath }: ErrorObject): string | null {
  const limit = String(params['limit']);
  switch (keyword) {
    case 'required': return 'This field is missing.';
    case 'additionalProperties': return 'There is no such field.';
    case 'minimum': return `Must be at least ${limit}.`;
    case 'exclusiveMinimum': return `Must be more than ${limit}.`;
    case 'maximum': case 'exclusiveMaximum': return `Must be at most ${limit}.`;
    case 'multipleOf': return `Must be a multiple of ${String(params['multipleOf'])}.`;
    case 'minLength': return 'Must not be empty.';
    case 'maxLength': return `Must have at most ${limit} characters.`;
    case 'minItems': return `Must have at least ${limit} entries.`;
    case 'maxItems': return `Must have at most ${limit} entries.`;
    case 'minProperties': return 'Nothing to change was given.';
    case 'pattern': return 'Must not begin or end with a space, nor hold a line break.';
    case 'format': return `Must be a valid ${String(params['format'])}.`;
    case 'enum': return `Must be one of ${(params['allowedValues'] as unknown[]).join(', ')}.`;
    case 'const': return `Must be ${String(params['allowedValue'])}.`;
    case 'type': return params['type'] === 'null' && schemaPath.includes('/anyOf/') ? null : `Must be a ${String(params['type'])}.`;
    default: return null;
  }
}
