import { expect, test } from '@playwright/test';
import readWorkbook from 'read-excel-file/node';
import { designOf, freshProject, signIn, tagList } from './support.ts';

test('an engineer takes a tag list to a checked I/O list', async ({ page }) => {
  await signIn(page, 'engineer');
  const project = await freshProject(page, 'Main job');

  await test.step('upload, check, import', async () => {
    await page.goto(`/projects/${project}/import`);
    await page.getByLabel('Tag list').setInputFiles(tagList('brackwater-points.csv'));
    await expect(page.getByText('26 of 26 used')).toBeVisible();
    await page.getByRole('button', { name: 'Import: create 60' }).click();
    await expect(page.getByRole('heading', { name: 'Imported' })).toBeVisible();
    expect((await designOf(page, project)).points).toHaveLength(60);
  });

  await test.step('the same file again changes nothing', async () => {
    await page.getByRole('button', { name: 'Import another file' }).click();
    await page.getByLabel('Tag list').setInputFiles(tagList('brackwater-points.csv'));
    await expect(page.getByRole('button', { name: 'Nothing to import' })).toBeDisabled();
  });

  await test.step('map what is open by auto-assignment, with a preview', async () => {
    await page.goto(`/projects/${project}/mapping`);
    await expect(page.getByText('17 of 60 dispensers mapped')).toBeVisible();
    await page.getByRole('button', { name: /^Auto-assign/ }).click();
    await expect(page.getByText('Auto-assign preview')).toBeVisible();
    await page.getByRole('button', { name: /^Assign \d+/ }).click();
    await expect(page.getByText('17 of 60 dispensers mapped')).toBeHidden();
    const mapped = (await designOf(page, project)).assignments.filter((a) => a.purpose === 'control').length;
    expect(mapped).toBeGreaterThan(40);
    await expect(page.getByText(`${mapped} of 60 dispensers mapped`)).toBeVisible();
  });

  await test.step('one click on a smaller k mends the overloaded group', async () => {
    const overload = page.getByText(/A in the group, rating 2\.00/);
    await expect(overload.first()).toBeVisible();
    const before = (await designOf(page, project)).circuits.find((c) => c.name === 'C1')?.concurrencyLimit ?? Infinity;
    await page.getByRole('button', { name: /^Set k to \d+ on C1$/ }).first().click();
    await expect(overload).toHaveCount(0);
    await expect(page.getByText('All saved').first()).toBeVisible();
    expect((await designOf(page, project)).circuits.find((c) => c.name === 'C1')?.concurrencyLimit).toBeLessThan(before);
  });

  await test.step('the exported workbook says what the screen says', async () => {
    await page.goto(`/projects/${project}/mapping`);
    await page.getByRole('button', { name: 'I/O list' }).click();
    const download = page.waitForEvent('download');
    await page.getByRole('menuitem', { name: /XLSX/ }).click();
    const path = await (await download).path();
    const sheets = await readWorkbook(path);
    const rows = sheets.flatMap((s) => s.data);
    const heading = rows.find((row) => row.includes('Tag') && row.includes('Output address'));
    const column = (name: string): number => heading?.indexOf(name) ?? -1;
    const design = await designOf(page, project);
    for (const tag of ['GC1-L01', 'SL1-L01', 'GC4-L06']) {
      const lane = rows.find((row) => row[column('Tag')] === tag);
      const point = design.points.find((p) => p.tag === tag);
      await page.goto(`/projects/${project}/lanes/${design.dispensers.find((d) => d.pointId === point?.id)?.id}`);
      await expect(page.getByRole('heading', { level: 1 })).toContainText(tag);
      await expect(page.getByText(String(lane?.[column('Output address')])).filter({ visible: true }).first()).toBeVisible();
      await expect(page.getByRole('region', { name: 'Voltage and load' })).toContainText(Number(lane?.[column('Computed worst voltage V')]).toFixed(1));
      const pulses = lane?.[column('Computed pulses')];
      await expect(page.getByRole('region', { name: 'Pulse plan' })).toContainText(typeof pulses === 'number' ? pulses.toLocaleString('en-GB') : '–');
    }
  });
});
