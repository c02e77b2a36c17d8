import { ampsAgainstMaximum, formatAmps, formatMetres, formatSection, formatVolts, NOTHING, voltsAgainstMinimum } from '#calc';
import { type LoopView, type ProfileStation, shownStations } from './loop-view';

/** One station of the lane as words, in the order in which one walks it. */
export interface StationRow {
  readonly station: string;
  /** What leads there: tag, length, cores and sections. */
  readonly cable: string;
  readonly metres: string;
  readonly amps: string;
  readonly worst: string;
  readonly alone: string;
  /** Codes of what is wrong there. */
  readonly findings: string;
}

/** What the diagram draws, for those who read rather than look. */
export function stationRows(loop: LoopView): readonly StationRow[] {
  const { supply, dispenser, cable, boxes } = loop;
  const stations = shownStations(loop);
  const at = (index: number): ProfileStation | undefined => (stations.length === boxes.length + 2 ? stations[index] : undefined);
  const cores = loop.wiring === 'two-core' ? 2 : loop.method === 'timed' ? 3 : 4;
  const rating = loop.output?.ratingA ?? null;
  const output = loop.method === 'timed' ? [] : [row(`Output ${loop.output?.address ?? 'not mapped'}`, loop.output ? `${loop.output.module}, channel ${loop.output.channel}` : '', undefined,
    loop.output ? `${ampsAgainstMaximum(loop.output.amps)}${rating === null ? '' : ` of ${formatAmps(rating)}`}` : NOTHING, codes(loop, ['output']))];
  return [
    row(`Supply ${supply.name ?? 'not chosen'}`, `${formatVolts(supply.setV)} as set`, undefined, NOTHING, codes(loop, ['supply'])),
    row(`Circuit ${supply.circuit ?? 'not chosen'}`, supply.protection ?? '', at(0), ampsAgainstMaximum(supply.worstA), codes(loop, ['protection'])),
    ...output,
    ...boxes.map((b, i) => row(`Box ${b.location}`, `${b.cableTag}, ${formatMetres(b.lengthM)}, 2 × ${formatSection(b.powerMm2)}, cores ${formatSection(b.signalMm2)}`, at(i + 1), NOTHING, i === 0 ? codes(loop, ['trunk']) : '')),
    row(`Dispenser ${dispenser.name}`, `${cable.tag ?? 'no tag'}, ${formatMetres(cable.lengthM)}, ${cores} × ${formatSection(cable.sectionMm2)}`, at(boxes.length + 1), formatAmps(dispenser.runA), codes(loop, ['cable', 'dispenser', 'point'])),
    ...(loop.wiring === 'four-core' ? [row(`Status input ${loop.status?.address ?? 'not mapped'}`, loop.status ? `${loop.status.module}, channel ${loop.status.channel}` : '', undefined, NOTHING, codes(loop, ['status']))] : []),
  ];
}

const row = (station: string, cable: string, at: ProfileStation | undefined, amps: string, findings: string): StationRow => ({
  station, cable, amps, findings,
  metres: at ? formatMetres(at.metres) : NOTHING, worst: at ? voltsAgainstMinimum(at.worstV) : NOTHING, alone: at ? formatVolts(at.aloneV) : NOTHING,
});

const codes = (loop: LoopView, places: readonly string[]): string =>
  loop.findings.filter((f) => places.includes(f.place)).map((f) => f.code).join(', ');
