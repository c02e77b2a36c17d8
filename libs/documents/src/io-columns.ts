import { formatInterval, formatNumber, NOTHING, THIN_SPACE, type Finding, type Rounding } from '#calc';
import type { Lane } from './io-rows.ts';

export type IoCell = string | number | null;
export type ColumnKind = 'text' | 'number' | 'integer';

/** A column of the I/O list. */
export interface IoColumn {
  readonly key: string;
  /** As it stands in the heading row, with the unit; the import finds its field again by it. */
  readonly heading: string;
  readonly unit: string | null;
  readonly kind: ColumnKind;
  /** Decimals always shown; null: as many as the number has. */
  readonly decimals: number | null;
  /** False: derived, and left out by an import. */
  readonly importable: boolean;
  /** Width in characters for a sheet. */
  readonly width: number;
  /** Stated values as stated, derived figures rounded as everywhere. */
  readonly cell: (lane: Lane) => IoCell;
}

type Extra = { readonly unit?: string; readonly decimals?: number };

const stated = (key: string, label: string, kind: ColumnKind, width: number, cell: IoColumn['cell'], unit: string | null = null): IoColumn => ({
  key, heading: unit === null ? label : `${label} ${unit}`, unit, kind, decimals: null, importable: true, width, cell,
});

/** Headings of derived columns begin with "Computed", which no field of the import is named. */
const derived = (key: string, label: string, kind: ColumnKind, width: number, cell: IoColumn['cell'], { unit, decimals }: Extra = {}): IoColumn => ({
  key, heading: `Computed ${label}${unit === undefined ? '' : ` ${unit}`}`, unit: unit ?? null, kind,
  decimals: decimals ?? null, importable: false, width, cell,
});

