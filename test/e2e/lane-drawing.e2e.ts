import AxeBuilder from '@axe-core/playwright';
import { expect, type Page, test } from '@playwright/test';
import { demoProject, designOf, signIn } from './support.ts';

/** A mapped four-core lane behind a box, a mapped two-core one that gets too little, an open one with findings. */
const lanes = { fourCore: 'GC2-L03', twoCore: 'GC4-L06', open: 'GC3-L06' } as const;

async function openLane(page: Page, tag: string): Promise<void> {
  await signIn(page, 'engineer');
  const project = await demoProject(page);
  const design = await designOf(page, project);
  const point = design.points.find((p) => p.tag === tag);
  await page.goto(`/projects/${project}/lanes/${design.dispensers.find((d) => d.pointId === point?.id)?.id}`);
  await expect(page.getByRole('heading', { name: 'Pulse plan' })).toBeVisible({ timeout: 20_000 });
}

const overflow = (page: Page): Promise<number> => page.evaluate<number>('document.documentElement.scrollWidth - document.documentElement.clientWidth');

async function expectNoFaults(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).include('lw-lane-page').withTags(['wcag2a', 'wcag2aa', 'wcag21aa']).analyze();
  expect(violations.map((v) => `${v.id}: ${v.nodes.slice(0, 3).map((n) => n.target.join(' ')).join('; ')}`)).toEqual([]);
}

const spoken = {
  fourCore: /^Loop diagram of lane GC2-L03, four-core, mapped\. output %QX5\.2 of DO1 in \+K1, over \+JB1 .*At worst \d+\.\d V/,
  twoCore: /^Loop diagram of lane GC4-L06, two-core, mapped.*too low: at least 19\.0 V/,
} as const;

for (const scheme of ['light', 'dark'] as const) {
  for (const kind of ['fourCore', 'twoCore'] as const) {
    test.describe(`${kind}, ${scheme}`, () => {
      test.use({ colorScheme: scheme });

      test('is drawn, spoken and free of faults', async ({ page }) => {
        await openLane(page, lanes[kind]);
        await expect(page.getByRole('img', { name: spoken[kind] })).toBeVisible();
        await expectNoFaults(page);
      });
    });
  }
}

test('the figures are a table too, opened by keyboard', async ({ page }) => {
  await openLane(page, lanes.fourCore);
  await page.locator('summary', { hasText: 'Stations as a table' }).press('Enter');
  await expect(page.getByRole('row', { name: /^Box \+JB1/ })).toContainText('-W1001, 20');
});

test('a lane of the same box is one click away, drawn in its row', async ({ page }) => {
  await openLane(page, lanes.fourCore);
  const row = page.locator('lw-lane-neighbours-table tr', { hasText: 'GC2-L05' });
  await expect(row.getByRole('img', { name: /^Lane GC2-L05, mapped: output %QX5\.4/ })).toBeVisible();
  await row.getByRole('link', { name: 'GC2-L05' }).click();
  await expect(page.getByRole('heading', { level: 1, name: /GC2-L05/ })).toBeVisible();
});

test.describe('lane drawing on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

  test('stands upright, nothing scrolls sideways, and everything can be touched', async ({ page }) => {
    await openLane(page, lanes.open);
    await expect(page.locator('lw-loop-upright ol > li').first()).toBeVisible();
    await expect(page.locator('svg.loop')).toBeHidden();
    expect(await overflow(page)).toBeLessThanOrEqual(0);
    const low = await page.locator('lw-lane-page :is(.lane-head a, lw-lane-neighbours-table a):visible').evaluateAll((links) => links.filter((l) => (l as unknown as { offsetHeight: number }).offsetHeight < 44).length);
    expect(low, 'links lower than 44 px').toBe(0);
  });
});

test('colours forced by the system leave the drawing its shapes', async ({ page }) => {
  await page.emulateMedia({ forcedColors: 'active' });
  await openLane(page, lanes.open);
  await expect(page.locator('svg.loop .octagon').first()).toBeVisible();
  expect(await page.locator('svg.loop .small-mark').count()).toBeGreaterThanOrEqual(3);
});

test.describe('on paper', () => {
  for (const [what, tag] of Object.entries(lanes)) {
    test(`a lane is one sheet (${what})`, async ({ page }) => {
      await openLane(page, tag);
      const pdf = (await page.pdf({ preferCSSPageSize: true })).toString('latin1');
      expect(pdf.match(/\/Type\s*\/Page\b/g)).toHaveLength(1);
      expect(pdf).toMatch(/\/MediaBox\s*\[0 0 84[12][.\d]* 59[45]/);
    });
  }

  test('the frame is gone, the heading names project and state, and brick is black', async ({ page }) => {
    await openLane(page, lanes.open);
    await page.emulateMedia({ media: 'print' });
    await expect(page.locator('lw-app-bar')).toBeHidden();
    await expect(page.locator('lw-nav-list')).toBeHidden();
    await expect(page.locator('svg.loop')).toBeVisible();
    const style = (name: string): Promise<string> => page.evaluate<string>(`getComputedStyle(document.documentElement).getPropertyValue('${name}')`);
    expect(await style('--lw-print-project')).toBe('"Brackwater Terminal"');
    expect(await style('--lw-print-state')).toContain('not for construction');
    expect([await style('--mat-sys-error'), await style('--lw-pulse')]).toEqual(['#000', '#000']);
  });

  test('mapping and points print their lists, the head first', async ({ page }) => {
    await signIn(page, 'engineer');
    const project = await demoProject(page);
    for (const [path, grid] of [['mapping', 'lw-channel-table'], ['points', 'lw-points-grid']] as const) {
      await page.goto(`/projects/${project}/${path}`);
      await expect(page.locator(grid).getByText('GC1-L01').first()).toBeVisible();
      await page.emulateMedia({ media: 'print' });
      await expect(page.locator(`${grid} .head[role=row]`).first()).toHaveCSS('display', 'table-header-group');
      await expect(page.locator('lw-page-head .tools')).toBeHidden();
      await page.emulateMedia({ media: 'screen' });
    }
  });
});
