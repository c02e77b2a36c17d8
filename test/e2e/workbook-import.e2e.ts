import AxeBuilder from '@axe-core/playwright';
import { expect, type Page, test } from '@playwright/test';
import { designOf, freshProject, signIn, tagList } from './support.ts';

const LONG_ROWS = 40_000;
/** Reading is a job of its own at the server. */
const READING = { timeout: 30_000 };

/** Opens the import of a new project. */
async function openImport(page: Page, name: string): Promise<string> {
  await signIn(page, 'engineer');
  const project = await freshProject(page, name);
  await page.goto(`/projects/${project}/import`);
  return project;
}

const choose = (page: Page, name: string) => page.getByLabel('Tag list', { exact: true }).setInputFiles(tagList(name));

/** A tag list long enough that reading it can be watched. */
function longList(): { readonly name: string; readonly mimeType: string; readonly buffer: Buffer } {
  const rows = Array.from({ length: LONG_ROWS }, (_, i) => `X${String(i).padStart(5, '0')},Bearing ${i},Conveyor ${i % 90},${100 + (i % 40)},1500`);
  return { name: 'long.csv', mimeType: 'text/csv', buffer: Buffer.from(['Tag,Description,Machine,Bore d mm,Speed rpm', ...rows].join('\n')) };
}

async function expectNoFaults(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21aa']).analyze();
  expect(violations.map((v) => `${v.id}: ${v.nodes.slice(0, 3).map((n) => n.target.join(' ')).join('; ')}`)).toEqual([]);
}

test('an issued signal list comes in, sheet by sheet and signal by signal', async ({ page }) => {
  const project = await openImport(page, 'Issued list');

  await test.step('the workbook is read as it stands', async () => {
    await choose(page, 'brackwater-signals.xlsx');
    await expect(page.getByRole('button', { name: /^Signals \d/ })).toHaveAttribute('aria-pressed', 'true', READING);
    await expect(page.getByRole('button', { name: /^Legend \d/ })).toHaveAttribute('aria-pressed', 'false');
    await expect(page.getByText(/Read as a workbook/)).toContainText('headings in row 6');
    await expect(page.getByRole('button', { name: 'Import: create 30' })).toBeVisible();
  });

  await test.step('two rows of the file make one point', async () => {
    await expect(page.getByRole('row', { name: /13, 14 New GC2-L01/ })).toBeVisible();
  });

  await test.step('a format has its own settings', async () => {
    await page.getByText(/Read as a workbook/).click();
    await expect(page.getByLabel('Heading row')).toHaveValue('6');
    await expect(page.getByLabel('Encoding')).toHaveCount(0);
  });

  await test.step('import', async () => {
    await page.getByRole('button', { name: 'Import: create 30' }).click();
    await expect(page.getByRole('heading', { name: 'Imported' })).toBeVisible(READING);
    const design = await designOf(page, project);
    expect(design.points).toHaveLength(30);
    expect(design.assignments).toHaveLength(54);
  });

  await test.step('and undo', async () => {
    await page.getByRole('button', { name: 'Undo this import' }).click();
    await expect(page.getByRole('heading', { name: 'Undone' })).toBeVisible(READING);
    expect((await designOf(page, project)).points).toHaveLength(0);
  });
});

test('what was mapped last time is suggested the next time', async ({ page }) => {
  await openImport(page, 'Remembered');
  const machine = page.getByRole('combobox', { name: /^Field for column \w+, Maschine/ });
  await choose(page, 'brackwater-points-semicolon-1252.csv');
  await expect(machine).toBeVisible(READING);
  await machine.selectOption({ label: 'leave out' });
  await page.getByRole('button', { name: /^Import: create 40/ }).click();
  await expect(page.getByRole('heading', { name: 'Imported' })).toBeVisible(READING);

  await page.getByRole('button', { name: 'Import another file' }).click();
  await choose(page, 'brackwater-points-semicolon-1252.csv');
  await expect(page.getByRole('button', { name: 'Nothing to import' })).toBeDisabled(READING);
  await expect(machine).toHaveValue('');
  await expect(page.getByText('left out last time')).toBeVisible();
  await expect(page.getByText('as last time', { exact: true }).first()).toBeVisible();

  await test.step('and is put right for whoever comes next', async () => {
    await machine.selectOption({ label: 'Machine' });
    await page.getByRole('button', { name: /^Import: change 40/ }).click();
    await expect(page.getByRole('heading', { name: 'Imported' })).toBeVisible(READING);
  });
});

