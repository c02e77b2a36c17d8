import AxeBuilder from '@axe-core/playwright';
import { expect, type Locator, type Page, test } from '@playwright/test';
import { demoProject, designOf, freshProject, importList, signIn } from './support.ts';

const said = (page: Page): Locator => page.locator('.cdk-live-announcer-element');
/** A channel of the first controller; both controllers count their addresses from the same byte. */
const channel = (page: Page, address: string): Locator =>
  page.getByRole('rowgroup', { name: /^PLC1 / }).getByRole('row', { name: new RegExp(`^${address.replace('.', '\\.')} `) });
const openRow = (page: Page, tag: string): Locator => page.getByRole('grid', { name: 'Dispensers not mapped' }).getByRole('row', { name: new RegExp(tag) });
const group = (page: Page, name: string): Locator => page.getByRole('rowgroup', { name }).getByRole('row').first();
const chip = (page: Page): Locator => page.locator('lw-move-chip');

/** A project of its own with the terminal's tag list: 17 of 60 dispensers come mapped. */
async function openMapping(page: Page, name: string): Promise<string> {
  await signIn(page, 'engineer');
  const project = await freshProject(page, name);
  await importList(page, project, 'brackwater-points.csv');
  await page.goto(`/projects/${project}/mapping`);
  await expect(page.getByText('17 of 60 dispensers mapped')).toBeVisible({ timeout: 15_000 });
  return project;
}

/** Presses the mouse on one thing and goes to another; it is not let go of. */
async function dragOver(page: Page, from: Locator, to: Locator): Promise<void> {
  // In the middle: at an edge the table scrolls on under the pointer.
  await to.evaluate((element) => (element as unknown as { scrollIntoView(how: object): void }).scrollIntoView({ block: 'center' }));
  await from.scrollIntoViewIfNeeded();
  const start = await from.boundingBox();
  if (!start) throw new Error('Nothing to drag');
  await page.mouse.move(start.x + 150, start.y + start.height / 2);
  await page.mouse.down();
  await page.mouse.move(start.x + 160, start.y + start.height / 2 + 10);
  const end = await to.boundingBox();
  if (!end) throw new Error('Nowhere to drop');
  await page.mouse.move(end.x + 200, end.y + end.height / 2, { steps: 4 });
}

const summaries = async (page: Page, project: string): Promise<readonly string[]> =>
  ((await (await page.request.get(`/api/v1/projects/${project}/history`)).json()) as { summary: string }[]).map((entry) => entry.summary);

