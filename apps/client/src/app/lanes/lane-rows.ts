import { type Assessment, type Circuit, type Design, type Dispenser, type DispenserType, type LaneFigures, type Point, type Wiring, wiringBy } from '#calc';

/** What belongs to one lane, looked up once. */
export interface LaneRows {
  readonly dispenser: Dispenser;
  readonly point: Point;
  readonly type: DispenserType | null;
  readonly wiring: Wiring | null;
  readonly circuit: Circuit | null;
  readonly figures: LaneFigures | null;
}

export function laneRowsOf(design: Design, assessment: Assessment, dispenserId: string): LaneRows | null {
  const dispenser = design.dispensers.find((d) => d.id === dispenserId);
  const point = design.points.find((p) => p.id === dispenser?.pointId);
  if (!dispenser || !point) return null;
  const type = design.dispenserTypes.find((t) => t.id === dispenser.typeId) ?? null;
  return {
    dispenser, point, type,
    wiring: wiringBy(dispenser, type),
    circuit: design.circuits.find((c) => c.id === dispenser.circuitId) ?? null,
    figures: assessment.lanes.get(dispenserId) ?? null,
  };
}

/** Rating and characteristic, as it stands on the device. */
export const protectionText = (circuit: Circuit): string => {
  const kinds: Readonly<Record<Circuit['protection'], string>> = {
    'breaker-B': 'breaker B', 'breaker-C': 'breaker C', electronic: 'electronic', fuse: 'fuse',
  };
  return `${circuit.protectionA} A, ${kinds[circuit.protection]}`;
};
