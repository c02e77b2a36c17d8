import { TestBed } from '@angular/core/testing';
import { type LaneMark, LaneMarks } from './lane-marks';

async function drawn(lanes: readonly LaneMark[]): Promise<SVGElement> {
  const fixture = TestBed.createComponent(LaneMarks);
  fixture.componentRef.setInput('lanes', lanes);
  await fixture.whenStable();
  return (fixture.nativeElement as HTMLElement).querySelector('svg')!;
}

const many = (count: number, state: LaneMark['state']): LaneMark[] => Array.from({ length: count }, (_, i) => ({ id: `${state}${i}`, state, severity: null }));

describe('LaneMarks', () => {
  it('draws one mark a lane with its finding above it', async () => {
    const svg = await drawn([...many(2, 'mapped'), { id: 'e', state: 'unmapped', severity: 'error' }, { id: 'w', state: 'signed', severity: 'warning' }]);
    expect(svg.querySelectorAll('.seg.thin')).toHaveLength(2);
    expect([svg.querySelectorAll('.octagon').length, svg.querySelectorAll('.triangle').length]).toEqual([1, 1]);
    expect(svg.querySelector('.seal.full')).not.toBeNull();
    expect(svg.getAttribute('aria-label')).toBe('1 signed, 2 mapped, 1 unmapped');
  });

  it('draws one stretch a state beyond 60 lanes, length by count', async () => {
    const svg = await drawn([...many(60, 'mapped'), ...many(20, 'unmapped')]);
    expect([svg.querySelectorAll('.seg.thin').length, svg.querySelectorAll('.seg.dotted').length]).toEqual([1, 1]);
  });
});
