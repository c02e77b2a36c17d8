import { groupKey, type Purpose } from '#calc';
import { channelKey } from '../board';
import type { GroupSection } from '../mapping-rows';

/** Where something can be put: a channel, a group or module to fill in order, or the list of what is not mapped. */
export type DropTarget =
  | { readonly kind: 'channel'; readonly moduleId: string; readonly channel: number }
  | { readonly kind: 'group'; readonly moduleId: string; readonly groupIndex: number }
  | { readonly kind: 'module'; readonly moduleId: string }
  | { readonly kind: 'unmapped' };

/** What is carried: from the list (`purpose` null: the channel decides which signal), or from channels of one kind. */
export interface Cargo {
  readonly dispenserIds: readonly string[];
  readonly purpose: Purpose | null;
}

export const UNMAPPED: DropTarget = { kind: 'unmapped' };

/** The key that the target's element carries in `data-drop`. */
export function targetKey(target: DropTarget): string {
  if (target.kind === 'unmapped') return 'unmapped';
  if (target.kind === 'module') return target.moduleId;
  return target.kind === 'channel' ? channelKey(target.moduleId, target.channel) : groupKey(target.moduleId, target.groupIndex);
}

/** The target that an element's key names. */
export function targetOf(key: string): DropTarget {
  if (key === 'unmapped') return UNMAPPED;
  const channel = /^(.*):(\d+)$/.exec(key);
  if (channel) return { kind: 'channel', moduleId: channel[1], channel: Number(channel[2]) };
  const group = /^(.*)\/(\d+)$/.exec(key);
  return group ? { kind: 'group', moduleId: group[1], groupIndex: Number(group[2]) } : { kind: 'module', moduleId: key };
}

/** Where the arrow keys stop while something is carried: each group's head, then its channels. */
export const stopsOf = (sections: readonly GroupSection[]): readonly string[] =>
  sections.flatMap((section) => [section.key, ...section.channels.map((row) => row.key)]);

/** The stop so many steps on, at the ends the last one there is. */
export function stepped(stops: readonly string[], from: string | null, by: number): string | null {
  const at = from === null ? -1 : stops.indexOf(from);
  return stops[Math.min(stops.length - 1, Math.max(0, at + by))] ?? null;
}

/** The head of the next group (or of the one before). */
export function nextGroup(sections: readonly GroupSection[], from: string | null, by: 1 | -1): string | null {
  const at = sections.findIndex((section) => section.key === from || section.channels.some((row) => row.key === from));
  const within = by < 0 && sections[at]?.key !== from;
  return sections[within ? at : Math.min(sections.length - 1, Math.max(0, at + by))]?.key ?? null;
}
