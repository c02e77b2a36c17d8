import { assess, directAddress, type Assessment, type Design, type Finding } from '#calc';
import { tagListExpectation } from '#support/brackwater-setup.ts';
import { describe, expect, it } from 'vitest';
import { brackwaterDesign, quayExtensionDesign } from './brackwater.ts';
import { greenfieldDesign } from './greenfield.ts';
import { seedIds } from './seed-ids.ts';

type Values = Record<string, string | number | null>;
interface Expectation {
  readonly points: readonly { readonly values: Values }[];
}
interface Setup {
  readonly dispenserTypes: readonly Record<string, unknown>[];
  readonly cabinets: readonly { readonly location: string; readonly description: string; readonly controllers: readonly { readonly name: string; readonly modules: readonly Record<string, unknown>[] }[] }[];
}

const ids = { catalogue: seedIds('catalogue'), row: seedIds('row') };
const design = brackwaterDesign(ids);
const draft = assess(design);

/** The findings that do not merely say that something is not mapped yet. */
const beyondMapping = ({ findings }: Assessment) => findings.filter(({ code }) => code !== 'MP-01' && code !== 'MP-02');
const titles = (found: readonly Finding[]) => found.map(({ code, subject }) => `${code} ${subject.label}`);
const withLimit = (circuit: string, concurrencyLimit: number): Design => ({
  ...design, circuits: design.circuits.map((each) => (each.name === circuit ? { ...each, concurrencyLimit } : each)),
});

describe('the Brackwater story', () => {
  it('shows each check once in the draft', () => {
    expect(titles(beyondMapping(draft).filter(({ severity }) => severity === 'error'))).toEqual([
      'AR-01 SL1-L14', 'CB-03 -W1301', 'IO-03 PLC1 DO1, channels 0–7', 'PR-02 C1', 'SG-09 SL1-L05', 'VD-01 GC4-L06',
    ]);
  });

  it('is mended in load and voltage by one smaller limit, which the finding names', () => {
    const [overload] = draft.findings.filter(({ code }) => code === 'IO-03');
    expect(overload.remedy).toContain('Set k to 6 on C1');
    const mended = titles(beyondMapping(assess(withLimit('C1', 6))).filter(({ severity }) => severity === 'error'));
    expect(mended).toEqual(['AR-01 SL1-L14', 'CB-03 -W1301', 'PR-02 C1', 'SG-09 SL1-L05']);
    expect(titles(beyondMapping(assess(withLimit('C1', 7))))).toContain('IO-03 PLC1 DO1, channels 0–7');
  });

  it('keeps warnings few: two blank doses, three cartridges that stay too long', () => {
    expect(titles(beyondMapping(draft).filter(({ severity }) => severity === 'warning'))).toEqual([
      'PL-05 GC3-L05', 'PL-05 GC3-L06', 'PL-15 SL1-L12', 'PL-15 SL1-L13', 'PL-15 SL1-L14',
    ]);
  });

  it('leaves 14 of 60 dispensers without an output', () => {
    expect(design.points).toHaveLength(60);
    expect(draft.findings.filter(({ code }) => code === 'MP-01')).toHaveLength(14);
  });

  it('gives nearly every cartridge a life of one to twelve months', () => {
    const lives = [...draft.lanes.values()].flatMap(({ plan }) => (plan ? [plan.lifeDays] : []));
    expect(lives).toHaveLength(58);
    expect(lives.filter((days) => days < 30 || days > 365)).toHaveLength(3);
  });

  it('has the same ids in every run, none twice', () => {
    expect(brackwaterDesign(ids)).toEqual(design);
    const all = Object.values(design).flatMap((rows) => (Array.isArray(rows) ? rows.map(({ id }: { id: string }) => id) : []));
    expect(new Set(all).size).toBe(all.length);
  });
});

describe('the Brackwater points', () => {
  const { points } = tagListExpectation<Expectation>('brackwater-points');

  it.each(points.map(({ values }) => [values['tag'], values] as const))('%s is as the tag list has it', (tag, values) => {
    const stated = Object.entries(values).filter(([, value]) => value !== null);
    // What the list leaves open the engineer may have decided since: doses and channels.
    const open = Object.entries(values).filter(([key, value]) => value === null && !/^(dose|output|status)/.test(key));
    expect(importedValues(String(tag))).toMatchObject(Object.fromEntries([...stated, ...open]));
  });

  it('has the hardware that the tag lists rest on', () => {
    const setup = tagListExpectation<Setup>('setup');
    expect(design.dispenserTypes).toMatchObject(setup.dispenserTypes);
    expect(design.cabinets).toMatchObject(setup.cabinets.map(({ location, description }) => ({ location, description })));
    const controllers = setup.cabinets.flatMap((each) => each.controllers);
    const modules = controllers.flatMap(({ name, modules: own }) => own.map((each) => ({ controller: name, name: each['name'], type: each['type'], baseByte: each['baseByte'] })));
    expect(design.modules.map(({ controllerId, typeId, name, baseByte }) => ({
      controller: design.controllers.find(({ id }) => id === controllerId)?.name, name,
      type: design.moduleTypes.find(({ id }) => id === typeId)?.name, baseByte,
    }))).toEqual(modules);
  });
});

describe('the other demo projects', () => {
  it('share the hardware without a point, or are another organisation’s', () => {
    const extension = quayExtensionDesign(ids);
    expect(extension.points).toEqual([]);
    expect(extension.modules).toEqual(design.modules);
    const quarry = greenfieldDesign(ids);
    expect(quarry.points).toHaveLength(12);
    expect(assess(quarry).findings.filter(({ severity }) => severity === 'error')).toEqual([]);
  });
});

/** What the design holds of a point, in the words of the expectation. */
function importedValues(tag: string): Values {
  const point = design.points.find((each) => each.tag === tag)!;
  const dispenser = design.dispensers.find((each) => each.pointId === point.id)!;
  const nameOf = (rows: readonly { readonly id: string; readonly name: string }[], id: string | null) => rows.find((row) => row.id === id)?.name ?? null;
  const { description, location, product, machine, boreMm, outsideMm, widthMm, speedRpm, hoursPerDay, remarks } = point;
  const { cartridgeUl, doseUl, wiring, cableTag, cableLengthM, crossSectionMm2 } = dispenser;
  return {
    tag, description, function: point.function, location, product, machine, boreMm, outsideMm, widthMm, speedRpm, hoursPerDay, remarks,
    demandUlPer100h: point.statedPer === '100h' ? point.statedUl : null,
    dispenserType: nameOf(design.dispenserTypes, dispenser.typeId), cartridgeUl, doseUl, wiring,
    controller: nameOf(design.controllers, dispenser.controllerId), circuit: nameOf(design.circuits, dispenser.circuitId),
    ...channelOf(dispenser.id, 'control', 'output'), ...channelOf(dispenser.id, 'status', 'status'),
    cableTag, cableLengthM, crossSectionMm2,
  };
}

function channelOf(dispenserId: string, purpose: 'control' | 'status', name: string): Values {
  const assignment = design.assignments.find((each) => each.dispenserId === dispenserId && each.purpose === purpose);
  const module = design.modules.find(({ id }) => id === assignment?.moduleId);
  const kind = purpose === 'control' ? 'output' : 'input';
  return {
    [`${name}Module`]: module?.name ?? null, [`${name}Channel`]: assignment?.channel ?? null,
    [`${name}Address`]: module && assignment ? directAddress(kind, module.baseByte, assignment.channel) : null,
  };
}
