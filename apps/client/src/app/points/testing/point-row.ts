import type { Dispenser, DispenserType, Point } from '#calc';
import type { CellContext } from '../cell-values';
import type { PointRow } from '../point-rows';

const type: DispenserType = {
  id: 'type', name: 'Dispenser, four-core, 160 cm³ family', typeVersion: 1, wiring: 'four-core',
  cartridgesUl: [80_000, 160_000], residualUl: 0, doseMinUl: 100, doseMaxUl: 2_500, doseStepUl: 100,
  runMsPerStep: 20_000, recoveryMs: 60_000, triggerMs: 500, timedMonths: [],
  load: 'constant-current', runA: 0.2, peakA: 0.4, idleA: 0.02, minV: 18, controlInputA: 0.008, controlOnV: 15,
  offStateA: 0.001, controlPolarity: 'sourcing', status: null, pins: {}, protectionLevels: [], maxSurfaceC: null,
};

/** A point with a stated demand of 50 cm³ per 1,000 h, 16 h every day, and its dispenser `d <tag>`; the tag is also its id. */
export function aPointRow(tag: string, changes: Partial<Point> = {}, atDispenser: Partial<Dispenser> = {}): PointRow {
  const point: Point = {
    id: tag, tag, description: null, function: '=T1.GL1', location: null, product: null, machine: 'Gallery conveyor 1', remarks: null,
    hoursPerDay: 16, daysPerWeek: 7, demandWay: 'stated', boreMm: null, outsideMm: null, widthMm: null, speedRpm: null,
    factors: { temperature: 1, contamination: 1, moisture: 1, vibration: 1, position: 1, design: 1 },
    statedUl: 50_000, statedPer: '1000h', practiceStrokes: null, practiceGramsPerStroke: null, practiceEveryDays: null,
    greaseId: null, zone: null, ...changes,
  };
  const dispenser: Dispenser = {
    id: `d ${tag}`, pointId: tag, typeId: 'type', wiring: 'four-core', method: 'pulse', cartridgeUl: 160_000, doseUl: 200,
    periodMonths: null, controllerId: null, circuitId: null, nodeId: null, cableTag: null, cableLengthM: null,
    crossSectionMm2: null, conductorClass: 5, ...atDispenser,
  };
  return {
    point, dispenser, type, grease: null, demandUlPer1000h: 50_000, refusal: null, plan: null, timed: null, findings: [], laneFindings: [],
    circuit: 'C1', cabinet: '+K1', text: `${tag} ${point.machine ?? ''}`.toLowerCase(),
  };
}

export const contextOf = (rows: readonly PointRow[]): CellContext =>
  ({ demandPer: '1000h', tags: new Map(rows.map((row) => [row.point.tag, row.point.id])) });
