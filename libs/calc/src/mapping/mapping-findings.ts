import type { LaneContext } from '../assess-context.ts';
import type { Assignment, Dispenser, ModuleType } from '../design.ts';
import { type DesignIndex, groupIndexOf, groupKey, grouped, tagOf, wiringBy } from '../design-index.ts';
import { type FindingCode, makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';
import { placeLabel } from '../hardware/load-findings.ts';
import { channelsUsed, type ModuleRows } from '../hardware/loads.ts';
import { feedOf, type Lane, laneTag, laneWiring, type ModulePlace } from '../lane-rows.ts';

/** Whether a dispenser takes its pulses from an output: one on its own clock does not. */
export function wantsControl(dispenser: Dispenser): boolean {
  return dispenser.method === 'pulse';
}

/** Whether a dispenser has a status signal to be read: four-core, and its type gives one. */
export function wantsStatus(index: DesignIndex, dispenser: Dispenser): boolean {
  const type = dispenser.typeId === null ? undefined : index.dispenserTypes.get(dispenser.typeId);
  return wiringBy(dispenser, type ?? null) === 'four-core' && type?.status != null;
}

/** What one lane lacks, or has where it should not: signals, circuit, feed. */
export function laneMappingFindings(lane: LaneContext, findings: Finding[]): void {
  const { rows } = lane;
  const { dispenser, control, status, type } = rows;
  const wiring = laneWiring(rows);
  const givesStatus = wiring === 'four-core' && type?.status != null;
  if (!control && wantsControl(dispenser)) {
    findings.push(laneFinding(rows, 'MP-01', 'No control output', 'Map it to a free output channel, or run the auto-assignment.',
      wiring === 'two-core' ? 'Its voltages leave out the output’s own drop until then.' : ''));
  }
  if (control && !wantsControl(dispenser)) findings.push(laneFinding(rows, 'MP-09', 'It runs on its own clock, yet has a control output', 'Free the output channel.'));
  if (!status && givesStatus) findings.push(laneFinding(rows, 'MP-02', 'No status input', 'Map it to a free input channel.', 'Nobody sees it when the device reports a fault.'));
  if (status && !givesStatus && wiring !== null) {
    findings.push(laneFinding(rows, 'MP-11', 'It has a status input, yet the device gives no status signal', 'Free the input channel.'));
  }
  if (!rows.circuit) findings.push(laneFinding(rows, 'MP-12', 'No circuit', 'Choose the circuit that feeds it.', 'Its voltages and loads on the supply are not computed.'));
  if (control && rows.output) controllerCheck(rows, control, rows.output, findings);
  if (status && rows.input) controllerCheck(rows, status, rows.input, findings);
  if (control && rows.output) feedCheck(lane, control, rows.output, findings);
}

function laneFinding(rows: Lane, code: FindingCode, title: string, remedy: string, detail = ''): Finding {
  const { dispenser } = rows;
  return makeFinding(code, 'dispenser', dispenser.id, laneTag(rows), { title, remedy, detail, dispenserIds: [dispenser.id] });
}

function controllerCheck(rows: Lane, assignment: Assignment, place: ModulePlace, findings: Finding[]): void {
  const { dispenser, controller } = rows;
  if (dispenser.controllerId === null || place.module.controllerId === dispenser.controllerId) return;
  const own = controller?.name ?? 'another controller';
  findings.push(laneFinding(rows, 'MP-10', `Its ${assignment.purpose} signal is on ${placeLabel(place)}, it belongs to ${own}`, `Map it to a module of ${own}, or change its controller.`));
}

function feedCheck({ rows, circuit: context }: LaneContext, control: Assignment, place: ModulePlace, findings: Finding[]): void {
  const { type } = place;
  if (!type || type.kind !== 'output' || !context) return;
  const { circuit } = context.rows;
  const feed = feedOf(place, groupIndexOf(type, control.channel));
  if (!feed || feed.id === rows.dispenser.circuitId) return;
  const bond = feed.supplyId === circuit.supplyId ? '' : ' The two circuits have different supplies: their 0 V conductors must be bonded.';
  findings.push(laneFinding(rows, 'MP-03', `Its output group is fed by ${feed.name}, the lane belongs to ${circuit.name}`,
    `Feed the group from ${circuit.name}, or map the lane to a group fed by it.`,
    (laneWiring(rows) === 'two-core' ? `Its motor current flows from ${feed.name}, so the loads of both circuits are not as computed.` : 'The pulse comes from another feeder than the device.') + bond));
}

/** A module: channels that do not exist, the wrong kind, used twice; groups in use that nobody feeds. */
export function moduleMappingFindings(rows: ModuleRows): Finding[] {
  const findings: Finding[] = [];
  const { type } = rows.place;
  if (!type) return findings;
  rows.assignments.forEach((assignment, i) => channelCheck(rows, type, assignment, assignedTag(rows, i), findings));
  doubleUse(rows, findings);
  if (type.kind === 'output') unfedGroups(rows, type, findings);
  return findings;
}

function assignedTag({ lanes, assignments }: ModuleRows, i: number): string {
  const lane = lanes[i];
  return lane ? laneTag(lane) : assignments[i].dispenserId;
}

function channelCheck({ place }: ModuleRows, type: ModuleType, a: Assignment, tag: string, findings: Finding[]): void {
  if (a.channel < 0 || a.channel >= type.channels) {
    findings.push(makeFinding('MP-05', 'module', place.module.id, placeLabel(place), {
      mark: a.id,
      dispenserIds: [a.dispenserId],
      title: `${tag} is on channel ${a.channel}, the module has channels 0 to ${type.channels - 1}`,
      remedy: 'Map it to a channel of the module.',
      compared: [{ name: 'channel', value: a.channel, limit: type.channels - 1, unit: '' }],
    }));
  }
  if ((a.purpose === 'control') !== (type.kind === 'output')) {
    findings.push(makeFinding('MP-06', 'module', place.module.id, placeLabel(place), {
      mark: a.id,
      dispenserIds: [a.dispenserId],
      title: `The ${a.purpose} signal of ${tag} is on an ${type.kind} module`,
      remedy: `Map it to an ${a.purpose === 'control' ? 'output' : 'input'} module.`,
    }));
  }
}

function doubleUse(rows: ModuleRows, findings: Finding[]): void {
  const { place, assignments } = rows;
  if (channelsUsed(assignments) === assignments.length) return;
  const label = placeLabel(place);
  const places = assignments.map((_, i) => i);
  for (const [channel, users] of grouped(places, (i) => String(assignments[i].channel))) {
    if (users.length < 2) continue;
    findings.push(makeFinding('MP-07', 'channel', `${place.module.id}/${channel}`, `${label}, channel ${channel}`, {
      title: `${users.map((i) => assignedTag(rows, i)).join(' and ')} are on one channel`,
      remedy: 'Map all but one to free channels.',
      dispenserIds: users.map((i) => assignments[i].dispenserId),
    }));
  }
}

function unfedGroups({ place, assignments }: ModuleRows, type: ModuleType, findings: Finding[]): void {
  const unfed = assignments.filter((a) => feedOf(place, groupIndexOf(type, a.channel)) === null);
  if (unfed.length === 0) return;
  for (const [group, users] of grouped(unfed, (a) => String(groupIndexOf(type, a.channel)))) {
    const label = `${placeLabel(place)}, group from channel ${Number(group) * type.channelsPerGroup}`;
    findings.push(makeFinding('MP-04', 'group', groupKey(place.module.id, Number(group)), label, {
      title: 'No circuit feeds the group',
      detail: `${users.length} ${users.length === 1 ? 'channel is' : 'channels are'} in use.`,
      remedy: 'Choose the circuit that feeds the group.',
      dispenserIds: users.map((u) => u.dispenserId),
    }));
  }
}

/** Signals that are mapped more than once. */
export function doubleSignals(index: DesignIndex): Finding[] {
  if (index.repeatedSignals.length === 0) return [];
  return [...grouped(index.repeatedSignals, (a) => `${a.purpose}/${a.dispenserId}`).values()].map((repeated) => {
    const { dispenserId, purpose } = repeated[0];
    return makeFinding('MP-08', 'dispenser', dispenserId, tagOf(index, dispenserId), {
      title: `Its ${purpose} signal is on ${repeated.length + 1} channels`,
      remedy: 'Free all but one.',
      mark: purpose,
      dispenserIds: [dispenserId],
    });
  });
}
