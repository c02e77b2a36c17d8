import type { Assessment, Design } from '#calc';
import type { LaneState } from '../shared/lane/lane-view';
import type { LoopDispenser, LoopView } from '../shared/lane/loop-view';
import type { LaneRows } from './lane-rows';
import { channelOf, supplyOf } from './loop-cabinet';
import { loopFindingsOf } from './loop-findings';
import { profileOf } from './loop-profile';
import { boxesOf, othersAtCabinet } from './loop-way';

/** The loop diagram of a lane; null while its wiring is not chosen. */
export function loopViewOf(design: Design, assessment: Assessment, rows: LaneRows): LoopView | null {
  const { dispenser, point, wiring, figures } = rows;
  if (!wiring) return null;
  const output = channelOf(design, rows, 'control');
  const status = channelOf(design, rows, 'status');
  const boxes = boxesOf(design, rows);
  return {
    tag: point.tag, wiring, output, status, boxes, method: dispenser.method,
    state: stateOf(dispenser.method === 'timed' ? status : output), statusState: stateOf(status),
    planned: Boolean(figures?.plan ?? figures?.timed),
    supply: supplyOf(design, assessment, rows),
    othersAtCabinet: othersAtCabinet(design, rows),
    cable: { tag: dispenser.cableTag, lengthM: dispenser.cableLengthM, sectionMm2: dispenser.crossSectionMm2 },
    dispenser: dispenserOf(rows),
    point: { tag: point.tag, description: point.description, demandUlPer1000h: assessment.points.get(point.id)?.demandUlPer1000h ?? null },
    profile: profileOf(design, assessment, rows, boxes),
    findings: loopFindingsOf(assessment.findingsByLane.get(dispenser.id) ?? [], dispenser.id),
  };
}

/** A channel makes a lane mapped; a dispenser on its own clock has its status channel only. */
const stateOf = (channel: object | null): LaneState => (channel === null ? 'unmapped' : 'mapped');

function dispenserOf({ dispenser, point, type, figures }: LaneRows): LoopDispenser {
  return {
    name: [point.function, point.product].filter(Boolean).join('') || (type?.name ?? ''),
    function: point.function ?? '', product: point.product ?? '',
    doseUl: dispenser.doseUl, periodMonths: dispenser.periodMonths,
    runA: type?.runA ?? null, runMs: figures?.plan?.runMs ?? null, idleA: type?.idleA ?? null,
    cartridgeUl: dispenser.cartridgeUl, pins: type?.pins ?? {},
  };
}
