import { v5 } from 'uuid';

/** Gives the row of a name its id: the same name has the same id in every run. */
export type SeedIds = (name: string) => string;

const NAMESPACE = '9d1f2c0e-6a54-4c55-8a43-2f3d7c1b5e60';

/** Ids of one organisation or project of the seed, told apart by its own name. */
export function seedIds(owner: string): SeedIds {
  const namespace = v5(owner, NAMESPACE);
  return (name) => v5(name, namespace);
}
