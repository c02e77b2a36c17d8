import { TestBed } from '@angular/core/testing';
import { SaveSelect } from './save-select';

async function select(inputs: Readonly<Record<string, unknown>>) {
  const fixture = TestBed.createComponent(SaveSelect<string>);
  const all = { label: 'Circuit', choices: [{ value: 'c1', label: 'C1' }, { value: 'c2', label: 'C2' }], value: 'c1', editable: true, ...inputs };
  for (const [name, value] of Object.entries(all)) fixture.componentRef.setInput(name, value);
  const picked: (string | null)[] = [];
  fixture.componentInstance.picked.subscribe((value) => picked.push(value));
  await fixture.whenStable();
  const host = fixture.nativeElement as HTMLElement;
  const options = async () => {
    host.querySelector<HTMLElement>('.mat-mdc-select-trigger')!.click();
    await fixture.whenStable();
    return [...document.querySelectorAll<HTMLElement>('mat-option')];
  };
  return { host, options, picked };
}

describe('SaveSelect', () => {
  it('saves as soon as one is chosen', async () => {
    const { options, picked } = await select({});
    const [, second] = await options();
    second.click();
    expect(picked).toEqual(['c2']);
  });

  it('offers none, by its name, where none may be chosen', async () => {
    const { options, picked } = await select({ clearable: true, none: 'not fed' });
    const all = await options();
    expect(all.map((option) => option.textContent?.trim())).toEqual(['not fed', 'C1', 'C2']);
    all[0].click();
    expect(picked).toEqual([null]);
  });

  it('speaks its label in a table and draws it elsewhere', async () => {
    const drawn = await select({});
    expect(drawn.host.querySelector('.label')?.textContent).toBe('Circuit');
    const spoken = await select({ cell: true });
    expect(spoken.host.querySelector('.label')).toBeNull();
    expect(spoken.host.querySelector('mat-select')?.getAttribute('aria-label')).toBe('Circuit');
  });

  it('shows only the words to those who may not edit', async () => {
    const { host } = await select({ value: null, editable: false });
    expect(host.querySelector('mat-select')).toBeNull();
    expect(host.querySelector('.read')?.textContent).toBe('not decided');
  });
});
