import type { Dispenser, DispenserType, Grease, Point, Project } from '../../design.ts';
import type { PointContext } from '../point-context.ts';

/** Rows for tests of demand and plan: invented, complete, without a finding; each test changes what it is about. */
export function aProject(changes: Partial<Project> = {}): Project {
  return {
    id: 'project', name: 'Gallery', description: '', timeZone: 'Europe/Amsterdam',
    voltageTempC: 40, tripTempC: 70, sparePercent: 20, supplyMarginPercent: 25,
    maxCartridgeDays: 365, minCartridgeDays: 30, maxOverGreasingPercent: 5,
    relayLifeYears: 10, slotMs: null, breakerDcFactor: 1.5, rankBy: 'fewest-changes', demandPer: '1000h',
    ...changes,
  };
}

export function aGrease(densityGPerCm3 = 0.9): Grease {
  return { id: 'grease', name: 'Gallery grease', nlgi: '2', thickener: 'lithium complex', densityGPerCm3 };
}

/** A point with a stated demand of 50 cm³ per 1,000 h, 16 h on 7 days. */
export function aPoint(changes: Partial<Point> = {}): Point {
  return {
    id: 'point', tag: 'GC1-LP11', description: null, function: null, location: null, product: null,
    machine: null, remarks: null, hoursPerDay: 16, daysPerWeek: 7, demandWay: 'stated',
    boreMm: null, outsideMm: null, widthMm: null, speedRpm: null,
    factors: { temperature: 1, contamination: 1, moisture: 1, vibration: 1, position: 1, design: 1 },
    statedUl: 50_000, statedPer: '1000h',
    practiceStrokes: null, practiceGramsPerStroke: null, practiceEveryDays: null,
    greaseId: 'grease', zone: null,
    ...changes,
  };
}

/** The bearing of the worked example: 100 × 180 × 46 mm at 1,000 rpm. */
export function aBearingPoint(changes: Partial<Point> = {}): Point {
  return aPoint({ demandWay: 'bearing', boreMm: 100, outsideMm: 180, widthMm: 46, speedRpm: 1000, statedUl: null, ...changes });
}

export function aType(changes: Partial<DispenserType> = {}): DispenserType {
  return {
    id: 'type', name: 'Dispenser, four-core', typeVersion: 1, wiring: 'four-core',
    cartridgesUl: [60_000, 120_000, 250_000], residualUl: 0, doseMinUl: 100, doseMaxUl: 2_500, doseStepUl: 100,
    runMsPerStep: 20_000, recoveryMs: 60_000, triggerMs: 500, timedMonths: [1, 2, 3, 6, 12],
    load: 'constant-current', runA: 0.2, peakA: 0.4, idleA: 0.02, minV: 18, controlInputA: 0.008, controlOnV: 15,
    offStateA: 0.001, controlPolarity: 'sourcing',
    status: { polarity: 'sourcing', maxA: 0.1, dropV: 1, leakageA: 0.0001 },
    pins: { supply: '1', pulse: '2', zero: '3', status: '4' }, protectionLevels: [], maxSurfaceC: null,
    ...changes,
  };
}

export function aDispenser(changes: Partial<Dispenser> = {}): Dispenser {
  return {
    id: 'dispenser', pointId: 'point', typeId: 'type', wiring: 'four-core', method: 'pulse',
    cartridgeUl: 120_000, doseUl: 200, periodMonths: null, controllerId: null, circuitId: null, nodeId: null,
    cableTag: null, cableLengthM: null, crossSectionMm2: null, conductorClass: 5,
    ...changes,
  };
}

export function aContext(changes: Partial<PointContext> = {}): PointContext {
  return { project: aProject(), point: aPoint(), dispenser: aDispenser(), type: aType(), grease: aGrease(), ...changes };
}
