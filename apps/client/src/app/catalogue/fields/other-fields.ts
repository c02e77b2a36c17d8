import { AMPS, type KindView, sameWords } from './field';

const coloured = { key: 'coreMarking', is: ['coloured'] } as const;

/** Cables between cabinets, boxes and dispensers. */
export const cableView: KindView = {
  kind: 'cableTypes', path: 'cable-types', label: 'Cables', one: 'cable type', versioned: true,
  columns: [
    { key: 'cores', head: 'Cores' }, { key: 'crossSectionMm2', head: 'Section' }, { key: 'conductorClass', head: 'Class' },
    { key: 'coreMarking', head: 'Marking' }, { key: 'coreColours', head: 'Colours' },
  ],
  groups: [
    {
      title: 'Electric', fields: [
        { kind: 'number', key: 'crossSectionMm2', label: 'Cross-section', hint: 'Copper of one core.', unit: 'mm²', above: 0, max: 300 },
        {
          kind: 'choice', key: 'conductorClass', label: 'Conductor class', hint: 'By IEC 60228; it sets the resistance.', number: true,
          choices: [{ value: '2', label: '2, stranded' }, { value: '5', label: '5, flexible' }],
        },
      ],
    },
    {
      title: 'Cores', fields: [
        { kind: 'number', key: 'cores', label: 'Cores', hint: 'How many it has.', whole: true, min: 1, max: 200 },
        { kind: 'choice', key: 'coreMarking', label: 'Marking', hint: 'How cores are told apart.', choices: sameWords(['numbered', 'coloured']) },
        { kind: 'text', key: 'coreColours', label: 'Colours', hint: 'IEC 60757 codes in the order of the cores.', typed: 'Parted by commas: BN, WH, BU, BK.', max: 10, list: { least: 1, most: 200 }, only: coloured, otherwise: [] },
      ],
    },
  ],
  rules: [{
    key: 'coreColours', words: 'Give one colour for each core.',
    holds: (r) => r['coreMarking'] === 'numbered' || (r['coreColours'] as readonly string[]).length === Number(r['cores']),
  }],
  blank: {},
};

/** 24 V supplies. */
export const supplyView: KindView = {
  kind: 'supplyTypes', path: 'supply-types', label: 'Supplies', one: 'supply type', versioned: true,
  columns: [
    { key: 'ratedA', head: 'Rated' }, { key: 'deratingFromC', head: 'Derates from' }, { key: 'tolerancePercent', head: 'Tolerance' },
    { key: 'shortCircuitA', head: 'Short circuit' }, { key: 'extraLowVoltage', head: 'Circuit' },
  ],
  groups: [{
    title: 'Electric', fields: [
      { ...AMPS, key: 'ratedA', label: 'Rated current', hint: 'What it delivers for good.', above: 0, max: 1000 },
      { kind: 'number', key: 'deratingFromC', label: 'Derates from', hint: 'Above this temperature the rating falls.', unit: '°C', min: -40, max: 100 },
      { kind: 'number', key: 'deratingPercentPerK', label: 'Derates by', hint: 'Of the rating, for each kelvin above.', unit: '%/K', min: 0, max: 100 },
      { kind: 'number', key: 'tolerancePercent', label: 'Tolerance', hint: 'How far the voltage strays from the set one.', empty: 'not stated, 24 V − 15 % counts', unit: '%', min: 0, max: 50, optional: true },
      { ...AMPS, key: 'shortCircuitA', label: 'Short-circuit current', hint: 'What it can deliver to trip a breaker.', above: 0, max: 10_000 },
      {
        kind: 'choice', key: 'extraLowVoltage', label: 'Circuit', hint: 'Whether its 0 V is earthed.',
        choices: [{ value: 'PELV', label: 'PELV, earthed' }, { value: 'SELV', label: 'SELV, not earthed' }],
      },
    ],
  }],
  rules: [], blank: {},
};

/** Greases; they have no versions. */
export const greaseView: KindView = {
  kind: 'greases', path: 'greases', label: 'Greases', one: 'grease', versioned: false,
  columns: [{ key: 'nlgi', head: 'NLGI' }, { key: 'thickener', head: 'Thickener' }, { key: 'densityGPerCm3', head: 'Density' }],
  groups: [{
    title: 'Grease', fields: [
      { kind: 'text', key: 'nlgi', label: 'NLGI grade', hint: 'How stiff it is: 000 flows, 6 is a block.', max: 10 },
      { kind: 'text', key: 'thickener', label: 'Thickener', hint: 'Soap that holds the oil; thickeners do not always mix.', max: 100 },
      { kind: 'number', key: 'densityGPerCm3', label: 'Density', hint: 'Turns grams into volume.', unit: 'g/cm³', min: 0.5, max: 2 },
    ],
  }],
  rules: [], blank: {},
};
