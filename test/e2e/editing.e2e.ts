import { expect, test } from '@playwright/test';
import { designOf, freshProject, importList, signIn } from './support.ts';

test('two people change the same field: both values are shown, and the choice is kept', async ({ page, browser }) => {
  await signIn(page, 'engineer');
  const project = await freshProject(page, 'Conflict');
  await importList(page, project, 'brackwater-points.csv');
  const design = await designOf(page, project);
  const point = design.points.find((p) => p.tag === 'GC1-L01');

  // This browser hears nothing of others: its events are cut, as in a bad network.
  await page.route('**/events', (route) => route.abort());
  await page.goto(`/projects/${project}/points`);
  await expect(page.getByText('GC1-L01').first()).toBeVisible();

  const colleague = await browser.newPage();
  await signIn(colleague, 'engineer');
  const theirs = await colleague.request.patch(`/api/v1/projects/${project}/points/${point?.id}`, {
    data: { description: 'Head pulley, colleague' }, headers: { 'If-Match': `"${point?.version}"` },
  });
  expect(theirs.status()).toBe(200);
  await colleague.close();

  const cell = page.getByRole('gridcell', { name: /Head pulley, bearing drive side/ }).first();
  await cell.click();
  await page.keyboard.press('F2');
  await page.keyboard.press('Control+A');
  await page.keyboard.type('Head pulley, mine');
  await page.keyboard.press('Enter');
  const dialog = page.getByRole('dialog');
  await expect(dialog).toContainText('Head pulley, colleague');
  await expect(dialog).toContainText('Head pulley, mine');
  await dialog.getByRole('button', { name: /mine/i }).click();
  await expect(page.getByText('All saved').first()).toBeVisible();
  expect((await designOf(page, project)).points.find((p) => p.tag === 'GC1-L01')?.description).toBe('Head pulley, mine');
});

test("a colleague's edit arrives by itself, and undoes nothing of one's own", async ({ page, browser }) => {
  await signIn(page, 'engineer');
  const project = await freshProject(page, 'Live');
  await page.goto(`/projects/${project}/hardware?part=circuits`);
  const limit = page.getByRole('textbox', { name: /k/ }).first();
  await expect(limit).toBeVisible();

  const colleague = await browser.newPage();
  await signIn(colleague, 'engineer');
  const circuit = (await designOf(colleague, project)).circuits.find((c) => c.name === 'C1');
  const answer = await colleague.request.patch(`/api/v1/projects/${project}/circuits/${circuit?.id}`, {
    data: { concurrencyLimit: 3 }, headers: { 'If-Match': `"${circuit?.version}"` },
  });
  expect(answer.status()).toBe(200);
  await colleague.close();
  await expect(limit).toHaveValue('3');
});

test('an output is mapped by keyboard: type part of a tag in a free channel, Enter, and unmapped with Delete', async ({ page }) => {
  await signIn(page, 'engineer');
  const project = await freshProject(page, 'Keyboard');
  await importList(page, project, 'brackwater-points.csv');
  await page.goto(`/projects/${project}/mapping`);
  const row = page.getByRole('rowgroup', { name: 'PLC1 DO1 group 2' }).getByRole('row', { name: /^%QX5\.0 / });
  await row.focus();
  await page.keyboard.type('GC3-L03');
  await expect(page.getByRole('option', { name: /GC3-L03/ })).toBeVisible();
  await page.keyboard.press('Enter');
  await expect(page.getByText('18 of 60 dispensers mapped')).toBeVisible();
  await expect(row).toContainText('GC3-L03');
  await row.focus();
  await page.keyboard.press('Delete');
  await expect(page.getByText('17 of 60 dispensers mapped')).toBeVisible();
});
