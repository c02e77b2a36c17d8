import type { DispenserType } from '#calc';
import type { DesignIndex } from './design-index.ts';
import type { Fault, ImportValues, ProblemCode } from './plan.ts';
import type { RowReading } from './row-reading.ts';

const TAG_LENGTH = 200;
const DOSE_STEP_UL = 100;
/** Far beyond any cartridge or demand; larger ones are slips, and no column could hold them. */
const MAX_VOLUME_UL = 1_000_000_000;

const POSITIVE = [
  ['boreMm', 'The bore'],
  ['outsideMm', 'The outside diameter'],
  ['widthMm', 'The width'],
  ['speedRpm', 'The speed'],
  ['hoursPerDay', 'The running time'],
  ['daysPerWeek', 'The number of days'],
  ['demandUlPer100h', 'The demand'],
  ['demandUlPer1000h', 'The demand'],
  ['cartridgeUl', 'The cartridge volume'],
  ['doseUl', 'The dose'],
  ['cableLengthM', 'The cable length'],
  ['crossSectionMm2', 'The cross-section'],
] as const;

const VOLUMES = ['demandUlPer100h', 'demandUlPer1000h', 'cartridgeUl', 'doseUl'] as const;

type NumberKey = (typeof POSITIVE)[number][0];

/**
 * Checks what a row says, by itself and together with what the project says of its point. A value at
 * fault becomes blank and is reported; one that the project has already is no fault of the file.
 */
export function checkValues(reading: RowReading): void {
  const { index } = reading.context;
  for (let i = 0; i < POSITIVE.length; i += 1) checkPositive(reading, POSITIVE[i][0], POSITIVE[i][1]);
  checkRanges(reading);
  checkDose(reading);
  checkDiameters(reading);
  checkDemand(reading);
  checkType(reading, index);
  checkBox(reading, index);
}

/** A row without a tag, or with one that is too long, makes no point. */
export function checkTag(reading: RowReading): void {
  const { tag } = reading.values;
  if (tag === null) {
    reading.error('tag', fault('tag-missing', 'The row has no tag.', 'Give the point a tag, or delete the row.'));
  } else if (tag.length > TAG_LENGTH) {
    reading.error(
      'tag',
      fault(
        'tag-too-long',
        `The tag has ${tag.length} characters; up to ${TAG_LENGTH} are possible.`,
        'Shorten the tag.',
      ),
    );
  }
}

function checkPositive(reading: RowReading, key: NumberKey, name: string): void {
  const value = reading.values[key];
  if (value !== null && value <= 0) {
    blank(
      reading,
      key,
      fault('not-positive', `${name} is not above 0.`, 'Write a value above 0, or leave the cell blank.'),
    );
  }
}

function checkRanges(reading: RowReading): void {
  atMost(reading, 'hoursPerDay', 24, 'A day has 24 hours.', 'Write the hours a day, up to 24.');
  atMost(reading, 'daysPerWeek', 7, 'A week has 7 days.', 'Write the days a week, up to 7.');
  for (const key of VOLUMES) {
    atMost(reading, key, MAX_VOLUME_UL, 'The volume is larger than a tank.', 'Check the number and its decimal sign.');
  }
}

function atMost(reading: RowReading, key: NumberKey, limit: number, message: string, remedy: string): void {
  const value = reading.values[key];
  if (value !== null && value > limit) blank(reading, key, fault('out-of-range', message, remedy));
}

function checkDose(reading: RowReading): void {
  const { doseUl } = reading.values;
  if (doseUl === null || doseUl % DOSE_STEP_UL === 0) return;
  const below = Math.floor(doseUl / DOSE_STEP_UL) * DOSE_STEP_UL;
  const near = [below, below + DOSE_STEP_UL].filter((each) => each > 0).map((each) => (each / 1000).toFixed(1));
  blank(
    reading,
    'doseUl',
    fault('dose-step', `${doseUl / 1000} cm³ is not a multiple of 0.1 cm³.`, `Write ${near.join(' or ')} cm³.`),
  );
}