/** The columns in order: all that the import understands, then the derived ones, remarks last. */
export const IO_COLUMNS: readonly IoColumn[] = [
  stated('tag', 'Tag', 'text', 16, ({ point }) => point.tag),
  stated('description', 'Description', 'text', 36, ({ point }) => point.description),
  stated('function', 'Function =', 'text', 12, ({ point }) => point.function),
  stated('location', 'Location +', 'text', 10, ({ point }) => point.location),
  stated('product', 'Product -', 'text', 10, ({ point }) => point.product),
  stated('machine', 'Machine', 'text', 20, ({ point }) => point.machine),
  stated('controller', 'Controller', 'text', 10, ({ controller }) => controller?.name ?? null),
  stated('outputModule', 'Output module', 'text', 10, ({ output }) => output?.module.name ?? null),
  stated('outputChannel', 'Output channel', 'integer', 9, ({ output }) => output?.channel ?? null),
  stated('outputAddress', 'Output address', 'text', 11, ({ output }) => output?.address ?? null),
  stated('statusModule', 'Status module', 'text', 10, ({ status }) => status?.module.name ?? null),
  stated('statusChannel', 'Status channel', 'integer', 9, ({ status }) => status?.channel ?? null),
  stated('statusAddress', 'Status address', 'text', 11, ({ status }) => status?.address ?? null),
  stated('dispenserType', 'Dispenser type', 'text', 32, ({ type }) => type?.name ?? null),
  stated('wiring', 'Wiring', 'text', 10, ({ dispenser }) => dispenser?.wiring ?? null),
  stated('cartridgeCm3', 'Cartridge', 'number', 10, ({ dispenser }) => cm3(dispenser?.cartridgeUl), 'cm³'),
  stated('doseCm3', 'Dose', 'number', 8, ({ dispenser }) => cm3(dispenser?.doseUl), 'cm³'),
  stated('circuit', 'Circuit', 'text', 8, ({ circuit }) => circuit?.name ?? null),
  stated('junctionBox', 'Junction box', 'text', 10, ({ box }) => box?.location ?? null),
  stated('cableTag', 'Cable', 'text', 10, ({ dispenser }) => dispenser?.cableTag ?? null),
  stated('cableLengthM', 'Cable length', 'number', 9, ({ dispenser }) => dispenser?.cableLengthM ?? null, 'm'),
  stated('crossSectionMm2', 'Cross-section', 'number', 9, ({ dispenser }) => dispenser?.crossSectionMm2 ?? null, 'mm²'),
  stated('boreMm', 'Bore d', 'number', 8, ({ point }) => point.boreMm, 'mm'),
  stated('outsideMm', 'Outside diameter D', 'number', 10, ({ point }) => point.outsideMm, 'mm'),
  stated('widthMm', 'Width B', 'number', 8, ({ point }) => point.widthMm, 'mm'),
  stated('speedRpm', 'Speed', 'number', 8, ({ point }) => point.speedRpm, 'rpm'),
  stated('hoursPerDay', 'Hours per day', 'number', 8, ({ point }) => point.hoursPerDay, 'h'),
  stated('daysPerWeek', 'Days per week', 'number', 8, ({ point }) => point.daysPerWeek, 'd'),
  // As it was stated, in the column of that unit only: turned into the other it may lose its last digit.
  stated('demandCm3Per100h', 'Demand', 'number', 11, statedPer('100h'), 'cm³/100 h'),
  stated('demandCm3Per1000h', 'Demand', 'number', 11, statedPer('1000h'), 'cm³/1000 h'),
  stated('grease', 'Grease', 'text', 20, ({ grease }) => grease?.name ?? null),
  derived('demand', 'demand', 'number', 12, ({ demandUlPer1000h }) => rounded(cm3(demandUlPer1000h), 1), { unit: 'cm³/1000 h', decimals: 1 }),
  derived('interval', 'interval', 'text', 12, ({ figures }) => intervalText(figures?.plan?.intervalMs)),
  derived('pulses', 'pulses', 'integer', 10, ({ figures }) => figures?.plan?.pulsesPerCartridge ?? null),
  derived('lifeDays', 'life', 'integer', 10, ({ figures }) => rounded((figures?.plan ?? figures?.timed)?.lifeDays, 0, 'down'), { unit: 'd' }),
  derived('worstVoltage', 'worst voltage', 'number', 10, ({ figures }) => rounded(figures?.worst?.volts, 1, 'down'), { unit: 'V', decimals: 1 }),
  derived('margin', 'margin', 'number', 10, marginV, { unit: 'V', decimals: 1 }),
  derived('channelLoad', 'channel load', 'integer', 10, ({ figures }) => rounded(milli(figures?.channelA), 0, 'up'), { unit: 'mA' }),
  derived('findings', 'findings', 'text', 16, ({ findings }) => codesOf(findings)),
  stated('remarks', 'Remarks', 'text', 40, ({ point }) => point.remarks),
];

function cm3(ul: number | null | undefined): number | null {
  return ul === null || ul === undefined ? null : ul / 1000;
}

function statedPer(per: '100h' | '1000h'): IoColumn['cell'] {
  return ({ point }) => (point.statedPer === per ? cm3(point.statedUl) : null);
}

function milli(amps: number | null | undefined): number | null {
  return amps === null || amps === undefined ? null : amps * 1000;
}

function marginV({ figures }: Lane): number | null {
  const volts = figures?.worst?.volts;
  return volts === undefined || figures?.minV === undefined || figures.minV === null ? null : rounded(volts - figures.minV, 1, 'down');
}

/** The figure that the screens show, as a number again. */
function rounded(value: number | null | undefined, decimals: number, rounding: Rounding = 'nearest'): number | null {
  const text = formatNumber(value, decimals, rounding);
  return text === NOTHING ? null : Number(text.replaceAll(',', '').replace('−', '-'));
}

/** With plain blanks: a list goes to programs that do not know thin ones. */
function intervalText(ms: number | undefined): string | null {
  const text = formatInterval(ms);
  return text === NOTHING ? null : text.replaceAll(THIN_SPACE, ' ');
}

/** Codes of errors and warnings, each once, errors first. */
function codesOf(findings: readonly Finding[]): string | null {
  const codes = (['error', 'warning'] as const).flatMap((severity) => findings.filter((each) => each.severity === severity).map((each) => each.code));
  return codes.length === 0 ? null : [...new Set(codes)].join(', ');
}
