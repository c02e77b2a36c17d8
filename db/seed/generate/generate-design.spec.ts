import { assess, type Collection, type Design } from '#calc';
import { describe, expect, it } from 'vitest';
import { generateDesign, generateProject } from './generate-design.ts';

const { design, planned } = generateProject({ lanes: 500, seed: 7 });
const assessment = assess(design);

/** Collection and field that refer to a row of another collection. */
const REFERENCES: readonly (readonly [Collection, string, Collection])[] = [
  ['points', 'greaseId', 'greases'], ['dispensers', 'pointId', 'points'], ['dispensers', 'typeId', 'dispenserTypes'],
  ['dispensers', 'controllerId', 'controllers'], ['dispensers', 'circuitId', 'circuits'], ['dispensers', 'nodeId', 'cableNodes'],
  ['controllers', 'cabinetId', 'cabinets'], ['modules', 'controllerId', 'controllers'], ['modules', 'typeId', 'moduleTypes'],
  ['moduleGroups', 'moduleId', 'modules'], ['moduleGroups', 'circuitId', 'circuits'], ['supplies', 'cabinetId', 'cabinets'], ['supplies', 'typeId', 'supplyTypes'],
  ['circuits', 'supplyId', 'supplies'], ['cableNodes', 'circuitId', 'circuits'], ['cableNodes', 'parentId', 'cableNodes'],
  ['assignments', 'dispenserId', 'dispensers'], ['assignments', 'moduleId', 'modules'],
];
/** What a planned fault brings along: a cable too long for the voltage is too long for tripping and signals, one k too many for a circuit is for its supply. */
const CONSEQUENCES = ['IO-03', 'IO-05', 'PL-01', 'PR-07', 'SG-01', 'SG-02', 'SU-01', 'VD-01', 'VD-02'];

const rowsOf = (of: Design, name: Collection) => of[name] as unknown as readonly Record<string, unknown>[];
const doubled = (values: readonly unknown[]) => values.filter((value, i) => values.indexOf(value) !== i);

describe('generateDesign', () => {
  it.each([100, 137, 500, 1000])('has exactly %i lanes', (lanes) => {
    const { points, dispensers } = generateDesign({ lanes, seed: 1 });
    expect([points.length, dispensers.length]).toEqual([lanes, lanes]);
  });

  it('gives the same rows for the same seed, ids included, and others for another', () => {
    const again = generateDesign({ lanes: 500, seed: 7 });
    expect(again).toEqual(design);
    const other = generateDesign({ lanes: 500, seed: 8 });
    expect(other.points.map(({ boreMm }) => boreMm)).not.toEqual(design.points.map(({ boreMm }) => boreMm));
  });

  it('keeps the rows of two owners or names apart, though the plant is the same', () => {
    const [mine, theirs] = ['a', 'b'].map((owner) => generateDesign({ lanes: 100, seed: 7, owner }));
    expect(mine.points.map(({ tag }) => tag)).toEqual(theirs.points.map(({ tag }) => tag));
    expect(mine.points.filter(({ id }) => theirs.points.some((each) => each.id === id))).toEqual([]);
  });

  it.each([99, 50_001, 100.5, NaN])('refuses %d lanes', (lanes) => {
    expect(() => generateDesign({ lanes, seed: 1 })).toThrow(`${lanes} lanes cannot be generated`);
  });

  it('has ids in the form of UUIDv7, ascending, none twice', () => {
    const ids = Object.values(design).flatMap((rows) => (Array.isArray(rows) ? rows.map(({ id }: { id: string }) => id) : []));
    expect(doubled(ids)).toEqual([]);
    for (const { id } of design.points) expect(id).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
    expect(design.points.map(({ id }) => id)).toEqual(design.points.map(({ id }) => id).sort());
  });

  it.each(REFERENCES)('%s.%s names a row of %s, or nothing', (collection, field, target) => {
    const known = new Set(design[target].map(({ id }) => id));
    const wrong = rowsOf(design, collection).filter((row) => row[field] !== null && !known.has(row[field] as string));
    expect(wrong).toEqual([]);
  });

  it('names each tag, channel, signal, circuit, controller and module once', () => {
    const { points, assignments, circuits, controllers, modules, moduleGroups } = design;
    expect(doubled(points.map(({ tag }) => tag))).toEqual([]);
    expect(doubled(assignments.map(({ moduleId, channel }) => `${moduleId}/${channel}`))).toEqual([]);
    expect(doubled(assignments.map(({ dispenserId, purpose }) => `${dispenserId}/${purpose}`))).toEqual([]);
    expect(doubled([...circuits, ...controllers].map(({ name }) => name))).toEqual([]);
    expect(doubled(modules.map(({ controllerId, name }) => `${controllerId}/${name}`))).toEqual([]);
    expect(doubled(moduleGroups.map(({ moduleId, groupIndex }) => `${moduleId}/${groupIndex}`))).toEqual([]);
  });

  it('hangs 5 to 12 dispensers on a box', () => {
    const counts = design.cableNodes.map(({ id }) => design.dispensers.filter(({ nodeId }) => nodeId === id).length);
    expect([Math.min(...counts), Math.max(...counts)]).toEqual([5, 12]);
  });

  it('maps 95 % of the lanes', () => {
    const mapped = new Set(design.assignments.map(({ dispenserId }) => dispenserId));
    expect(mapped.size / design.dispensers.length).toBeCloseTo(0.95, 2);
  });
});

describe('the findings of a generated project', () => {
  it('hold each that was planned', () => {
    const codes = new Set(planned.map(({ code }) => code));
    expect([...codes].sort()).toEqual([
      'AR-01', 'AR-03', 'CB-01', 'CB-03', 'MP-01', 'MP-02', 'MP-03', 'PL-01', 'PL-03', 'PL-05', 'PL-06', 'PL-15', 'PL-16', 'PR-01', 'PR-02', 'TG-01', 'VD-01',
    ]);
    const missed = planned.filter(({ code, id }) =>
      !assessment.findings.some((found) => found.code === code && (found.subject.id === id || found.dispenserIds.includes(id))));
    expect(missed).toEqual([]);
  });

  it('hold no error or warning beyond, but for what these bring along', () => {
    const expected = (code: string, ids: readonly string[]) => CONSEQUENCES.includes(code) || planned.some((each) => each.code === code && ids.includes(each.id));
    const surprises = assessment.findings.filter(({ severity, code, subject, dispenserIds }) => severity !== 'note' && !expected(code, [subject.id, ...dispenserIds]));
    expect(surprises.map(({ code, subject }) => `${code} ${subject.label}`)).toEqual([]);
  });

  it('leave most lanes clean and give nearly every one a plan', () => {
    const troubled = new Set(assessment.findings.filter(({ severity }) => severity === 'error').flatMap(({ dispenserIds }) => dispenserIds));
    expect(troubled.size).toBeLessThan(0.1 * design.dispensers.length);
    const planless = [...assessment.lanes.values()].filter(({ plan, timed }) => !plan && !timed);
    expect(planless.length).toBeLessThan(0.02 * design.dispensers.length);
  });
});
