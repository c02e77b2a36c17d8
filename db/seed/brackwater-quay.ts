import type { BearingFactors } from '#calc';
import { BEARING_GREASE, FOUR_CORE_160, FOUR_CORE_320, GEAR_GREASE, TWO_CORE_160, TWO_CORE_80 } from './brackwater-catalogue.ts';
import type { SeedLane } from './seed-rows.ts';

/** Values of the common factor table: shaking elevator heads, a wet boot pit, sea spray on the ship loader. */
const DUSTY_SHAKING = { contamination: 0.4, moisture: 0.4, vibration: 0.3 };
const WET = { contamination: 0.4, moisture: 0.1, vibration: 0.6 };

const SIDES = ['drive side', 'non-drive side'] as const;
type Channel = readonly [string, number];

/** The bucket elevators and the ship loader: cabinet +K2, circuit C2. */
export function quayLanes(): SeedLane[] {
  return [...[1, 2, 3].flatMap(elevatorLanes), ...shipLoaderLanes()];
}

function elevatorLanes(elevator: number): SeedLane[] {
  return [0, 1, 2, 3].map((i): SeedLane => {
    const head = i < 2;
    const tag = `BE${elevator}-L0${i + 1}`;
    const first = 4 * (elevator - 1);
    return {
      tag,
      point: {
        demandWay: 'bearing', boreMm: head ? 120 : 100, outsideMm: head ? 215 : 180, widthMm: head ? 58 : 46, speedRpm: 53.5, hoursPerDay: 17.5,
        description: `${head ? 'Head' : 'Boot'} shaft, bearing ${SIDES[i % 2]}`, function: `=T1.GL${10 + elevator}`, location: '+E1', product: `-GP0${i + 1}`,
        machine: `Bucket elevator ${elevator}`, grease: BEARING_GREASE, zone: head ? '22' : '21', remarks: ELEVATOR_REMARKS[tag] ?? null,
        factors: !head && elevator === 2 ? WET : DUSTY_SHAKING,
      },
      dispenser: {
        type: head ? FOUR_CORE_320 : FOUR_CORE_160, wiring: 'four-core', cartridgeUl: head ? 320_000 : 160_000, doseUl: head ? 600 : 400,
        controller: 'PLC2', circuit: 'C2', box: '+JB3', cableTag: `-W2${elevator}0${i + 1}`,
        cableLengthM: 62 + 11 * (elevator - 1) + (head ? 8 : 0) + (i % 2), crossSectionMm2: 1,
      },
      ...(elevator < 3 && { output: ['DO1', first + i] as Channel, status: ['DI1', first + i] as Channel }),
    };
  });
}

const ELEVATOR_REMARKS: Readonly<Record<string, string>> = { 'BE1-L01': 'Platform at +31 m', 'BE2-L03': 'Boot pit, may be wet' };

interface LoaderPoint {
  readonly point: SeedLane['point'];
  readonly type: string;
  readonly cartridgeUl: number;
  readonly doseUl: number;
  readonly lengthM: number;
  readonly section: number;
  readonly output?: Channel;
  readonly status?: Channel;
}

function shipLoaderLanes(): SeedLane[] {
  const points = [...slewBearing(), slewPinion(), ...boomConveyor(), ...ropeSheaves(), ...winchDrum(), ...loadingChute()];
  return points.map(({ point, type, lengthM, section, output, status, ...doses }, i): SeedLane => {
    const number = String(i + 1).padStart(2, '0');
    return {
      tag: `SL1-L${number}`,
      point: { function: '=T1.GL21', location: '+Q1', product: `-GP${number}`, machine: 'Ship loader 1', ...point },
      dispenser: {
        ...doses, type, wiring: type === TWO_CORE_160 || type === TWO_CORE_80 ? 'two-core' : 'four-core', controller: 'PLC2', circuit: 'C2', box: '+JB4',
        cableTag: `-W31${number}`, cableLengthM: lengthM, crossSectionMm2: section,
      },
      ...(output && { output }),
      ...(status && { status }),
    };
  });
}

