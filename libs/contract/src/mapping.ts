import type * as calc from '#calc';
import { oneOf, Uuid, Whole } from './common.ts';
import { type Fits, fits, resource, type RowOf } from './resource.ts';

export const assignments = resource('assignments', 'assignments', {
  dispenserId: Uuid,
  moduleId: Uuid,
  channel: Whole(0, 127),
  purpose: oneOf(['control', 'status']),
}, ['dispenserId', 'moduleId', 'channel', 'purpose']);
fits<Fits<RowOf<typeof assignments>, calc.Versioned<calc.Assignment>>>();
