import type { Explanation } from '../assessment.ts';
import { formatAmps, formatVolts, voltsAgainstMinimum } from '../format.ts';
import { pulsePolarity } from '../wiring/signals.ts';
import { input, step, typeSource, type LaneContext } from './lane-context.ts';

export type LevelFigureName = 'pulseLevel' | 'statusLevel';

const CORES = 'resistance of conductors by IEC 60228';

/** A signal level of the lane; null while it cannot be computed. */
export function explainLevel(ctx: LaneContext, figure: LevelFigureName): Explanation | null {
  return figure === 'pulseLevel' ? pulseLevel(ctx) : statusLevel(ctx);
}

function pulseLevel({ figures: { pulseLevelV }, type, outputType }: LaneContext): Explanation | null {
  if (pulseLevelV === null || !type) return null;
  const result = voltsAgainstMinimum(pulseLevelV);
  return {
    title: `Why ${result} at the pulse input`,
    formula: `level = lowest supply − drop in the output − I × R(pulse core) − ${pulsePolarity(type, outputType) === 'sourcing' ? 'rise of the dispenser’s own 0 V' : 'drop on its own +24 V conductor'}`,
    substituted: result,
    inputs: [
      ...(outputType ? [input('drop in the output', formatVolts(outputType.dropV), typeSource(outputType))] : []),
      input('current into the pulse input', formatAmps(type.controlInputA), typeSource(type)),
      input('“on” for certain from', formatVolts(type.controlOnV), typeSource(type)),
    ],
    rounding: [step('down to 0.1 V', result, 'toward the level that the type takes for “on”')],
    result,
    source: `Type data; ${CORES}`,
    usedBy: ['check of the pulse level'],
  };
}

function statusLevel({ figures: { statusLevelV }, type, design, dispenser }: LaneContext): Explanation | null {
  if (statusLevelV === null || !type?.status) return null;
  const assigned = design.assignments.find((each) => each.dispenserId === dispenser.id && each.purpose === 'status');
  const module = design.modules.find((each) => each.id === assigned?.moduleId);
  const inputType = design.moduleTypes.find((each) => each.id === module?.typeId);
  const result = voltsAgainstMinimum(statusLevelV);
  return {
    title: `Why ${result} at the status input`,
    formula: `level = supply − ${type.status.polarity === 'sourcing' ? 'drop on the +24 V conductor' : 'rise of the device’s 0 V'} − drop in the device’s output − I_in × R(status core)`,
    substituted: result,
    inputs: [
      input('drop in the device’s output', formatVolts(type.status.dropV), typeSource(type)),
      ...(inputType ? [input('current of the input', formatAmps(inputType.inputA), `${typeSource(inputType)}, IEC 61131-2 type ${inputType.inputType}`)] : []),
    ],
    rounding: [step('down to 0.1 V', result, 'toward the level that the input takes for “on”')],
    result,
    source: `IEC 61131-2 limits of digital inputs; ${CORES}`,
    usedBy: ['check of the status level'],
  };
}
