import type { ChangeNotice, DesignDocument, RowChange } from '#contract';
import fc from 'fast-check';
import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { runs } from '#support/property-runs.ts';
import { type Agent, signedIn, testApp, type TestApp } from '#support/test-app.ts';
import { type ModelChange, UndoModel } from '#support/undo-model.ts';

let app: TestApp;
let people: Agent[];

beforeAll(async () => {
  app = await testApp();
  // Two people at two instances of the server.
  people = [await app.as('engineer'), await signedIn(await app.secondInstance(), app.org.emails.engineer)];
});
afterAll(() => app.close());

const number = fc.nat({ max: 1000 });
const who = fc.nat({ max: 1 });
const value = fc.integer({ min: 1, max: 3 });
const step = fc.oneof(
  { weight: 4, arbitrary: fc.record({ kind: fc.constant('edit' as const), who, row: number, field: fc.constantFrom('boreMm', 'machine', 'tag', 'doseUl'), value }) },
  { weight: 2, arbitrary: fc.record({ kind: fc.constant('bulk' as const), who, rows: fc.array(number, { minLength: 2, maxLength: 4 }), value }) },
  { weight: 2, arbitrary: fc.record({ kind: fc.constant('import' as const), who, tags: fc.uniqueArray(fc.nat({ max: 5 }), { minLength: 1, maxLength: 3 }), value }) },
  { weight: 1, arbitrary: fc.record({ kind: fc.constant('delete' as const), who, row: number }) },
  { weight: 6, arbitrary: fc.record({ kind: fc.constant('undo' as const), who, set: number }) },
  { weight: 5, arbitrary: fc.record({ kind: fc.constant('undo latest' as const), who, back: fc.nat({ max: 2 }) }) },
);
type Step = typeof step extends fc.Arbitrary<infer T> ? T : never;

/** One project, two people, and the model beside it. */
class Run {
  readonly model = new UndoModel();
  private readonly versions = new Map<string, number>();

  constructor(private readonly url: string) {}

  async take(one: Step): Promise<void> {
    if (one.kind === 'undo' || one.kind === 'undo latest') {
      const { entries } = this.model;
      const at = one.kind === 'undo' ? one.set % Math.max(1, entries.length) : entries.length - 1 - one.back;
      if (entries[at]) await this.undo(people[one.who], at);
      return;
    }
    const changes = this.changesOf(one).filter((change) => this.alters(change));
    if (changes.length > 0) await this.apply(people[one.who], changes);
  }

  /** The design is what the model says. */
  async compare(): Promise<void> {
    const design = (await people[0]?.get(`${this.url}/design`).expect(200))?.body as DesignDocument;
    const shown = new Map<string, Readonly<Record<string, unknown>>>([
      ...design.points.map(({ id, tag, boreMm, machine }) => [id, { tag, boreMm, machine }] as const),
      ...design.dispensers.map(({ id, pointId, doseUl }) => [id, { pointId, doseUl }] as const),
    ]);
    expect(shown).toEqual(this.model.rows());
  }

  private changesOf(one: Exclude<Step, { kind: 'undo' | 'undo latest' }>): ModelChange[] {
    if (one.kind === 'import') return one.tags.flatMap((tag) => this.imported(`T-${tag}`, one.value));
    const rows = [...this.model.rows()];
    const points = rows.filter(([, row]) => 'tag' in row).map(([id]) => id);
    const dispensers = rows.filter(([, row]) => 'pointId' in row).map(([id]) => id);
    const pick = (ids: readonly string[], n: number): string[] => (ids.length > 0 ? [ids[n % ids.length]] : []);
    if (one.kind === 'bulk') return [...new Set(one.rows.flatMap((n) => pick(dispensers, n)))].map((id) => update('dispensers', id, { doseUl: one.value * 100 }));
    if (one.kind === 'delete') {
      return pick(points, one.row).flatMap((id) => [
        ...rows.filter(([, row]) => row['pointId'] === id).map(([below]) => remove('dispensers', below)), remove('points', id),
      ]);
    }
    if (one.field === 'doseUl') return pick(dispensers, one.row).map((id) => update('dispensers', id, { doseUl: one.value * 100 }));
    const values = { boreMm: { boreMm: one.value * 10 }, machine: { machine: `M${one.value}` }, tag: { tag: `T-${one.value}` } }[one.field];
    return pick(points, one.row).map((id) => update('points', id, values));
  }

  /** As an import does it: a tag that is there is changed, another is made with its dispenser. */
  private imported(tag: string, n: number): ModelChange[] {
    const present = [...this.model.rows()].find(([, row]) => row['tag'] === tag);
    if (present) return [update('points', present[0], { boreMm: n * 10, machine: `M${n}` })];
    const id = newId();
    return [
      { id, collection: 'points', op: 'create', values: { tag, boreMm: n * 10, machine: null } },
      { id: newId(), collection: 'dispensers', op: 'create', values: { pointId: id, doseUl: null } },
    ];
  }

