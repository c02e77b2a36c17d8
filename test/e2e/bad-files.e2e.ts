import { expect, test } from '@playwright/test';
import { designOf, freshProject, signIn, tagList } from './support.ts';

const bad = [
  { name: 'workbook.csv', bytes: Buffer.from([0x50, 0x4b, 0x03, 0x04, 0, 0, 0, 0]), says: /workbook/i },
  { name: 'empty.csv', bytes: Buffer.alloc(0), says: /empty/i },
  { name: 'open-quote.csv', bytes: Buffer.from('Tag,Description\nA-1,"never closed\nA-2,x\n'), says: /quot/i },
];

for (const { name, bytes, says } of bad) {
  test(`${name} is refused with what to do, and nothing is created`, async ({ page }) => {
    await signIn(page, 'engineer');
    const project = await freshProject(page, `Refused ${name}`);
    await page.goto(`/projects/${project}/import`);
    await page.getByLabel('Tag list').setInputFiles({ name, mimeType: 'text/csv', buffer: bytes });
    await expect(page.getByRole('alert')).toContainText(says);
    expect((await designOf(page, project)).points).toHaveLength(0);
  });
}

test('rows at fault are held back with cell and remedy, the sound ones are imported', async ({ page }) => {
  await signIn(page, 'engineer');
  const project = await freshProject(page, 'Faults');
  await page.goto(`/projects/${project}/import`);
  await page.getByLabel('Tag list').setInputFiles(tagList('brackwater-faults.csv'));
  await expect(page.getByText('3 held back').first()).toBeVisible();
  await page.getByRole('radio', { name: /^Problems/ }).click();
  await expect(page.getByText(/GC9-L01/).first()).toBeVisible();
  await page.getByRole('button', { name: 'Import: create 27' }).click();
  await expect(page.getByRole('heading', { name: 'Imported' })).toBeVisible();
  expect((await designOf(page, project)).points).toHaveLength(27);
});