test.describe('with the mouse', () => {
  test('one dispenser is dragged onto a channel; figures follow, and it is one change set', async ({ page }) => {
    const project = await openMapping(page, 'Drag one');
    await dragOver(page, openRow(page, 'GC2-L01'), channel(page, '%QX5.2'));
    await expect(chip(page)).toContainText('On %QX5.2, free.');
    await expect(chip(page)).toContainText(/Group load .* of 2\.00/);
    await expect(channel(page, '%QX5.2')).toContainText('GC2-L01');
    await page.mouse.up();
    await expect(page.getByText('18 of 60 dispensers mapped')).toBeVisible();
    await expect(said(page)).toContainText('GC2-L01 placed on %QX5.2.');
    await expect(page.getByText('All saved').first()).toBeVisible();
    expect((await summaries(page, project))[0]).toBe('Mapping of GC2-L01');
  });

  test('three are chosen with Shift and dragged onto a group, then one is dragged back', async ({ page }) => {
    const project = await openMapping(page, 'Drag three');
    await openRow(page, 'GC2-L01').click();
    await openRow(page, 'GC2-L03').click({ modifiers: ['Shift'] });
    await expect(page.getByText('3 selected')).toBeVisible();
    await dragOver(page, openRow(page, 'GC2-L02'), group(page, 'PLC1 DO1 group 2'));
    await expect(chip(page)).toContainText('Fills 3 channels, %QX5.0 to %QX5.2.');
    await page.mouse.up();
    for (const [at, tag] of [['%QX5.0', 'GC2-L01'], ['%QX5.1', 'GC2-L02'], ['%QX5.2', 'GC2-L03']]) await expect(channel(page, at)).toContainText(tag);
    await dragOver(page, channel(page, '%QX5.1'), page.getByRole('region', { name: 'Not mapped' }).getByRole('heading'));
    await expect(chip(page)).toContainText('Frees %QX5.1.');
    await page.mouse.up();
    await expect(channel(page, '%QX5.1')).toContainText('free');
    await expect(page.getByText('All saved').first()).toBeVisible();
    expect((await summaries(page, project)).slice(0, 2)).toEqual(['Unmapping of GC2-L02', 'Mapping of 3 dispensers']);
  });

  test('two mapped dispensers change places', async ({ page }) => {
    const project = await openMapping(page, 'Swap');
    await dragOver(page, channel(page, '%QX4.0'), channel(page, '%QX4.2'));
    await expect(chip(page)).toContainText('Swaps with GC1-L03.');
    await page.mouse.up();
    await expect(channel(page, '%QX4.0')).toContainText('GC1-L03');
    await expect(channel(page, '%QX4.2')).toContainText('GC1-L01');
    await expect(page.getByText('All saved').first()).toBeVisible();
    expect((await summaries(page, project))[0]).toBe('Swap of GC1-L01 and GC1-L03');
    await page.reload();
    await expect(channel(page, '%QX4.0')).toContainText('GC1-L03');
  });

  test('what cannot be is refused with its reason, and nothing changes', async ({ page }) => {
    const project = await openMapping(page, 'Refusals');
    const before = (await designOf(page, project)).assignments.length;
    await dragOver(page, openRow(page, 'BE3-L01'), channel(page, '%QX5.0'));
    await expect(chip(page)).toContainText('BE3-L01 belongs to PLC2; this is a module of PLC1.');
    await page.mouse.up();
    await expect(page.getByRole('alert')).toContainText('BE3-L01 belongs to PLC2');
    await dragOver(page, openRow(page, 'GC2-L01'), channel(page, '%QX4.0'));
    await expect(chip(page)).toContainText('Channel taken: %QX4.0 holds GC1-L01.');
    await page.keyboard.press('Escape');
    await page.mouse.up();
    await expect(chip(page)).toHaveCount(0);
    await openRow(page, 'GC2-L01').click();
    await openRow(page, 'GC3-L03').click({ modifiers: ['Shift'] });
    await dragOver(page, openRow(page, 'GC2-L03'), group(page, 'PLC1 DO1 group 2'));
    await expect(chip(page)).toContainText(/Not enough free channels: 8 of \d+\./);
    await page.mouse.up();
    await expect(page.getByText('17 of 60 dispensers mapped')).toBeVisible();
    expect((await designOf(page, project)).assignments).toHaveLength(before);
  });
});

test('the keyboard alone maps, moves, swaps and unmaps, and each step is said', async ({ page }) => {
  const project = await openMapping(page, 'Keys');
  const focused = page.locator(':focus');
  const tabTo = async (what: Locator): Promise<void> => {
    for (let i = 0; i < 80 && (await what.and(focused).count()) === 0; i++) await page.keyboard.press('Tab');
    await expect(what).toBeFocused();
  };
  await tabTo(page.getByLabel('Filter the dispensers that are not mapped'));
  await page.keyboard.type('GC2');
  await tabTo(openRow(page, 'GC2-L01'));

  await page.keyboard.press('Alt+m');
  await expect(said(page)).toContainText(/GC2-L01 picked up\. .*GC2-L01 over PLC1 DO1 channel 8, %QX5\.0, free\. Enter places it\. Group load .* of 2\.00\sA\./);
  await page.keyboard.press('ArrowDown');
  await expect(said(page)).toContainText('GC2-L01 over PLC1 DO1 channel 9, %QX5.1, free.');
  await page.keyboard.press('Enter');
  await expect(said(page)).toContainText('GC2-L01 placed on %QX5.1.');
  await expect(page.getByText('18 of 60 dispensers mapped')).toBeVisible();
  await expect(focused).toContainText('GC2-L01');

  await page.keyboard.press('Alt+m');
  await page.keyboard.press('ArrowUp');
  await page.keyboard.press('Enter');
  await expect(said(page)).toContainText('GC2-L01 moved to %QX5.0.');
  await expect(channel(page, '%QX5.0')).toContainText('GC2-L01');

  await page.keyboard.press('Alt+m');
  await page.keyboard.press('PageUp');
  await expect(said(page)).toContainText('GC2-L01 over PLC1 DO1 group 2.');
  await page.keyboard.press('ArrowUp');
  await expect(said(page)).toContainText('GC2-L01 over PLC1 DO1 channel 7, %QX4.7. Enter swaps with GC1-L08.');
  await page.keyboard.press('Enter');
  await expect(said(page)).toContainText('GC2-L01 and GC1-L08 swapped.');
  await expect(channel(page, '%QX5.0')).toContainText('GC1-L08');

  await page.keyboard.press('Alt+m');
  await expect(page.getByRole('group', { name: 'Move under way' })).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(said(page)).toContainText('Cancelled; nothing has changed.');
  await expect(focused).toContainText('GC2-L01');
  await page.keyboard.press('Delete');
  await expect(said(page)).toContainText('GC2-L01 unmapped.');
  await expect(channel(page, '%QX4.7')).toContainText('free');
  await expect(page.getByText('All saved').first()).toBeVisible();
  expect((await summaries(page, project)).slice(0, 4)).toEqual(['Unmapping of GC2-L01', 'Swap of GC2-L01 and GC1-L08', 'Move of GC2-L01', 'Mapping of GC2-L01']);
});

