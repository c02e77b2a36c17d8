import { assess, type Design, type Dispenser } from '#calc';
import { laneViewsOf } from './lane-views';
import { fourCoreLoopDesign } from '#support/loop-designs';

const viewOf = (design: Design, id: string) => laneViewsOf(design, assess(design)).get(id)!;
const withLane = (design: Design, change: Partial<Dispenser>): Design => ({ ...design, dispensers: design.dispensers.map((d, i) => (i === 0 ? { ...d, ...change } : d)) });

describe('laneViewsOf', () => {
  const design = fourCoreLoopDesign();
  const [first, second] = design.dispensers;

  it('derives addresses, place and figures', () => {
    expect(viewOf(design, first.id)).toMatchObject({ tag: 'GC1-L01', state: 'mapped', statusState: 'mapped', output: '%QX4.0', status: '%IX8.0', from: '+JB2', wiring: 'four-core' });
    expect(viewOf(design, first.id).worstV).toBeGreaterThan(18);
  });

  it('keeps the view of a lane that an edit elsewhere leaves alone', () => {
    const before = laneViewsOf(design, assess(design));
    const edited = { ...design, dispensers: design.dispensers.map((d) => (d.id === second.id ? { ...d, cableTag: '-W99' } : d)) };
    const after = laneViewsOf(edited, assess(edited));
    expect(after.get(first.id)).toBe(before.get(first.id));
  });

  it('knows a lane without a dose, and one on its own clock', () => {
    expect(viewOf(withLane(design, { doseUl: null }), first.id)).toMatchObject({ planned: false, intervalMs: null });
    const timed = withLane({ ...design, assignments: design.assignments.filter((a) => a.purpose === 'status') }, { method: 'timed', periodMonths: 6 });
    expect(viewOf(timed, first.id)).toMatchObject({ method: 'timed', planned: true, output: null, state: 'mapped' });
  });

  it('says that a voltage collapses instead of giving a figure', () => {
    expect(viewOf(withLane(design, { cableLengthM: 60_000 }), first.id)).toMatchObject({ collapsed: true, worstV: null });
  });
});
