import { statedUlFor } from './lubrication.ts';
import type { LaneDraft, PlannedFinding, Site } from './site.ts';

/** One lane in so many is left unmapped; the two never meet, so that each fault stands alone. */
const UNMAPPED_EVERY = 20;
/** One lane in so many has the next fault of the list. */
const FAULT_EVERY = 28;

/** A fault that people make: spoils a lane; `before` is its neighbour in the list, whose row was copied. */
interface Fault {
  /** Code of the finding that it leads to; null: told where the lane gets its channels. */
  readonly code: string | null;
  /** @returns false where the lane has nothing to spoil */
  readonly spoil: (lane: LaneDraft, before: LaneDraft | undefined) => boolean;
}

const fault = (code: string | null, change: (lane: LaneDraft) => void): Fault => ({
  code,
  spoil: (lane) => {
    change(lane);
    return true;
  },
});
const copied = (code: string, copy: (lane: LaneDraft, before: LaneDraft) => void): Fault => ({
  code,
  spoil: (lane, before) => {
    if (before) copy(lane, before);
    return before !== undefined;
  },
});

/** Common faults, each with the finding that the checks make of it. */
const FAULTS: readonly Fault[] = [
  { code: 'PL-05', spoil: ({ dispenser }) => dispenser.method === 'pulse' && ((dispenser.doseUl = null), true) },
  fault('AR-01', ({ point }) => (point.zone = '1')),
  copied('CB-03', ({ dispenser }, before) => (dispenser.cableTag = before.dispenser.cableTag)),
  fault('VD-01', ({ dispenser }) => Object.assign(dispenser, { cableLengthM: 340, crossSectionMm2: 0.75 })),
  fault('PL-15', (lane) => stateLife(lane, 600)),
  fault('CB-01', ({ dispenser }) => (dispenser.cableLengthM = null)),
  copied('TG-01', ({ point }, { point: { function: aspect, product } }) => Object.assign(point, { function: aspect, product })),
  fault(null, (lane) => (lane.astray = true)),
  fault('AR-03', ({ point }) => (point.zone = null)),
  fault('PL-16', (lane) => stateLife(lane, 20)),
  fault('PL-03', ({ dispenser }) => (dispenser.typeId = null)),
  fault('PL-06', ({ point }) => (point.hoursPerDay = null)),
  fault('PL-01', ({ point }) => Object.assign(point, { demandWay: 'bearing', boreMm: null, speedRpm: null })),
];

/**
 * Spoils some lanes in the order of the plant, so that each common fault turns up, and notes what the checks
 * must find.
 *
 * @param ordinal of the lane in the whole project
 */
export function spoilLane(planned: PlannedFinding[], lane: LaneDraft, before: LaneDraft | undefined, ordinal: number): void {
  const { id, method } = lane.dispenser;
  lane.mapped = ordinal % UNMAPPED_EVERY !== UNMAPPED_EVERY - 6;
  if (ordinal % FAULT_EVERY === FAULT_EVERY - 11) {
    const { code, spoil } = FAULTS[Math.floor(ordinal / FAULT_EVERY) % FAULTS.length];
    if (spoil(lane, before) && code !== null) planned.push({ code, id });
  }
  if (!lane.mapped && method === 'pulse') planned.push({ code: 'MP-01', id });
  if (!lane.mapped && lane.dispenser.wiring === 'four-core' && lane.dispenser.typeId !== null) planned.push({ code: 'MP-02', id });
}

/** A stated demand for which the cartridge lasts so many running days. */
function stateLife({ point, dispenser, type }: LaneDraft, days: number): void {
  const usableUl = dispenser.cartridgeUl! - type.residualUl;
  const statedUl = statedUlFor(usableUl, days, point.hoursPerDay!);
  Object.assign(point, { demandWay: 'stated', statedPer: '1000h', statedUl });
  Object.assign(dispenser, { method: 'pulse', periodMonths: null, doseUl: dispenser.doseUl ?? type.doseMinUl * 3 });
}

/** One circuit in so many has a breaker that a far short circuit does not trip, and one a limit k that is too large. */
const BREAKER_EVERY = 12;
const LIMIT_EVERY = 15;
const MANY = 20;

/** What is particular to a circuit, by its number in the project: seeded faults and k. */
export function circuitSettings({ random }: Site, ordinal: number, lanes: number): { readonly breaker: boolean; readonly limit: number; readonly tooMany: boolean } {
  const tooMany = ordinal % LIMIT_EVERY === 8 && lanes >= MANY;
  return { breaker: ordinal % BREAKER_EVERY === 5, tooMany, limit: tooMany ? MANY : random.whole(3, 5) };
}
