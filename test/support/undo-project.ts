import type { ChangeNotice, HistoryEntry, RowChange } from '#contract';
import { v7 as newId } from 'uuid';
import type { Agent } from './test-app.ts';
import type { TestProject } from './test-project.ts';

/** What tests of undo ask of a project, each in one call. */
export function undoProject({ url }: TestProject) {
  const apply = async (agent: Agent, summary: string, changes: readonly RowChange[], id = newId()): Promise<string> => {
    await agent.post(`${url}/change-sets`).send({ id, summary, changes }).expect(200);
    return id;
  };
  const row = async (agent: Agent, path: string, id: string) => (await agent.get(`${url}/${path}/${id}`).expect(200)).body as Record<string, unknown> & { version: number };
  const undo = (agent: Agent, setId: string, id = newId()) => agent.post(`${url}/change-sets/${setId}/undo`).send({ id });
  return {
    url, apply, row, undo,
    /** Changes fields of one row as it is now. */
    edit: async (agent: Agent, collection: 'points' | 'dispensers' | 'circuits', id: string, values: Record<string, unknown>, summary = 'Edit') => {
      const { version } = await row(agent, collection, id);
      return apply(agent, summary, [{ collection, op: 'update', id, version, values }]);
    },
    /** An undo that succeeds. @returns the answer and the identifier of the new set */
    undone: async (agent: Agent, setId: string) => {
      const id = newId();
      const notice = (await undo(agent, setId, id).expect(200)).body as ChangeNotice;
      return { id, notice };
    },
    /** An undo that is refused. @returns the reason */
    refused: async (agent: Agent, setId: string) => {
      const { body } = await undo(agent, setId).expect(409);
      return body as { type: string; title: string; detail: string };
    },
    history: async (agent: Agent) => (await agent.get(`${url}/history?limit=200`).expect(200)).body as HistoryEntry[],
    /** Every row of the project, without versions and in a fixed order: equal states are equal values. */
    state: async (agent: Agent): Promise<unknown> => {
      const { sequence: _sequence, catalogue: _catalogue, ...collections } = (await agent.get(`${url}/design`).expect(200)).body as Record<string, unknown>;
      return withoutVersions(collections);
    },
  };
}

function withoutVersions(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(withoutVersions).sort((a, b) => ((a as { id: string }).id < (b as { id: string }).id ? -1 : 1));
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).filter(([key]) => key !== 'version').map(([key, inner]) => [key, withoutVersions(inner)]));
}

export const created = (collection: RowChange['collection'], id: string, values: Record<string, unknown>): RowChange => ({ collection, op: 'create', id, values });
export const deleted = (collection: RowChange['collection'], id: string, version: number): RowChange => ({ collection, op: 'delete', id, version });
export const updated = (collection: RowChange['collection'], id: string, version: number, values: Record<string, unknown>): RowChange =>
  ({ collection, op: 'update', id, version, values });
