import { TestBed } from '@angular/core/testing';
import { LoopDiagram } from './loop-diagram';
import type { LoopView } from './loop-view';
import { COLLAPSED_LOOP, FOUR_CORE_LOOP, TWO_CORE_LOOP } from './testing/loop-views';

/** The test's browser has no layout, hence no sizes to observe. */
class NoSizes {
  observe(): void { /* nothing has a size */ }
  disconnect(): void { /* nothing was observed */ }
}

async function drawn(loop: LoopView): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(LoopDiagram);
  fixture.componentRef.setInput('loop', loop);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

const said = async (loop: LoopView): Promise<string> => (await drawn(loop)).querySelector('svg[role=img]')!.getAttribute('aria-label')!;

describe('LoopDiagram', () => {
  beforeEach(() => vi.stubGlobal('ResizeObserver', NoSizes));
  afterEach(() => vi.unstubAllGlobals());

  it('says what it draws: from where to where, state, worst figure', async () => {
    expect(await said(FOUR_CORE_LOOP)).toBe(
      'Loop diagram of lane GC1-L01, four-core, mapped. output %QX5.2 of DO1 in +K1, over +JB1, +JB2 to dispenser =T1.GL1-GP01, 97.5 m. status back to %IX4.2. '
      + 'At worst 21.3 V at the dispenser, at least 18.0 V; running alone 23.0 V');
    expect(await said(TWO_CORE_LOOP)).toContain('At worst 18.9 V at the dispenser, too low: at least 19.0 V');
    expect(await said(COLLAPSED_LOOP)).toContain('no voltage is left at the dispenser');
  });

  it('says what is wrong', async () => {
    expect(await said({ ...FOUR_CORE_LOOP, findings: [{ place: 'dispenser', severity: 'error', code: 'VD-01', title: '17.9 V while 10 run' }] })).toMatch(/error: 17\.9 V while 10 run$/);
  });

  it('has its figures in a table too, which opens by keyboard', async () => {
    const element = await drawn(FOUR_CORE_LOOP);
    expect(element.querySelector('details > summary')?.textContent).toBe('Stations as a table');
    const rows = [...element.querySelectorAll('lw-loop-stations tbody tr')].map((r) => [...r.children].map((c) => c.textContent?.replaceAll('\u2009', ' ')));
    expect(rows).toContainEqual(['Box +JB2', '-W2, 40 m, 2 × 4 mm², cores 1 mm²', '60 m', '–', '22.1 V', '23.5 V', '–']);
    expect(rows).toContainEqual(['Output %QX5.2', 'DO1, channel 10', '–', '8 mA of 0.50 A', '–', '–', '–']);
  });

  it('stands upright with the profile as a column', async () => {
    const element = (await drawn(FOUR_CORE_LOOP)).querySelector('lw-loop-upright')!;
    const stations = [...element.querySelectorAll('ol > li')];
    expect(stations.map((s) => s.querySelector('.k')?.textContent)).toEqual(['Output', 'Circuit', 'Box', 'Box', 'Dispenser', 'Point']);
    expect(stations.map((s) => s.querySelector('.r')?.textContent?.replace(/\s/g, ''))).toEqual([undefined, '23.2V', '22.6V', '22.1V', '21.3V', '0.3cm³']);
    expect(stations.map((s) => s.querySelectorAll('.dot').length)).toEqual([0, 1, 1, 1, 1, 0]);
    expect(element.textContent).toContain('Status back to %IX4.2');
  });

  it('stands upright without a figure where the voltage collapses', async () => {
    const element = (await drawn(COLLAPSED_LOOP)).querySelector('lw-loop-upright')!;
    expect(element.querySelectorAll('.dot')).toHaveLength(0);
    expect(element.querySelector('.bad')?.textContent).toBe('none');
  });
});
