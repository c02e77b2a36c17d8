import { TestBed } from '@angular/core/testing';
import { vi } from 'vitest';
import type { ImportProgress } from '../progress-words';
import { JobProgress } from './job-progress';

const progress = (part: Partial<ImportProgress>): ImportProgress => ({ stage: 'reading', done: 100, total: null, leftMs: null, ...part });

async function shown(first: ImportProgress) {
  const fixture = TestBed.createComponent(JobProgress);
  const show = async (now: ImportProgress) => {
    fixture.componentRef.setInput('progress', now);
    await fixture.whenStable();
  };
  fixture.componentRef.setInput('label', 'list.csv');
  await show(first);
  const host = fixture.nativeElement as HTMLElement;
  return { fixture, show, bar: host.querySelector('[role=progressbar]')!, said: () => host.querySelector('[aria-live]')!.textContent, host };
}

describe('JobProgress', () => {
  afterEach(() => vi.restoreAllMocks());

  it('tells the bar in words, with a value only where the size is known', async () => {
    const { bar, show } = await shown(progress({}));
    expect(bar.getAttribute('aria-valuetext')).toBe('Reading the file, 100 rows');
    expect(bar.getAttribute('aria-valuenow')).toBeNull();
    await show(progress({ stage: 'checking', done: 250, total: 1000, leftMs: 7200 }));
    expect(bar.getAttribute('aria-valuetext')).toBe('Checking the rows, 250 of 1,000 rows, about 8 s left');
    expect(bar.getAttribute('aria-valuenow')).toBe('25');
  });

  it('announces each stage at once, and then only every ten seconds', async () => {
    const now = vi.spyOn(performance, 'now').mockReturnValue(0);
    const { said, show } = await shown(progress({ done: 100 }));
    now.mockReturnValue(5000);
    await show(progress({ done: 200 }));
    expect(said()).toBe('Reading the file, 100 rows');
    now.mockReturnValue(10_500);
    await show(progress({ done: 300 }));
    expect(said()).toBe('Reading the file, 300 rows');
    now.mockReturnValue(11_000);
    await show(progress({ stage: 'writing', done: 1, total: 9 }));
    expect(said()).toBe('Writing to the project, 1 of 9 rows');
  });

  it('offers to stop, once', async () => {
    const { fixture, host, show } = await shown(progress({}));
    let stops = 0;
    fixture.componentInstance.cancelled.subscribe(() => (stops += 1));
    const button = host.querySelector('button')!;
    button.click();
    await show(progress({ stage: 'stopping', done: 0 }));
    expect(stops).toBe(1);
    expect(button.disabled).toBe(true);
  });
});
