import { cabinets as cabinetResource, controllers as controllerResource, moduleGroups as groupResource, modules as moduleResource } from '#contract';
import { cabinets, controllers, moduleGroups, modules } from '#schema';
import type { Collection } from '../platform/editing/collection.ts';
import { labelBy } from '../platform/editing/labels.ts';
import { groupsFollowModules } from './module-groups.ts';
import { groupsStayWithTheirModule, modulesKeepTheirChannels } from './hardware-rules.ts';

export const hardwareCollections: readonly Collection[] = [
  { name: 'cabinets', resource: cabinetResource, table: cabinets, noun: 'cabinet', labelOf: labelBy('location') },
  { name: 'controllers', resource: controllerResource, table: controllers, noun: 'controller', labelOf: labelBy('name') },
  {
    name: 'modules', resource: moduleResource, table: modules, noun: 'module', labelOf: labelBy('name'),
    expand: groupsFollowModules, rules: [modulesKeepTheirChannels],
  },
  {
    name: 'moduleGroups', resource: groupResource, table: moduleGroups, noun: 'group',
    labelOf: (row) => String(Number(row['groupIndex']) + 1), rules: [groupsStayWithTheirModule],
  },
];
