import type { Assessment, Explanation, LaneFigures } from '../assessment.ts';
import type { Circuit, Design, Dispenser, DispenserType, Grease, ModuleType, Point, Supply } from '../design.ts';

/** All that an explanation of one lane's figures looks at. */
export interface LaneContext {
  readonly design: Design;
  readonly assessment: Assessment;
  readonly figures: LaneFigures;
  readonly dispenser: Dispenser;
  readonly point: Point;
  readonly demandUlPer1000h: number | null;
  readonly type: DispenserType | null;
  readonly grease: Grease | null;
  readonly circuit: Circuit | null;
  readonly supply: Supply | null;
  /** Type of the output module. */
  readonly outputType: ModuleType | null;
}

/** Gathers a lane's rows; null where the dispenser or its point is not in the design. */
export function laneContext(design: Design, assessment: Assessment, dispenserId: string): LaneContext | null {
  const dispenser = byId(design.dispensers, dispenserId);
  const point = byId(design.points, dispenser?.pointId ?? null);
  const figures = assessment.lanes.get(dispenserId);
  if (!dispenser || !point || !figures) return null;
  const circuit = byId(design.circuits, dispenser.circuitId);
  const output = design.assignments.find((each) => each.dispenserId === dispenserId && each.purpose === 'control');
  const module = byId(design.modules, output?.moduleId ?? null);
  return {
    design, assessment, figures, dispenser, point, circuit,
    demandUlPer1000h: assessment.points.get(point.id)?.demandUlPer1000h ?? null,
    type: byId(design.dispenserTypes, dispenser.typeId),
    grease: byId(design.greases, point.greaseId),
    supply: byId(design.supplies, circuit?.supplyId ?? null),
    outputType: byId(design.moduleTypes, module?.typeId ?? null),
  };
}

/** Tags of the points at which dispensers stand, in the order given. */
export function tagsOf(design: Design, dispenserIds: readonly string[]): string {
  const tags = dispenserIds.map((id) => byId(design.points, byId(design.dispensers, id)?.pointId ?? null)?.tag ?? 'unknown');
  return tags.length === 0 ? 'none' : tags.join(', ');
}

export type Input = Explanation['inputs'][number];
export type RoundingStep = Explanation['rounding'][number];

export function input(name: string, value: string, source: string): Input {
  return { name, value, source };
}

export function step(name: string, value: string, why: string): RoundingStep {
  return { step: name, value, why };
}

/** Where a catalogue value comes from. */
export function typeSource(type: { readonly name: string; readonly typeVersion: number }): string {
  return `type data: ${type.name}, version ${type.typeVersion}`;
}

/** A tag's own row. */
export const FROM_POINT = 'entered at the point';
export const FROM_DISPENSER = 'chosen at the dispenser';
export const FROM_POLICY = 'policy of the project';

function byId<T extends { readonly id: string }>(rows: readonly T[], id: string | null): T | null {
  return rows.find((row) => row.id === id) ?? null;
}
