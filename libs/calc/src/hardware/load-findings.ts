import type { CircuitContext, LaneContext } from '../assess-context.ts';
import type { LoadFigures } from '../assessment.ts';
import type { Module, ModuleType } from '../design.ts';
import type { DesignIndex } from '../design-index.ts';
import { type FindingCode, makeFinding } from '../finding-codes.ts';
import type { Finding, SubjectKind } from '../findings.ts';
import { ampsAgainstMaximum, formatAmps, formatCount } from '../format.ts';
import { type Lane, laneTag, laneWiring, type ModulePlace } from '../lane-rows.ts';
import { largestRunA } from '../wiring/lane-voltages.ts';
import { limitOfCircuit } from '../wiring/supply-network.ts';
import { relayOperations } from '../wiring/signals.ts';
import { channelLoad, leastChannelA } from './channel-load.ts';
import type { ModuleLoads, ModuleRows } from './loads.ts';

const TOLERANCE_A = 1e-9;

/** Name of a module with its controller, `PLC1 DO1`. */
export function moduleLabel({ controllers }: Pick<DesignIndex, 'controllers'>, module: Module): string {
  return labelled(controllers.get(module.controllerId)?.name, module);
}

/** The same where its controller is at hand. */
export function placeLabel({ controller, module }: ModulePlace): string {
  return labelled(controller?.name, module);
}

function labelled(controller: string | undefined, module: Module): string {
  return `${controller ?? ''} ${module.name}`.trim();
}

/** The circuits of a module's lanes with their figures, by id. */
type Circuits = ReadonlyMap<string, CircuitContext>;

/** A module and its groups against their ratings, under the limits and with all on. */
export function loadFindings(rows: ModuleRows, loads: ModuleLoads, circuits: Circuits): Finding[] {
  const findings: Finding[] = [];
  const { module, type } = rows.place;
  if (!type || type.kind !== 'output') return findings;
  if (isOver(loads.module)) {
    const place = { kind: 'module' as const, id: module.id, label: placeLabel(rows.place), word: 'module' };
    findings.push(overLoad(rows, loads.module, loads.module.ratingA, circuits, ['IO-05', 'IO-06'], place));
  }
  loads.groups.forEach((group, g) => {
    if (!isOver(group)) return;
    const place = { kind: 'group' as const, id: `${module.id}/${g}`, label: `${placeLabel(rows.place)}, ${channelsText(type, g)}`, word: 'group' };
    findings.push(overLoad(rows, group, group.ratingA, circuits, ['IO-03', 'IO-04'], place));
  });
  return findings;
}

function isOver(figures: LoadFigures): figures is LoadFigures & { readonly ratingA: number } {
  return figures.ratingA !== null && figures.allOnA > figures.ratingA + TOLERANCE_A;
}

/** Channels of a group, `channels 0–7`. */
export function channelsText(type: ModuleType, group: number): string {
  const first = group * type.channelsPerGroup;
  return `channels ${first}–${Math.min(type.channels, first + type.channelsPerGroup) - 1}`;
}

interface Place {
  readonly kind: SubjectKind;
  readonly id: string;
  readonly label: string;
  readonly word: string;
}

function overLoad(
  rows: ModuleRows, figures: LoadFigures, ratingA: number, circuits: Circuits, codes: readonly [FindingCode, FindingCode], place: Place,
): Finding {
  const { worstA, allOnA } = figures;
  const over = worstA > ratingA + TOLERANCE_A;
  const amps = over ? worstA : allOnA;
  const shown = `${ampsAgainstMaximum(amps)} in the ${place.word}`;
  return makeFinding(codes[over ? 0 : 1], place.kind, place.id, place.label, {
    title: over ? `${shown}, rating ${formatAmps(ratingA)}` : `${shown} if all run at once, rating ${formatAmps(ratingA)}`,
    detail: over
      ? `Worst set under the limits: ${formatCount(figures.worstSet.length)} dispensers. With all on: ${ampsAgainstMaximum(allOnA)}.`
      : `Under the limits it is ${ampsAgainstMaximum(worstA)}. The program alone keeps them: forcing or an online change bypasses it, and then only the output’s own protection holds.`,
    remedy: over ? loadRemedy(rows, figures, ratingA, circuits, place) : 'Spread the dispensers so that all may run, or keep forcing under control.',
    compared: [{ name: `load of the ${place.word}`, value: amps, limit: ratingA, unit: 'A' }],
    dispenserIds: over ? figures.worstSet : [],
  });
}

