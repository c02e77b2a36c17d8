import { groupIndexOf, groupKey } from '#calc';
import { type Board, channelKey, heldKey } from '../board';
import type { Shown } from '../mapping-rows';
import { channelsOf, purposeOf, willingFor } from './drop-rules';
import type { Cargo } from './drop-target';

/** Where the keyboard begins: on its own channel what is mapped; else the first free channel, best in a group of its own circuit. */
export function firstTarget(board: Board, cargo: Cargo, shown: Shown): { readonly key: string; readonly moduleId: string } | null {
  const [first] = cargo.dispenserIds;
  const own = cargo.purpose && board.held.get(heldKey(cargo.purpose, first));
  if (own) return { key: channelKey(own.moduleId, own.channel), moduleId: own.moduleId };
  const kinds = shown === 'input' ? ['input', 'output'] : ['output', 'input'];
  for (const kind of kinds) {
    const found = freeChannel(board, cargo, kind);
    if (found) return found;
  }
  return null;
}

function freeChannel(board: Board, cargo: Cargo, kind: string): { readonly key: string; readonly moduleId: string } | null {
  const circuitId = board.occupants.get(cargo.dispenserIds[0])?.dispenser.circuitId ?? null;
  let any: { readonly key: string; readonly moduleId: string } | null = null;
  for (const rack of board.modules) {
    if (rack.type.kind !== kind || willingFor(board, cargo, rack.module.id).kind === 'refused') continue;
    for (const { moduleId, channel } of channelsOf(rack)) {
      const key = channelKey(moduleId, channel);
      if (board.taken.has(key)) continue;
      any ??= { key, moduleId };
      const feed = board.feeds.get(groupKey(moduleId, groupIndexOf(rack.type, channel)));
      if (purposeOf(rack.type) === 'status' || feed === circuitId) return { key, moduleId };
    }
  }
  return any;
}
