import { fieldName } from '#contract';
import type { Scope } from '../../../platform/editing/collection.ts';
import { ProblemError } from '../../../platform/problems.ts';
import { collectionNamed } from '../../collections.ts';
import type { Chain, SetWords } from './chain.ts';
import { differingFields } from './field-changes.ts';
import type { Clash } from './inverse.ts';
import { findLaterChanges, type LaterChange } from './later-changes.ts';
import type { Dangling } from './references.ts';
import { findRowOrItsLast, nameOfRow } from './row-names.ts';

/** As many reasons as a person reads; the others are counted. */
const NAMED = 3;

/** 409: what was done cannot be taken back, and why. */
export class UndoRefused extends ProblemError {
  constructor(title: string, detail: string) {
    super(409, 'undo-refused', title, { detail });
  }
}

/** Somebody took it back before. */
export function refusedAsDone({ root, depth, tip }: Chain): UndoRefused {
  const verb = depth % 2 === 0 ? 'undone' : 'redone';
  return new UndoRefused(`This was ${verb} already`, `“${root.summary}” was ${verb} by ${tip.by} on ${tip.at}.`);
}

/** Later changes stand on the rows of a set: which, by whom, when, in which entry. */
export async function refusedAsChanged(scope: Scope, { tip }: Chain, clashes: readonly Clash[]): Promise<UndoRefused> {
  const named = clashes.slice(0, NAMED);
  const later = await findLaterChanges(scope, named.map((clash) => clash.rowId), tip.sequence);
  const reasons: string[] = [];
  for (const clash of named) reasons.push(await clashInWords(scope, clash, later));
  const others = clashes.length - named.length;
  if (others > 0) reasons.push(`${others} more ${others === 1 ? 'row was' : 'rows were'} changed later too.`);
  return new UndoRefused('Later changes stand on this', `${reasons.join(' ')} Undo the later changes first.`);
}

async function clashInWords(scope: Scope, clash: Clash, later: readonly LaterChange[]): Promise<string> {
  const name = await nameOfRow(scope, clash.collection, clash.row);
  const what = clash.kind === 'changed' ? `${listed(clash.fields)} changed` : clash.kind === 'deleted' ? 'deleted' : 'there again, written';
  const by = later.find((change) => change.rowId === clash.rowId && explains(change, clash));
  return `${name}: ${what}${by ? ` ${inEntry(by.set)}` : ' since'}.`;
}

function explains({ collection, before, after }: LaterChange, { kind, fields }: Clash): boolean {
  if (kind === 'deleted') return !after;
  if (kind === 'exists') return after !== null;
  return before !== null && after !== null && differingFields(collectionNamed(collection), before, after).some((field) => fields.includes(field));
}

/** Rows would name others that are gone: those that the undo deletes, or that somebody deleted since. */
export async function refusedAsDangling(scope: Scope, { tip }: Chain, dangling: readonly Dangling[], own: ReadonlySet<string>): Promise<UndoRefused> {
  const named = dangling.slice(0, NAMED);
  const later = await findLaterChanges(scope, named.flatMap(({ fromId, toId }) => [fromId, toId]), tip.sequence);
  const reasons: string[] = [];
  for (const each of named) reasons.push(await danglingInWords(scope, each, later, own.has(each.toId)));
  return new UndoRefused('Other rows stand on this', reasons.join(' '));
}

async function danglingInWords(scope: Scope, { from, fromId, to, toId }: Dangling, later: readonly LaterChange[], deletedByUndo: boolean): Promise<string> {
  const [child, parent] = [await findRowOrItsLast(scope, from, fromId), await findRowOrItsLast(scope, to, toId)];
  const childName = child ? await nameOfRow(scope, from, child) : `A ${from.noun}`;
  const parentName = parent ? await nameOfRow(scope, to, parent) : `a ${to.noun} that is gone`;
  const by = later.find((change) => (deletedByUndo ? change.rowId === fromId : change.rowId === toId && !change.after));
  const entry = by ? `, ${inEntry(by.set)}` : '';
  return deletedByUndo
    ? `${childName} belongs to ${inSentence(parentName)} now${entry}. Move or delete it first.`
    : `${childName} would need ${inSentence(parentName)}, which was deleted${entry}. Undo that first.`;
}

const inEntry = ({ by, at, summary }: SetWords): string => `by ${by} on ${at} (“${summary}”)`;
const inSentence = (name: string): string => name.charAt(0).toLowerCase() + name.slice(1);

/** "dose", "dose and cartridge", "dose, cartridge and 4 more" */
function listed(fields: readonly string[]): string {
  const words = fields.map((field) => fieldName(field).toLowerCase());
  if (words.length <= 2) return words.join(' and ');
  return `${words.slice(0, 2).join(', ')} and ${words.length - 2} more`;
}
