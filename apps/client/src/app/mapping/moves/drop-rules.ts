import { directAddress, type Dispenser, groupIndexOf, groupKey, type ModuleType, type Purpose, wiringBy } from '#calc';
import { type Board, channelKey, dispenserTypesOf, heldKey, missingPurposes, type RackModule, tagOf } from '../board';
import { type Cargo, type DropTarget, targetOf } from './drop-target';

export interface Refused {
  readonly kind: 'refused';
  /** What is in the way, in words. */
  readonly reason: string;
}

export const refusal = (reason: string): Refused => ({ kind: 'refused', reason });

export interface Place {
  readonly moduleId: string;
  readonly channel: number;
}

interface Willing {
  readonly kind: 'willing';
  readonly purpose: Purpose;
  readonly dispenserIds: readonly string[];
  readonly leftOut: readonly string[];
}

interface Places {
  readonly kind: 'places';
  readonly dispenserIds: readonly string[];
  readonly places: readonly Place[];
}

export const purposeOf = (type: ModuleType): Purpose => (type.kind === 'output' ? 'control' : 'status');

/** Those of the carried that a module of this kind and controller may take; refused where the kind or the controller is wrong. */
export function willingFor(board: Board, cargo: Cargo, moduleId: string): Willing | Refused {
  const rack = board.moduleOf.get(moduleId);
  if (!rack) return refusal('The module is not there any more.');
  const purpose = purposeOf(rack.type);
  if (cargo.purpose !== null && cargo.purpose !== purpose) return refusal(wrongKind(cargo.purpose, rack));
  const types = dispenserTypesOf(board.design);
  const lacks = (id: string): boolean => {
    const dispenser = board.occupants.get(id)?.dispenser;
    return dispenser !== undefined && missingPurposes(board, dispenser, types).includes(purpose);
  };
  const dispenserIds = cargo.purpose === null ? cargo.dispenserIds.filter(lacks) : cargo.dispenserIds;
  const leftOut = cargo.dispenserIds.filter((id) => !dispenserIds.includes(id)).map((id) => whyNot(board, id, purpose));
  if (dispenserIds.length === 0) return refusal(leftOut.length === 1 ? leftOut[0] : `None of these ${leftOut.length} lacks ${purpose === 'control' ? 'an output' : 'a status input'}.`);
  return foreign(board, dispenserIds, rack) ?? { kind: 'willing', purpose, dispenserIds, leftOut };
}

/** The channels that so many would get: free ones in order, those that the carried leave counting as free. */
export function placesFor(board: Board, target: Exclude<DropTarget, { kind: 'unmapped' }>, { dispenserIds, purpose }: { readonly dispenserIds: readonly string[]; readonly purpose: Purpose }): Places | Refused {
  const carried = new Set(dispenserIds);
  const isFree = ({ moduleId, channel }: Place): boolean => {
    const there = board.taken.get(channelKey(moduleId, channel));
    return !there || (there.purpose === purpose && carried.has(there.dispenserId));
  };
  const candidates = candidatesOf(board, target);
  if (target.kind === 'channel' && candidates[0] && !isFree(candidates[0])) return refusal(takenBy(board, candidates[0]));
  const free = candidates.filter(isFree);
  if (free.length < dispenserIds.length) return refusal(free.length === 0 ? 'No free channel.' : `Not enough free channels: ${free.length} of ${dispenserIds.length}.`);
  return { kind: 'places', dispenserIds, places: free.slice(0, dispenserIds.length) };
}

/** Status inputs for those that lack one, in the same order, on the inputs of the same controller. */
export function statusPlaces(board: Board, dispenserIds: readonly string[], moduleId: string): Places | Refused {
  const types = dispenserTypesOf(board.design);
  const wanting = dispenserIds.filter((id) => {
    const dispenser = board.occupants.get(id)?.dispenser;
    return dispenser !== undefined && missingPurposes(board, dispenser, types).includes('status');
  });
  const controllerId = board.moduleOf.get(moduleId)?.controller.id;
  const free = board.modules.filter((m) => m.controller.id === controllerId && m.type.kind === 'input').flatMap((m) => channelsOf(m))
    .filter((p) => !board.taken.has(channelKey(p.moduleId, p.channel)));
  if (free.length < wanting.length) return refusal(`Not enough free status inputs: ${free.length} of ${wanting.length}. Leave them out, or add an input module.`);
  return { kind: 'places', dispenserIds: wanting, places: free.slice(0, wanting.length) };
}

