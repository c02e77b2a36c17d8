import { laneShapes, LANE_SIZES, type LaneSize } from './lane-shapes';
import type { LaneView } from './lane-view';

const lane: LaneView = {
  tag: 'GC1-L01', state: 'checked', statusState: 'checked', wiring: 'four-core', output: '%QX4.0', status: '%IX4.0', from: '+JB1',
  lengthM: 33, sectionMm2: 1.5, worstV: 23.85, minV: 21, intervalMs: 13_200_000,
};

describe('laneShapes', () => {
  it('gives the same marks for the same view and size, so that nothing is drawn again', () => {
    expect(laneShapes(lane, 'inline')).toBe(laneShapes(lane, 'inline'));
    expect(laneShapes(lane, 'alone')).not.toBe(laneShapes(lane, 'inline'));
    expect(laneShapes({ ...lane }, 'inline')).not.toBe(laneShapes(lane, 'inline'));
  });

  it.each(Object.keys(LANE_SIZES) as LaneSize[])('puts no figure in words into a path or a place (%s)', (size) => {
    const blank: LaneView = { ...lane, lengthM: null, sectionMm2: null, worstV: null, minV: null, intervalMs: null, from: null, output: null };
    expect(JSON.stringify([...laneShapes(lane, size), ...laneShapes(blank, size)])).not.toMatch(/NaN|undefined|Infinity/);
  });

  it('keeps figures in the same places for every lane, so that rows align', () => {
    const xs = (view: LaneView): readonly string[] => laneShapes(view, 'inline').filter((m) => m.tag === 'text').map((m) => m.attrs['x']);
    expect(xs({ ...lane, lengthM: 1234.5, from: '+JB112', worstV: 9.1 })).toEqual(xs(lane));
  });
});
