import { type Page, expect, test } from '@playwright/test';
import { readFileSync, readdirSync } from 'node:fs';
import { demoProject, designOf, freshProject, signIn, tagList } from './support.ts';

/** Where the pictures go: `npm run guide` names the guide's own folder. */
const FOLDER = process.env['GUIDE_IMAGES'] ?? 'test-results/guide';
const GUIDE = 'docs/guide';

const views = {
  wide: { viewport: { width: 1280, height: 800 }, colorScheme: 'light' },
  phone: { viewport: { width: 390, height: 780 }, colorScheme: 'light' },
  dark: { viewport: { width: 1280, height: 800 }, colorScheme: 'dark' },
} as const;

const pages = readdirSync(GUIDE).filter((name) => name.endsWith('.md'));
/** The pictures that its pages show. */
const shown = new Set(pages.flatMap((name) => [...readFileSync(`${GUIDE}/${name}`, 'utf8').matchAll(/\]\(images\/([\w-]+\.png)\)/g)].map(([, image]) => image)));

for (const [view, settings] of Object.entries(views)) {
  test.describe(`pictures of the guide, ${view}`, () => {
    test.use({ ...settings, reducedMotion: 'reduce' });

    const take = async (page: Page, name: string): Promise<void> => {
      if (!shown.has(`${name}-${view}.png`)) return;
      // The pointer would show what is under it as touched.
      await page.mouse.move(0, 0);
      await page.screenshot({ path: `${FOLDER}/${name}-${view}.png`, animations: 'disabled', caret: 'hide' });
    };

    for (const { name, path, shows } of [
      { name: 'overview', path: 'overview', shows: /Needs you now/ },
      { name: 'mapping', path: 'mapping', shows: /dispensers mapped/ },
      { name: 'findings', path: 'findings', shows: /A in the group/ },
    ]) {
      test(name, async ({ page }) => {
        await signIn(page, 'engineer');
        await page.goto(`/projects/${await demoProject(page)}/${path}`);
        await expect(page.getByText(shows).first()).toBeVisible();
        await take(page, name);
      });
    }

    test('points and alternatives', async ({ page }) => {
      await signIn(page, 'engineer');
      await page.goto(`/projects/${await demoProject(page)}/points`);
      await expect(page.getByText('GC1-L01').first()).toBeVisible();
      await take(page, 'points');
      if (view === 'phone') return;
      await page.getByRole('gridcell', { name: /Head pulley, bearing drive side/ }).first().click();
      await page.keyboard.press('Alt+ArrowDown');
      await expect(page.getByText('Interval by cartridge and dose')).toBeVisible();
      await take(page, 'alternatives');
    });

    test('lane', async ({ page }) => {
      await signIn(page, 'engineer');
      const project = await demoProject(page);
      const { points, dispensers } = await designOf(page, project);
      const point = points.find((p) => p.tag === 'GC2-L03');
      await page.goto(`/projects/${project}/lanes/${dispensers.find((d) => d.pointId === point?.id)?.id}`);
      await expect(page.getByRole('heading', { name: 'Pulse plan' })).toBeVisible();
      await take(page, 'lane');
    });

    test('import and history', async ({ page }) => {
      await signIn(page, 'engineer');
      const project = await freshProject(page, 'Terminal, signal list');
      await page.goto(`/projects/${project}/import`);
      await page.locator('input[type=file]').setInputFiles(tagList('brackwater-signals.xlsx'));
      const commit = page.getByRole('button', { name: /^Import: create 30/ });
      await expect(commit).toBeEnabled();
      await expect(page.locator('lw-rows-panel').getByText('GC1-L01').first()).toBeVisible();
      await take(page, 'import');
      await commit.click();
      await expect(page.getByText('Imported').first()).toBeVisible();
      await page.goto(`/projects/${project}/history`);
      await expect(page.getByText('Import of brackwater-signals.xlsx')).toBeVisible();
      await take(page, 'history');
    });
  });
}

test('every picture that the guide shows was taken, and no other stands in its folder', () => {
  expect([...shown].filter((image) => !readdirSync(FOLDER).includes(image))).toEqual([]);
  expect(readdirSync(`${GUIDE}/images`).sort()).toEqual([...shown].sort());
});
