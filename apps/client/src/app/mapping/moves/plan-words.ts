import { ampsAgainstMaximum, formatAmps, voltsAgainstMinimum } from '#calc';
import { type Board, channelKey, tagOf } from '../board';
import type { Doable, DropPlan } from './drop-plan';
import { addressOf, moduleLabel } from './drop-rules';
import type { Cargo, DropTarget } from './drop-target';
import { isOver, type LoadChange, type LoadsAfter } from './load-after';

/** Who is carried: one tag, or the first and how many more. */
export function cargoWords(board: Board, { dispenserIds }: Cargo): string {
  const first = tagOf(board, dispenserIds[0] ?? '');
  return dispenserIds.length > 1 ? `${first} and ${dispenserIds.length - 1} more` : first;
}

/** A target as people name it: "PLC1 DO1 channel 4, %QX4.4". */
export function targetWords(board: Board, target: DropTarget): string {
  if (target.kind === 'unmapped') return 'the list of those not mapped';
  const rack = board.moduleOf.get(target.moduleId);
  if (!rack) return '';
  const label = moduleLabel(rack);
  if (target.kind === 'channel') return `${label} channel ${target.channel}, ${addressOf(board, target)}`;
  return target.kind === 'group' ? `${label} group ${target.groupIndex + 1}` : `module ${label}`;
}

/** What would happen, short enough to follow the pointer. */
export function planWords(board: Board, plan: DropPlan, target: DropTarget): string {
  if (plan.kind === 'refused') return plan.reason;
  const parts = [act(board, plan, target), statusPart(plan), ...plan.leftOut.slice(0, 2)];
  if (plan.leftOut.length > 2) parts.push(`${plan.leftOut.length - 2} more stay.`);
  return parts.filter(Boolean).join(' ');
}

/** The load of a place after the plan: "Group load 1.2 A of 2 A." */
export function loadWords(name: string, change: LoadChange): string {
  const rating = change.ratingA === null ? '' : ` of ${formatAmps(change.ratingA)}`;
  return `${name} ${ampsAgainstMaximum(change.afterA)}${rating}${isOver(change) ? ', over its rating' : ''}.`;
}

/** Group loads, then voltage, in words; a circuit is named where the plan moves or overloads it. */
export function loadsWords({ groups, circuits, tooLow }: LoadsAfter): readonly string[] {
  const told = circuits.filter((c) => isOver(c) || Math.abs(c.afterA - c.beforeA) > 1e-9);
  return [
    ...groups.map((g) => loadWords(groups.length === 1 ? 'Group load' : `${g.label} load`, g)),
    ...told.map((c) => loadWords(`Circuit ${c.label} load`, c)),
    ...(tooLow ? [`${tooLow.tag} would have ${voltsAgainstMinimum(tooLow.volts)} at worst, under its ${voltsAgainstMinimum(tooLow.minV)}.`] : []),
  ];
}

/** What is said at each stop while something is carried by the keyboard. */
export function stopWords(board: Board, cargo: Cargo, target: DropTarget, plan: DropPlan, loads: LoadsAfter | null): string {
  const over = `${cargoWords(board, cargo)} over ${targetWords(board, target)}`;
  if (plan.kind === 'refused') return `${over}. Not possible: ${plan.reason}`;
  const state = plan.kind === 'swap' || plan.kind === 'unmap' || target.kind !== 'channel' ? '' : ', free';
  const does = plan.kind === 'swap' ? `Enter swaps with ${tagOf(board, plan.swapped?.[1] ?? '')}.` : target.kind === 'channel' && cargo.dispenserIds.length === 1 ? 'Enter places it.' : `${planWords(board, plan, target)} Enter places them.`;
  return [`${over}${state}.`, does, ...(loads ? loadsWords(loads) : [])].join(' ');
}

/** What is said, and written, once it is done. */
export function doneWords(board: Board, plan: Doable, target: DropTarget, loads: LoadsAfter | null): string {
  return [done(board, plan, target), ...(loads ? loadsWords(loads) : [])].join(' ');
}

function act(board: Board, plan: Doable, target: DropTarget): string {
  const count = new Set(plan.placements.map((p) => p.dispenserId)).size;
  if (plan.kind === 'swap') return `Swaps with ${tagOf(board, plan.swapped?.[1] ?? '')}.`;
  if (plan.kind === 'unmap') return plan.freed.length === 1 ? `Frees ${addressOf(board, plan.freed[0])}.` : `Frees ${plan.freed.length} channels.`;
  const first = plan.placements[0];
  if (count === 1 && first) return `On ${addressOf(board, first)}${target.kind === 'channel' ? ', free' : ', the first that is free'}.`;
  const own = plan.placements.filter((p) => p.purpose === first?.purpose);
  return `Fills ${own.length} channels, ${addressOf(board, own[0])} to ${addressOf(board, own[own.length - 1])}.`;
}

function statusPart({ kind, placements }: Doable): string {
  const outputs = placements.filter((p) => p.purpose === 'control').length;
  const inputs = placements.length - outputs;
  if (outputs === 0 || inputs === 0) return '';
  return kind === 'swap' ? 'Status inputs too.' : `${inputs} status ${inputs === 1 ? 'input' : 'inputs'} too.`;
}

function done(board: Board, plan: Doable, target: DropTarget): string {
  if (plan.kind === 'swap') return `${tagOf(board, plan.swapped?.[0] ?? '')} and ${tagOf(board, plan.swapped?.[1] ?? '')} swapped.`;
  const ids = [...new Set([...plan.placements, ...plan.freed].map((p) => p.dispenserId))];
  const who = ids.length === 1 ? tagOf(board, ids[0]) : `${ids.length} dispensers`;
  if (plan.kind === 'unmap') return `${who} unmapped.`;
  const at = ids.length === 1 ? addressOf(board, plan.placements[0]) : targetWords(board, target);
  return `${who} ${plan.kind === 'move' ? 'moved to' : 'placed'} ${plan.kind === 'move' ? '' : ids.length === 1 || target.kind !== 'channel' ? 'on ' : 'from '}${at}${ids.length > 1 && target.kind === 'channel' ? ' on' : ''}.`;
}

/** The ghosts that the table shows: who would be on which channel. */
export const ghostsOf = (board: Board, plan: DropPlan | null): ReadonlyMap<string, string> =>
  new Map(plan === null || plan.kind === 'refused' ? [] : plan.placements.map((p) => [channelKey(p.moduleId, p.channel), tagOf(board, p.dispenserId)]));
