import { TestBed } from '@angular/core/testing';
import { LaneLine } from './lane-line';
import type { LaneSize } from './lane-shapes';
import type { LaneView } from './lane-view';

const lane: LaneView = {
  tag: 'GC1-L01', state: 'mapped', statusState: 'mapped', wiring: 'four-core', output: '%QX4.0', status: '%IX4.0', from: '+JB1',
  lengthM: 33, sectionMm2: 1.5, worstV: 23.85, minV: 21, intervalMs: 13_200_000,
};

async function drawn(view: LaneView, size: LaneSize = 'inline'): Promise<SVGElement> {
  const fixture = TestBed.createComponent(LaneLine);
  fixture.componentRef.setInput('lane', view);
  fixture.componentRef.setInput('size', size);
  await fixture.whenStable();
  return (fixture.nativeElement as HTMLElement).querySelector('svg')!;
}

describe('LaneLine', () => {
  it.each(['alone', 'inline', 'phone', 'large'] as const)('draws the status signal for four-core only (%s)', async (size) => {
    expect((await drawn(lane, size)).querySelector('.status')).not.toBeNull();
    expect((await drawn({ ...lane, wiring: 'two-core', status: null }, size)).querySelector('.status')).toBeNull();
  });

  it('tells the states apart by the stroke', async () => {
    expect((await drawn({ ...lane, state: 'unmapped' })).querySelector('.seg.dotted')).not.toBeNull();
    expect((await drawn(lane)).querySelector('.seg.thin')).not.toBeNull();
    expect((await drawn({ ...lane, state: 'wired' })).querySelector('.seg.heavy')).not.toBeNull();
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
    expect(low.getAttribute('aria-label')).toContain('too low');
  });

  it('says in words what it draws', async () => {
    expect((await drawn(lane)).getAttribute('aria-label')).toMatch(/^GC1-L01: output %QX4\.0, status %IX4\.0, cable 33 m, 23\.8 V/);
    expect((await drawn({ ...lane, state: 'unmapped', output: null })).getAttribute('aria-label')).toBe('GC1-L01: not mapped');
  });
});
