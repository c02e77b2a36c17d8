import { TestBed } from '@angular/core/testing';
import { MAT_DIALOG_DATA, MatDialogRef } from '@angular/material/dialog';
import { ConfirmDelete, type Deletion } from './confirm-delete';

async function buttons(data: Deletion): Promise<{ readonly text: string; readonly names: readonly string[] }> {
  TestBed.configureTestingModule({ providers: [{ provide: MAT_DIALOG_DATA, useValue: data }, { provide: MatDialogRef, useValue: {} }] });
  const fixture = TestBed.createComponent(ConfirmDelete);
  await fixture.whenStable();
  const host = fixture.nativeElement as HTMLElement;
  return { text: host.textContent ?? '', names: [...host.querySelectorAll('button')].map((button) => button.textContent?.trim() ?? '') };
}

describe('ConfirmDelete', () => {
  it('says what goes and offers to delete', async () => {
    const { text, names } = await buttons({ name: '-KF4', goes: 'The module goes.', held: '', how: [] });
    expect(text).toContain('The module goes. This cannot be undone.');
    expect(names).toEqual(['Keep', 'Delete']);
  });

  it('says what has to go first and offers no deletion', async () => {
    const { text, names } = await buttons({ name: 'C1', goes: 'The circuit goes.', held: '2 boxes, 30 dispensers', how: ['Boxes: delete them under Cable tree.'] });
    expect(text).toContain('Still on it: 2 boxes, 30 dispensers. Move or delete these first.');
    expect(text).toContain('Boxes: delete them under Cable tree.');
    expect(names).toEqual(['Close']);
  });
});
