import { OverlayContainer } from '@angular/cdk/overlay';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ApplicationRef, ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatDialog } from '@angular/material/dialog';
import { firstValueFrom } from 'rxjs';
import { ConflictDialog, type ConflictAnswer, type ConflictView } from './conflict-dialog';

@Component({ selector: 'lw-conflict-host', changeDetection: ChangeDetectionStrategy.OnPush, template: '' })
class Host {}

const view: ConflictView = { label: 'GC1-L11', fields: [{ name: 'Dose', mine: '0.2 cm³', theirs: '0.3 cm³' }] };

async function opened() {
  const fixture = TestBed.createComponent(Host);
  const dialog = TestBed.inject(MatDialog).open<ConflictDialog, ConflictView, ConflictAnswer>(ConflictDialog, { data: view });
  await TestBed.inject(ApplicationRef).whenStable();
  return { answer: firstValueFrom(dialog.afterClosed()), loader: TestbedHarnessEnvironment.documentRootLoader(fixture) };
}

describe('ConflictDialog', () => {
  it('shows both values side by side', async () => {
    await opened();
    const row = TestBed.inject(OverlayContainer).getContainerElement().querySelector('tbody tr');
    expect([...row!.children].map((cell) => cell.textContent)).toEqual(['Dose', '0.2 cm³', '0.3 cm³']);
  });

  it.each([['Keep mine', 'mine'], ['Take theirs', 'theirs']] as const)('%s answers %s', async (button, expected) => {
    const { answer, loader } = await opened();
    await (await loader.getHarness(MatButtonHarness.with({ text: button }))).click();
    expect(await answer).toBe(expected);
  });
});
