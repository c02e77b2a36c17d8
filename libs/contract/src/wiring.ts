import type * as calc from '#calc';
import { Type } from 'typebox';
import { Name, NotNegative, nullable, oneOf, Positive, Uuid, Whole } from './common.ts';
import { type Fits, fits, resource, type RowOf } from './resource.ts';

export const supplies = resource('supplies', 'supplies', {
  cabinetId: Uuid,
  typeId: Uuid,
  name: Name(),
  setV: Type.Number({ minimum: 18, maximum: 30 }),
  internalOhm: NotNegative(10),
  otherLoadA: NotNegative(1000),
  redundant: Type.Boolean(),
}, ['cabinetId', 'typeId', 'name', 'setV']);
fits<Fits<RowOf<typeof supplies>, calc.Versioned<calc.Supply>>>();

export const circuits = resource('circuits', 'circuits', {
  supplyId: Uuid,
  name: Name(),
  protection: oneOf(['breaker-B', 'breaker-C', 'electronic', 'fuse']),
  protectionA: Positive(1000),
  protectionOhm: NotNegative(10),
  concurrencyLimit: nullable(Whole(1, 100_000)),
}, ['supplyId', 'name', 'protection', 'protectionA']);
fits<Fits<RowOf<typeof circuits>, calc.Versioned<calc.Circuit>>>();

export const cableNodes = resource('cableNodes', 'cable-nodes', {
  circuitId: Uuid,
  parentId: nullable(Uuid),
  location: Name(),
  cableTag: Name(),
  lengthM: Positive(10_000),
  powerMm2: Positive(300),
  signalMm2: Positive(300),
  conductorClass: Type.Union([Type.Literal(2), Type.Literal(5)]),
}, ['circuitId', 'location', 'cableTag', 'lengthM', 'powerMm2', 'signalMm2']);
fits<Fits<RowOf<typeof cableNodes>, calc.Versioned<calc.CableNode>>>();
