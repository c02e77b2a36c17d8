import type { Dispenser, Grease, Point, Wiring } from '#calc';
import { BEARING_GREASE, GEAR_GREASE } from '../brackwater-catalogue.ts';
import { sizesOf } from './bearings.ts';
import { bearingLubrication, type Lubrication, statedLubrication, statedUlFor, type Surroundings, typesFor } from './lubrication.ts';
import { type MachineKind, MACHINES, type Part } from './machines.ts';
import type { Area, LaneDraft, Site } from './site.ts';

const TWO_CORE_PART = 0.45;
/** Part of the four-core lanes that run on their own clock. */
const TIMED_PART = 0.02;
/** Days that a month of standing supply has, 730.5 h. */
const MONTH_DAYS = 30.4375;

/** Lanes of an area, machine by machine, without an end: the caller takes as many as it needs. */
export function* areaLanes(site: Site, area: Area): Generator<LaneDraft, never> {
  for (;;) yield* machineLanes(site, area, site.random.pick(MACHINES));
}

interface Machine {
  readonly area: Area;
  readonly kind: MachineKind;
  readonly number: number;
  readonly hoursPerDay: number;
  readonly wiring: Wiring;
}

function* machineLanes(site: Site, area: Area, kind: MachineKind): Generator<LaneDraft, void> {
  const { random, machines } = site;
  const number = (machines.get(kind.code) ?? 0) + 1;
  machines.set(kind.code, number);
  const wiring = random.next() < TWO_CORE_PART ? 'two-core' : 'four-core';
  const machine: Machine = { area, kind, number, wiring, hoursPerDay: random.whole(...kind.hours) };
  let count = 0;
  for (const part of kind.parts) {
    // Both bearings of a shaft are alike.
    const size = part.bearing && random.pick(sizesOf(part.bearing.series, ...part.bearing.bore));
    const speedRpm = part.bearing && random.whole(...part.bearing.rpm);
    for (const place of part.places) yield laneOf(site, machine, part, place, size && speedRpm ? { size, speedRpm } : null, ++count);
  }
}

type Bearing = { readonly size: Parameters<typeof bearingLubrication>[0]; readonly speedRpm: number } | null;

function laneOf(site: Site, machine: Machine, part: Part, place: string, bearing: Bearing, number: number): LaneDraft {
  const { area, kind } = machine;
  // Dust gathers in a boot: zone 21, which only a four-core type suits.
  const zone = !area.dusty ? 'none' : part.name.startsWith('Boot') ? '21' : '22';
  const wiring = zone === '21' ? 'four-core' : machine.wiring;
  const grease = greaseOf(site, part);
  const around: Surroundings = {
    hoursPerDay: machine.hoursPerDay, densityGPerCm3: grease.densityGPerCm3, types: typesFor(site.catalogue.dispenserTypes, wiring, zone === '21' ? 'Db' : 'Dc'),
  };
  const found = (bearing && bearingLubrication(bearing.size, bearing.speedRpm, around, site.random)) ?? statedLubrication(around, site.random);
  const lubrication = wiring === 'four-core' && site.random.next() < TIMED_PART ? timedInstead(found, machine, site) : found;
  const name = `${area.code}-${kind.code}${String(machine.number).padStart(3, '0')}`;
  const point: Point = {
    ...BLANK_POINT, id: site.id(), tag: `${name}-L${twoDigits(number)}`, description: `${part.name}, ${place}`, function: `=${area.code}.${kind.code}${machine.number}`,
    location: `+${area.code}`, product: `-GP${twoDigits(number)}`, machine: `${kind.name} ${machine.number}`, hoursPerDay: machine.hoursPerDay,
    daysPerWeek: area.daysPerWeek, greaseId: grease.id, zone, ...lubrication.point,
  };
  return { point, dispenser: dispenserOf(site, point.id, wiring, lubrication), type: lubrication.type, mapped: true, astray: false };
}

type Set = Lubrication & { readonly periodMonths?: number };

/** The same cartridge, emptied on the device's own clock, for a demand that this just meets. */
function timedInstead(found: Lubrication, { area, hoursPerDay }: Machine, { random }: Site): Set {
  const periodMonths = random.pick(found.type.timedMonths.filter((months) => months >= 3));
  const runningDays = (periodMonths * MONTH_DAYS * area.daysPerWeek) / 7;
  const fullUl = statedUlFor(found.cartridgeUl - found.type.residualUl, runningDays, hoursPerDay);
  return { ...found, periodMonths, point: { demandWay: 'stated', statedPer: '1000h', statedUl: Math.floor(fullUl * 0.98) } };
}

function dispenserOf(site: Site, pointId: string, wiring: Wiring, { type, cartridgeUl, doseUl, periodMonths }: Set): Dispenser {
  const { random } = site;
  return {
    id: site.id(), pointId, typeId: type.id, wiring, method: periodMonths === undefined ? 'pulse' : 'timed', cartridgeUl,
    doseUl: periodMonths === undefined ? doseUl : null, periodMonths: periodMonths ?? null, controllerId: null, circuitId: null, nodeId: null,
    cableTag: null, cableLengthM: random.whole(8, 60) / 2, crossSectionMm2: 1.5, conductorClass: 5,
  };
}

const greaseOf = ({ catalogue, catalogueId }: Site, { gear }: Part): Grease => {
  const id = catalogueId(gear ? GEAR_GREASE : BEARING_GREASE);
  return catalogue.greases.find((each) => each.id === id)!;
};

const BLANK_POINT: Omit<Point, 'id' | 'tag'> = {
  description: null, function: null, location: null, product: null, machine: null, remarks: null, hoursPerDay: null, daysPerWeek: 7, demandWay: null,
  boreMm: null, outsideMm: null, widthMm: null, speedRpm: null, statedUl: null, statedPer: '1000h', practiceStrokes: null, practiceGramsPerStroke: null,
  practiceEveryDays: null, greaseId: null, zone: null,
  factors: { temperature: 1, contamination: 1, moisture: 1, vibration: 1, position: 1, design: 1 },
};

const twoDigits = (number: number): string => String(number).padStart(2, '0');
