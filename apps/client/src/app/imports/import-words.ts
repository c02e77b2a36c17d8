import type { ImportPreview } from '#contract';
import { counted } from './progress/progress-words';

type Counts = ImportPreview['counts'];

/** `1 point`, `30 points`. */
export const several = (count: number, noun: string): string => `${counted(count)} ${noun}${count === 1 ? '' : 's'}`;

/** On the button: `Import: create 30, change 2`. */
export function actWords({ toCreate, toUpdate }: Counts): string {
  const parts = [toCreate > 0 ? `create ${counted(toCreate)}` : '', toUpdate > 0 ? `change ${counted(toUpdate)}` : ''].filter(Boolean);
  return parts.length > 0 ? `Import: ${parts.join(', ')}` : 'Nothing to import';
}

/** What the import will do, in a sentence: `Creates 30 points, changes 2; 3 rows are held back.` */
export function effectWords({ toCreate, toUpdate, heldBack }: Counts): string {
  const held = heldBack > 0 ? `; ${several(heldBack, 'row')} ${heldBack === 1 ? 'is' : 'are'} held back` : '';
  if (toCreate + toUpdate === 0) return `The file changes nothing${held}.`;
  if (toCreate === 0) return `Changes ${several(toUpdate, 'point')}${held}.`;
  return `Creates ${several(toCreate, 'point')}${toUpdate > 0 ? `, changes ${counted(toUpdate)}` : ''}${held}.`;
}

/** Beside the title: the file, its sheets and its rows. */
export function fileWords({ fileName, sheets, counts }: ImportPreview): string {
  const taken = sheets.filter((sheet) => sheet.taken).map((sheet) => `“${sheet.name}”`);
  const which = taken.length === 0 ? [] : taken.length > 3 ? [`${taken.length} sheets`] : [`${taken.length === 1 ? 'sheet' : 'sheets'} ${taken.join(', ')}`];
  return [fileName, ...which, several(counts.rows, 'row')].join(', ');
}

/** Formulas that were saved without their result, and what to do; empty where there are none. */
export function formulaWords({ formulasWithoutValue: count }: ImportPreview): string {
  if (count === 0) return '';
  const [what, read] = count === 1 ? ['1 formula was', 'its cell is'] : [`${counted(count)} formulas were`, 'their cells are'];
  return `${what} saved without a result, so that ${read} read as blank. Open the file in a spreadsheet program, save it there, and import it again.`;
}

/** A heading that stands below another, `Signal / Type`, as group and name; no group where there is none. */
export function headingParts(heading: string): { readonly group: string; readonly name: string } {
  const at = heading.lastIndexOf(' / ');
  return at < 0 ? { group: '', name: heading } : { group: heading.slice(0, at), name: heading.slice(at + 3) };
}

const DELIMITERS: Readonly<Record<string, string>> = { ',': 'comma', ';': 'semicolon', '\t': 'tab', '|': 'bar' };
const ENCODINGS: Readonly<Record<string, string>> = { 'utf-8': 'UTF-8', 'windows-1252': 'Windows-1252', 'utf-16le': 'UTF-16, little end first', 'utf-16be': 'UTF-16, big end first' };

/** How the file was read: `Read as UTF-8, parted by comma, decimal point, headings in row 1`. */
export function readingWords({ settings: { encoding, delimiter, decimal, headerRow } }: ImportPreview): string {
  const format = encoding === null ? ['a workbook'] : [ENCODINGS[encoding], ...(delimiter === null ? [] : [`parted by ${DELIMITERS[delimiter]}`])];
  return `Read as ${[...format, `decimal ${decimal === '.' ? 'point' : 'comma'}`, `headings in row ${headerRow}`].join(', ')}`;
}

const choices = (words: Readonly<Record<string, string>>) => Object.entries(words).map(([value, label]) => ({ value, label }));

export const ENCODING_CHOICES = choices(ENCODINGS);
export const DELIMITER_CHOICES = choices(DELIMITERS);