test('several are chosen by keyboard and fill a group, status inputs following', async ({ page }) => {
  const project = await openMapping(page, 'Keys, several');
  await page.getByLabel('with status inputs').check();
  await openRow(page, 'GC2-L01').focus();
  await page.keyboard.press('Space');
  await page.keyboard.press('Shift+ArrowDown');
  await page.keyboard.press('Shift+ArrowDown');
  await expect(page.getByText('3 selected')).toBeVisible();
  await page.keyboard.press('Alt+m');
  await page.keyboard.press('PageUp');
  await expect(said(page)).toContainText('GC2-L01 and 2 more over PLC1 DO1 group 2. Fills 3 channels, %QX5.0 to %QX5.2. 3 status inputs too.');
  await page.keyboard.press('Enter');
  await expect(page.getByText('20 of 60 dispensers mapped')).toBeVisible();
  await expect(page.getByText('All saved').first()).toBeVisible();
  expect((await designOf(page, project)).assignments.filter((a) => a.purpose === 'status').length).toBeGreaterThanOrEqual(3);
});

test('a group is filled in a chosen order, shown before it is saved', async ({ page }) => {
  const project = await openMapping(page, 'Fill');
  const before = (await designOf(page, project)).assignments.length;
  await group(page, 'PLC1 DO1 group 2').hover();
  await page.getByRole('button', { name: 'Fill PLC1 DO1 group 2 in order' }).click();
  await page.getByLabel('Order', { exact: true }).selectOption({ label: 'Cable run, shortest first' });
  await expect(page.getByRole('heading', { name: '8 to place' })).toBeVisible();
  const proposed = await page.getByRole('rowgroup', { name: 'PLC1 DO1 group 2' }).locator('.ghost .tag').allTextContents();
  expect(proposed).toHaveLength(8);
  expect((await designOf(page, project)).assignments).toHaveLength(before);
  await page.getByRole('button', { name: 'Fill 8' }).click();
  await expect(page.getByText('25 of 60 dispensers mapped')).toBeVisible();
  await expect(page.getByText('All saved').first()).toBeVisible();
  expect((await summaries(page, project))[0]).toBe('Mapping of 8 dispensers');
  expect(await page.getByRole('rowgroup', { name: 'PLC1 DO1 group 2' }).locator('.tag').allTextContents()).toEqual(proposed);
});

test('the menu of a row swaps and unmaps without pointer drags or keys', async ({ page }) => {
  await openMapping(page, 'Menu');
  await channel(page, '%QX4.0').hover();
  await page.getByRole('button', { name: 'Move, swap or unmap GC1-L01' }).click();
  await page.getByRole('menuitem', { name: 'Swap with…' }).click();
  await page.getByLabel('With the dispenser').fill('GC1-L05');
  await page.getByRole('option', { name: /GC1-L05/ }).click();
  await expect(page.getByRole('dialog')).toContainText('Swaps with GC1-L05.');
  await page.getByRole('dialog').getByRole('button', { name: 'Swap' }).click();
  await expect(channel(page, '%QX4.4')).toContainText('GC1-L01');
  await channel(page, '%QX4.4').hover();
  await page.getByRole('button', { name: 'Move, swap or unmap GC1-L01' }).click();
  await page.getByRole('menuitem', { name: 'Unmap' }).click();
  await expect(page.getByText('16 of 60 dispensers mapped')).toBeVisible();
});

