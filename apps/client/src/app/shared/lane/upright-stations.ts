import { ampsAgainstMaximum, formatAmps, formatDemand, formatMetres, formatSection, formatVolume, type Severity, voltsAgainstMinimum } from '#calc';
import { circle, type Mark, path, rect } from '../drawing/mark';
import type { LaneState } from './lane-view';
import { isLow, type LoopPlace, type LoopView, type ProfileStation, shownStations } from './loop-view';

/** One line of the upright lane on a phone. */
export interface UprightStation {
  readonly kind: string;
  readonly name: string;
  readonly mono: boolean;
  readonly detail: string;
  /** At the right: the worst-case voltage, or what leads there. */
  readonly figure: string;
  readonly bad: boolean;
  readonly grease: boolean;
  readonly state: LaneState;
  readonly node: readonly Mark[];
  /** Its place in the voltage profile; undefined: it has none. */
  readonly volts?: ProfileStation;
  /** The gravest finding here. */
  readonly found: Severity | null;
}

/** The lane from top to bottom, in the order in which one walks it. */
export function uprightStations(loop: LoopView): readonly UprightStation[] {
  const at = stationAt(loop);
  const last = loop.boxes.length + 1;
  const cores = loop.wiring === 'two-core' ? 2 : loop.method === 'timed' ? 3 : 4;
  return [
    outputStation(loop),
    station(loop, 'Circuit', loop.supply.circuit ?? 'No circuit yet', [loop.supply.name, loop.supply.protection, worstLoad(loop)], ['supply', 'protection'], { node: [circle('term', 12, 12, 4.5)], volts: at(0) }),
    ...loop.boxes.map((b, i) => station(loop, 'Box', b.location, [b.cableTag, formatMetres(b.lengthM), `2 × ${formatSection(b.powerMm2)}`], i === 0 ? ['trunk'] : [], {
      node: [rect('node', 3, 4, 18, 16), circle('term', 12, 4, 2.6), circle('term', 12, 20, 2.6)], volts: at(i + 1),
    })),
    station(loop, 'Dispenser', loop.dispenser.name, [loop.cable.tag, formatMetres(loop.cable.lengthM), `${cores} × ${formatSection(loop.cable.sectionMm2)}`, formatAmps(loop.dispenser.runA)], ['cable', 'dispenser'], {
      bad: isLow(loop.profile), volts: at(last), figure: loop.profile?.collapsed ? 'none' : undefined, node: [rect('node', 2, 3, 20, 18, 4), ...driven(loop)],
    }),
    station(loop, 'Point', loop.point.description ?? loop.point.tag, [formatDemand(loop.point.demandUlPer1000h)], ['point'], {
      mono: false, grease: true, figure: formatVolume(loop.dispenser.doseUl), state: loop.planned ? loop.state : 'unmapped', node: [circle('node', 12, 12, 8), ...(loop.planned ? [circle('head', 12, 12, 2.6)] : [])],
    }),
  ];
}

function outputStation(loop: LoopView): UprightStation {
  const { output } = loop;
  if (loop.method === 'timed') return station(loop, 'Output', 'None: own clock', [loop.supply.cabinet], ['output'], { mono: false, node: [rect('node open', 5, 5, 14, 14)] });
  const load = output ? [ampsAgainstMaximum(output.amps), ...(output.ratingA === null ? [] : [`of ${formatAmps(output.ratingA)}`])].join(' ') : '';
  return station(loop, 'Output', output?.address ?? 'No output yet', [output && `${output.module}, channel ${output.channel}`, loop.supply.cabinet, load], ['output'], {
    mono: output !== null, node: [rect(output === null ? 'node open' : loop.state === 'mapped' ? 'node' : 'node solid', 5, 5, 14, 14)],
  });
}

const driven = (loop: LoopView): readonly Mark[] =>
  loop.method === 'timed' ? [circle('clock', 12, 12, 5.5), path('clock', 'M12 8.5V12h3')] : loop.planned ? [path('pulse', 'M6 16h3v-8h6v8h3')] : [];

const worstLoad = ({ supply }: LoopView): string => (supply.worstA === null ? '' : `${ampsAgainstMaximum(supply.worstA)} at worst`);

interface Rest {
  readonly mono?: boolean;
  readonly bad?: boolean;
  readonly grease?: boolean;
  readonly figure?: string;
  readonly state?: LaneState;
  readonly volts?: ProfileStation;
  readonly node: readonly Mark[];
}

function station(loop: LoopView, kind: string, name: string, details: readonly (string | null | undefined)[], places: readonly LoopPlace[], rest: Rest): UprightStation {
  const found = loop.findings.filter((f) => places.includes(f.place)).map((f) => f.severity);
  return {
    kind, name, node: rest.node, volts: rest.volts, detail: details.filter((d) => d && d !== '–').join(', '),
    figure: rest.figure ?? (rest.volts ? voltsAgainstMinimum(rest.volts.worstV) : ''),
    mono: rest.mono ?? /^[%=+-]/.test(name), bad: rest.bad ?? false, grease: rest.grease ?? false, state: rest.state ?? loop.state,
    found: (['error', 'warning', 'note'] as const).find((s) => found.includes(s)) ?? null,
  };
}

/** Only where the profile's stations are the diagram's own can a figure stand beside one; at the dispenser always. */
const stationAt = (loop: LoopView) => (index: number): ProfileStation | undefined => {
  const stations = shownStations(loop);
  if (stations.length === loop.boxes.length + 2) return stations[index];
  return index === loop.boxes.length + 1 ? stations.at(-1) : undefined;
};