function checkDiameters(reading: RowReading): void {
  const { values, existing } = reading;
  if (values.boreMm === null && values.outsideMm === null) return;
  const bore = values.boreMm ?? existing.boreMm;
  const outside = values.outsideMm ?? existing.outsideMm;
  if (bore === null || outside === null || outside > bore) return;
  const key = values.outsideMm === null || values.outsideMm === existing.outsideMm ? 'boreMm' : 'outsideMm';
  if (values[key] === existing[key]) return;
  blank(
    reading,
    key,
    fault(
      'outside-not-above-bore',
      `The outside diameter ${outside} is not above the bore ${bore}.`,
      'Check whether the two are exchanged.',
    ),
  );
  // the bore alone may still be too large for the outside diameter that stays
  if (key === 'outsideMm') checkDiameters(reading);
}

function checkDemand(reading: RowReading): void {
  const { demandUlPer100h, demandUlPer1000h } = reading.values;
  if (demandUlPer100h === null || demandUlPer1000h === null || demandUlPer100h * 10 === demandUlPer1000h) return;
  blank(
    reading,
    'demandUlPer1000h',
    fault(
      'demand-contradiction',
      'The demands per 100 h and per 1000 h are not the same.',
      'Correct the one that is wrong, or map one column only.',
    ),
  );
}

function checkType(reading: RowReading, index: DesignIndex): void {
  const type = effectiveType(reading, index);
  if (!type) return;
  checkCartridge(reading, type);
  const { values, existing } = reading;
  if (values.wiring !== null && values.wiring !== type.wiring) {
    blank(
      reading,
      'wiring',
      fault(
        'wiring-contradiction',
        `The dispenser type is ${type.wiring}, the row says ${values.wiring}.`,
        `Write ${type.wiring}, or choose another dispenser type.`,
      ),
    );
  }
  const staying = values.wiring ?? existing.wiring;
  if (values.dispenserType !== null && staying !== null && staying !== type.wiring) {
    blank(
      reading,
      'dispenserType',
      fault(
        'wiring-contradiction',
        `The type is ${type.wiring}, but the point stays ${staying}.`,
        'Give the wiring in the list too, or change it at the point first.',
      ),
    );
  }
}

/** A point that keeps its type keeps the version of it too. */
function effectiveType({ values, existing, point }: RowReading, index: DesignIndex): DispenserType | undefined {
  const name = values.dispenserType ?? existing.dispenserType;
  if (name === null) return undefined;
  const typeId = point && name === existing.dispenserType ? index.dispenserByPoint.get(point.id)?.typeId : null;
  return (typeId && index.typeById.get(typeId)) || index.typeNamed(name);
}

function checkCartridge(reading: RowReading, type: DispenserType): void {
  const { cartridgeUl } = reading.values;
  if (cartridgeUl === null || type.cartridgesUl.includes(cartridgeUl)) return;
  const fitting = type.cartridgesUl.map((each) => each / 1000).join(' or ');
  blank(
    reading,
    'cartridgeUl',
    fault(
      'no-such-cartridge',
      `The type has no cartridge of ${cartridgeUl / 1000} cm³.`,
      `Write ${fitting} cm³, or choose another dispenser type.`,
    ),
  );
}

function checkBox(reading: RowReading, index: DesignIndex): void {
  const { junctionBox } = reading.values;
  const circuit = reading.values.circuit ?? reading.existing.circuit;
  if (junctionBox === null || circuit === null) return;
  if (index.boxNamed(junctionBox)?.circuitId === index.circuitNamed(circuit)?.id) return;
  blank(
    reading,
    'junctionBox',
    fault(
      'box-contradiction',
      `Junction box ${junctionBox} is not on circuit ${circuit}.`,
      'Correct the circuit or the box.',
    ),
  );
}

function blank(reading: RowReading, key: keyof ImportValues, reason: Fault): void {
  if (reading.values[key] === reading.existing[key]) return;
  reading.values[key] = null;
  reading.warn(key, reason);
}

function fault(code: ProblemCode, message: string, remedy: string): Fault {
  return { code, message, remedy };
}
