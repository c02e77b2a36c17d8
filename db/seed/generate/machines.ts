import type { Series } from './bearings.ts';

/** Lubrication points of one part of a machine. */
export interface Part {
  readonly name: string;
  /** What tells its points apart; their number is the number of points. */
  readonly places: readonly string[];
  /** Null: no bearing, the demand is stated. */
  readonly bearing: { readonly series: Series; readonly bore: readonly [number, number]; readonly rpm: readonly [number, number] } | null;
  /** An open gear or chain takes the gear grease. */
  readonly gear?: boolean;
}

/** A kind of machine with its lubrication points. */
export interface MachineKind {
  /** Class code of the reference designation, for instance BC in =R1.BC3. */
  readonly code: string;
  readonly name: string;
  readonly parts: readonly Part[];
  /** Runs on a running day, h. */
  readonly hours: readonly [number, number];
}

const BEARINGS = ['bearing drive side', 'bearing non-drive side'];

const shaft = (name: string, series: Series, bore: readonly [number, number], rpm: readonly [number, number]): Part => ({
  name, places: BEARINGS, bearing: { series, bore, rpm },
});
const stated = (name: string, places: readonly string[], gear = false): Part => ({ name, places, bearing: null, gear });

/** Machines of a bulk-handling and milling plant, invented; speeds and sizes as such machines commonly have them. */
export const MACHINES: readonly MachineKind[] = [
  {
    code: 'BC', name: 'Belt conveyor', hours: [12, 20],
    parts: [shaft('Head pulley', '22', [90, 130], [60, 80]), shaft('Tail pulley', '22', [80, 110], [75, 100]), shaft('Snub pulley', '22', [70, 90], [110, 150]), shaft('Take-up pulley', '02', [70, 90], [95, 120])],
  },
  { code: 'BE', name: 'Bucket elevator', hours: [12, 20], parts: [shaft('Head shaft', '22', [110, 140], [45, 60]), shaft('Boot shaft', '22', [90, 110], [45, 60])] },
  { code: 'CC', name: 'Chain conveyor', hours: [10, 18], parts: [shaft('Drive shaft', '22', [80, 110], [15, 30]), shaft('Tail shaft', '22', [70, 90], [15, 30]), stated('Chain', ['top strand'], true)] },
  { code: 'SC', name: 'Screw conveyor', hours: [10, 20], parts: [shaft('Screw shaft', '02', [70, 95], [40, 70]), stated('Hanger bearing', ['first third', 'second third'])] },
  { code: 'FN', name: 'Fan', hours: [20, 24], parts: [shaft('Impeller shaft', '22', [70, 100], [740, 1480])] },
  { code: 'HM', name: 'Hammer mill', hours: [14, 20], parts: [shaft('Rotor shaft', '22', [100, 130], [980, 1480])] },
  { code: 'BM', name: 'Ball mill', hours: [20, 24], parts: [stated('Trunnion bearing', ['inlet', 'outlet']), shaft('Pinion shaft', '22', [140, 160], [120, 180]), stated('Girth gear', ['mesh, left', 'mesh, right'], true)] },
  { code: 'VS', name: 'Vibrating screen', hours: [12, 20], parts: [shaft('Exciter shaft 1', '23', [80, 120], [800, 950]), shaft('Exciter shaft 2', '23', [80, 120], [800, 950])] },
  { code: 'CR', name: 'Roller crusher', hours: [10, 18], parts: [shaft('Fixed roller', '23', [120, 160], [90, 180]), shaft('Loose roller', '23', [120, 160], [90, 180])] },
  { code: 'PM', name: 'Process pump', hours: [18, 24], parts: [shaft('Pump shaft', '03', [50, 80], [980, 1480])] },
  { code: 'MX', name: 'Paddle mixer', hours: [8, 16], parts: [shaft('Paddle shaft', '22', [100, 140], [20, 45]), stated('Shaft seal', ['drive side', 'non-drive side'])] },
  { code: 'RV', name: 'Rotary valve', hours: [12, 20], parts: [shaft('Rotor', '02', [50, 70], [15, 30])] },
];

/** What an area of the plant is for; a large plant has each several times. */
export const AREAS = ['Intake', 'Cleaning', 'Drying', 'Storage', 'Milling', 'Screening', 'Blending', 'Bagging', 'Load-out', 'Dust removal'] as const;
