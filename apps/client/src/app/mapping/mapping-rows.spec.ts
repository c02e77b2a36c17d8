import { assess, type Design } from '#calc';
import { buildAssignment, buildDesign, buildLane, buildModule, buildOutputType } from '#support/design-builder';
import { describe, expect, it } from 'vitest';
import { boardOf } from './board';
import { type GroupSection, mappingSections, type Proposal } from './mapping-rows';

const module = buildModule();
const designWith = (assignments: Design['assignments']): Design =>
  buildDesign({ lanes: ['P-01', 'P-02', 'P-03'].map((name) => buildLane(name)), moduleTypes: [buildOutputType()], modules: [module], assignments });
const sectionsOf = (design: Design, proposals: readonly Proposal[] = [], before: readonly GroupSection[] = []): readonly GroupSection[] =>
  mappingSections({ board: boardOf(design), assessment: assess(design), lanes: new Map(), shown: 'output', proposals }, before);

describe('mapping sections', () => {
  it('shows every channel of a group with its direct address and who is on it', () => {
    const sections = sectionsOf(designWith([buildAssignment('P-01', module.id, 2)]));
    expect(sections.map((s) => s.channels.length)).toEqual([8, 8]);
    const taken = sections[0].channels[2];
    expect(taken.address).toBe(`%QX${module.baseByte}.2`);
    expect(taken.occupant?.point.tag).toBe('P-01');
    expect(sections[0].free).toBe(7);
  });

  it('shows a proposal on a free channel, and never on a taken one', () => {
    const proposals = [0, 1].map((channel) => ({ dispenserId: 'P-02', moduleId: module.id, channel, purpose: 'control' as const }));
    const [section] = sectionsOf(designWith([buildAssignment('P-01', module.id, 0)]), proposals);
    expect(section.channels.slice(0, 2).map((c) => [c.occupant?.point.tag, c.proposed])).toEqual([['P-01', false], ['P-02', true]]);
  });

  it('keeps the objects of rows and groups that read as before', () => {
    const design = designWith([buildAssignment('P-01', module.id, 2)]);
    const before = sectionsOf(design);
    const after = sectionsOf({ ...design, assignments: [...design.assignments, buildAssignment('P-02', module.id, 9)] }, [], before);
    expect(after[0]).toBe(before[0]);
    expect(after[1]).not.toBe(before[1]);
    expect(after[1].channels.map((row, i) => row === before[1].channels[i])).toEqual([true, false, true, true, true, true, true, true]);
  });
});
