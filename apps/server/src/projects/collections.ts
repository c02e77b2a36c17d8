import { projects as projectResource } from '#contract';
import { projects } from '#schema';
import { hardwareCollections } from '../hardware/hardware-collections.ts';
import { assignmentCollection } from '../mapping/assignment-collection.ts';
import type { Collection, CollectionName, Rule } from '../platform/editing/collection.ts';
import { labelBy } from '../platform/editing/labels.ts';
import { Invalid } from '../platform/problems.ts';
import { dispenserCollection, pointCollection } from '../points/point-collections.ts';
import { wiringCollections } from '../wiring/wiring-collections.ts';

const timeZoneExists: Rule = async ({ tx }, touched) => {
  if (touched('projects').length === 0) return;
  const [project] = await tx.select({ timeZone: projects.timeZone }).from(projects);
  if (project) requireTimeZone(project.timeZone);
};

/** @throws {Invalid} where the name is no time zone of the IANA database */
export function requireTimeZone(timeZone: string): void {
  try {
    new Intl.DateTimeFormat('en', { timeZone });
  } catch {
    throw new Invalid([{ field: 'timeZone', message: 'There is no such time zone. Give a name such as Europe/Amsterdam.' }]);
  }
}

export const projectCollection: Collection = {
  name: 'projects', resource: projectResource, table: projects, noun: 'project', labelOf: labelBy('name'), rules: [timeZoneExists],
};

/** Every collection that people edit, those that others refer to first. */
export const collections: readonly Collection[] = [
  projectCollection, ...hardwareCollections, ...wiringCollections, pointCollection, dispenserCollection, assignmentCollection,
];

const byName = new Map(collections.map((collection) => [collection.name, collection]));

export function collectionNamed(name: CollectionName): Collection {
  const collection = byName.get(name);
  if (!collection) throw new Error(`Nobody declares the collection ${name}`);
  return collection;
}
