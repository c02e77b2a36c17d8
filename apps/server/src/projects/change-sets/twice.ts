import { brokenUnique, isTransient } from '../../platform/database-problems.ts';

/** Runs a write again where the same request was under way a second time, or two writes stood in each other's way. */
export async function twice<T>(attempt: () => Promise<T>): Promise<T> {
  try {
    return await attempt();
  } catch (error) {
    // The same request was under way a second time: now its rows are there.
    if (!brokenUnique(error)?.endsWith('_pkey') && !isTransient(error)) throw error;
    return attempt();
  }
}
