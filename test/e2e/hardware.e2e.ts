import { expect, type Page, test } from '@playwright/test';
import { randomUUID } from 'node:crypto';
import { designOf, signIn } from './support.ts';

test('hardware is laid out from nothing: cabinet, controller, module, supply, circuit, box', async ({ page }) => {
  await signIn(page, 'engineer');
  const project = randomUUID();
  await page.request.post('/api/v1/projects', { data: { id: project, name: `Laid out ${project.slice(0, 8)}` } });

  await page.goto(`/projects/${project}/hardware`);
  await add(page, 'Cabinet');
  await add(page, 'Controller');
  await add(page, 'Module', async () => {
    await choose(page, 'Type', /^Output module, 16/);
    await expect(page.getByRole('dialog').getByLabel('Name')).toHaveValue('DO1');
  });
  await expect(page.getByText('%QX0.0 to %QX1.7')).toBeVisible();

  await page.goto(`/projects/${project}/hardware?part=circuits`);
  await add(page, 'Supply', async () => {
    await choose(page, 'Cabinet', /^\+K1/);
    await choose(page, 'Type', /^Supply, 24 V/);
  });
  await add(page, 'Circuit', async () => {
    await choose(page, 'Protection', /^Electronic/);
    await page.getByRole('dialog').getByLabel('Rating').fill('4');
  });

  await page.goto(`/projects/${project}/hardware?part=cables`);
  await add(page, 'Add a box at the terminals of C1', async () => {
    await page.getByRole('dialog').getByLabel(/Length/).fill('35,5');
  });

  const design = (await designOf(page, project)) as unknown as Record<string, readonly Record<string, unknown>[]>;
  expect(design['moduleGroups']).toHaveLength(2);
  expect(design['circuits']).toMatchObject([{ name: 'C1', protection: 'electronic', protectionA: 4, concurrencyLimit: null }]);
  expect(design['cableNodes']).toMatchObject([{ lengthM: 35.5, parentId: null }]);
});

// A cable type: no dispenser, module or supply of the other tests' projects takes another version of it.
test('a new version of a type leaves the old one as it is', async ({ page }) => {
  const name = 'Control cable, 2 × 0.75 mm², numbered';
  await signIn(page, 'engineer');
  await page.goto('/catalogue?kind=cableTypes');
  await page.getByText(name).first().click();
  await page.getByRole('button', { name: 'New version' }).click();
  await page.getByLabel(/^Cores/).first().fill('3');
  await page.getByRole('button', { name: 'Save new version' }).click();
  await expect(page.getByText(/version 2/i).first()).toBeVisible();
  const { cableTypes } = (await (await page.request.get('/api/v1/catalogue')).json()) as { cableTypes: { name: string; typeVersion: number; cores: number }[] };
  const versions = cableTypes.filter((t) => t.name === name).sort((a, b) => a.typeVersion - b.typeVersion);
  expect(versions.map((t) => t.cores)).toEqual([2, 3]);
});

/** Opens the dialog that adds one, fills what `fill` says over the suggestions, and waits until it is saved. */
async function add(page: Page, what: string, fill?: () => Promise<void>): Promise<void> {
  await page.getByRole('button', { name: what, exact: true }).first().click();
  await fill?.();
  await page.getByRole('dialog').getByRole('button', { name: 'Add' }).click();
  await expect(page.getByRole('dialog')).toBeHidden();
  await expect(page.getByText('All saved').first()).toBeVisible();
}

async function choose(page: Page, field: string, option: RegExp): Promise<void> {
  await page.getByRole('dialog').getByRole('combobox', { name: field }).click();
  await page.getByRole('option', { name: option }).first().click();
}
