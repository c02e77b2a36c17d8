import type { LoopView } from '../loop-view';

/** A mapped four-core lane with two boxes; volts fall from 23.2 to 21.34. */
export const FOUR_CORE_LOOP: LoopView = {
  tag: 'GC1-L01', wiring: 'four-core', method: 'pulse', state: 'mapped', statusState: 'mapped', planned: true,
  supply: { cabinet: '+K1', name: '-T1', setV: 24, extraLowVoltage: 'PELV', circuit: 'C1', protection: '6 A, breaker B', worstA: 3.62, ratingA: 6 },
  output: { module: 'DO1', channel: 10, address: '%QX5.2', amps: 0.008, ratingA: 0.5 },
  status: { module: 'DI1', channel: 2, address: '%IX4.2', amps: 0.0025, ratingA: null },
  boxes: [
    { location: '+JB1', cableTag: '-W1', lengthM: 20, powerMm2: 4, signalMm2: 1, others: 7, onTo: ['+JB3'] },
    { location: '+JB2', cableTag: '-W2', lengthM: 40, powerMm2: 4, signalMm2: 1, others: 1, onTo: [] },
  ],
  othersAtCabinet: 18,
  cable: { tag: '-W11', lengthM: 37.5, sectionMm2: 1.5 },
  dispenser: {
    name: '=T1.GL1-GP01', function: '=T1.GL1', product: '-GP01', doseUl: 300, periodMonths: null, runA: 0.35, runMs: 6000, idleA: 0.02,
    cartridgeUl: 160_000, pins: { supply: '1', pulse: '2', zero: '3', status: '4' },
  },
  point: { tag: 'GC1-L01', description: 'Tail pulley, bearing drive side', demandUlPer1000h: 24_500 },
  profile: {
    stations: [
      { label: 'Supply -T1', metres: 0, worstV: 23.5, aloneV: 24 }, { label: 'Terminals C1', metres: 0, worstV: 23.2, aloneV: 23.9 },
      { label: '+JB1', metres: 20, worstV: 22.6, aloneV: 23.7 }, { label: '+JB2', metres: 60, worstV: 22.1, aloneV: 23.5 },
      { label: 'Device', metres: 97.5, worstV: 21.34, aloneV: 23 },
    ],
    lowestV: 23.5, tempC: 40, minV: 18, worstSet: 'worst set of 3: GC1-L01, GC1-L02, GC1-L03', idleV: 22, allOnV: 20.06, allOnCount: 30, collapsed: false,
  },
  findings: [],
};

/** The output feeds the motor, its own cable begins at the cabinet. */
export const TWO_CORE_LOOP: LoopView = {
  ...FOUR_CORE_LOOP,
  wiring: 'two-core', status: null, statusState: 'unmapped', boxes: [],
  output: { module: 'DO2', channel: 5, address: '%QX6.5', amps: 0.25, ratingA: 0.5 },
  dispenser: { ...FOUR_CORE_LOOP.dispenser, idleA: 0, pins: { supply: '1', zero: '2' } },
  profile: {
    ...FOUR_CORE_LOOP.profile!, idleV: null, minV: 19,
    stations: [{ label: 'Supply -T1', metres: 0, worstV: 23.5, aloneV: 24 }, { label: 'Terminals C1', metres: 0, worstV: 22.4, aloneV: 23.4 }, { label: 'Device', metres: 245, worstV: 18.96, aloneV: 20 }],
  },
};

/** No voltage is left at the dispenser. */
export const COLLAPSED_LOOP: LoopView = {
  ...FOUR_CORE_LOOP,
  profile: {
    ...FOUR_CORE_LOOP.profile!, collapsed: true, idleV: null, allOnV: null, worstSet: 'no voltage left with the worst permitted set',
    stations: FOUR_CORE_LOOP.profile!.stations.map((s) => ({ ...s, worstV: null, aloneV: null })),
  },
};
