import { TestBed } from '@angular/core/testing';
import { LaneLine } from './lane-line';
import type { LaneSize } from './lane-shapes';
import { ALL_LANE_STATES, type LaneState, type LaneView } from './lane-view';

const lane: LaneView = {
  tag: 'GC1-L01', state: 'mapped', statusState: 'mapped', wiring: 'four-core', output: '%QX4.0', status: '%IX4.0', from: '+JB1',
  lengthM: 33, sectionMm2: 1.5, worstV: 23.85, minV: 21, intervalMs: 13_200_000,
};
const inState = (state: LaneState, rest: Partial<LaneView> = {}): LaneView => ({ ...lane, state, statusState: state, ...rest });

async function fixtureOf(view: LaneView, size: LaneSize) {
  const fixture = TestBed.createComponent(LaneLine);
  fixture.componentRef.setInput('lane', view);
  fixture.componentRef.setInput('size', size);
  await fixture.whenStable();
  return fixture;
}

async function drawn(view: LaneView, size: LaneSize = 'inline'): Promise<SVGElement> {
  return ((await fixtureOf(view, size)).nativeElement as HTMLElement).querySelector('svg')!;
}

/** How a state looks without its colour: the class of each stroke and mark, in order. */
const shape = (svg: SVGElement): string =>
  [...svg.querySelectorAll('path, circle, rect')].map((e) => e.getAttribute('class')).join(' ');

describe('LaneLine', () => {
  it.each(['alone', 'inline', 'phone', 'large'] as const)('draws the status signal for four-core only (%s)', async (size) => {
    expect((await drawn(lane, size)).querySelector('.status')).not.toBeNull();
    expect((await drawn({ ...lane, wiring: 'two-core', status: null }, size)).querySelector('.status')).toBeNull();
  });

  it.each(['alone', 'inline', 'phone', 'large'] as const)('tells every state by shape alone (%s)', async (size) => {
    const shapes = await Promise.all(ALL_LANE_STATES.map(async (state) => shape(await drawn(inState(state), size))));
    expect(new Set(shapes).size).toBe(ALL_LANE_STATES.length);
  });

  it.each([
    ['unmapped', '.seg.dotted'], ['mapped', '.seg.thin'], ['wired', '.seg.heavy'], ['checked', '.beside'], ['signed', '.seg.case + .seg.core'], ['stale', '.delta'],
  ] as const)('draws %s with %s', async (state, mark) => {
    expect((await drawn(inState(state))).querySelector(mark)).not.toBeNull();
  });

  it('fills the seal of a signed lane, breaks that of a stale one and leaves a place for the others', async () => {
    expect((await drawn(inState('signed'))).querySelector('.seal.full')).not.toBeNull();
    expect((await drawn(inState('stale'))).querySelectorAll('.seal:not(.place)')).toHaveLength(2);
    expect((await drawn(inState('checked'))).querySelector('.seal.place')).not.toBeNull();
  });

  it('breaks a stale lane only where something moved', async () => {
    const cable = await drawn(inState('stale'));
    expect([cable.querySelectorAll('.st-stale .delta').length, cable.querySelectorAll('.st-signed .seg.case').length]).toEqual([1, 2]);
    const point = await drawn(inState('stale', { moved: ['point'] }));
    expect(point.querySelector('.grease .delta')).not.toBeNull();
    expect(point.querySelectorAll('.st-signed .seg.case')).toHaveLength(2);
  });

  it('draws the delta hollow while only the draft makes it stale', async () => {
    expect((await drawn(inState('stale', { aboutTo: true }))).querySelector('.delta.hollow')).not.toBeNull();
    expect((await drawn(inState('stale'))).querySelector('.delta.hollow')).toBeNull();
  });

  it('leaves capsule and grease empty until there is a plan', async () => {
    const svg = await drawn({ ...lane, intervalMs: null });
    expect(svg.querySelector('.pulse')).toBeNull();
    expect(svg.querySelector('.grease .seg.dotted')).not.toBeNull();
    expect(svg.getAttribute('aria-label')).toContain('no plan yet');
  });

  it('gives a dispenser on its own clock a clock and no output', async () => {
    const svg = await drawn({ ...lane, method: 'timed', planned: true, output: null, intervalMs: null });
    expect(svg.querySelector('.clock')).not.toBeNull();
    expect(svg.textContent).toContain('own clock');
    expect(svg.textContent).not.toContain('no output');
  });

  it('leaves the status dotted while only the output is mapped', async () => {
    const svg = await drawn({ ...lane, status: null, statusState: 'unmapped' });
    expect(svg.querySelector('.status .dotted')).not.toBeNull();
    expect(svg.querySelector('.st-mapped .thin')).not.toBeNull();
  });

  it('rounds volts down and marks those below the lowest', async () => {
    expect((await drawn(lane)).textContent).toContain('23.8');
    const low = await drawn({ ...lane, worstV: 20.98 });
    expect(low.querySelector('.bad')?.textContent).toContain('20.9');
    expect(low.getAttribute('aria-label')).toContain('too low: at least 21.0 V');
  });

  it('writes no figure for a voltage that collapses', async () => {
    const svg = await drawn({ ...lane, worstV: null, collapsed: true });
    expect(svg.querySelector('.bad')?.textContent).toBe('none');
    expect(svg.textContent).not.toContain('NaN');
  });

  it('says in a sentence what it draws', async () => {
    expect((await drawn(lane)).getAttribute('aria-label')).toBe(
      'Lane GC1-L01, mapped: output %QX4.0, by +JB1 to the dispenser, 33 m of 1.5 mm²; at worst 23.8 V; a pulse every 3\u2009h\u200940; status back to %IX4.0');
    expect((await drawn(inState('unmapped', { output: null, status: null }))).getAttribute('aria-label')).toMatch(/^Lane GC1-L01, unmapped: no output yet, .*status not mapped$/);
    expect((await drawn(inState('stale', { aboutTo: true }))).getAttribute('aria-label')).toContain('about to go stale');
  });

  it('is drawn once from left to right when its state moves on, and not when a row shows another lane', async () => {
    const fixture = await fixtureOf(lane, 'alone');
    const svg = (fixture.nativeElement as HTMLElement).querySelector('svg')!;
    fixture.componentRef.setInput('lane', { ...inState('wired'), tag: 'GC1-L02' });
    await fixture.whenStable();
    expect(svg.classList).not.toContain('moved-on');
    fixture.componentRef.setInput('lane', { ...inState('checked'), tag: 'GC1-L02' });
    await fixture.whenStable();
    expect(svg.classList).toContain('moved-on');
  });
});
