import { readFileSync } from 'node:fs';
import type {
  Cabinet,
  Circuit,
  Controller,
  Design,
  DispenserType,
  Module,
  ModuleGroup,
  ModuleType,
  Project,
  Supply,
  SupplyType,
} from '#calc';

const TAG_LISTS = new URL('../fixtures/tag-lists/', import.meta.url);

interface SetupModule {
  readonly name: string;
  readonly kind: 'output' | 'input';
  readonly type: string;
  readonly channels: number;
  readonly group: number;
  readonly baseByte: number;
}

interface SetupCabinet {
  readonly location: string;
  readonly description: string;
  readonly controllers: readonly { readonly name: string; readonly modules: readonly SetupModule[] }[];
  readonly circuits: readonly string[];
}

type SetupType = Pick<DispenserType, 'name' | 'wiring' | 'cartridgesUl' | 'doseStepUl' | 'doseMinUl' | 'doseMaxUl'>;

interface Setup {
  readonly dispenserTypes: readonly SetupType[];
  readonly cabinets: readonly SetupCabinet[];
}

/** The bytes of a file of `test/fixtures/tag-lists`, by its name. */
export function tagListBytes(name: string): Buffer {
  return readFileSync(new URL(name, TAG_LISTS));
}

/** What `expected/<name>.json` says that an import of the list yields. */
export function tagListExpectation<T>(name: string): T {
  return JSON.parse(readFileSync(new URL(`expected/${name}.json`, TAG_LISTS), 'utf8')) as T;
}

/** Ids for tests: valid as UUIDs and the same in each run. */
export function countingIds(prefix = '00000000'): () => string {
  let next = 0;
  return () => `${prefix}-0000-4000-8000-${(next += 1).toString(16).padStart(12, '0')}`;
}

/**
 * The project that the tag lists are imported into: hardware and catalogue of `expected/setup.json`, no
 * points yet. What the file leaves open has sensible, invented values.
 */
export function brackwaterSetup(): Design {
  const setup = tagListExpectation<Setup>('setup');
  const id = countingIds('b4ac0a7e');
  const project = projectWith(id());
  const supplyType = supplyTypeWith(id());
  const moduleTypes = moduleTypesOf(setup, id);
  const hardware = setup.cabinets.map((each) => cabinetRows(each, moduleTypes, supplyType, id));
  return {
    project,
    dispenserTypes: setup.dispenserTypes.map((each) => dispenserType(each, id())),
    moduleTypes,
    cableTypes: [],
    supplyTypes: [supplyType],
    greases: [],
    points: [],
    dispensers: [],
    cabinets: hardware.map(({ cabinet }) => cabinet),
    controllers: hardware.flatMap(({ controllers }) => controllers),
    modules: hardware.flatMap(({ modules }) => modules),
    moduleGroups: hardware.flatMap(({ groups }) => groups),
    supplies: hardware.map(({ supply }) => supply),
    circuits: hardware.flatMap(({ circuits }) => circuits),
    cableNodes: [],
    assignments: [],
  };
}

function projectWith(id: string): Project {
  return {
    id,
    name: 'Brackwater Terminal',
    description: 'Retrofit of the lubrication',
    timeZone: 'Europe/Amsterdam',
    voltageTempC: 40,
    tripTempC: 70,
    sparePercent: 10,
    supplyMarginPercent: 20,
    maxCartridgeDays: 365,
    minCartridgeDays: 30,
    maxOverGreasingPercent: 25,
    relayLifeYears: 10,
    slotMs: null,
    breakerDcFactor: 1.4,
    rankBy: 'fewest-changes',
    demandPer: '1000h',
  };
}

function dispenserType(setup: SetupType, id: string): DispenserType {
  const twoCore = setup.wiring === 'two-core';
  return {
    ...setup,
    id,
    typeVersion: 1,
    residualUl: 2000,
    runMsPerStep: 1500,
    recoveryMs: 5000,
    triggerMs: twoCore ? null : 500,
    timedMonths: [],
    load: 'constant-current',
    runA: 0.2,
    peakA: 0.35,
    idleA: twoCore ? 0 : 0.01,
    minV: 18,
    controlInputA: twoCore ? null : 0.005,
    controlOnV: twoCore ? null : 15,
    offStateA: 0.002,
    controlPolarity: 'sourcing',
    status: twoCore ? null : { polarity: 'sourcing', maxA: 0.1, dropV: 1, leakageA: 0.0002 },
    pins: {},
    protectionLevels: [],
    maxSurfaceC: null,
  };
}

