import { GUARD_MARK } from './apostrophe-guard.ts';
import { fieldsNamed, groupNamed, isCommon, type FieldGroup } from './field-groups.ts';
import { FIELDS, fieldOf, type Field, type FieldKey, type SignalKey } from './fields.ts';
import type { Headings } from './heading-block.ts';
import { headingParts, normalHeading, type HeadingParts } from './heading-text.ts';

/** Column index → field. */
export type Found = Map<number, FieldKey>;

interface Candidate {
  readonly index: number;
  readonly key: FieldKey;
  readonly score: number;
}

const SIGNAL_PARTS: readonly FieldKey[] = ['module', 'channel', 'address'] satisfies SignalKey[];
const BY_SYMBOL = FIELDS.filter(({ symbol }) => symbol !== null);

/**
 * Gives each column the field that its heading names best; each column and each field once. Module,
 * channel and address of a row's own signal are meant only where a column says which signal a row is.
 *
 * @param found columns that are settled already; it is added to
 * @param passed columns that are not to be looked at
 */
export function matchByName(headings: Headings, found: Found, passed: ReadonlySet<number> = new Set()): void {
  const candidates = candidatesOf(headings, passed);
  const used = new Set(found.values());
  const signals = used.has('signalType') || candidates.some(({ key, index }) => key === 'signalType' && !found.has(index));
  candidates.sort((a, b) => b.score - a.score || a.index - b.index);
  for (const { index, key } of preferring(candidates, signals)) {
    if (found.has(index) || used.has(key)) continue;
    found.set(index, key);
    used.add(key);
  }
}

/** With signals a bare "Module" is the signal's own, without them the output's. */
function preferring(candidates: readonly Candidate[], signals: boolean): readonly Candidate[] {
  if (!signals) return candidates.filter(({ key }) => !SIGNAL_PARTS.includes(key));
  const own = candidates.filter(({ key }) => SIGNAL_PARTS.includes(key));
  const atLeast = (index: number, score: number): boolean => own.some((each) => each.index === index && each.score > score - 1);
  return candidates.filter(({ key, index, score }) => !key.startsWith('output') || !atLeast(index, score));
}

function candidatesOf({ groups, leaves }: Headings, passed: ReadonlySet<number>): Candidate[] {
  return leaves.flatMap((leaf, index) => {
    if (passed.has(index) || leaf.startsWith(GUARD_MARK)) return [];
    const group = groups[index] ?? '';
    return [...scoresOf(leaf, group)].map(([key, score]) => ({ index, key, score }));
  });
}

/** The fields that a heading may name, with how well; a group heading over it counts with it. */
function scoresOf(leaf: string, group: string): Map<FieldKey, number> {
  const alone = headingParts(leaf);
  if (group === '') return scored(alone);
  const scores = scored(headingParts(`${group} ${leaf}`));
  const known = groupNamed(normalHeading(group));
  for (const [key, score] of underGroup(alone, known)) {
    if (!scores.has(key)) scores.set(key, score);
  }
  return scores;
}

/** What the lower heading says by itself, in the light of the group over it. */
function underGroup(alone: HeadingParts, group: FieldGroup | undefined): Map<FieldKey, number> {
  const scores = new Map<FieldKey, number>();
  const word = group?.words[alone.name];
  if (word && unitScore(alone, fieldOf(word)) !== null) scores.set(word, 95);
  for (const [key, score] of scored(alone)) {
    const meant = group?.meant[key];
    if (meant) scores.set(meant, Math.max(score - 5, scores.get(meant) ?? 0));
    else if (!group || group.fields.includes(key)) scores.set(key, score - 10);
    else if (!isCommon(key)) scores.set(key, score - 30);
  }
  return scores;
}

/**
 * A unit that is not the field's own rules it out, since its numbers would be misread; earlier synonyms
 * are the more telling ones.
 */
function scored(parts: HeadingParts): Map<FieldKey, number> {
  const scores = new Map<FieldKey, number>();
  for (const [key, place] of fieldsNamed(parts.name)) {
    const unit = unitScore(parts, fieldOf(key));
    if (unit !== null) scores.set(key, 100 + unit + symbolScore(parts, fieldOf(key)) - place / 100);
  }
  if (parts.name !== '') return scores;
  for (const field of BY_SYMBOL) {
    const unit = field.symbol === parts.symbol ? unitScore(parts, field) : null;
    if (unit !== null) scores.set(field.key, 105 + unit);
  }
  return scores;
}

function unitScore({ unit }: HeadingParts, field: Field): number | null {
  if (unit === null) return field.unitNeeded ? null : field.unit === null ? 15 : 0;
  return field.units.includes(unit) ? 20 : null;
}

function symbolScore({ symbol }: HeadingParts, field: Field): number {
  return field.symbol !== null && symbol === field.symbol ? 5 : 0;
}
