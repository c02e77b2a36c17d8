import { expect, type Page } from '@playwright/test';
import { randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';

interface Account {
  readonly role: string;
  readonly email: string;
  readonly password: string;
}

const accounts = JSON.parse(process.env['E2E_ACCOUNTS'] ?? '[]') as Account[];

/** The demo's account for a role; `email` picks one organisation's. */
export function accountOf(role: string, organisation = 'brackwater'): Account {
  const account = accounts.find((a) => a.role === role && a.email.includes(organisation));
  if (!account) throw new Error(`The demo has no account for ${role} at ${organisation}`);
  return account;
}

/** Signs in through the API: its cookies are then the browser's. */
export async function signIn(page: Page, role: string, organisation?: string): Promise<void> {
  const { email, password } = accountOf(role, organisation);
  const answer = await page.request.post('/api/v1/auth/sign-in', { data: { email, password } });
  expect(answer.status()).toBe(200);
}

interface ProjectSummary {
  readonly id: string;
  readonly name: string;
  readonly points: number;
}

export async function projectsOf(page: Page): Promise<readonly ProjectSummary[]> {
  return (await (await page.request.get('/api/v1/projects')).json()) as ProjectSummary[];
}

/** The demo's full project. */
export async function demoProject(page: Page): Promise<string> {
  const project = (await projectsOf(page)).find((p) => p.name === 'Brackwater Terminal');
  if (!project) throw new Error('The demo project is missing');
  return project.id;
}

/** A new project with the terminal's hardware and no points, so that tests do not meet. Needs an engineer signed in. */
export async function freshProject(page: Page, name: string): Promise<string> {
  const id = randomUUID();
  const answer = await page.request.post('/api/v1/projects', { data: { id, name: `${name} ${id.slice(0, 8)}`, copyHardwareFrom: await demoProject(page) } });
  expect(answer.status()).toBe(201);
  return id;
}

export interface DesignAnswer {
  readonly points: readonly { readonly id: string; readonly tag: string; readonly version: number; readonly description: string | null }[];
  readonly dispensers: readonly { readonly id: string; readonly pointId: string; readonly version: number; readonly doseUl: number | null }[];
  readonly assignments: readonly { readonly dispenserId: string; readonly purpose: string }[];
  readonly circuits: readonly { readonly id: string; readonly name: string; readonly version: number; readonly concurrencyLimit: number | null }[];
}

export async function designOf(page: Page, projectId: string): Promise<DesignAnswer> {
  return (await (await page.request.get(`/api/v1/projects/${projectId}/design`)).json()) as DesignAnswer;
}

export const tagList = (name: string): string => `test/fixtures/tag-lists/${name}`;

/** Imports a tag list as it is, through the API. */
export async function importList(page: Page, projectId: string, name: string): Promise<void> {
  const file = { name, mimeType: 'text/csv', buffer: readFileSync(tagList(name)) };
  const upload = await page.request.post(`/api/v1/projects/${projectId}/imports`, { multipart: { file } });
  const { id } = (await upload.json()) as { id: string };
  expect((await page.request.post(`/api/v1/projects/${projectId}/imports/${id}/commit`, { data: {} })).status()).toBe(200);
}
