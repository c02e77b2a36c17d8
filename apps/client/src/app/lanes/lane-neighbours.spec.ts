import { assess } from '#calc';
import { fourCoreLoopDesign } from '#support/loop-designs';
import { laneRowsOf } from './lane-rows';
import { neighboursOf } from './lane-neighbours';

const of = (id: string, design = fourCoreLoopDesign()) => {
  const assessment = assess(design);
  return neighboursOf(design, assessment, laneRowsOf(design, assessment, id)!);
};

describe('neighboursOf', () => {
  it('lists the lanes of the same box by tag, and who runs in the worst set', () => {
    expect(of('GC1-L01')).toMatchObject({ place: '+JB2', count: 2, lanes: [{ id: 'GC1-L01', inWorstSet: true }, { id: 'GC1-L02' }] });
  });

  it('lists those of one circuit where the cable begins at the cabinet', () => {
    expect(of('GC1-L04')).toMatchObject({ place: 'the cabinet, circuit C1', lanes: [{ id: 'GC1-L04' }] });
  });

  it('shows the nearest two dozen of many', () => {
    const design = fourCoreLoopDesign();
    const tags = Array.from({ length: 60 }, (_, i) => `GC1-L${i + 1}`);
    const many = {
      ...design,
      points: tags.map((tag) => ({ ...design.points[0], id: `point-${tag}`, tag })),
      dispensers: tags.map((id) => ({ ...design.dispensers[0], id, pointId: `point-${id}` })),
      assignments: [],
    };
    const { count, lanes } = of('GC1-L40', many)!;
    expect([count, lanes.length, lanes[0].id, lanes.at(-1)?.id]).toEqual([60, 24, 'GC1-L28', 'GC1-L51']);
  });
});
