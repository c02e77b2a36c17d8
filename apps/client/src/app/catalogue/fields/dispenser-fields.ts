import { AMPS, type Field, type KindView, MILLIAMPS, POLARITIES, sameWords, SECONDS, VOLTS, VOLUME } from './field';

const fourCore = { key: 'wiring', is: ['four-core'] } as const;
const withStatus = { key: 'hasStatus', is: ['yes'] } as const;

const electric: readonly Field[] = [
  { kind: 'choice', key: 'wiring', label: 'Wiring', hint: 'Two cores: the output feeds the motor. Four cores: supply, pulse and status are apart.', choices: sameWords(['two-core', 'four-core']) },
  {
    kind: 'choice', key: 'load', label: 'Kind of load', hint: 'Whether the current stays, or the power, when the voltage falls.',
    choices: [{ value: 'constant-current', label: 'constant current' }, { value: 'constant-power', label: 'constant power' }],
  },
  { ...AMPS, key: 'runA', label: 'Run current', hint: 'While the motor runs; for constant power at 24 V.', above: 0, max: 100 },
  { ...AMPS, key: 'peakA', label: 'Peak current', hint: 'When the motor starts.', above: 0, max: 100 },
  { ...MILLIAMPS, key: 'idleA', label: 'Standing current', hint: 'Between runs; 0 for two-core.', min: 0, max: 10_000 },
  { ...VOLTS, key: 'minV', label: 'Lowest voltage', hint: 'At the device; below it, it may not run.', above: 0, max: 30 },
];

const dose: readonly Field[] = [
  { ...VOLUME, key: 'cartridgesUl', label: 'Cartridges', hint: 'Nominal volumes that fit.', typed: 'Parted by semicolons.', min: 1, max: 10_000, list: { least: 1, most: 20 } },
  { ...VOLUME, key: 'residualUl', label: 'Residual volume', hint: 'What stays in an empty cartridge.', min: 0, max: 1000 },
  { ...VOLUME, key: 'doseMinUl', label: 'Smallest dose', hint: 'One pulse gives at least this.', min: 0.001, max: 1000 },
  { ...VOLUME, key: 'doseMaxUl', label: 'Largest dose', hint: 'One pulse gives at most this.', min: 0.001, max: 1000 },
  { ...VOLUME, key: 'doseStepUl', label: 'Dose step', hint: 'Doses are set in steps of this.', min: 0.001, max: 100 },
  { ...SECONDS, key: 'runMsPerStep', label: 'Run time a step', hint: 'How long the motor runs for one dose step.', min: 0.001, max: 3600 },
  { ...SECONDS, key: 'recoveryMs', label: 'Rest after a run', hint: 'Before the motor may run again.', min: 0, max: 86_400 },
  { kind: 'number', key: 'timedMonths', label: 'Timed discharge', hint: 'Months in which a cartridge can be emptied.', typed: 'Parted by semicolons.', empty: 'pulses only', unit: 'months', whole: true, min: 1, max: 60, list: { least: 0, most: 60 } },
];

const signals: readonly Field[] = [
  { kind: 'choice', key: 'controlPolarity', label: 'Output it wants', hint: 'Polarity of the output that drives it.', choices: POLARITIES },
  { ...SECONDS, key: 'triggerMs', label: 'Pulse width', hint: 'How long the output stays on to start a run.', empty: 'as long as the run', min: 0.001, max: 3600, optional: true, only: fourCore },
  { ...MILLIAMPS, key: 'controlInputA', label: 'Pulse input current', hint: 'What the pulse input draws.', empty: 'not stated', above: 0, max: 1000, optional: true, only: fourCore },
  { ...VOLTS, key: 'controlOnV', label: 'Pulse input on at', hint: 'From this voltage it is surely on.', empty: 'not stated', above: 0, max: 30, optional: true, only: fourCore },
  { ...MILLIAMPS, key: 'offStateA', label: 'Off-state current', hint: 'Up to this current it surely stays off.', min: 0, max: 1000 },
  { kind: 'choice', key: 'hasStatus', group: 'status', label: 'Status signal', hint: 'Whether it reports that it ran.', choices: sameWords(['yes', 'no']) },
  { kind: 'choice', key: 'status.polarity', label: 'Status polarity', hint: 'What its status output switches.', choices: POLARITIES, only: withStatus },
  { ...MILLIAMPS, key: 'status.maxA', label: 'Status current', hint: 'What the status output can deliver.', above: 0, max: 10_000, only: withStatus },
  { ...VOLTS, key: 'status.dropV', label: 'Status voltage drop', hint: 'Lost in the status output when on.', min: 0, max: 10, only: withStatus },
  { ...MILLIAMPS, key: 'status.leakageA', label: 'Status leakage', hint: 'What still flows when off.', min: 0, max: 1000, only: withStatus },
];

const pin = (key: string, label: string, hint: string): Field => ({ kind: 'text', key: `pins.${key}`, label, hint, max: 20, optional: true });

const area: readonly Field[] = [
  { kind: 'choices', key: 'protectionLevels', label: 'Protection levels', hint: 'Equipment protection levels it is certified for; G for gas, D for dust.', empty: 'none known', choices: sameWords(['Ga', 'Gb', 'Gc', 'Da', 'Db', 'Dc']) },
  { kind: 'number', key: 'maxSurfaceC', label: 'Hottest surface', hint: 'Temperature that its surface can reach.', empty: 'not stated', unit: '°C', min: 0, max: 600, optional: true },
];

const n = (value: unknown): number => Number(value);

/** Devices that press grease into a point. */
export const dispenserView: KindView = {
  kind: 'dispenserTypes', path: 'dispenser-types', label: 'Dispensers', one: 'dispenser type', versioned: true,
  columns: [
    { key: 'wiring', head: 'Wiring' }, { key: 'cartridgesUl', head: 'Cartridges' }, { key: 'doseMinUl', head: 'Dose from' }, { key: 'doseMaxUl', head: 'Dose to' },
    { key: 'runA', head: 'Runs at' }, { key: 'idleA', head: 'Stands at' }, { key: 'minV', head: 'Needs' },
  ],
  groups: [
    { title: 'Electric', fields: electric },
    { title: 'Dose and cartridge', fields: dose },
    { title: 'Signals', fields: signals },
    {
      title: 'Pins', fields: [
        pin('supply', 'Supply, +24 V', 'Pin of the plug; two-core: the switched core.'), { ...pin('pulse', 'Pulse in', 'Pin of the plug.'), only: fourCore },
        pin('zero', '0 V', 'Pin of the plug.'), { ...pin('status', 'Status out', 'Pin of the plug.'), only: withStatus },
      ],
    },
    { title: 'Area', fields: area },
  ],
  rules: [
    { key: 'doseMinUl', words: 'The smallest dose is at least one dose step.', holds: (r) => n(r['doseMinUl']) >= n(r['doseStepUl']) },
    { key: 'doseMaxUl', words: 'The largest dose is not below the smallest.', holds: (r) => n(r['doseMaxUl']) >= n(r['doseMinUl']) },
    { key: 'peakA', words: 'The peak is not below the run current.', holds: (r) => n(r['peakA']) >= n(r['runA']) },
  ],
  blank: { status: null, pins: {} },
};