/** Names the largest k of the one circuit that loads the place, where a smaller one mends it. */
function loadRemedy({ lanes }: ModuleRows, { worstSet, worstA }: LoadFigures, ratingA: number, circuits: Circuits, { word }: Place): string {
  const spread = `spread the dispensers over two ${word}s`;
  const inSet = new Set(worstSet);
  const placesOfSet = new Set(lanes.filter((lane) => lane !== null && inSet.has(lane.dispenser.id)).map((lane) => lane?.circuit ?? null));
  const [place] = placesOfSet;
  const circuit = placesOfSet.size === 1 ? place?.circuit : undefined;
  const largest = circuit && circuits.get(circuit.id)?.figures.largestPassingK;
  if (circuit && largest && largest < limitOfCircuit(circuit.concurrencyLimit)) return `Set k to ${largest} on ${circuit.name}, or ${spread}.`;
  return worstA > ratingA && worstSet.length > 1 ? `${capitalised(spread)}.` : `Choose a ${word} with a higher rating.`;
}

function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** One output channel: continuous rating, starting peak, and what a relay contact can stand. */
export function channelFindings(lane: LaneContext, findings: Finding[]): void {
  const { rows, circuit, column } = lane;
  const type = rows.output?.type;
  const wiring = laneWiring(rows);
  const load = channelLoad(rows.type, wiring, circuit ? largestRunA(circuit.solution, column) : null);
  if (!type || type.kind !== 'output' || !load) return;
  if (type.channelA !== null && load.amps > type.channelA + TOLERANCE_A) {
    findings.push(channelFinding(rows, 'IO-01', { name: 'channel load', value: load.amps, limit: type.channelA, unit: 'A' },
      `${ampsAgainstMaximum(load.amps)} on the channel, rating ${formatAmps(type.channelA)}`, 'Map it to a module with a higher channel rating.'));
  }
  if (type.channelPeakA !== null && load.peakA !== null && load.peakA > type.channelPeakA + TOLERANCE_A) {
    findings.push(channelFinding(rows, 'IO-02', { name: 'starting peak', value: load.peakA, limit: type.channelPeakA, unit: 'A' },
      `${ampsAgainstMaximum(load.peakA)} when the motor starts, the channel stands ${formatAmps(type.channelPeakA)}`,
      'Map it to a module that stands the peak, or choose a four-core type.'));
  }
  if (type.technology !== 'relay') return;
  const { supply = null, supplyType = null } = rows.circuit ?? {};
  relayFindings(lane, type, leastChannelA(rows.type, wiring, supply, supplyType, load.amps), findings);
}

function channelFinding(rows: Lane, code: FindingCode, compared: Finding['compared'][number], title: string, remedy: string, detail = ''): Finding {
  const { dispenser } = rows;
  return makeFinding(code, 'dispenser', dispenser.id, laneTag(rows), { title, remedy, detail, compared: [compared], dispenserIds: [dispenser.id] });
}

function relayFindings({ rows, figures }: LaneContext, type: ModuleType, leastA: number, findings: Finding[]): void {
  const { project, dispenser } = rows;
  if (type.minLoadA !== null && leastA < type.minLoadA - TOLERANCE_A) {
    findings.push(channelFinding(rows, 'SG-08', { name: 'channel load', value: leastA, limit: type.minLoadA, unit: 'A' },
      `${formatAmps(leastA, 'down')} on the relay contact, least load ${formatAmps(type.minLoadA)}`,
      'Map it to a transistor output.', 'Below its least load a contact may fail to close for good.'));
  }
  const years = project.relayLifeYears;
  const pulses = dispenser.method === 'pulse' ? figures.plan?.pulsesPerYear : undefined;
  if (type.ratedOperations !== null && pulses !== undefined) {
    const operations = relayOperations(pulses, years);
    if (operations > type.ratedOperations) {
      findings.push(channelFinding(rows, 'SG-09', { name: 'operations', value: operations, limit: type.ratedOperations, unit: '' },
        `${formatCount(Math.ceil(operations))} operations in ${years} years, rated ${formatCount(type.ratedOperations)}`,
        'Map it to a transistor output, or choose a larger dose.', `${formatCount(Math.ceil(pulses))} pulses a year.`));
    }
  }
}
