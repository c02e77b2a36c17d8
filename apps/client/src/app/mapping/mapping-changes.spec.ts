import { assess, type Design } from '#calc';
import { buildAssignment, buildDesign, buildLane, buildModule, buildOutputType } from '#support/design-builder';
import { describe, expect, it } from 'vitest';
import { assignChange, fillFrom, missingPurposes, unassignChanges } from './mapping-changes';
import { channelKey, mappingSections } from './mapping-rows';

const module = buildModule();
const designWith = (assignments: Design['assignments']): Design =>
  buildDesign({ lanes: ['P-01', 'P-02', 'P-03'].map((name) => buildLane(name)), moduleTypes: [buildOutputType()], modules: [module], assignments });
const ids = (design: Design): readonly string[] => design.dispensers.map((d) => d.id);

describe('mapping sections', () => {
  it('shows every channel of a group with its direct address and who is on it', () => {
    const first = designWith([]);
    const design = designWith([buildAssignment(ids(first)[0], module.id, 2)]);
    const sections = mappingSections(design, assess(design), 'output', []);
    expect(sections.map((s) => s.channels.length)).toEqual([8, 8]);
    const taken = sections[0].channels[2];
    expect(taken.address).toBe(`%QX${module.baseByte}.2`);
    expect(taken.occupant?.point.tag).toBe('P-01');
    expect(sections[0].free).toBe(7);
  });

  it('shows a proposal on a free channel, and never on a taken one', () => {
    const first = designWith([]);
    const [a, b] = ids(first);
    const design = designWith([buildAssignment(a, module.id, 0)]);
    const proposals = [0, 1].map((channel) => ({ dispenserId: b, moduleId: module.id, channel, purpose: 'control' as const }));
    const [section] = mappingSections(design, assess(design), 'output', proposals);
    expect(section.channels.slice(0, 2).map((c) => [c.occupant?.point.tag, c.proposed])).toEqual([['P-01', false], ['P-02', true]]);
  });
});

describe('mapping changes', () => {
  it('frees the channel that a dispenser held when it is put on another', () => {
    const first = designWith([]);
    const design = designWith([buildAssignment(ids(first)[0], module.id, 0)]);
    const target = mappingSections(design, assess(design), 'output', [])[0].channels[5];
    const changes = assignChange(design, ids(design)[0], target);
    expect(changes.map((c) => c.op)).toEqual(['delete', 'create']);
    expect(changes[1].values).toMatchObject({ channel: 5, purpose: 'control', moduleId: module.id });
  });

  it('fills free channels in order from the one under the keyboard, and leaves out what finds none', () => {
    const first = designWith([]);
    const design = designWith([buildAssignment(ids(first)[0], module.id, 14)]);
    const sections = mappingSections(design, assess(design), 'output', []);
    const placed = fillFrom(sections, sections[1].channels[5], ids(design).slice(1).concat('one-too-many'));
    expect(placed.map((p) => p.channel)).toEqual([13, 15]);
  });

  it('unmaps the channels that are marked', () => {
    const first = designWith([]);
    const design = designWith([buildAssignment(ids(first)[0], module.id, 0), buildAssignment(ids(first)[1], module.id, 1)]);
    expect(unassignChanges(design, new Set([channelKey(module.id, 1)])).map((c) => c.id)).toEqual([design.assignments[1].id]);
  });

  it('wants no output for a timed dispenser and no status for a two-core one', () => {
    const design = designWith([]);
    const [lane] = design.dispensers;
    expect(missingPurposes(design, { ...lane, wiring: 'four-core', method: 'timed' })).toEqual(['status']);
    expect(missingPurposes(design, { ...lane, wiring: 'two-core', method: 'pulse' })).toEqual(['control']);
  });
});
