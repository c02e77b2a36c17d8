import type { LaneView } from '../../shared/lane/lane-view';

export interface SampleLane {
  readonly name: string;
  readonly says: string;
  readonly lane: LaneView;
}

const base: LaneView = {
  tag: 'GC1-L01', state: 'mapped', statusState: 'mapped', wiring: 'four-core', output: '%QX4.0', status: '%IX4.0', from: '+JB1',
  lengthM: 33, sectionMm2: 1.5, worstV: 23.8, minV: 21, intervalMs: 13_200_000,
};

/** How the line speaks, on invented lanes. */
export const SAMPLE_LANES: readonly SampleLane[] = [
  {
    name: 'Unmapped', says: 'designed, no output yet',
    lane: { ...base, tag: 'SL1-L09', state: 'unmapped', statusState: 'unmapped', output: null, status: null, from: '+JB4', lengthM: 105, sectionMm2: 2.5, worstV: 21.8, intervalMs: 9_600_000 },
  },
  { name: 'Mapped, four-core', says: 'an output gives the pulse, the status comes back', lane: base },
  {
    name: 'Mapped, two-core', says: 'the output itself feeds the motor; there is no status to bring back',
    lane: { ...base, tag: 'BE1-L03', wiring: 'two-core', output: '%QX6.2', status: null, from: '+K1', lengthM: 41, sectionMm2: 2.5, worstV: 23.2, intervalMs: 8_400_000 },
  },
  {
    name: 'Too far', says: 'the worst set running at once leaves too few volts',
    lane: { ...base, tag: 'SL1-L16', output: '%QX8.7', status: '%IX8.7', from: '+JB5', lengthM: 137, sectionMm2: 2.5, worstV: 20.9, intervalMs: 9_600_000 },
  },
  {
    name: 'Wired', says: 'cables and terminals are done',
    lane: { ...base, tag: 'GC1-L14', state: 'wired', statusState: 'wired', output: '%QX5.5', status: '%IX5.5', from: '+JB3', lengthM: 103, sectionMm2: 4, worstV: 23.1, intervalMs: 9_120_000 },
  },
];