function supplyTypeWith(id: string): SupplyType {
  return {
    id,
    name: 'Power supply, 24 V DC 10 A',
    typeVersion: 1,
    ratedA: 10,
    deratingFromC: 50,
    deratingPercentPerK: 2.5,
    tolerancePercent: 1,
    shortCircuitA: 15,
    extraLowVoltage: 'SELV',
  };
}

function moduleTypesOf(setup: Setup, id: () => string): ModuleType[] {
  const modules = setup.cabinets.flatMap((each) => each.controllers).flatMap((each) => each.modules);
  const byName = new Map(modules.map((each) => [each.type, each]));
  return [...byName.values()].map((each) => moduleType(each, id()));
}

function moduleType({ type, kind, channels, group }: SetupModule, id: string): ModuleType {
  const relay = type.startsWith('Relay');
  const output = kind === 'output';
  return {
    id,
    name: type,
    typeVersion: 1,
    kind,
    technology: !output ? 'input' : relay ? 'relay' : 'transistor',
    polarity: output ? 'sourcing' : 'sinking',
    channels,
    channelsPerGroup: group,
    channelA: output ? (relay ? 2 : 0.5) : null,
    groupA: output ? (relay ? 8 : 2) : null,
    moduleA: output ? 8 : null,
    channelPeakA: null,
    dropV: output && !relay ? 0.3 : 0,
    leakageA: output && !relay ? 0.0005 : 0,
    shortCircuitA: output && !relay ? 1 : null,
    minLoadA: relay ? 0.01 : null,
    ratedOperations: relay ? 100_000 : null,
    inputType: output ? null : 3,
    inputA: output ? null : 0.003,
  };
}

interface CabinetRows {
  readonly cabinet: Cabinet;
  readonly supply: Supply;
  readonly circuits: readonly Circuit[];
  readonly controllers: readonly Controller[];
  readonly modules: readonly Module[];
  readonly groups: readonly ModuleGroup[];
}

function cabinetRows(
  setup: SetupCabinet,
  types: readonly ModuleType[],
  supplyType: SupplyType,
  id: () => string,
): CabinetRows {
  const cabinet = { id: id(), location: setup.location, description: setup.description, temperatureC: 35 };
  const supply: Supply = {
    id: id(),
    cabinetId: cabinet.id,
    typeId: supplyType.id,
    name: '-T1',
    setV: 24,
    internalOhm: 0.02,
    otherLoadA: 0,
    redundant: false,
  };
  const circuits = setup.circuits.map((name): Circuit => ({
    id: id(),
    supplyId: supply.id,
    name,
    protection: 'breaker-C',
    protectionA: 6,
    protectionOhm: 0.03,
    concurrencyLimit: null,
  }));
  const racks = setup.controllers.map((each) => rack(each, cabinet.id, types, id));
  const modules = racks.flatMap((each) => each.modules);
  const groups = modules.flatMap((each) => groupsOf(each, types, circuits[0], id));
  return { cabinet, supply, circuits, controllers: racks.map((each) => each.controller), modules, groups };
}

function rack(
  setup: SetupCabinet['controllers'][number],
  cabinetId: string,
  types: readonly ModuleType[],
  id: () => string,
): { controller: Controller; modules: Module[] } {
  const controller = { id: id(), cabinetId, name: setup.name };
  const modules = setup.modules.map((each, i): Module => ({
    id: id(),
    controllerId: controller.id,
    typeId: types.find(({ name }) => name === each.type)!.id,
    name: each.name,
    baseByte: each.baseByte,
    slot: i + 1,
  }));
  return { controller, modules };
}

function groupsOf(module: Module, types: readonly ModuleType[], circuit: Circuit, id: () => string): ModuleGroup[] {
  const type = types.find((each) => each.id === module.typeId)!;
  if (type.kind === 'input') return [];
  const count = type.channels / type.channelsPerGroup;
  return Array.from({ length: count }, (_, groupIndex) => ({
    id: id(),
    moduleId: module.id,
    groupIndex,
    circuitId: circuit.id,
  }));
}
