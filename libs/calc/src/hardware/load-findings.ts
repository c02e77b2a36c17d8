import type { Electrics, LaneContext } from '../assess-context.ts';
import type { LoadFigures } from '../assessment.ts';
import type { Module, ModuleType } from '../design.ts';
import { type DesignIndex, moduleTypeOf } from '../design-index.ts';
import { type FindingCode, makeFinding } from '../finding-codes.ts';
import type { Finding, SubjectKind } from '../findings.ts';
import { ampsAgainstMaximum, formatAmps, formatCount } from '../format.ts';
import { relayOperations } from '../wiring/signals.ts';
import { channelLoad, leastChannelA } from './loads.ts';

const TOLERANCE_A = 1e-9;

/** Name of a module with its controller, `PLC1 DO1`. */
export function moduleLabel(index: DesignIndex, module: Module): string {
  return `${index.controllers.get(module.controllerId)?.name ?? ''} ${module.name}`.trim();
}

/** Groups and modules against their ratings, under the limits and with all on. */
export function loadFindings(electrics: Electrics): Finding[] {
  const findings: Finding[] = [];
  const { index, hardware } = electrics;
  for (const module of index.design.modules) {
    const type = index.moduleTypes.get(module.typeId);
    const figures = hardware.modules.get(module.id);
    if (!type || !figures || type.kind !== 'output') continue;
    const label = moduleLabel(index, module);
    pushLoad(findings, electrics, figures, ['IO-05', 'IO-06'], { kind: 'module', id: module.id, label, word: 'module' });
    for (let g = 0; ; g++) {
      const group = hardware.groups.get(`${module.id}/${g}`);
      if (!group) break;
      const where = { kind: 'group' as const, id: `${module.id}/${g}`, label: `${label}, ${channelsText(type, g)}`, word: 'group' };
      pushLoad(findings, electrics, group, ['IO-03', 'IO-04'], where);
    }
  }
  return findings;
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

function pushLoad(findings: Finding[], electrics: Electrics, figures: LoadFigures, codes: readonly [FindingCode, FindingCode], place: Place): void {
  const { worstA, allOnA, ratingA } = figures;
  if (ratingA === null || allOnA <= ratingA + TOLERANCE_A) return;
  const over = worstA > ratingA + TOLERANCE_A;
  const amps = over ? worstA : allOnA;
  const shown = `${ampsAgainstMaximum(amps)} in the ${place.word}`;
  findings.push(
    makeFinding(codes[over ? 0 : 1], place.kind, place.id, place.label, {
      title: over ? `${shown}, rating ${formatAmps(ratingA)}` : `${shown} if all run at once, rating ${formatAmps(ratingA)}`,
      detail: over
        ? `Worst set under the limits: ${formatCount(figures.worstSet.length)} dispensers. With all on: ${ampsAgainstMaximum(allOnA)}.`
        : `Under the limits it is ${ampsAgainstMaximum(worstA)}. The program alone keeps them: forcing or an online change bypasses it, and then only the output’s own protection holds.`,
      remedy: over ? loadRemedy(electrics, figures, place) : 'Spread the dispensers so that all may run, or keep forcing under control.',
      compared: [{ name: `load of the ${place.word}`, value: amps, limit: ratingA, unit: 'A' }],
      dispenserIds: over ? figures.worstSet : [],
    }),
  );
}

/** Names the largest k of the one circuit that loads the place, where a smaller one mends it. */
function loadRemedy({ index, circuits, limitOf }: Electrics, { worstSet, ratingA, worstA }: LoadFigures, { word }: Place): string {
  const spread = `spread the dispensers over two ${word}s`;
  const circuitIds = new Set(worstSet.map((id) => index.dispensers.get(id)?.circuitId ?? null));
  const [circuitId] = circuitIds;
  const circuit = circuitIds.size === 1 && circuitId !== null ? index.circuits.get(circuitId) : undefined;
  const largest = circuit && circuits.get(circuit.id)?.figures.largestPassingK;
  if (circuit && largest && largest < limitOf(circuit.id)) return `Set k to ${largest} on ${circuit.name}, or ${spread}.`;
  return worstA > (ratingA ?? 0) && worstSet.length > 1 ? `${capitalised(spread)}.` : `Choose a ${word} with a higher rating.`;
}

function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** One output channel: continuous rating, starting peak, and what a relay contact can stand. */
export function channelFindings(lane: LaneContext): Finding[] {
  const { index, dispenser, tag, voltages } = lane;
  const control = index.control.get(dispenser.id);
  const type = control && moduleTypeOf(index, control.moduleId);
  const load = channelLoad(index, dispenser.id, voltages?.runA ?? null);
  if (!control || !type || type.kind !== 'output' || !load) return [];
  const about = (code: FindingCode, name: string, value: number, limit: number, unit: string, title: string, remedy: string, detail = '') =>
    makeFinding(code, 'dispenser', dispenser.id, tag, {
      title, remedy, detail, compared: [{ name, value, limit, unit }], dispenserIds: [dispenser.id],
    });
  const findings: Finding[] = [];
  if (type.channelA !== null && load.amps > type.channelA + TOLERANCE_A) {
    findings.push(about('IO-01', 'channel load', load.amps, type.channelA, 'A',
      `${ampsAgainstMaximum(load.amps)} on the channel, rating ${formatAmps(type.channelA)}`, 'Map it to a module with a higher channel rating.'));
  }
  if (type.channelPeakA !== null && load.peakA !== null && load.peakA > type.channelPeakA + TOLERANCE_A) {
    findings.push(about('IO-02', 'starting peak', load.peakA, type.channelPeakA, 'A',
      `${ampsAgainstMaximum(load.peakA)} when the motor starts, the channel stands ${formatAmps(type.channelPeakA)}`,
      'Map it to a module that stands the peak, or choose a four-core type.'));
  }
  return type.technology === 'relay' ? [...findings, ...relayFindings(lane, type, leastChannelA(index, dispenser.id, load.amps), about)] : findings;
}

function relayFindings(
  { index, figures, dispenser }: LaneContext, type: ModuleType, leastA: number,
  about: (code: FindingCode, name: string, value: number, limit: number, unit: string, title: string, remedy: string, detail?: string) => Finding,
): Finding[] {
  const findings: Finding[] = [];
  if (type.minLoadA !== null && leastA < type.minLoadA - TOLERANCE_A) {
    findings.push(about('SG-08', 'channel load', leastA, type.minLoadA, 'A',
      `${formatAmps(leastA, 'down')} on the relay contact, least load ${formatAmps(type.minLoadA)}`,
      'Map it to a transistor output.', 'Below its least load a contact may fail to close for good.'));
  }
  const years = index.design.project.relayLifeYears;
  const pulses = dispenser.method === 'pulse' ? figures.plan?.pulsesPerYear : undefined;
  if (type.ratedOperations !== null && pulses !== undefined) {
    const operations = relayOperations(pulses, years);
    if (operations > type.ratedOperations) {
      findings.push(about('SG-09', 'operations', operations, type.ratedOperations, '',
        `${formatCount(Math.ceil(operations))} operations in ${years} years, rated ${formatCount(type.ratedOperations)}`,
        'Map it to a transistor output, or choose a larger dose.', `${formatCount(Math.ceil(pulses))} pulses a year.`));
    }
  }
  return findings;
}
