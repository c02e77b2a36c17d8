import { assess, type Design, type Dispenser } from '#calc';
import type { LoopView } from '../shared/lane/loop-view';
import { fourCoreLoopDesign, twoCoreLoopDesign } from '#support/loop-designs';
import { laneRowsOf } from './lane-rows';
import { loopViewOf } from './loop-view-of';

function viewOf(design: Design, id = 'GC1-L01'): LoopView {
  const assessment = assess(design);
  return loopViewOf(design, assessment, laneRowsOf(design, assessment, id)!)!;
}

const withLane = (design: Design, change: Partial<Dispenser>): Design => ({ ...design, dispensers: design.dispensers.map((d, i) => (i === 0 ? { ...d, ...change } : d)) });

describe('loopViewOf', () => {
  it('follows the trunk box by box and says who else hangs there', () => {
    const view = viewOf(fourCoreLoopDesign());
    expect(view.boxes.map((b) => [b.location, b.cableTag, b.others, b.onTo])).toEqual([['+JB1', '-W1', 1, ['+JB3']], ['+JB2', '-W2', 1, []]]);
    expect(view.othersAtCabinet).toBe(1);
  });

  it('names channel, load and rating, protection and its worst load', () => {
    const view = viewOf(fourCoreLoopDesign());
    expect(view.output).toMatchObject({ module: 'DO1', channel: 0, address: '%QX4.0', amps: 0.005, ratingA: 0.5 });
    expect(view.status).toMatchObject({ module: 'DI1', address: '%IX8.0', ratingA: null });
    expect(view.supply).toMatchObject({ cabinet: '+K1', name: '-T1', setV: 24, extraLowVoltage: 'PELV', circuit: 'C1', protection: '6 A, breaker B', ratingA: 6 });
    expect(view.supply.worstA).toBeGreaterThan(0.5);
  });

  it('hangs the profile from supply, terminals, boxes and device', () => {
    const { profile } = viewOf(fourCoreLoopDesign());
    expect(profile?.stations.map((s) => s.metres)).toEqual([0, 0, 20, 55, 85]);
    expect(profile).toMatchObject({ minV: 20, allOnCount: 4, collapsed: false, tempC: 40 });
    expect(profile?.worstSet).toMatch(/^worst set of 2: GC1-L01, /);
    expect(profile!.allOnV!).toBeLessThan(profile!.stations.at(-1)!.worstV!);
  });

  it('has no idle voltage and no status for two-core', () => {
    const view = viewOf(twoCoreLoopDesign());
    expect([view.wiring, view.status, view.profile?.idleV]).toEqual(['two-core', null, null]);
    expect(view.dispenser.pins).toEqual({ supply: '1', zero: '2' });
  });

  it('keeps the stations without voltages where these collapse', () => {
    const { profile } = viewOf(withLane(fourCoreLoopDesign(), { cableLengthM: 60_000 }));
    expect(profile).toMatchObject({ collapsed: true, worstSet: 'no voltage left with the worst permitted set' });
    expect(profile?.stations.map((s) => [s.metres, s.worstV])).toEqual([[0, null], [0, null], [20, null], [55, null], [60_055, null]]);
  });

  it('is null while the wiring is not known', () => {
    const design = withLane(fourCoreLoopDesign(), { wiring: null, typeId: null });
    const assessment = assess(design);
    expect(loopViewOf(design, assessment, laneRowsOf(design, assessment, 'GC1-L01')!)).toBeNull();
  });

  it('puts each finding where it stands', () => {
    const places = (design: Design, id?: string) => Object.fromEntries(viewOf(design, id).findings.map((f) => [f.code, f.place]));
    expect(places(fourCoreLoopDesign(), 'GC1-L02')).toMatchObject({ 'MP-01': 'output', 'MP-02': 'status' });
    expect(places(withLane(fourCoreLoopDesign(), { cableLengthM: 900 }))).toMatchObject({ 'VD-01': 'dispenser' });
    expect(places(withLane(fourCoreLoopDesign(), { doseUl: null }))).toMatchObject({ 'PL-05': 'dispenser' });
  });
});
