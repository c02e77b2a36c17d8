import { TestBed } from '@angular/core/testing';
import type { Explanation } from '#calc';
import { ExplainPanel } from './explain-panel';

const explanation: Explanation = {
  title: 'Pulse interval', formula: '1,000 h × dose ÷ demand', substituted: '1,000 h × 0.2 cm³ ÷ 74.3 cm³', result: '2\u2009h\u200940',
  inputs: [{ name: 'dose', value: '0.2\u2009cm³', source: 'this dispenser' }],
  rounding: [
    { step: 'exact', value: '2 h 41 min 30.417 s', why: '' },
    { step: 'down to slots of 2 min', value: '2\u2009h\u200940', why: 'never less grease than the demand' },
  ],
  source: 'policy of the project', usedBy: ['life', 'pulses a year'],
};

async function panel() {
  const fixture = TestBed.createComponent(ExplainPanel);
  fixture.componentRef.setInput('explanation', explanation);
  await fixture.whenStable();
  return fixture;
}

describe('ExplainPanel', () => {
  it('shows each rounding with its reason, in order', async () => {
    const host = (await panel()).nativeElement as HTMLElement;
    const rows = [...host.querySelectorAll('tr.rounding')].map((row) => [...row.querySelectorAll('td')].map((cell) => cell.textContent?.trim()));
    expect(rows).toEqual([['exact', '2 h 41 min 30.417 s', ''], ['down to slots of 2 min', '2\u2009h\u200940', 'never less grease than the demand']]);
  });

  it('shows inputs with their source, and what uses the figure', async () => {
    const host = (await panel()).nativeElement as HTMLElement;
    expect(host.querySelector('tr.input')?.textContent).toContain('this dispenser');
    expect(host.textContent).toContain('life, pulses a year');
  });

  it('says when it is closed', async () => {
    const fixture = await panel();
    let closed = 0;
    fixture.componentInstance.closed.subscribe(() => closed++);
    (fixture.nativeElement as HTMLElement).querySelector<HTMLButtonElement>('button[aria-label="Close the explanation"]')!.click();
    expect(closed).toBe(1);
  });
});