const stated = (statedUl: number, hoursPerDay: number, description: string): SeedLane['point'] => ({
  demandWay: 'stated', statedUl, statedPer: '100h', hoursPerDay, description, grease: GEAR_GREASE, zone: 'none',
});

function slewBearing(): LoaderPoint[] {
  return [0, 1, 2, 3].map((q) => ({
    point: { ...stated(12_500, 9, `Slew bearing, raceway nipple ${q + 1} of 4 (${q * 90}°)`), ...(q === 0 && { remarks: 'Open gear, sea air' }) },
    type: FOUR_CORE_320, cartridgeUl: 320_000, doseUl: 800, lengthM: 38 + 2 * q, section: 1.5, output: ['DO1', 8 + q], status: ['DI1', 8 + q],
  }));
}

/** On the relay card on purpose: its many pulses a year wear the contact. */
function slewPinion(): LoaderPoint {
  return {
    point: { ...stated(18_000, 9, 'Slew pinion, tooth flank'), remarks: 'Relay contact, count pulses a year' },
    type: TWO_CORE_160, cartridgeUl: 160_000, doseUl: 200, lengthM: 36.5, section: 1.5, output: ['RO1', 0],
  };
}

function boomConveyor(): LoaderPoint[] {
  const pulleys = [['head', 90, 160, 40, 95.5, 118], ['tail', 80, 140, 33, 120, 56], ['bend', 60, 110, 28, 150, 87]] as const;
  return pulleys.flatMap(([name, ...size], p) =>
    SIDES.map((side, s): LoaderPoint => ({
      point: {
        ...bearing(size, 9, WET), description: `Boom conveyor ${name} pulley, bearing ${side}`, zone: '22',
        ...(2 * p + s === 4 && { remarks: 'Ambient -15 to +40 °C' }),
      },
      type: FOUR_CORE_160, cartridgeUl: 160_000, doseUl: 300, lengthM: size[4] + 1.5 * s, section: 2.5, output: ['DO2', 2 * p + s], status: ['DI2', 2 * p + s],
    })),
  );
}

/** The outermost sheave hangs in the dust over the hold. */
function ropeSheaves(): LoaderPoint[] {
  return [1, 2, 3].map((k) => ({
    point: { ...stated(2500, 6, `Luffing rope sheave ${k}`), zone: k === 3 ? '21' : 'none' },
    type: TWO_CORE_80, cartridgeUl: 80_000, doseUl: 100, lengthM: 74 + 3 * k, section: 1.5, output: ['DO2', 7 + k],
  }));
}

function winchDrum(): LoaderPoint[] {
  return SIDES.map((side, s) => ({
    point: { ...bearing([140, 250, 68, 22], 6, WET), description: `Luffing winch drum, bearing ${side}`, zone: 'none' },
    type: FOUR_CORE_320, cartridgeUl: 160_000, doseUl: 400, lengthM: 44 + 1.5 * s, section: 1.5,
  }));
}

function loadingChute(): LoaderPoint[] {
  return ['left', 'right'].map((side, s) => ({
    point: { ...stated(6000, 9, `Loading chute, guide ${side}`), zone: '21' },
    type: FOUR_CORE_160, cartridgeUl: 80_000, doseUl: 500, lengthM: 121 + 2 * s, section: 2.5, output: ['DO2', 6 + s], status: ['DI2', 6 + s],
  }));
}

/** @param size bore, outside diameter, width in mm, then speed in rpm */
function bearing(size: readonly number[], hoursPerDay: number, factors: Partial<BearingFactors>): SeedLane['point'] {
  const [boreMm, outsideMm, widthMm, speedRpm] = size;
  return { demandWay: 'bearing', boreMm, outsideMm, widthMm, speedRpm, hoursPerDay, factors, grease: BEARING_GREASE };
}
