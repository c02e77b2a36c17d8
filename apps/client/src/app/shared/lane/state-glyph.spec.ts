import { TestBed } from '@angular/core/testing';
import { ALL_LANE_STATES, type LaneState } from './lane-view';
import { StateGlyph } from './state-glyph';

async function drawn(state: LaneState, aboutTo = false): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(StateGlyph);
  fixture.componentRef.setInput('state', state);
  fixture.componentRef.setInput('aboutTo', aboutTo);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('StateGlyph', () => {
  it('has a shape of its own for every state', async () => {
    const shapes = await Promise.all(ALL_LANE_STATES.map(async (s) => [...(await drawn(s)).querySelectorAll('path, circle')].map((e) => e.getAttribute('class')).join(' ')));
    expect(new Set(shapes).size).toBe(ALL_LANE_STATES.length);
  });

  it('names the state', async () => {
    expect((await drawn('checked')).textContent?.trim()).toBe('Checked');
    expect((await drawn('stale', true)).textContent?.trim()).toBe('About to go stale');
  });

  it('draws the delta hollow while it is about to go stale', async () => {
    expect((await drawn('stale', true)).querySelector('.delta.hollow')).not.toBeNull();
  });
});
