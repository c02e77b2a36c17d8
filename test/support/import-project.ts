import type { Design } from '#calc';
import type { DesignDocument, ImportPreview, ImportResult, ImportRowPage } from '#contract';
import { sql } from 'drizzle-orm';
import { drizzle } from 'drizzle-orm/postgres-js';
import { v7 as newId } from 'uuid';
import { brackwaterDesign } from '../../db/seed/brackwater.ts';
import { insertDesign } from '../../db/seed/insert-design.ts';
import { seedIds } from '../../db/seed/seed-ids.ts';
import { tagListBytes } from './brackwater-setup.ts';
import type { Agent, TestApp } from './test-app.ts';

/** Puts the terminal into the organisation, as a project whose hardware others copy. */
export async function seedTerminal(app: TestApp): Promise<Design> {
  const terminal = brackwaterDesign({ catalogue: seedIds('catalogue'), row: seedIds('row') });
  await drizzle(app.database.owner).transaction(async (tx) => {
    await tx.execute(sql`select set_config('lanewright.org_id', ${app.org.id}, true)`);
    await insertDesign(tx, app.org.id, terminal);
  });
  return terminal;
}

/** A project with the terminal's hardware and no points, and what an engineer does there with tag lists. */
export class ImportProject {
  private constructor(readonly engineer: Agent, readonly url: string) {}

  static async create(engineer: Agent, copyHardwareFrom: string): Promise<ImportProject> {
    const id = newId();
    await engineer.post('/api/v1/projects').send({ id, name: `Import ${id}`, copyHardwareFrom }).expect(201);
    return new ImportProject(engineer, `/api/v1/projects/${id}`);
  }

  async upload(name: string, bytes: Buffer = tagListBytes(name)): Promise<ImportPreview> {
    return (await this.engineer.post(`${this.url}/imports`).attach('file', bytes, name).expect(201)).body as ImportPreview;
  }

  async preview({ id }: { readonly id: string }, settings: object): Promise<ImportPreview> {
    return (await this.engineer.post(`${this.url}/imports/${id}/preview`).send(settings).expect(200)).body as ImportPreview;
  }

  /** @param query for instance "?show=problems" */
  async rows({ id }: { readonly id: string }, query = ''): Promise<ImportRowPage> {
    return (await this.engineer.get(`${this.url}/imports/${id}/rows${query}`).expect(200)).body as ImportRowPage;
  }

  async commit({ id }: { readonly id: string }, settings: object = {}): Promise<ImportResult> {
    return (await this.engineer.post(`${this.url}/imports/${id}/commit`).send(settings).expect(200)).body as ImportResult;
  }

  async design(): Promise<DesignDocument> {
    return (await this.engineer.get(`${this.url}/design`).expect(200)).body as DesignDocument;
  }
}
