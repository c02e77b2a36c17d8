import AxeBuilder from '@axe-core/playwright';
import { expect, type Page, test } from '@playwright/test';
import { demoProject, designOf, signIn } from './support.ts';

const sizes = { wide: { width: 1440, height: 900 }, phone: { width: 390, height: 844 } } as const;

/** Address below the project, and a text that says the screen is there. */
const screens: readonly { readonly name: string; readonly path: string; readonly shows: RegExp }[] = [
  { name: 'overview', path: 'overview', shows: /GL1/ },
  { name: 'points', path: 'points', shows: /GC1-L01/ },
  { name: 'mapping', path: 'mapping', shows: /46 of 60 dispensers mapped/ },
  { name: 'hardware', path: 'hardware', shows: /2 cabinets, 12 modules/ },
  { name: 'findings', path: 'findings', shows: /A in the group/ },
  { name: 'import', path: 'import', shows: /Drop a tag list/ },
  { name: 'history', path: 'history', shows: /who, when and what/ },
];

/** Dark on the phone has the elements of light on the phone and the colours of dark on the desk. */
const schemesOf = (size: string) => (size === 'phone' ? (['light'] as const) : (['light', 'dark'] as const));

for (const [size, viewport] of Object.entries(sizes)) {
  for (const scheme of schemesOf(size)) {
    test.describe(`${size}, ${scheme}`, () => {
      test.use({ viewport, colorScheme: scheme });

      for (const { name, path, shows } of screens) {
        test(`${name} reads well`, async ({ page }) => {
          await signIn(page, 'engineer');
          await page.goto(`/projects/${await demoProject(page)}/${path}`);
          await expect(page.getByText(shows).first()).toBeVisible();
          await look(page, name, size, scheme);
        });
      }

      test('lane reads well', async ({ page }) => {
        await signIn(page, 'engineer');
        const project = await demoProject(page);
        const design = await designOf(page, project);
        const point = design.points.find((p) => p.tag === 'GC2-L03');
        await page.goto(`/projects/${project}/lanes/${design.dispensers.find((d) => d.pointId === point?.id)?.id}`);
        await expect(page.getByRole('heading', { name: 'Pulse plan' })).toBeVisible();
        await look(page, 'lane', size, scheme);
      });

      test('projects, catalogue and sign-in read well', async ({ page }) => {
        await page.goto('/sign-in');
        await expect(page.getByRole('button', { name: 'Sign in' })).toBeVisible();
        await look(page, 'sign-in', size, scheme);
        await signIn(page, 'engineer');
        await page.goto('/projects');
        await expect(page.getByText('Brackwater Terminal').first()).toBeVisible();
        await look(page, 'projects', size, scheme);
        await page.goto('/catalogue');
        await expect(page.getByText('Dispenser, four-core, 160 cm³ family').first()).toBeVisible();
        await look(page, 'catalogue', size, scheme);
      });
    });
  }
}

/** Nothing wider than the screen, and no fault that axe finds; the picture is kept for eyes. */
async function look(page: Page, name: string, size: string, scheme: string): Promise<void> {
  await page.screenshot({ path: `test-results/screens/${name}-${size}-${scheme}.png` });
  const overflow = await page.evaluate<number>('document.documentElement.scrollWidth - document.documentElement.clientWidth');
  expect(overflow, 'pixels wider than the screen').toBeLessThanOrEqual(0);
  const { violations } = await new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21aa']).analyze();
  expect(violations.map((v) => `${v.id}: ${v.nodes.slice(0, 3).map((n) => n.target.join(' ')).join('; ')}`)).toEqual([]);
}
