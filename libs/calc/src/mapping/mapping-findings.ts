import type { LaneContext } from '../assess-context.ts';
import type { Assignment, Dispenser } from '../design.ts';
import { type DesignIndex, groupIndexOf, groupKey, grouped, moduleTypeOf, tagOf, wiringOf } from '../design-index.ts';
import { type FindingCode, makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';
import { moduleLabel } from '../hardware/load-findings.ts';

/** Whether a dispenser takes its pulses from an output: one on its own clock does not. */
export function wantsControl(dispenser: Dispenser): boolean {
  return dispenser.method === 'pulse';
}

/** Whether a dispenser has a status signal to be read: four-core, and its type gives one. */
export function wantsStatus(index: DesignIndex, dispenser: Dispenser): boolean {
  const type = dispenser.typeId === null ? undefined : index.dispenserTypes.get(dispenser.typeId);
  return wiringOf(index, dispenser) === 'four-core' && type?.status != null;
}

/** What one lane lacks, or has where it should not: signals, circuit, feed. */
export function laneMappingFindings(lane: LaneContext): Finding[] {
  const { index, dispenser, tag, wiring } = lane;
  const findings: Finding[] = [];
  const notice = (code: FindingCode, title: string, remedy: string, detail = ''): void => {
    findings.push(makeFinding(code, 'dispenser', dispenser.id, tag, { title, remedy, detail, dispenserIds: [dispenser.id] }));
  };
  const control = index.control.get(dispenser.id);
  const status = index.status.get(dispenser.id);
  if (!control && wantsControl(dispenser)) {
    notice('MP-01', 'No control output', 'Map it to a free output channel, or run the auto-assignment.',
      wiring === 'two-core' ? 'Its voltages leave out the output’s own drop until then.' : '');
  }
  if (control && !wantsControl(dispenser)) notice('MP-09', 'It runs on its own clock, yet has a control output', 'Free the output channel.');
  if (!status && wantsStatus(index, dispenser)) notice('MP-02', 'No status input', 'Map it to a free input channel.', 'Nobody sees it when the device reports a fault.');
  if (status && !wantsStatus(index, dispenser) && wiring !== null) {
    notice('MP-11', 'It has a status input, yet the device gives no status signal', 'Free the input channel.');
  }
  if (dispenser.circuitId === null || !index.circuits.has(dispenser.circuitId)) {
    notice('MP-12', 'No circuit', 'Choose the circuit that feeds it.', 'Its voltages and loads on the supply are not computed.');
  }
  for (const assignment of [control, status]) if (assignment) controllerCheck(index, dispenser, assignment, notice);
  if (control) feedCheck(lane, control, notice);
  return findings;
}

type Notice = (code: FindingCode, title: string, remedy: string, detail?: string) => void;

function controllerCheck(index: DesignIndex, dispenser: Dispenser, assignment: Assignment, notice: Notice): void {
  const module = index.modules.get(assignment.moduleId);
  if (!module || dispenser.controllerId === null || module.controllerId === dispenser.controllerId) return;
  const own = index.controllers.get(dispenser.controllerId)?.name ?? 'another controller';
  notice('MP-10', `Its ${assignment.purpose} signal is on ${moduleLabel(index, module)}, it belongs to ${own}`, `Map it to a module of ${own}, or change its controller.`);
}

function feedCheck({ index, dispenser, circuit, wiring }: LaneContext, control: Assignment, notice: Notice): void {
  const type = moduleTypeOf(index, control.moduleId);
  const module = index.modules.get(control.moduleId);
  if (!type || !module || type.kind !== 'output' || !circuit) return;
  const feedId = index.groups.get(groupKey(module.id, groupIndexOf(type, control.channel)))?.circuitId ?? null;
  const feed = feedId === null ? undefined : index.circuits.get(feedId);
  if (!feed || feed.id === dispenser.circuitId) return;
  const bond = feed.supplyId === circuit.supplyId ? '' : ' The two circuits have different supplies: their 0 V conductors must be bonded.';
  notice('MP-03', `Its output group is fed by ${feed.name}, the lane belongs to ${circuit.name}`,
    `Feed the group from ${circuit.name}, or map the lane to a group fed by it.`,
    (wiring === 'two-core' ? `Its motor current flows from ${feed.name}, so the loads of both circuits are not as computed.` : 'The pulse comes from another feeder than the device.') + bond);
}

/** Modules: channels that do not exist, the wrong kind, used twice; groups in use that nobody feeds. */
export function moduleMappingFindings(index: DesignIndex): Finding[] {
  const findings: Finding[] = [];
  for (const module of index.design.modules) {
    const type = index.moduleTypes.get(module.typeId);
    const assignments = index.assignmentsByModule.get(module.id) ?? [];
    if (!type) continue;
    const label = moduleLabel(index, module);
    for (const a of assignments) {
      const tag = tagOf(index, a.dispenserId);
      const about = { mark: a.id, dispenserIds: [a.dispenserId] };
      if (a.channel < 0 || a.channel >= type.channels) {
        findings.push(makeFinding('MP-05', 'module', module.id, label, {
          ...about,
          title: `${tag} is on channel ${a.channel}, the module has channels 0 to ${type.channels - 1}`,
          remedy: 'Map it to a channel of the module.',
          compared: [{ name: 'channel', value: a.channel, limit: type.channels - 1, unit: '' }],
        }));
      }
      if ((a.purpose === 'control') !== (type.kind === 'output')) {
        findings.push(makeFinding('MP-06', 'module', module.id, label, {
          ...about,
          title: `The ${a.purpose} signal of ${tag} is on an ${type.kind} module`,
          remedy: `Map it to an ${a.purpose === 'control' ? 'output' : 'input'} module.`,
        }));
      }
    }
    for (const [channel, users] of grouped(assignments, (a) => String(a.channel))) {
      if (users.length < 2) continue;
      findings.push(makeFinding('MP-07', 'channel', `${module.id}/${channel}`, `${label}, channel ${channel}`, {
        title: `${users.map((u) => tagOf(index, u.dispenserId)).join(' and ')} are on one channel`,
        remedy: 'Map all but one to free channels.',
        dispenserIds: users.map((u) => u.dispenserId),
      }));
    }
    if (type.kind === 'output') findings.push(...unfedGroups(index, module.id, label, assignments));
  }
  return [...findings, ...doubleSignals(index)];
}

function unfedGroups(index: DesignIndex, moduleId: string, label: string, assignments: readonly Assignment[]): Finding[] {
  const type = moduleTypeOf(index, moduleId)!;
  const findings: Finding[] = [];
  for (const [group, users] of grouped(assignments, (a) => String(groupIndexOf(type, a.channel)))) {
    const key = groupKey(moduleId, Number(group));
    const circuitId = index.groups.get(key)?.circuitId ?? null;
    if (circuitId !== null && index.circuits.has(circuitId)) continue;
    findings.push(makeFinding('MP-04', 'group', key, `${label}, group from channel ${Number(group) * type.channelsPerGroup}`, {
      title: 'No circuit feeds the group',
      detail: `${users.length} ${users.length === 1 ? 'channel is' : 'channels are'} in use.`,
      remedy: 'Choose the circuit that feeds the group.',
      dispenserIds: users.map((u) => u.dispenserId),
    }));
  }
  return findings;
}

function doubleSignals(index: DesignIndex): Finding[] {
  const findings: Finding[] = [];
  for (const rows of grouped(index.design.assignments, (a) => `${a.purpose}/${a.dispenserId}`).values()) {
    if (rows.length < 2) continue;
    const { dispenserId, purpose } = rows[0];
    findings.push(makeFinding('MP-08', 'dispenser', dispenserId, tagOf(index, dispenserId), {
      title: `Its ${purpose} signal is on ${rows.length} channels`,
      remedy: 'Free all but one.',
      mark: purpose,
      dispenserIds: [dispenserId],
    }));
  }
  return findings;
}