/** From a channel on: the rest of its module, then the modules after it of the same kind and controller. */
export function candidatesOf(board: Board, target: Exclude<DropTarget, { kind: 'unmapped' }>): readonly Place[] {
  const rack = board.moduleOf.get(target.moduleId);
  if (!rack) return [];
  const own = channelsOf(rack);
  if (target.kind === 'module') return own;
  if (target.kind === 'group') {
    const from = target.groupIndex * rack.type.channelsPerGroup;
    return own.slice(from, from + rack.type.channelsPerGroup);
  }
  const after = board.modules.slice(board.modules.indexOf(rack) + 1)
    .filter((m) => m.controller.id === rack.controller.id && m.type.kind === rack.type.kind);
  return [...own.slice(target.channel), ...after.flatMap(channelsOf)];
}

export const channelsOf = ({ module, type }: RackModule): readonly Place[] =>
  Array.from({ length: type.channels }, (_, channel) => ({ moduleId: module.id, channel }));

export const moduleLabel = ({ controller, module }: RackModule): string => `${controller.name} ${module.name}`;

/** The key of the group in which a target lies; a module's own key where it has one group. */
export function groupOf(board: Board, key: string): string | null {
  const target = targetOf(key);
  if (target.kind !== 'channel') return key;
  const type = board.moduleOf.get(target.moduleId)?.type;
  if (!type) return null;
  return type.channelsPerGroup >= type.channels ? target.moduleId : groupKey(target.moduleId, groupIndexOf(type, target.channel));
}

export function addressOf(board: Board, { moduleId, channel }: Place): string {
  const rack = board.moduleOf.get(moduleId);
  return rack ? directAddress(rack.type.kind, rack.module.baseByte, channel) : '';
}

const takenBy = (board: Board, place: Place): string =>
  `Channel taken: ${addressOf(board, place)} holds ${tagOf(board, board.taken.get(channelKey(place.moduleId, place.channel))?.dispenserId ?? '')}.`;

function wrongKind(purpose: Purpose, rack: RackModule): string {
  return purpose === 'control' ? `A control pulse needs an output; ${moduleLabel(rack)} is an input module.` : `A status signal needs an input; ${moduleLabel(rack)} is an output module.`;
}

function foreign(board: Board, ids: readonly string[], rack: RackModule): Refused | null {
  const others = ids.map((id) => board.occupants.get(id)?.dispenser).filter((d): d is Dispenser => d?.controllerId != null && d.controllerId !== rack.controller.id);
  if (others.length === 0) return null;
  const own = board.controllers.get(others[0].controllerId ?? '') ?? 'another controller';
  const who = ids.length === 1 ? tagOf(board, others[0].id) : `${others.length} of ${ids.length}`;
  return refusal(`${who} ${others.length === 1 ? 'belongs' : 'belong'} to ${own}; this is a module of ${rack.controller.name}.`);
}

function whyNot(board: Board, id: string, purpose: Purpose): string {
  const tag = tagOf(board, id);
  const held = board.held.get(heldKey(purpose, id));
  if (held) return `${tag} has its ${purpose === 'control' ? 'output' : 'status input'} already, on ${addressOf(board, held)}.`;
  const dispenser = board.occupants.get(id)?.dispenser;
  if (purpose === 'control') return `${tag} runs on its own clock and takes no output.`;
  const type = board.design.dispenserTypes.find((t) => t.id === dispenser?.typeId) ?? null;
  return wiringBy(dispenser ?? null, type) === null ? `The wiring of ${tag} is not chosen yet.` : `${tag} is two-core and gives no status signal.`;
}
