import type { LaneContext } from '../assess-context.ts';
import type { DispenserType, ModuleType } from '../design.ts';
import { type FindingCode, makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';
import { ampsAgainstMaximum, ampsAgainstMinimum, formatAmps, formatVolts, voltsAgainstMinimum } from '../format.ts';
import { laneTag } from '../lane-rows.ts';
import { INPUT_LIMITS, leakageLevelV, neededInputA, outputFits, pulsePolarity, statusFitsInput } from './signals.ts';

interface Compared {
  readonly name: string;
  readonly value: number;
  readonly limit: number;
  readonly unit: string;
}
/** Pulse and status signals of one lane: levels, polarity, leakage, currents. */
export function signalFindings(lane: LaneContext, findings: Finding[]): void {
  const { type, output, input } = lane.rows;
  if (!type) return;
  if (output?.type?.kind === 'output') outputChecks(lane, type, output.type, findings);
  if (input?.type?.kind === 'input' && type.status) statusChecks(lane, type.status, input.type, findings);
}

function signalFinding({ rows }: LaneContext, code: FindingCode, title: string, remedy: string, compared?: Compared, detail = ''): Finding {
  const { dispenser } = rows;
  return makeFinding(code, 'dispenser', dispenser.id, laneTag(rows), {
    title, remedy, detail, compared: compared ? [compared] : [], dispenserIds: [dispenser.id],
  });
}

function outputChecks(lane: LaneContext, type: DispenserType, output: ModuleType, findings: Finding[]): void {
  if (!outputFits(output, type.controlPolarity)) {
    findings.push(signalFinding(lane, 'SG-03', `The device wants a ${type.controlPolarity} output, the module is ${output.polarity}`, `Map it to a ${type.controlPolarity} module.`));
  }
  if (output.leakageA > type.offStateA + 1e-12) {
    findings.push(signalFinding(lane, 'SG-05', `${ampsAgainstMaximum(output.leakageA)} leak through the output that is off, the device stays off up to ${ampsAgainstMinimum(type.offStateA)}`,
      'Choose a module with less leakage, or add a load resistor across the output.',
      { name: 'off-state leakage', value: output.leakageA, limit: type.offStateA, unit: 'A' }));
  }
  const level = lane.figures.pulseLevelV;
  const sourcing = pulsePolarity(type, output) === 'sourcing';
  if (level !== null && type.controlOnV !== null && level < type.controlOnV - 1e-9) {
    findings.push(signalFinding(lane, 'SG-01', `${voltsAgainstMinimum(level)} pulse at the device, it takes ${formatVolts(type.controlOnV)} for on`,
      `Enlarge the ${sourcing ? '0 V' : '+24 V'} conductor or the signal cores, or set a smaller k.`,
      { name: 'pulse level', value: level, limit: type.controlOnV, unit: 'V' },
      `Lowest supply less the output’s drop, the drop on the signal core and the ${sourcing ? 'rise of the device’s own 0 V' : 'drop on the device’s own +24 V'} with the worst set.`));
  }
}

function statusChecks(lane: LaneContext, status: NonNullable<DispenserType['status']>, input: ModuleType, findings: Finding[]): void {
  if (!statusFitsInput(status.polarity, input.polarity)) {
    const wanted = status.polarity === 'sourcing' ? 'sinking' : 'sourcing';
    findings.push(signalFinding(lane, 'SG-04', `The status output is ${status.polarity} and the input too`, `Map it to a ${wanted} input.`, undefined,
      'A sourcing output drives current into a sinking input.'));
  }
  if (input.inputType === null) return;
  const limits = INPUT_LIMITS[input.inputType];
  const level = lane.figures.statusLevelV;
  if (level !== null && level < limits.onV - 1e-9) {
    findings.push(signalFinding(lane, 'SG-02', `${voltsAgainstMinimum(level)} status at the input, type ${input.inputType} takes ${formatVolts(limits.onV)} for on`,
      'Enlarge the conductors, or choose an input of type 3.', { name: 'status level', value: level, limit: limits.onV, unit: 'V' },
      'Lowest supply less the drop to the device with the worst set, the device’s own drop and the drop on the status core.'));
  }
  const needed = neededInputA(input);
  if (status.maxA < needed - 1e-12) {
    findings.push(signalFinding(lane, 'SG-07', `${ampsAgainstMinimum(status.maxA)} from the status output, the input takes ${formatAmps(needed)}`,
      'Choose an input that takes less current.', { name: 'status current', value: status.maxA, limit: needed, unit: 'A' }));
  }
  if (status.leakageA > limits.offA + 1e-12) {
    findings.push(signalFinding(lane, 'SG-06', `${ampsAgainstMaximum(status.leakageA)} leak from the status output, type ${input.inputType} stays off up to ${formatAmps(limits.offA)}`,
      'Choose an input of another type, or add a load resistor.', { name: 'status leakage', value: status.leakageA, limit: limits.offA, unit: 'A' }));
    return;
  }
  const offV = leakageLevelV(status.leakageA, input);
  if (offV > limits.offV + 1e-9) {
    findings.push(signalFinding(lane, 'SG-10', `${formatVolts(offV, 'up')} at the input while the status is off, type ${input.inputType} is off for certain up to ${formatVolts(limits.offV)}`,
      'Choose an input that takes more current, or add a load resistor.', { name: 'off level', value: offV, limit: limits.offV, unit: 'V' },
      `The status output leaks ${ampsAgainstMaximum(status.leakageA)} through the input, which counts as a resistor that draws its current at 24 V. The current alone keeps its limit of ${formatAmps(limits.offA)}.`));
  }
}
