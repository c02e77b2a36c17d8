import { AMPS, type Field, type KindView, MILLIAMPS, sameWords, VOLTS } from './field';

const output = { key: 'kind', is: ['output'] } as const;
const input = { key: 'kind', is: ['input'] } as const;
const relay = { key: 'technology', is: ['relay'] } as const;

const channels: readonly Field[] = [
  { kind: 'choice', key: 'kind', label: 'Kind', hint: 'Outputs drive dispensers, inputs read their status.', choices: sameWords(['output', 'input']) },
  { kind: 'choice', key: 'technology', label: 'Switches by', hint: 'Transistor or relay contact.', choices: sameWords(['transistor', 'relay']), only: output, otherwise: 'input' },
  { kind: 'choice', key: 'polarity', label: 'Polarity', hint: 'Sourcing outputs switch +24 V and drive sinking inputs; the others the other way round.', choices: sameWords(['sourcing', 'sinking']) },
  { kind: 'number', key: 'channels', label: 'Channels', hint: 'How many it has.', whole: true, min: 1, max: 128 },
  { kind: 'number', key: 'channelsPerGroup', label: 'Channels a group', hint: 'Channels that share one feed.', whole: true, min: 1, max: 128 },
];

const outputs: readonly Field[] = [
  { ...AMPS, key: 'channelA', label: 'Channel rating', hint: 'Most that a channel carries.', empty: 'no limit of its own', above: 0, max: 100, optional: true, only: output },
  { ...AMPS, key: 'groupA', label: 'Group rating', hint: 'Most that a group carries together.', empty: 'no limit of its own', above: 0, max: 1000, optional: true, only: output },
  { ...AMPS, key: 'moduleA', label: 'Module rating', hint: 'Most that the module carries.', empty: 'no limit of its own', above: 0, max: 1000, optional: true, only: output },
  { ...AMPS, key: 'channelPeakA', label: 'Inrush of a channel', hint: 'Peak it stands when it switches on.', empty: 'not stated', above: 0, max: 1000, optional: true, only: output },
  { ...VOLTS, key: 'dropV', label: 'Voltage drop', hint: 'Lost in an output that is on.', min: 0, max: 10, only: output, otherwise: 0 },
  { ...MILLIAMPS, key: 'leakageA', label: 'Leakage', hint: 'What still flows when the output is off.', min: 0, max: 1000, only: output, otherwise: 0 },
  { ...AMPS, key: 'shortCircuitA', label: 'Short circuit limited to', hint: 'What the output lets through at most.', empty: 'not limited', above: 0, max: 1000, optional: true, only: output },
];

const contacts: readonly Field[] = [
  { ...MILLIAMPS, key: 'minLoadA', label: 'Least load', hint: 'Below it a contact may not switch reliably.', empty: 'not stated', min: 0, max: 10_000, optional: true, only: relay },
  { kind: 'number', key: 'ratedOperations', label: 'Rated operations', hint: 'How often a contact switches in its life.', empty: 'not stated', whole: true, min: 1, max: Number.MAX_SAFE_INTEGER, optional: true, only: relay },
];

const inputs: readonly Field[] = [
  { kind: 'choice', key: 'inputType', label: 'Input type', hint: 'Type 1, 2 or 3 of IEC 61131-2: which voltages and currents count as on.', choices: sameWords(['1', '2', '3']), number: true, only: input },
  { ...MILLIAMPS, key: 'inputA', label: 'Input current', hint: 'What an input draws at 24 V.', empty: 'not stated', above: 0, max: 1000, optional: true, only: input },
];

/** Output and input modules of a controller. */
export const moduleView: KindView = {
  kind: 'moduleTypes', path: 'module-types', label: 'Modules', one: 'module type', versioned: true,
  columns: [
    { key: 'kind', head: 'Kind' }, { key: 'technology', head: 'Switches by' }, { key: 'channels', head: 'Channels' }, { key: 'channelsPerGroup', head: 'Per group' },
    { key: 'channelA', head: 'Channel' }, { key: 'groupA', head: 'Group' }, { key: 'moduleA', head: 'Module' }, { key: 'inputType', head: 'Input type' },
  ],
  groups: [
    { title: 'Channels', fields: channels }, { title: 'Outputs', fields: outputs },
    { title: 'Relay contacts', fields: contacts }, { title: 'Inputs', fields: inputs },
  ],
  rules: [{ key: 'channelsPerGroup', words: 'A group has no more channels than the module.', holds: (r) => Number(r['channelsPerGroup']) <= Number(r['channels']) }],
  blank: {},
};
