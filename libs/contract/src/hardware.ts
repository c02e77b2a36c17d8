import type * as calc from '#calc';
import { Type } from 'typebox';
import { Name, nullable, Text, Uuid, Whole } from './common.ts';
import { type Fits, fits, resource, type RowOf } from './resource.ts';

export const cabinets = resource('cabinets', 'cabinets', {
  location: Name(),
  description: Text(500),
  temperatureC: Type.Number({ minimum: -40, maximum: 90 }),
}, ['location']);
fits<Fits<RowOf<typeof cabinets>, calc.Versioned<calc.Cabinet>>>();

export const controllers = resource('controllers', 'controllers', { cabinetId: Uuid, name: Name() }, ['cabinetId', 'name']);
fits<Fits<RowOf<typeof controllers>, calc.Versioned<calc.Controller>>>();

/** Creating a module also creates its groups; deleting it deletes them. */
export const modules = resource('modules', 'modules', {
  controllerId: Uuid,
  typeId: Uuid,
  name: Name(),
  baseByte: Whole(0, 65_535),
  slot: Whole(0, 1000),
}, ['controllerId', 'typeId', 'name', 'baseByte', 'slot']);
fits<Fits<RowOf<typeof modules>, calc.Versioned<calc.Module>>>();

export const moduleGroups = resource('moduleGroups', 'module-groups', {
  moduleId: Uuid,
  groupIndex: Whole(0, 127),
  circuitId: nullable(Uuid),
}, ['moduleId', 'groupIndex']);
fits<Fits<RowOf<typeof moduleGroups>, calc.Versioned<calc.ModuleGroup>>>();
