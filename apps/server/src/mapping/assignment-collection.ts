import { assignments as assignmentResource } from '#contract';
import { assignments } from '#schema';
import type { Collection } from '../platform/editing/collection.ts';
import { channelsAreFree, channelsExist } from './assignment-rules.ts';

export const assignmentCollection: Collection = {
  name: 'assignments', resource: assignmentResource, table: assignments, noun: 'assignment',
  labelOf: (row) => `of channel ${String(row['channel'])}`, rules: [channelsExist, channelsAreFree],
};
