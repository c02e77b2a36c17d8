import type { Mark } from '../drawing/mark';
import { ALL_LANE_STATES } from './lane-view';
import { LEAST_WIDTH, layoutOf, WIDTH } from './loop-geometry';
import { loopShapes } from './loop-shapes';
import type { LoopFinding, LoopView } from './loop-view';
import { COLLAPSED_LOOP, FOUR_CORE_LOOP, TWO_CORE_LOOP } from './testing/loop-views';

const flat = (marks: readonly Mark[]): readonly Mark[] => marks.flatMap((m) => [m, ...flat(m.children ?? [])]);
const words = (loop: LoopView, width?: number): readonly string[] =>
  flat(loopShapes(loop, width)).filter((m) => m.tag === 'text').map((m) => m.text ?? (m.children ?? []).map((c) => c.text).join(''));
const classes = (loop: LoopView): readonly string[] => flat(loopShapes(loop)).map((m) => m.attrs['class'] ?? '');
const count = (loop: LoopView, cls: string): number => classes(loop).filter((c) => c.split(' ').includes(cls)).length;

describe('loopShapes', () => {
  it('draws four conductors with the pins of the type and a terminal on both sides of each box', () => {
    const shown = words(FOUR_CORE_LOOP);
    expect(shown).toEqual(expect.arrayContaining(['+24 V', '0 V', 'pulse', 'status', '1', '3', '2', '4', '+JB1', '+JB2', '-GP01', 'DO1:10', '%QX5.2', '%IX4.2']));
    // Four in the cabinet, two a conductor in each of two boxes.
    expect(count(FOUR_CORE_LOOP, 'term')).toBe(4 + 4 * 2 * 2);
  });

  it('draws two conductors for two-core: output and 0 V, no status', () => {
    const shown = words(TWO_CORE_LOOP);
    expect(shown).toEqual(expect.arrayContaining(['output', '0 V', '1', '2', '%QX6.5']));
    expect(shown).not.toContain('status');
    expect(count(TWO_CORE_LOOP, 'term')).toBe(2);
  });

  it('gives every trunk its tag, length and sections, and the own cable its cores', () => {
    const shown = words(FOUR_CORE_LOOP).map((w) => w.replaceAll('\u2009', ' '));
    expect(shown).toEqual(expect.arrayContaining(['-W1 20 m 2 × 4 mm²', 'cores 1 mm²', '37.5 m', '4 × 1.5 mm²']));
  });

  it('shows who else hangs there, and where the trunk goes on', () => {
    expect(words(FOUR_CORE_LOOP)).toEqual(expect.arrayContaining(['+18 lanes', '+7 lanes', '+1 lane', 'to +JB3']));
  });

  it('draws the earth bond of PELV and none for SELV', () => {
    expect(words(FOUR_CORE_LOOP)).toContain('PELV: 0 V bonded to PE');
    expect(words({ ...FOUR_CORE_LOOP, supply: { ...FOUR_CORE_LOOP.supply, extraLowVoltage: 'SELV' } })).toContain('SELV: no earth bond');
  });

  it('leaves the pulse out where the dispenser runs on its own clock', () => {
    const timed: LoopView = { ...FOUR_CORE_LOOP, method: 'timed', output: null, dispenser: { ...FOUR_CORE_LOOP.dispenser, periodMonths: 6 } };
    expect(words(timed)).toEqual(expect.arrayContaining(['6 months', 'no output: it runs on its own clock']));
    expect(words(timed)).not.toContain('pulse');
    expect(count(timed, 'clock')).toBeGreaterThan(0);
  });

  it('says what is missing instead of leaving a gap', () => {
    const young: LoopView = { ...FOUR_CORE_LOOP, state: 'unmapped', statusState: 'unmapped', output: null, status: null, planned: false, profile: null, dispenser: { ...FOUR_CORE_LOOP.dispenser, doseUl: null, cartridgeUl: null } };
    expect(words(young)).toEqual(expect.arrayContaining(['no output', 'no status input', 'no dose yet', 'no size']));
    expect(count(young, 'pulse')).toBe(0);
  });

  it('tells every state by shape', () => {
    const shapes = ALL_LANE_STATES.map((state) => classes({ ...FOUR_CORE_LOOP, state, statusState: state }).filter((c) => !c.startsWith('st-')).join(' '));
    expect(new Set(shapes).size).toBe(ALL_LANE_STATES.length);
  });

  it('marks a part with its gravest finding and tells the pointer all of them', () => {
    const findings: readonly LoopFinding[] = [
      { place: 'protection', severity: 'note', code: 'PR-04', title: 'a note' }, { place: 'protection', severity: 'error', code: 'PR-02', title: 'will not trip' },
    ];
    const found = flat(loopShapes({ ...FOUR_CORE_LOOP, findings }));
    expect(found.filter((m) => m.attrs['class'] === 'octagon')).toHaveLength(1);
    expect(found.filter((m) => m.attrs['class'] === 'note')).toHaveLength(0);
    expect(found.find((m) => m.tag === 'title')?.text).toBe('PR-04: a note\nPR-02: will not trip');
    expect(found.find((m) => m.text === '6 A, breaker B')?.attrs['class']).toContain('c-err');
  });

  it('keeps everything within its width, from the least on', () => {
    for (const width of [LEAST_WIDTH, WIDTH, 1600]) {
      const { zones, boxes, dispenser } = layoutOf(FOUR_CORE_LOOP, width);
      expect([...boxes, ...zones.map((z) => z.x)].every((x) => x < width)).toBe(true);
      expect(zones.map((z) => z.x)).toEqual([...zones.map((z) => z.x)].sort((a, b) => a - b));
      expect(boxes.at(-1)).toBeLessThan(dispenser);
    }
  });

  it.each([['four-core', FOUR_CORE_LOOP], ['two-core', TWO_CORE_LOOP], ['collapsed', COLLAPSED_LOOP]])('writes no missing number into a drawing (%s)', (_name, loop) => {
    expect(JSON.stringify(loopShapes(loop))).not.toMatch(/NaN|undefined|Infinity|null/);
  });
});

