import { formatAmps, formatDemand, formatMetres, formatSection, formatVolume, voltsAgainstMinimum } from '#calc';
import { circle, type Mark, path, rect } from '../drawing/mark';
import { type LoopProfile, type LoopView, shownStations } from './loop-view';

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
  readonly node: readonly Mark[];
}

/** The lane from top to bottom, in the order in which one walks it. */
export function uprightStations(loop: LoopView): readonly UprightStation[] {
  const volts = voltsAt(loop);
  const last = loop.boxes.length + 1;
  return [
    station('Output', loop.output?.address ?? 'No output yet', [loop.output?.module, loop.supply.cabinet], '', { mono: loop.output !== null, node: [rect(loop.output ? 'node' : 'node open', 5, 5, 14, 14)] }),
    station('Supply', loop.supply.circuit ?? 'No circuit yet', [loop.supply.name, loop.supply.protection], volts(0), { node: [circle('term', 12, 12, 4.5)] }),
    ...loop.boxes.map((b, i) => station('Box', b.location, [b.cableTag, formatMetres(b.lengthM), `2 × ${formatSection(b.powerMm2)}`], volts(i + 1), {
      node: [rect('node', 3, 4, 18, 16), circle('term', 12, 4, 2.6), circle('term', 12, 20, 2.6)],
    })),
    station('Dispenser', loop.dispenser.name, [loop.cable.tag, formatMetres(loop.cable.lengthM), formatSection(loop.cable.sectionMm2), formatAmps(loop.dispenser.runA)], volts(last), {
      bad: isLow(loop.profile), node: [rect('node', 2, 3, 20, 18, 4), path('pulse', 'M6 16h3v-8h6v8h3')],
    }),
    station('Point', loop.point.description ?? loop.point.tag, [formatDemand(loop.point.demandUlPer1000h)], formatVolume(loop.dispenser.doseUl), {
      mono: false, grease: true, node: [circle('node', 12, 12, 8), circle('head', 12, 12, 2.6)],
    }),
  ];
}

interface Rest {
  readonly mono?: boolean;
  readonly bad?: boolean;
  readonly grease?: boolean;
  readonly node: readonly Mark[];
}

const station = (kind: string, name: string, details: readonly (string | null | undefined)[], figure: string, rest: Rest): UprightStation => ({
  kind, name, figure, detail: details.filter((d) => d && d !== '–').join(', '),
  mono: rest.mono ?? /^[%=+-]/.test(name), bad: rest.bad ?? false, grease: rest.grease ?? false, node: rest.node,
});

/** Only where the profile's stations are the diagram's own can a figure stand beside one. */
const voltsAt = (loop: LoopView) => (index: number): string => {
  const stations = shownStations(loop);
  if (stations.length === loop.boxes.length + 2) return voltsAgainstMinimum(stations[index]?.worstV);
  return index === loop.boxes.length + 1 ? voltsAgainstMinimum(stations.at(-1)?.worstV) : '';
};

const isLow = (profile: LoopProfile | null): boolean => {
  const end = profile?.stations.at(-1);
  return end !== undefined && profile!.minV !== null && end.worstV < profile!.minV;
};
