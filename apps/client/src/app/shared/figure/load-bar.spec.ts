import { TestBed } from '@angular/core/testing';
import { LoadBar } from './load-bar';

async function bar(value: number, rating: number | null): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(LoadBar);
  fixture.componentRef.setInput('value', value);
  fixture.componentRef.setInput('rating', rating);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('LoadBar', () => {
  it('hatches what lies over the rating and says so', async () => {
    const host = await bar(1.68, 1.5);
    expect(parseFloat(host.querySelector<HTMLElement>('.over')!.style.width)).toBeGreaterThan(0);
    expect(host.getAttribute('aria-label')).toBe('1.68\u2009A of 1.50\u2009A, over the rating');
  });

  it('does not hatch a load within its rating', async () => {
    const host = await bar(0.86, 1.5);
    expect(host.querySelector('.over')).toBeNull();
    expect(host.getAttribute('aria-label')).toBe('0.86\u2009A of 1.50\u2009A');
  });

  it('has no mark where the type states no rating', async () => {
    const host = await bar(0.86, null);
    expect(host.querySelector('u')).toBeNull();
    expect(host.querySelector('.over')).toBeNull();
  });
});
