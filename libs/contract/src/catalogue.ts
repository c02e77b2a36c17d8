import type * as calc from '#calc';
import { type Static, Type } from 'typebox';
import { Name, NotNegative, nullable, oneOf, Positive, Text, Uuid, Whole } from './common.ts';
import { type Fits, fits, type RowOf } from './resource.ts';

const polarity = oneOf(['sourcing', 'sinking']);

/** A catalogue type: rows never change; posting a name again makes its next version. */
function catalogueType<F extends Parameters<typeof Type.Object>[0]>(collection: string, path: string, fields: F) {
  return {
    collection, path,
    Row: Type.Object({ id: Uuid, name: Name(), typeVersion: Type.Integer(), ...fields }),
    New: Type.Object({ id: Uuid, name: Name(), ...fields }, { additionalProperties: false }),
  };
}

export const dispenserTypes = catalogueType('dispenserTypes', 'dispenser-types', {
  wiring: oneOf(['two-core', 'four-core']),
  cartridgesUl: Type.Array(Whole(1000, 10_000_000), { minItems: 1, maxItems: 20 }),
  residualUl: Whole(0, 1_000_000),
  doseMinUl: Whole(1, 1_000_000),
  doseMaxUl: Whole(1, 1_000_000),
  doseStepUl: Whole(1, 100_000),
  runMsPerStep: Whole(1, 3_600_000),
  recoveryMs: Whole(0, 86_400_000),
  triggerMs: nullable(Whole(1, 3_600_000)),
  timedMonths: Type.Array(Whole(1, 60), { maxItems: 60 }),
  load: oneOf(['constant-current', 'constant-power']),
  runA: Positive(100),
  peakA: Positive(100),
  idleA: NotNegative(10),
  minV: Positive(30),
  controlInputA: nullable(Positive(1)),
  controlOnV: nullable(Positive(30)),
  offStateA: NotNegative(1),
  controlPolarity: polarity,
  status: nullable(Type.Object({ polarity, maxA: Positive(10), dropV: NotNegative(10), leakageA: NotNegative(1) }, { additionalProperties: false })),
  pins: Type.Object({
    supply: Type.Optional(Text(20)), pulse: Type.Optional(Text(20)), zero: Type.Optional(Text(20)), status: Type.Optional(Text(20)),
  }, { additionalProperties: false }),
  protectionLevels: Type.Array(oneOf(['Ga', 'Gb', 'Gc', 'Da', 'Db', 'Dc']), { maxItems: 6 }),
  maxSurfaceC: nullable(Type.Number({ minimum: 0, maximum: 600 })),
});
fits<Fits<RowOf<typeof dispenserTypes>, calc.DispenserType>>();

export const moduleTypes = catalogueType('moduleTypes', 'module-types', {
  kind: oneOf(['output', 'input']),
  technology: oneOf(['transistor', 'relay', 'input']),
  polarity,
  channels: Whole(1, 128),
  channelsPerGroup: Whole(1, 128),
  channelA: nullable(Positive(100)),
  groupA: nullable(Positive(1000)),
  moduleA: nullable(Positive(1000)),
  channelPeakA: nullable(Positive(1000)),
  dropV: NotNegative(10),
  leakageA: NotNegative(1),
  shortCircuitA: nullable(Positive(1000)),
  minLoadA: nullable(NotNegative(10)),
  ratedOperations: nullable(Whole(1)),
  inputType: nullable(Type.Union([Type.Literal(1), Type.Literal(2), Type.Literal(3)])),
  inputA: nullable(Positive(1)),
});
fits<Fits<RowOf<typeof moduleTypes>, calc.ModuleType>>();

export const cableTypes = catalogueType('cableTypes', 'cable-types', {
  crossSectionMm2: Positive(300),
  conductorClass: Type.Union([Type.Literal(2), Type.Literal(5)]),
  cores: Whole(1, 200),
  coreMarking: oneOf(['numbered', 'coloured']),
  coreColours: Type.Array(Text(10), { maxItems: 200 }),
});
fits<Fits<RowOf<typeof cableTypes>, calc.CableType>>();

export const supplyTypes = catalogueType('supplyTypes', 'supply-types', {
  ratedA: Positive(1000),
  deratingFromC: Type.Number({ minimum: -40, maximum: 100 }),
  deratingPercentPerK: NotNegative(100),
  tolerancePercent: nullable(NotNegative(50)),
  shortCircuitA: Positive(10_000),
  extraLowVoltage: oneOf(['SELV', 'PELV']),
});
fits<Fits<RowOf<typeof supplyTypes>, calc.SupplyType>>();

const greaseFields = { name: Name(), nlgi: Text(10), thickener: Text(100), densityGPerCm3: Type.Number({ minimum: 0.5, maximum: 2 }) };
export const greases = {
  collection: 'greases', path: 'greases',
  Row: Type.Object({ id: Uuid, ...greaseFields }),
  New: Type.Object({ id: Uuid, ...greaseFields }, { additionalProperties: false }),
};
fits<Fits<RowOf<typeof greases>, calc.Grease>>();

/** The organisation's whole catalogue, every version. */
export const Catalogue = Type.Object({
  dispenserTypes: Type.Array(dispenserTypes.Row),
  moduleTypes: Type.Array(moduleTypes.Row),
  cableTypes: Type.Array(cableTypes.Row),
  supplyTypes: Type.Array(supplyTypes.Row),
  greases: Type.Array(greases.Row),
});
export type Catalogue = Static<typeof Catalogue>;

export const catalogueResources = { dispenserTypes, moduleTypes, cableTypes, supplyTypes, greases } as const;
