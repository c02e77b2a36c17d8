import type { Assessment } from '#calc';
import type { Board } from '../board';
import { channelKey } from '../board';
import { type DropPlan, planDrop } from './drop-plan';
import { candidatesOf, willingFor } from './drop-rules';
import type { DropTarget } from './drop-target';

/** In which order dispensers fill a group. */
export type FillOrder = 'tag' | 'machine' | 'location' | 'run-length';

export const FILL_ORDERS: readonly { readonly value: FillOrder; readonly label: string }[] = [
  { value: 'tag', label: 'Tag' },
  { value: 'machine', label: 'Machine, then tag' },
  { value: 'location', label: 'Location, then tag' },
  { value: 'run-length', label: 'Cable run, shortest first' },
];

/** Tags as people count: L2 before L10. */
const byValue = new Intl.Collator('en', { numeric: true });

/** The same dispensers in the order chosen; what is not known comes last. */
export function inOrder(board: Board, assessment: Assessment, dispenserIds: readonly string[], order: FillOrder): readonly string[] {
  const keyed = dispenserIds.map((id) => {
    const occupant = board.occupants.get(id);
    const tag = occupant?.point.tag ?? '';
    return { id, tag, word: order === 'machine' ? occupant?.point.machine : order === 'location' ? locationOf(board, id) : null, metres: assessment.lanes.get(id)?.runLengthM ?? Infinity };
  });
  keyed.sort((a, b) => (order === 'run-length' ? a.metres - b.metres || 0 : wordOrder(a.word, b.word)) || byValue.compare(a.tag, b.tag));
  return keyed.map((row) => row.id);
}

export interface Fill {
  readonly plan: DropPlan;
  /** Those that find no channel there, or may not go there. */
  readonly staying: readonly string[];
}

/** Fills a group or module with as many of these, in order, as it takes; the others stay. */
export function planFill(board: Board, dispenserIds: readonly string[], target: Exclude<DropTarget, { kind: 'unmapped' }>, withStatus: boolean): Fill {
  const allowed = dispenserIds.filter((id) => willingFor(board, { dispenserIds: [id], purpose: null }, target.moduleId).kind === 'willing');
  const free = candidatesOf(board, target).filter((p) => !board.taken.has(channelKey(p.moduleId, p.channel))).length;
  const placed = allowed.slice(0, free);
  const staying = dispenserIds.filter((id) => !placed.includes(id));
  if (allowed.length > 0 && free === 0) return { plan: { kind: 'refused', reason: 'No free channel.' }, staying };
  return { plan: planDrop(board, { dispenserIds: placed.length > 0 ? placed : dispenserIds, purpose: null }, target, withStatus), staying };
}

/** Where it stands: its own location, else the box or cabinet where its cable begins. */
function locationOf(board: Board, id: string): string | null {
  const occupant = board.occupants.get(id);
  return occupant?.point.location ?? board.boxes.get(occupant?.dispenser.nodeId ?? '')?.location ?? null;
}

function wordOrder(a: string | null | undefined, b: string | null | undefined): number {
  if (!a || !b) return a === b ? 0 : a ? -1 : b ? 1 : 0;
  return byValue.compare(a, b);
}
