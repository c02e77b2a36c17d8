import type { CircuitContext } from '../assess-context.ts';
import type { Circuit } from '../design.ts';
import { type FindingCode, makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';
import { ampsAgainstMaximum, ampsAgainstMinimum, formatAmps } from '../format.ts';
import { laneTag } from '../lane-rows.ts';
import { overloadText } from './protection.ts';

interface Compared {
  readonly name: string;
  readonly value: number;
  readonly limit: number;
  readonly unit: string;
}
type Notice = (code: FindingCode, title: string, remedy: string, detail: string, compared?: Compared, dispenserIds?: readonly string[]) => void;

/** Screening of a circuit's protection: load, tripping at the far end, what the supply can deliver. */
export function protectionFindings(context: CircuitContext): Finding[] {
  const { rows: { circuit }, short } = context;
  const findings: Finding[] = [];
  const notice: Notice = (code, title, remedy, detail, compared, dispenserIds = []) =>
    findings.push(makeFinding(code, 'circuit', circuit.id, circuit.name, { title, remedy, detail, compared: compared ? [compared] : [], dispenserIds }));
  loadChecks(context, notice);
  if (circuit.protection === 'fuse') {
    notice('PR-03', 'A fuse is judged by its time-current curve', 'Check the melting time at the smallest short-circuit current against the curve.',
      short.amps === null ? '' : `Smallest short-circuit current ${ampsAgainstMinimum(short.amps)}.`);
  } else tripChecks(context, notice);
  if (short.behindOutput.length > 0) {
    notice('PR-04', `${short.behindOutput.length} two-core ${short.behindOutput.length === 1 ? 'lane stands' : 'lanes stand'} behind outputs that limit their own short-circuit current`,
      'Nothing to do: the output’s own limit governs there.', 'A short circuit on such a lane does not reach the circuit’s protection.', undefined, short.behindOutput);
  }
  return findings;
}

function loadChecks({ supply, rows: { circuit }, figures, solution }: CircuitContext, notice: Notice): void {
  if (solution.worst.collapsed) {
    notice('PR-08', 'The current of the circuit cannot be computed: it has no working point', 'Mend the voltage collapse first (VD-04).',
      `The loads take at least ${ampsAgainstMinimum(figures.worstA)}, which they would at the voltage without any drop. Nothing says yet that the protection carries them.`);
  }
  const rated = formatAmps(figures.ratingA);
  if (figures.worstA > figures.ratingA + 1e-9) {
    const k = figures.largestPassingK;
    const smaller = k !== null && k > 0 ? `Set k to ${k} on ${circuit.name}` : 'Set a smaller k';
    notice('PR-01', `${ampsAgainstMaximum(figures.worstA)} in the circuit, protection ${rated}`, `${smaller}, or split the circuit.`,
      `With all on: ${ampsAgainstMaximum(figures.allOnA)}.`, { name: 'worst current', value: figures.worstA, limit: figures.ratingA, unit: 'A' }, figures.worstSet);
  } else if (!solution.worst.collapsed && (figures.allOnA > figures.ratingA + 1e-9 || solution.allOn.collapsed)) {
    // Without a working point the true current with all on lies above what is known of it.
    const atLeast = solution.allOn.collapsed;
    const overload = atLeast ? 'With all on the circuit has no working point.' : (overloadText(circuit, figures.allOnA, supply.rows.project.breakerDcFactor) ?? '');
    notice('PR-05', `${atLeast ? `At least ${ampsAgainstMinimum(figures.allOnA)}` : ampsAgainstMaximum(figures.allOnA)} if all run at once, protection ${rated}`,
      'Keep forcing under control.', `Under the limit it is ${ampsAgainstMaximum(figures.worstA)}. ${overload}`,
      { name: 'current with all on', value: figures.allOnA, limit: figures.ratingA, unit: 'A' });
  }
}

function tripChecks({ supply, rows: { circuit, lanes }, figures, short }: CircuitContext, notice: Notice): void {
  const { tripA } = figures;
  if (tripA === null || short.amps === null || short.at === null || short.amps >= tripA) return;
  const compared = { name: 'smallest short-circuit current', value: short.amps, limit: tripA, unit: 'A' };
  const needs = ampsAgainstMaximum(tripA);
  const farthest = lanes.find((lane) => lane.dispenser.id === short.at);
  const at = farthest ? laneTag(farthest) : short.at;
  if (short.limitedBySupply) {
    notice('PR-06', `The supply delivers ${ampsAgainstMinimum(short.amps)}, tripping at once takes ${needs}`,
      'Choose a smaller rating, a characteristic that trips earlier, electronic protection, or a supply that delivers more.',
      'However thick the cable, the protection does not trip at once.', compared, [short.at]);
    return;
  }
  const supplyFallsShort = (short.supplyA ?? Infinity) < tripA;
  const temperature = supply.rows.project.tripTempC;
  const detail = `Short circuit at ${at}, lowest supply voltage, conductors at ${temperature} °C.`;
  if (circuit.protection === 'electronic') {
    notice('PR-07', `${ampsAgainstMinimum(short.amps)} at the far end, the protection takes ${needs}`,
      supplyFallsShort ? `Choose a smaller rating, or a supply that delivers ${needs}.` : 'Lay a larger section, or choose a smaller rating.', detail, compared, [short.at]);
    return;
  }
  notice('PR-02', `${ampsAgainstMinimum(short.amps)} at the far end, the breaker takes ${needs} to trip at once`,
    breakerRemedy(circuit, short.supplyA ?? Infinity, tripA),
    detail, compared, [short.at]);
}

/** A larger section is named only where the supply can deliver the current that it would let through. */
function breakerRemedy({ protection }: Circuit, supplyA: number, tripA: number): string {
  const earlier = protection === 'breaker-C' ? 'characteristic B' : 'a smaller rating';
  if (supplyA < tripA) return `Choose electronic protection, ${earlier}, or a supply that delivers ${ampsAgainstMaximum(tripA)}.`;
  return protection === 'breaker-C'
    ? 'Choose characteristic B, a larger section, or electronic protection.'
    : 'Choose electronic protection, a larger section, or a smaller rating.';
}