test.describe('by touch', () => {
  test.use({ viewport: { width: 1024, height: 768 }, hasTouch: true });

  test('a long press picks up, a quick move scrolls', async ({ page }) => {
    await openMapping(page, 'Touch');
    const touch = await page.context().newCDPSession(page);
    const send = (type: 'touchStart' | 'touchMove' | 'touchEnd', at?: { x: number; y: number }) => touch.send('Input.dispatchTouchEvent', { type, touchPoints: at ? [at] : [] });
    const spot = async (what: Locator): Promise<{ x: number; y: number }> => {
      await what.scrollIntoViewIfNeeded();
      const box = await what.boundingBox();
      return { x: (box?.x ?? 0) + 120, y: (box?.y ?? 0) + 20 };
    };
    await send('touchStart', await spot(openRow(page, 'GC2-L01')));
    await expect(chip(page)).toBeVisible();
    await send('touchMove', await spot(channel(page, '%QX4.3')));
    await expect(chip(page)).toContainText('Channel taken: %QX4.3 holds GC1-L04.');
    await send('touchEnd');
    await expect(page.getByRole('alert')).toContainText('Channel taken');
    const from = await spot(openRow(page, 'GC2-L02'));
    await send('touchStart', from);
    await send('touchMove', { x: from.x, y: from.y - 60 });
    await send('touchMove', { x: from.x, y: from.y - 90 });
    await expect(chip(page)).toHaveCount(0);
    await send('touchEnd');
  });
});

test.describe('on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true });

  test('a row is placed by its menu, and several are unmapped in selection mode', async ({ page }) => {
    await openMapping(page, 'Phone');
    await page.getByRole('button', { name: 'Move GC2-L01' }).tap();
    await page.getByRole('menuitem', { name: /Place on/ }).tap();
    await expect(page.getByRole('dialog')).toContainText('On %QX5.0');
    const place = page.getByRole('dialog').getByRole('button', { name: 'Place' });
    expect((await place.boundingBox())?.height).toBeGreaterThanOrEqual(44);
    await place.tap();
    await expect(page.getByText('18 of 60 dispensers mapped')).toBeVisible();
    await page.getByRole('button', { name: 'Select' }).tap();
    await channel(page, '%QX4.0').tap();
    await channel(page, '%QX4.1').tap();
    await page.getByRole('button', { name: 'Unmap 2' }).tap();
    await expect(page.getByText('16 of 60 dispensers mapped')).toBeVisible();
  });
});

for (const role of ['viewer', 'technician']) {
  test(`a ${role} sees no handles and moves nothing`, async ({ page }) => {
    await signIn(page, role);
    await page.goto(`/projects/${await demoProject(page)}/mapping`);
    await expect(page.getByText(/of 60 dispensers mapped/)).toBeVisible({ timeout: 15_000 });
    await expect(page.locator('[data-lift], .grip, [data-menu]')).toHaveCount(0);
    const before = await channel(page, '%QX4.0').textContent();
    await channel(page, '%QX4.0').focus();
    await page.keyboard.press('Alt+m');
    await page.keyboard.press('Delete');
    await expect(page.getByRole('group', { name: 'Move under way' })).toHaveCount(0);
    expect(await channel(page, '%QX4.0').textContent()).toBe(before);
  });
}

for (const scheme of ['light', 'dark'] as const) {
  test.describe(scheme, () => {
    test.use({ colorScheme: scheme });

    test('a move under way has no fault that axe finds', async ({ page }) => {
      await signIn(page, 'engineer');
      await page.goto(`/projects/${await demoProject(page)}/mapping`);
      await channel(page, '%QX4.0').click();
      await channel(page, '%QX4.2').click({ modifiers: ['Shift'] });
      await page.keyboard.press('Alt+m');
      await page.keyboard.press('ArrowDown');
      await expect(page.getByRole('group', { name: 'Move under way' })).toBeVisible();
      const { violations } = await new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21aa']).analyze();
      expect(violations.map((v) => `${v.id}: ${v.nodes.slice(0, 3).map((n) => n.target.join(' ')).join('; ')}`)).toEqual([]);
    });
  });
}
