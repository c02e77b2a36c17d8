import type { Controller, Module, Purpose } from '#calc';
import { INPUTS_16, OUTPUTS_16 } from '../brackwater-catalogue.ts';
import type { BuiltCircuit } from './circuit.ts';
import type { LaneDraft, Site } from './site.ts';

const CHANNELS = 16;
const CHANNELS_A_GROUP = 8;
const GROUPS_A_MODULE = CHANNELS / CHANNELS_A_GROUP;
/** Part of the channels that may be used: the rest are spare. */
const USED_PART = 0.8;

/** A group of 8 outputs with the circuit that feeds it and the lanes on it, from channel 0. */
interface Group {
  readonly circuitId: string;
  readonly lanes: readonly LaneDraft[];
}

/** Adds output modules, feeds their groups and maps the lanes that are to be mapped; each group keeps a spare channel. */
export function placeOutputs(site: Site, controller: Controller, circuits: readonly BuiltCircuit[]): void {
  const groups = circuits.flatMap(groupsOf);
  const modules = addModules(site, controller, 'DO', OUTPUTS_16, Math.ceil(groups.length / GROUPS_A_MODULE));
  modules.forEach((module, m) => {
    for (let groupIndex = 0; groupIndex < GROUPS_A_MODULE; groupIndex++) {
      const group = groups[m * GROUPS_A_MODULE + groupIndex] ?? groups[groups.length - 1];
      site.moduleGroups.push({ id: site.id(), moduleId: module.id, groupIndex, circuitId: group.circuitId });
    }
  });
  groups.forEach((group, g) => {
    const first = (g % GROUPS_A_MODULE) * CHANNELS_A_GROUP;
    group.lanes.forEach((lane, i) => {
      if (lane.dispenser.method === 'pulse' && lane.mapped) placeOutput(site, groups, modules, lane, { g, channel: first + i });
    });
  });
}

function groupsOf({ circuit, lanes }: BuiltCircuit): Group[] {
  const count = Math.ceil(lanes.length / (CHANNELS_A_GROUP * USED_PART));
  const each = Math.ceil(lanes.length / count);
  return Array.from({ length: count }, (_, i) => ({ circuitId: circuit.id, lanes: lanes.slice(i * each, (i + 1) * each) }));
}

/** On its channel; a lane gone astray on the last, spare channel of a group that another circuit feeds, if there is one. */
function placeOutput(site: Site, groups: readonly Group[], modules: readonly Module[], lane: LaneDraft, own: { readonly g: number; readonly channel: number }): void {
  const stray = lane.astray ? groups.findIndex(({ circuitId }) => circuitId !== lane.dispenser.circuitId) : -1;
  if (stray < 0) {
    assign(site, lane, modules[Math.floor(own.g / GROUPS_A_MODULE)], own.channel, 'control');
    return;
  }
  const channel = (stray % GROUPS_A_MODULE) * CHANNELS_A_GROUP + CHANNELS_A_GROUP - 1;
  assign(site, lane, modules[Math.floor(stray / GROUPS_A_MODULE)], channel, 'control');
  site.planned.push({ code: 'MP-03', id: lane.dispenser.id });
}

/** Adds input modules and maps the status signals of a cabinet's four-core lanes. */
export function placeStatuses(site: Site, controller: Controller, lanes: readonly LaneDraft[]): void {
  const withStatus = lanes.filter(({ dispenser }) => dispenser.wiring === 'four-core');
  const modules = addModules(site, controller, 'DI', INPUTS_16, Math.ceil(withStatus.length / (CHANNELS * USED_PART)));
  withStatus.forEach((lane, i) => {
    if (lane.mapped && lane.dispenser.typeId !== null) assign(site, lane, modules[Math.floor(i / CHANNELS)], i % CHANNELS, 'status');
  });
}

function addModules({ id, catalogueId, modules }: Site, controller: Controller, prefix: 'DO' | 'DI', type: string, count: number): Module[] {
  const before = modules.filter(({ controllerId }) => controllerId === controller.id).length;
  const added = Array.from({ length: count }, (_, i): Module => ({
    id: id(), controllerId: controller.id, typeId: catalogueId(type), name: `${prefix}${i + 1}`, baseByte: 2 * i, slot: before + i + 1,
  }));
  modules.push(...added);
  return added;
}

function assign(site: Site, { dispenser }: LaneDraft, module: Module, channel: number, purpose: Purpose): void {
  site.assignments.push({ id: site.id(), dispenserId: dispenser.id, moduleId: module.id, channel, purpose });
}
