import { expect, test } from '@playwright/test';
import { designOf, freshProject, signIn, tagList } from './support.ts';

test('two people change the same field: both values are shown, and the choice is kept', async ({ page, browser }) => {
  await signIn(page, 'engineer');
  const project = await freshProject(page, 'Conflict');
  const upload = await page.request.post(`/api/v1/projects/${project}/imports`, {
    multipart: { file: { name: 'points.csv', mimeType: 'text/csv', buffer: await (await import('node:fs/promises')).readFile(tagList('brackwater-points.csv')) } },
  });
  const { id } = (await upload.json()) as { id: string };
  await page.request.post(`/api/v1/projects/${project}/imports/${id}/commit`, { data: {} });
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
