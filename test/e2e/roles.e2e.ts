import { expect, test } from '@playwright/test';
import { accountOf, demoProject, designOf, signIn } from './support.ts';

test('signing in by hand leads to the projects, signing out ends it', async ({ page }) => {
  const { email, password } = accountOf('engineer');
  await page.goto('/projects');
  await expect(page).toHaveURL(/sign-in/);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(`${password} not`);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('alert')).toContainText('E-mail address or password is wrong');
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('heading', { name: 'Projects' })).toBeVisible();
  await expect(page.getByText('Brackwater Terminal').first()).toBeVisible();
});

for (const role of ['electrician', 'viewer']) {
  test(`a ${role} sees the design without edit controls, and the API answers 403`, async ({ page }) => {
    await signIn(page, role);
    const project = await demoProject(page);
    await page.goto(`/projects/${project}/mapping`);
    await expect(page.getByText(/46 of 60 dispensers mapped/)).toBeVisible();
    await expect(page.getByRole('button', { name: /^Auto-assign/ })).toHaveCount(0);
    await page.goto(`/projects/${project}/points`);
    await expect(page.getByText('GC1-L01').first()).toBeVisible();
    await expect(page.getByRole('button', { name: /Point$/ })).toHaveCount(0);
    await page.goto(`/projects/${project}/import`);
    await expect(page.getByLabel('Tag list')).toHaveCount(0);

    const point = (await designOf(page, project)).points[0];
    const answer = await page.request.patch(`/api/v1/projects/${project}/points/${point?.id}`, {
      data: { description: 'not mine to change' }, headers: { 'If-Match': `"${point?.version}"` },
    });
    expect(answer.status()).toBe(403);
    expect(((await answer.json()) as { title: string }).title).toBe('You may not do this');
  });
}

test('the second organisation sees its own projects only', async ({ page, browser }) => {
  await signIn(page, 'engineer');
  const theirs = await demoProject(page);
  const other = await browser.newPage();
  await signIn(other, 'engineer', 'hollin');
  await other.goto('/projects');
  await expect(other.getByRole('heading', { name: 'Projects' })).toBeVisible();
  await expect(other.getByText('Brackwater')).toHaveCount(0);
  expect((await other.request.get(`/api/v1/projects/${theirs}/design`)).status()).toBe(404);
  await other.close();
});
