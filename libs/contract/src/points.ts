import type * as calc from '#calc';
import { Type } from 'typebox';
import { Name, nullable, oneOf, Positive, Text, Uuid, Whole } from './common.ts';
import { type Fits, fits, resource, type RowOf } from './resource.ts';

const Factor = Type.Number({ exclusiveMinimum: 0, maximum: 10 });

export const BearingFactors = Type.Object({
  temperature: Factor, contamination: Factor, moisture: Factor, vibration: Factor, position: Factor, design: Factor,
}, { additionalProperties: false });

export const points = resource('points', 'points', {
  tag: Name(),
  description: nullable(Text(500)),
  function: nullable(Text()),
  location: nullable(Text()),
  product: nullable(Text()),
  machine: nullable(Text()),
  remarks: nullable(Text(4000)),
  hoursPerDay: nullable(Positive(24)),
  daysPerWeek: Positive(7),
  demandWay: nullable(oneOf(['bearing', 'stated', 'practice'])),
  boreMm: nullable(Positive(5000)),
  outsideMm: nullable(Positive(8000)),
  widthMm: nullable(Positive(2000)),
  speedRpm: nullable(Positive(200_000)),
  factors: BearingFactors,
  statedUl: nullable(Whole(1, 1e10)),
  statedPer: oneOf(['1000h', '100h', 'running-day', 'week', 'month']),
  practiceStrokes: nullable(Positive(10_000)),
  practiceGramsPerStroke: nullable(Positive(1000)),
  practiceEveryDays: nullable(Positive(3650)),
  greaseId: nullable(Uuid),
  zone: nullable(oneOf(['0', '1', '2', '20', '21', '22', 'none'])),
}, ['tag']);
fits<Fits<RowOf<typeof points>, calc.Versioned<calc.Point>>>();

export const dispensers = resource('dispensers', 'dispensers', {
  pointId: Uuid,
  typeId: nullable(Uuid),
  wiring: nullable(oneOf(['two-core', 'four-core'])),
  method: oneOf(['pulse', 'timed']),
  cartridgeUl: nullable(Whole(1, 10_000_000)),
  /** Whole steps of 0.1 cm³. */
  doseUl: nullable(Type.Integer({ minimum: 100, maximum: 1_000_000, multipleOf: 100 })),
  periodMonths: nullable(Whole(1, 60)),
  controllerId: nullable(Uuid),
  circuitId: nullable(Uuid),
  nodeId: nullable(Uuid),
  cableTag: nullable(Text()),
  cableLengthM: nullable(Positive(10_000)),
  crossSectionMm2: nullable(Positive(300)),
  conductorClass: Type.Union([Type.Literal(2), Type.Literal(5)]),
}, ['pointId']);
fits<Fits<RowOf<typeof dispensers>, calc.Versioned<calc.Dispenser>>>();