test('a long file shows how far it is, can be stopped, and is read on demand', async ({ page }) => {
  test.setTimeout(180_000);
  const project = await openImport(page, 'Long');

  await test.step('stopped while it is read', async () => {
    await page.getByLabel('Tag list', { exact: true }).setInputFiles(longList());
    await expect(page.getByRole('progressbar')).toHaveAttribute('aria-valuetext', /Sending|Reading|Checking|Waiting/);
    await page.getByRole('button', { name: 'Cancel' }).click();
    await expect(page.getByText('Stopped. Nothing was changed.')).toBeVisible();
    await expect(page.getByText('Drop a tag list here')).toBeVisible();
  });

  await test.step('read to the end', async () => {
    await page.getByLabel('Tag list', { exact: true }).setInputFiles(longList());
    await expect(page.getByRole('button', { name: 'Import: create 40,000' })).toBeVisible({ timeout: 90_000 });
  });

  await test.step('any row is one step away', async () => {
    await page.getByLabel('Go to row').fill('31416');
    await page.getByRole('button', { name: 'Go', exact: true }).click();
    await expect(page.getByRole('row', { name: /X31414/ })).toBeVisible();
    await expect(page.getByText(/of 40,000/)).toBeVisible();
  });

  await test.step('stopped while it is imported', async () => {
    await page.getByRole('button', { name: 'Import: create 40,000' }).click();
    await page.getByRole('button', { name: 'Stop the import' }).click();
    await expect(page.getByText('Stopped. Nothing was imported.')).toBeVisible({ timeout: 60_000 });
    expect((await designOf(page, project)).points).toHaveLength(0);
  });
});

test('rows are filtered by what they do, and problems are visited by key', async ({ page }) => {
  await openImport(page, 'Filters');
  await choose(page, 'brackwater-faults.csv');
  await page.getByRole('radio', { name: /^Held back ?3$/ }).click();
  await expect(page.getByText('1 to 3 of 3')).toBeVisible();
  await page.getByRole('radio', { name: /^All/ }).click();
  await page.keyboard.press('Alt+n');
  await expect(page.getByRole('region', { name: 'Row 3' })).toContainText(/row 2/);
  await page.keyboard.press('Alt+n');
  await expect(page.getByRole('region', { name: 'Row 4' })).toBeVisible();
  await page.keyboard.press('Alt+p');
  await expect(page.getByRole('region', { name: 'Row 3' })).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(page.getByRole('region', { name: 'Row 3' })).toHaveCount(0);
});

for (const [size, viewport] of Object.entries({ wide: { width: 1440, height: 900 }, phone: { width: 390, height: 844 } })) {
  for (const scheme of ['light', 'dark'] as const) {
    test.describe(`${size}, ${scheme}`, () => {
      test.use({ viewport, colorScheme: scheme });

      test('the check reads well', async ({ page }) => {
        test.slow(); // Hundreds of cells and choices for axe to look at.
        await openImport(page, `Looks ${size}`);
        await choose(page, 'brackwater-faults.csv');
        await expect(page.getByRole('button', { name: 'Import: create 27' })).toBeVisible(READING);
        await page.keyboard.press('Alt+n');
        await expect(page.getByRole('region', { name: 'Row 3' })).toBeVisible();
        await page.screenshot({ path: `test-results/screens/import-check-${size}-${scheme}.png` });
        const overflow = await page.evaluate<number>('document.documentElement.scrollWidth - document.documentElement.clientWidth');
        expect(overflow, 'pixels wider than the screen').toBeLessThanOrEqual(0);
        await expectNoFaults(page);
      });
    });
  }
}
