import { TestBed } from '@angular/core/testing';
import { FindingMark, type FindingMarkKind } from './finding-mark';

async function mark(kind: FindingMarkKind, hollow = false): Promise<SVGElement> {
  const fixture = TestBed.createComponent(FindingMark);
  fixture.componentRef.setInput('kind', kind);
  fixture.componentRef.setInput('hollow', hollow);
  await fixture.whenStable();
  return (fixture.nativeElement as HTMLElement).querySelector('svg')!;
}

describe('FindingMark', () => {
  it.each(['error', 'warning', 'note', 'changed', 'passes'] as const)('names %s for those who listen', async (kind) => {
    expect((await mark(kind)).getAttribute('aria-label')).toBe(kind);
  });

  it('has a shape of its own for each kind', async () => {
    const shapes = await Promise.all((['error', 'warning', 'note', 'changed', 'passes'] as const).map(async (k) => (await mark(k)).innerHTML));
    expect(new Set(shapes).size).toBe(5);
  });

  it('is outlined when it is only about to be', async () => {
    const svg = await mark('changed', true);
    expect(svg.querySelector('.plum')).toBeNull();
    expect(svg.getAttribute('aria-label')).toBe('about to be: changed');
  });
});
