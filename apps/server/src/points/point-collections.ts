import { dispensers as dispenserResource, points as pointResource } from '#contract';
import { assignments, dispensers, points } from '#schema';
import type { Collection } from '../platform/editing/collection.ts';
import { labelBy } from '../platform/editing/labels.ts';
import { findIdsBy } from '../platform/editing/rows.ts';
import { tagsAreUnique, wiringFitsType } from './point-rules.ts';

export const pointCollection: Collection = {
  name: 'points', resource: pointResource, table: points, noun: 'point', labelOf: labelBy('tag'),
  /** A deleted point takes its dispenser along. */
  expand: async (scope, plan) => {
    const deleted = plan.of('points', 'delete').map((change) => change.id);
    for (const id of await findIdsBy(scope, dispensers, dispensers.pointId, deleted)) plan.add({ collection: 'dispensers', op: 'delete', id });
  },
  rules: [tagsAreUnique],
};

export const dispenserCollection: Collection = {
  name: 'dispensers', resource: dispenserResource, table: dispensers, noun: 'dispenser', labelOf: () => '',
  /** A deleted dispenser frees its channels. */
  expand: async (scope, plan) => {
    const deleted = plan.of('dispensers', 'delete').map((change) => change.id);
    for (const id of await findIdsBy(scope, assignments, assignments.dispenserId, deleted)) plan.add({ collection: 'assignments', op: 'delete', id });
  },
  rules: [wiringFitsType],
};
