import type { Assessment, Dispenser, Point, Purpose } from '#calc';
import { type Board, dispenserTypesOf, missingPurposes } from './board';
import { kept } from './mapping-rows';

/** A dispenser that lacks a signal. */
export interface OpenLane {
  readonly dispenser: Dispenser;
  readonly point: Point;
  readonly lacks: 'both' | 'output' | 'status';
  readonly circuit: string | null;
  readonly controller: string | null;
  readonly loadA: number | null;
  readonly runLengthM: number | null;
}

const byValue = new Intl.Collator('en', { numeric: true });

/** Those that lack an output or a status input, in order of their tags; what reads as before is the same object. */
export function openLanes(board: Board, assessment: Assessment, before: readonly OpenLane[] = []): readonly OpenLane[] {
  const old = new Map(before.map((lane) => [lane.dispenser.id, lane]));
  const types = dispenserTypesOf(board.design);
  const lanes: OpenLane[] = [];
  for (const { dispenser, point } of board.occupants.values()) {
    const missing = missingPurposes(board, dispenser, types);
    if (missing.length === 0) continue;
    const figures = assessment.lanes.get(dispenser.id);
    lanes.push(kept({
      dispenser, point, lacks: missing.length === 2 ? 'both' : missing[0] === 'control' ? 'output' : 'status',
      circuit: board.circuits.get(dispenser.circuitId ?? '') ?? null, controller: board.controllers.get(dispenser.controllerId ?? '') ?? null,
      loadA: figures?.channelA ?? null, runLengthM: figures?.runLengthM ?? null,
    }, old.get(dispenser.id)));
  }
  return lanes.sort((a, b) => byValue.compare(a.point.tag, b.point.tag));
}

export const lacking = (lane: OpenLane, purpose: Purpose): boolean => lane.lacks === 'both' || lane.lacks === (purpose === 'control' ? 'output' : 'status');

/** Those in which every word typed occurs. */
export function filtered(lanes: readonly OpenLane[], text: string): readonly OpenLane[] {
  const words = text.toLowerCase().split(/\s+/).filter(Boolean);
  if (words.length === 0) return lanes;
  return lanes.filter((lane) => {
    const all = [lane.point.tag, lane.point.description, lane.point.machine, lane.circuit, lane.controller].join(' ').toLowerCase();
    return words.every((word) => all.includes(word));
  });
}