describe('voltage profile', () => {
  it('hangs each station under its part of the diagram', () => {
    const { boxes, terminal, dispenser } = layoutOf(FOUR_CORE_LOOP, WIDTH);
    const dots = flat(loopShapes(FOUR_CORE_LOOP)).filter((m) => m.attrs['class'] === 'v-dot').map((m) => Number(m.attrs['cx']));
    expect(dots.slice(0, 4)).toEqual([terminal, ...boxes, dispenser]);
  });

  it('shows the worst set, alone, idle, all on and the lowest, each rounded toward its limit', () => {
    const shown = words(FOUR_CORE_LOOP).join('|').replaceAll('\u202f', ' ');
    for (const figure of ['21.3 V', '23.0 V running alone', '22.0 V idle', '20.0 V with all 30 on', '3.3 V above the lowest, 18.0 V', 'lowest supply 23.5 V, cable at 40 °C']) expect(shown).toContain(figure);
    expect(['v-idle', 'v-all', 'v-min'].map((c) => count(FOUR_CORE_LOOP, c) > 0)).toEqual([true, true, true]);
  });

  it('is in brick where the dispenser gets too little, by how much rounded up', () => {
    const shown = words(TWO_CORE_LOOP).join('|').replaceAll('\u202f', ' ');
    expect(shown).toContain('18.9 V');
    expect(shown).toContain('0.1 V below the lowest, 19.0 V');
    expect(classes(TWO_CORE_LOOP)).toContain('lead c-err');
  });

  it('lets a collapse fall out of the chart: a cross, no figure and no line to the dispenser', () => {
    expect(words(COLLAPSED_LOOP)).toEqual(expect.arrayContaining(['none', 'no voltage left', 'it takes at least 18.0 V']));
    expect(count(COLLAPSED_LOOP, 'v-fall')).toBeGreaterThan(0);
    expect(flat(loopShapes(COLLAPSED_LOOP)).filter((m) => m.attrs['class'] === 'v-now')).toHaveLength(0);
  });
});
