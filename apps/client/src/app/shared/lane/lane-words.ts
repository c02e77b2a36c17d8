import { formatInterval, formatNumber } from '#calc';
import { isBelowMinimum, isPlanned, isTimed, LANE_STATE_WORDS, type LaneView } from './lane-view';

/** The line as a sentence, for those who listen: what, from where to where, its state, its worst figure. */
export function laneWords(lane: LaneView): string {
  const state = lane.aboutTo ? 'about to go stale' : LANE_STATE_WORDS[lane.state].toLowerCase();
  return `Lane ${lane.tag}, ${state}: ${[way(lane), volts(lane), plan(lane), status(lane)].filter(Boolean).join('; ')}`;
}

function way(lane: LaneView): string {
  const start = isTimed(lane) ? 'own clock, no output' : lane.output === null ? 'no output yet' : `output ${lane.output}`;
  const cable = [lane.lengthM === null ? '' : `${formatNumber(lane.lengthM, 0)} m`, lane.sectionMm2 === null ? '' : `of ${formatNumber(lane.sectionMm2)} mm²`].filter(Boolean).join(' ');
  return `${start}${lane.from === null ? '' : `, by ${lane.from}`} to the dispenser${cable === '' ? '' : `, ${cable}`}`;
}

function volts(lane: LaneView): string {
  if (lane.collapsed) return 'no voltage left with the worst set';
  if (lane.worstV === null) return '';
  return `at worst ${formatNumber(lane.worstV, 1, 'down')} V${isBelowMinimum(lane) ? `, too low: at least ${formatNumber(lane.minV, 1)} V` : ''}`;
}

function plan(lane: LaneView): string {
  if (lane.intervalMs !== null) return `a pulse every ${formatInterval(lane.intervalMs)}`;
  return isPlanned(lane) ? '' : 'no plan yet';
}

function status(lane: LaneView): string {
  if (lane.wiring !== 'four-core') return '';
  return lane.status === null ? 'status not mapped' : `status back to ${lane.status}`;
}
