import { groupKey, type Purpose } from '#calc';
import { type Board, channelKey, type RackModule, tagOf } from '../board';
import { groupsOf } from '../mapping-rows';
import { addressOf, channelsOf, moduleLabel, type Place, purposeOf } from './drop-rules';

export interface PlaceOption {
  readonly key: string;
  readonly label: string;
}

/** Modules and groups to choose from, by cabinet, each with what is free. `purpose` null: of both kinds. */
export function placeOptions(board: Board, purpose: Purpose | null): readonly { readonly label: string; readonly options: readonly PlaceOption[] }[] {
  return board.cabinets.map(({ cabinet, modules }) => ({
    label: cabinet.location,
    options: modules.filter(({ type }) => purpose === null || purposeOf(type) === purpose).flatMap((rack) => optionsOf(board, rack)),
  })).filter(({ options }) => options.length > 0);
}

/** The channels of a module or group to choose from: in order from the first free, or one of them. */
export function channelOptions(board: Board, key: string): readonly PlaceOption[] {
  const [moduleId, group] = key.split('/');
  const rack = board.moduleOf.get(moduleId);
  if (!rack) return [];
  const from = group === undefined ? 0 : Number(group) * rack.type.channelsPerGroup;
  const places = group === undefined ? channelsOf(rack) : channelsOf(rack).slice(from, from + rack.type.channelsPerGroup);
  return [
    { key, label: 'In order, from the first that is free' },
    ...places.map((place) => ({ key: channelKey(place.moduleId, place.channel), label: `${addressOf(board, place)}, ${occupantWords(board, place)}` })),
  ];
}

function optionsOf(board: Board, rack: RackModule): readonly PlaceOption[] {
  const free = (places: readonly Place[]): string => `${places.filter((p) => !board.taken.has(channelKey(p.moduleId, p.channel))).length} of ${places.length} free`;
  const all = channelsOf(rack);
  const size = rack.type.channelsPerGroup;
  const groups = groupsOf(rack.type);
  return [
    { key: rack.module.id, label: `${moduleLabel(rack)}, ${rack.type.kind}s, ${free(all)}` },
    ...(groups.length < 2 ? [] : groups.map((index) => ({
      key: groupKey(rack.module.id, index), label: `${moduleLabel(rack)} group ${index + 1}, ${free(all.slice(index * size, (index + 1) * size))}`,
    }))),
  ];
}

function occupantWords(board: Board, place: Place): string {
  const taken = board.taken.get(channelKey(place.moduleId, place.channel));
  return taken ? tagOf(board, taken.dispenserId) : 'free';
}
