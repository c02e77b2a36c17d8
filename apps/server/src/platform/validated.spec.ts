import { NewChangeSet, points } from '#contract';
import { Type } from 'typebox';
import { describe, expect, it } from 'vitest';
import { faultsOf, validated, validatedQuery } from './validated.ts';

const id = '01939a00-0000-7000-8000-000000000001';
const messages = (value: object) => Object.fromEntries(faultsOf(points.Change, value).map(({ field, message }) => [field, message]));

describe('faults in words', () => {
  it('say what the number may be, not that it could be null', () => {
    expect(messages({ hoursPerDay: 30, boreMm: 0 })).toEqual({ hoursPerDay: 'Must be at most 24.', boreMm: 'Must be more than 0.' });
  });

  it('name choices, inner fields and unknown fields', () => {
    expect(messages({ zone: '7' })['zone']).toBe('Must be one of 0, 1, 2, 20, 21, 22, none.');
    expect(messages({ factors: { temperature: 1 } })['factors.moisture']).toBe('This field is missing.');
    expect(messages({ colour: 'red' })['colour']).toBe('There is no such field.');
    expect(messages({})['']).toBe('Nothing to change was given.');
  });

  it('never turn a text into a number in a body', () => {
    expect(messages({ boreMm: '60' })['boreMm']).toBe('Must be a number.');
  });

  it('are at most fifty', () => {
    const changes = Array.from({ length: 200 }, () => ({ collection: 'x', op: 'create', id }));
    expect(faultsOf(NewChangeSet, { id, summary: '', changes })).toHaveLength(50);
  });
});

describe('validated', () => {
  it('gives the value back as it is', () => {
    const change = { tag: 'GC1-L01' };
    expect(validated(points.Change, change)).toBe(change);
  });
});

describe('a query string', () => {
  const Query = Type.Object({ since: Type.Integer({ minimum: 0 }), limit: Type.Integer({ default: 20 }) });

  it('has its numbers read and its defaults filled in', () => {
    expect(validatedQuery(Query, { since: '7' })).toEqual({ since: 7, limit: 20 });
  });

  it('is refused where a number is none', () => {
    expect(() => validatedQuery(Query, { since: 'x' })).toThrow();
  });
});
