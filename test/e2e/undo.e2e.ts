import { expect, type Page, test } from '@playwright/test';
import { designOf, freshProject, importList, signIn } from './support.ts';

/** A project of its own with the terminal's points, opened at the points. */
async function openPoints(page: Page, name: string): Promise<string> {
  await signIn(page, 'engineer');
  const project = await freshProject(page, name);
  await importList(page, project, 'brackwater-points.csv');
  await page.goto(`/projects/${project}/points`);
  await expect(page.getByText('GC1-L01').first()).toBeVisible();
  return project;
}

const doseOf = async (page: Page, project: string, tag: string): Promise<number | null | undefined> => {
  const design = await designOf(page, project);
  return design.dispensers.find((d) => d.pointId === design.points.find((p) => p.tag === tag)?.id)?.doseUl;
};

/** The cell of a row and column of the points grid, from its place beside the tag. */
async function typeDose(page: Page, tag: string, dose: string): Promise<void> {
  const row = page.getByRole('row').filter({ has: page.getByText(tag, { exact: true }) });
  await row.locator('[id$="-doseUl"]').click();
  await page.keyboard.type(dose);
  await page.keyboard.press('Enter');
  await saved(page);
}
const saved = (page: Page) => expect(page.getByText('All saved').first()).toBeVisible();
const told = (page: Page, text: string | RegExp) => expect(page.locator('mat-snack-bar-container').getByText(text)).toBeVisible();

test('a dose edit is undone with Ctrl Z and redone with Ctrl Y; the buttons say what', async ({ page }) => {
  const project = await openPoints(page, 'Undo');
  const undo = page.locator('lw-undo-buttons').getByRole('button').first();
  await expect(undo).toHaveAccessibleName('Undo');
  await expect(undo).toHaveAttribute('aria-disabled', 'true');
  const before = await doseOf(page, project, 'GC1-L01');
  await typeDose(page, 'GC1-L01', '0.5');
  expect(await doseOf(page, project, 'GC1-L01')).toBe(500);
  await expect(undo).toHaveAccessibleName('Undo: Dose of GC1-L01');

  await page.keyboard.press('Control+z');
  await told(page, 'Undone: Dose of GC1-L01');
  expect(await doseOf(page, project, 'GC1-L01')).toBe(before);
  await page.keyboard.press('Control+y');
  await told(page, 'Redone: Dose of GC1-L01');
  expect(await doseOf(page, project, 'GC1-L01')).toBe(500);
  await undo.click();
  await told(page, 'Undone: Dose of GC1-L01');
  await page.locator('mat-snack-bar-container').getByRole('button', { name: 'Redo' }).click();
  await told(page, 'Redone: Dose of GC1-L01');
  expect(await doseOf(page, project, 'GC1-L01')).toBe(500);
});

test('while text is typed in a field, Ctrl Z is that of the text', async ({ page }) => {
  const project = await openPoints(page, 'Text');
  await typeDose(page, 'GC1-L01', '0.5');
  const filter = page.getByRole('searchbox', { name: /Filter rows/ });
  await filter.click();
  await page.keyboard.type('GC2');
  await page.keyboard.press('Control+z');
  await expect(filter).not.toHaveValue('GC2');
  expect(await doseOf(page, project, 'GC1-L01')).toBe(500);
});

test('a bulk change is undone as a whole, and an edit on another screen before it', async ({ page }) => {
  const project = await openPoints(page, 'Bulk');
  const before = await designOf(page, project);
  await page.goto(`/projects/${project}/hardware?part=circuits`);
  const limit = page.getByRole('textbox', { name: /k/ }).first();
  const k = await limit.inputValue();
  await limit.fill('2');
  await limit.press('Enter');
  await saved(page);

  await page.getByRole('link', { name: /Points and doses/ }).first().click();
  await page.getByRole('checkbox', { name: /GC1-L01/ }).click();
  await page.getByRole('checkbox', { name: /GC1-L02/ }).click();
  await page.getByRole('region', { name: 'Ticked points' }).getByRole('button', { name: 'Change' }).click();
  await page.getByRole('dialog').getByLabel(/Hours/).fill('7');
  await page.getByRole('dialog').getByRole('button', { name: /Change 2 points/ }).click();
  await saved(page);
  await expect(page.getByRole('button', { name: 'Undo: Hours per day of 2 points' })).toBeVisible();
  await page.keyboard.press('Control+z');
  await told(page, 'Undone: Hours per day of 2 points');
  await page.keyboard.press('Control+z');
  await told(page, /Undone: Concurrency limit k of circuit/);
  await page.goto(`/projects/${project}/hardware?part=circuits`);
  await expect(limit).toHaveValue(k);
  expect(withoutVersions(await designOf(page, project))).toEqual(withoutVersions(before));
});

test('an import is undone from the history, by whom and when, and redone', async ({ page }) => {
  const project = await openPoints(page, 'Import');
  await page.goto(`/projects/${project}/history`);
  const entry = page.getByRole('row', { name: /Import of brackwater-points\.csv/ }).last();
  await entry.getByRole('button', { name: /^Undo/ }).click();
  const dialog = page.getByRole('dialog', { name: /^Undo \d+ rows/ });
  await expect(dialog).toContainText('Import of brackwater-points.csv');
  await dialog.getByRole('button', { name: /^Undo/ }).click();
  await told(page, /Undone: Import of brackwater-points\.csv/);
  await expect(entry).toContainText(/Undone by .+, \d+ \w+ \d{4}/);
  await expect(entry.locator('s')).toContainText('Import of brackwater-points.csv');
  expect((await designOf(page, project)).points).toHaveLength(0);

  await entry.getByRole('button', { name: /^Redo/ }).click();
  await page.getByRole('dialog').getByRole('button', { name: /^Redo/ }).click();
  await told(page, /Redone: Import of/);
  expect((await designOf(page, project)).points).toHaveLength(60);
});

test('an undo is refused with the reason where a later change stands on it', async ({ page, browser }) => {
  const project = await openPoints(page, 'Refused');
  await typeDose(page, 'GC1-L01', '0.5');
  const colleague = await browser.newPage();
  await signIn(colleague, 'engineer');
  const design = await designOf(colleague, project);
  const dispenser = design.dispensers.find((d) => d.pointId === design.points.find((p) => p.tag === 'GC1-L01')?.id);
  const theirs = await colleague.request.patch(`/api/v1/projects/${project}/dispensers/${dispenser?.id}`, {
    data: { doseUl: 400 }, headers: { 'If-Match': `"${dispenser?.version}"` },
  });
  expect(theirs.status()).toBe(200);
  await colleague.close();

  await page.keyboard.press('Control+z');
  const notice = page.getByRole('alert').filter({ hasText: 'Not undone' });
  await expect(notice).toContainText(/Dose of GC1-L01: Later changes stand on this\. Dispenser at GC1-L01: dose changed by .+ on \d+ \w+ \d{4}/);
  expect(await doseOf(page, project, 'GC1-L01')).toBe(400);

  await page.goto(`/projects/${project}/history`);
  const entry = page.getByRole('row', { name: /Dose of GC1-L01/ });
  await entry.getByRole('button', { name: 'Undo: Dose of GC1-L01' }).click();
  await expect(entry.getByRole('alert')).toContainText('dose changed by');
});

const withoutVersions = (value: object): unknown => JSON.parse(JSON.stringify(value, (key, inner: unknown) => (['version', 'sequence'].includes(key) ? undefined : inner)));
