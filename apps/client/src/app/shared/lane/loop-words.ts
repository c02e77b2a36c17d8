import { formatMetres, formatNumber, THIN_SPACE } from '#calc';
import { LANE_STATE_WORDS } from './lane-view';
import { isLow, type LoopProfile, type LoopView } from './loop-view';

/** The diagram as a sentence: what, from where to where, its state, its worst figure, what is wrong. */
export function loopWords(loop: LoopView): string {
  const start = loop.method === 'timed' ? 'own clock, no output' : loop.output ? `output ${loop.output.address} of ${loop.output.module}` : 'no output yet';
  const over = loop.boxes.length === 0 ? '' : `, over ${loop.boxes.map((b) => b.location).join(', ')}`;
  const metres = loop.profile?.stations.at(-1)?.metres;
  return [
    `Loop diagram of lane ${loop.tag}, ${loop.wiring}, ${LANE_STATE_WORDS[loop.state].toLowerCase()}`,
    `${start} in ${loop.supply.cabinet}${over} to dispenser ${loop.dispenser.name}${metres === undefined ? '' : `, ${formatMetres(metres).replace(THIN_SPACE, ' ')}`}`,
    ...(loop.wiring === 'four-core' ? [loop.status ? `status back to ${loop.status.address}` : 'status not mapped'] : []),
    ...(loop.profile ? [voltageWords(loop.profile)] : ['voltages not known yet']),
    ...(loop.findings.length === 0 ? [] : [loop.findings.map((f) => `${f.severity}: ${f.title}`).join('; ')]),
  ].join('. ');
}

function voltageWords(profile: LoopProfile): string {
  const end = profile.stations.at(-1);
  if (profile.collapsed || !end || end.worstV === null) return 'With the worst set no voltage is left at the dispenser';
  const limit = profile.minV === null ? '' : `, ${isLow(profile) ? 'too low: ' : ''}at least ${formatNumber(profile.minV, 1)} V`;
  return `At worst ${formatNumber(end.worstV, 1, 'down')} V at the dispenser${limit}; running alone ${formatNumber(end.aloneV, 1)} V`;
}
