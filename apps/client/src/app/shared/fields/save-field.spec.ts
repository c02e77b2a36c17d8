import { TestBed } from '@angular/core/testing';
import { SaveField } from './save-field';
import { numberWithin, textOf } from './typed';

async function field(editable = true) {
  const fixture = TestBed.createComponent(SaveField<number>);
  const inputs = { label: 'Base byte of -KF4', value: '4', read: numberWithin({ min: 0, max: 65_535, whole: true }), editable, cell: true, number: true };
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  const saved: number[] = [];
  fixture.componentInstance.saved.subscribe((value) => saved.push(value));
  await fixture.whenStable();
  const host = fixture.nativeElement as HTMLElement;
  const type = async (text: string, end: Event) => {
    const box = host.querySelector('input')!;
    box.value = text;
    box.dispatchEvent(new Event('input'));
    box.dispatchEvent(end);
    await fixture.whenStable();
  };
  return { host, saved, type };
}

const key = (name: string) => new KeyboardEvent('keydown', { key: name });

describe('SaveField', () => {
  it('saves what was typed once it is left, and nothing where it is the same', async () => {
    const { saved, type } = await field();
    await type('4', new Event('blur'));
    await type('12', new Event('blur'));
    expect(saved).toEqual([12]);
  });

  it('says at the field why a value cannot be, sends nothing and keeps what was typed', async () => {
    const { host, saved, type } = await field();
    await type('70000', key('Enter'));
    expect(host.querySelector('[role=alert]')?.textContent).toBe('Enter 0 to 65,535.');
    expect(host.querySelector('input')?.value).toBe('70000');
    expect(host.querySelector('input')?.getAttribute('aria-invalid')).toBe('true');
    expect(saved).toEqual([]);
  });

  it('takes back what was typed on Escape', async () => {
    const { host, saved, type } = await field();
    await type('abc', key('Enter'));
    await type('abc', key('Escape'));
    expect(host.querySelector('input')?.value).toBe('4');
    expect(host.querySelector('[role=alert]')).toBeNull();
    expect(saved).toEqual([]);
  });

  it('is a box of several lines that is left to save', async () => {
    const fixture = TestBed.createComponent(SaveField<string>);
    const inputs = { label: 'Remarks', value: '', read: textOf(20), editable: true, rows: 3 };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    const saved: string[] = [];
    fixture.componentInstance.saved.subscribe((value) => saved.push(value));
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    const box = host.querySelector('textarea')!;
    expect(host.querySelector('label')?.htmlFor).toBe(box.id);
    box.value = 'two\nlines';
    box.dispatchEvent(new Event('input'));
    box.dispatchEvent(key('Enter'));
    expect(saved).toEqual([]);
    box.dispatchEvent(new Event('blur'));
    expect(saved).toEqual(['two\nlines']);
  });

  it('shows only the value to those who may not edit', async () => {
    const { host } = await field(false);
    expect(host.querySelector('input')).toBeNull();
    expect(host.textContent).toContain('4');
  });
});