  private alters({ id, op, values }: ModelChange): boolean {
    const row = this.model.rows().get(id);
    return op !== 'update' || (row !== undefined && Object.entries(values).some(([field, to]) => row[field] !== to));
  }

  private async apply(agent: Agent, wanted: readonly ModelChange[]): Promise<void> {
    const rows = this.model.rows();
    // A field that stays as it is, is not touched.
    const changes = wanted.map((c) => ({ ...c, values: c.op === 'update' ? differing(c.values, rows.get(c.id)) : c.values }));
    const set = { id: newId(), summary: 'Step', changes: changes.map((change) => this.rowChange(change)) };
    const answer = await agent.post(`${this.url}/change-sets`).send(set);
    if (answer.status === 409) return this.expectTagTaken(changes);
    expect(answer.status).toBe(200);
    this.keepVersions(answer.body as ChangeNotice);
    this.model.edit(set.id, changes);
  }

  private rowChange({ id, collection, op, values }: ModelChange): RowChange {
    if (op === 'create') return { collection, op, id, values: { ...values } };
    return { collection, op, id, version: this.versions.get(id) ?? 0, ...(op === 'update' && { values: { ...values } }) };
  }

  private async undo(agent: Agent, at: number): Promise<void> {
    const entry = this.model.entries[at];
    if (!entry) return;
    const id = newId();
    const answer = await agent.post(`${this.url}/change-sets/${entry.id}/undo`).send({ id });
    if (answer.status === 200) {
      expect(this.model.stands(entry)).toBe(true);
      this.keepVersions(answer.body as ChangeNotice);
      this.model.toggle(id, entry);
      return;
    }
    expect(answer.status).toBe(409);
    const { title, detail } = answer.body as { title: string; detail: string };
    if (/already$/.test(title)) expect(this.model.stands(entry)).toBe(false);
    else if (title === 'The design no longer allows this') expect([...tagsTwice(this.model.rowsWithout(entry))]).not.toEqual([]);
    else if (title === 'Other rows stand on this') expect(orphans(this.model.rowsWithout(entry))).not.toEqual([]);
    else {
      expect(title).toBe('Later changes stand on this');
      expect(detail).toMatch(/by The engineer on/);
      expect(this.model.touchedLater(entry)).toBe(true);
    }
  }

  private keepVersions({ items }: ChangeNotice): void {
    for (const { id, row } of items) {
      if (!row) continue;
      expect(Number(row['version'])).toBeGreaterThan(this.versions.get(id) ?? 0);
      this.versions.set(id, Number(row['version']));
    }
  }

  private expectTagTaken(changes: readonly ModelChange[]): void {
    expect(changes.some(({ values }) => 'tag' in values)).toBe(true);
  }
}

const update = (collection: ModelChange['collection'], id: string, values: Record<string, unknown>): ModelChange => ({ id, collection, op: 'update', values });
const remove = (collection: ModelChange['collection'], id: string): ModelChange => ({ id, collection, op: 'delete', values: {} });
const differing = (values: Readonly<Record<string, unknown>>, row: Readonly<Record<string, unknown>> | undefined) =>
  Object.fromEntries(Object.entries(values).filter(([field, to]) => row?.[field] !== to));

function tagsTwice(rows: ReadonlyMap<string, Readonly<Record<string, unknown>>>): Set<unknown> {
  const tags = [...rows.values()].flatMap((row) => ('tag' in row ? [row['tag']] : []));
  return new Set(tags.filter((tag, i) => tags.indexOf(tag) !== i));
}

const orphans = (rows: ReadonlyMap<string, Readonly<Record<string, unknown>>>): string[] =>
  [...rows].filter(([, row]) => 'pointId' in row && !rows.has(String(row['pointId']))).map(([id]) => id);

describe('any sequence of edits, bulk edits, imports, deletions, undos and redos by two people', () => {
  it('ends in the state that the standing edits make, field by field', async () => {
    await fc.assert(fc.asyncProperty(fc.array(step, { minLength: 6, maxLength: 24, size: 'max' }), async (steps) => {
      const id = newId();
      await people[0]?.post('/api/v1/projects').send({ id, name: `Model ${id}` }).expect(201);
      const run = new Run(`/api/v1/projects/${id}`);
      await run.take({ kind: 'import', who: 0, tags: [0, 1, 2], value: 1 });
      for (const one of steps) await run.take(one);
      await run.compare();
    }), { numRuns: runs(10) });
  }, 600_000);
});
