import type { Explanation } from '../assessment.ts';
import { wiringBy } from '../design-index.ts';
import { ampsAgainstMaximum, ampsAgainstMinimum, formatAmps, formatPercent } from '../format.ts';
import { FROM_POLICY, input, step, tagsOf, typeSource, type Input, type LaneContext } from './lane-context.ts';

export type LoadFigureName = 'channelLoad' | 'groupLoad' | 'supplyLoad';

const UP = 'toward the rating that it is compared with';

/** A load that the lane is part of; null while it is unmapped or cannot be computed, as in a collapse. */
export function explainLoad(ctx: LaneContext, figure: LoadFigureName): Explanation | null {
  if (ctx.figures.collapsed) return null;
  switch (figure) {
    case 'channelLoad':
      return channelLoad(ctx);
    case 'groupLoad':
      return groupLoad(ctx);
    case 'supplyLoad':
      return supplyLoad(ctx);
  }
}

function channelLoad({ figures: { channelA }, dispenser, type, outputType }: LaneContext): Explanation | null {
  if (channelA === null || !type) return null;
  const twoCore = wiringBy(dispenser, type) === 'two-core';
  const result = ampsAgainstMaximum(channelA);
  return {
    title: `Why ${result} on the channel`,
    formula: twoCore ? 'load = current of the motor' : 'load = current into the pulse input',
    substituted: formatAmps(channelA),
    inputs: [
      twoCore ? input('motor current', formatAmps(type.runA), typeSource(type)) : input('pulse input', formatAmps(type.controlInputA), typeSource(type)),
      ...(outputType ? [input('rating of the channel', ampsAgainstMinimum(outputType.channelA), typeSource(outputType))] : []),
    ],
    rounding: [step('up', result, UP)],
    result,
    source: 'Type data; output ratings after IEC 61131-2',
    usedBy: ['check of the channel’s rating', 'load of the group'],
  };
}

function groupLoad(ctx: LaneContext): Explanation | null {
  const { figures: { outputGroup }, assessment, design, outputType } = ctx;
  const group = outputGroup === null ? undefined : assessment.groups.get(outputGroup);
  if (!group) return null;
  const result = ampsAgainstMaximum(group.worstA);
  return {
    title: `Why ${result} in the group`,
    formula: 'load = what draws continuously + for each circuit with limit k the k largest increments in the group',
    substituted: `worst set of ${group.worstSet.length}: ${result}; all on: ${ampsAgainstMaximum(group.allOnA)}`,
    inputs: [
      input('worst set', tagsOf(design, group.worstSet), 'largest increments under the limits'),
      limitInput(ctx),
      input('all on', ampsAgainstMaximum(group.allOnA), 'the limit is kept by software only'),
      input('rating of the group', ampsAgainstMinimum(group.ratingA), outputType ? typeSource(outputType) : 'type data'),
    ],
    rounding: [step('up', result, UP)],
    result,
    source: 'Type data; output ratings after IEC 61131-2',
    usedBy: ['check of the group’s rating', 'assignment of channels'],
  };
}

function supplyLoad(ctx: LaneContext): Explanation | null {
  const { supply, assessment, design: { project } } = ctx;
  const load = supply ? assessment.supplies.get(supply.id) : undefined;
  if (!supply || !load) return null;
  const result = ampsAgainstMaximum(load.demandA);
  return {
    title: `Why ${result} on ${supply.name}`,
    formula: 'demand = (standing load + worst sum of run increments under the limits) × (1 + margin)',
    substituted: `${formatAmps(load.worstA)} × (1 + ${formatPercent(project.supplyMarginPercent)})`,
    inputs: [
      input('standing load', formatAmps(load.standingA), 'idle currents, timed lanes and other load of the supply'),
      input('with the worst permitted set', formatAmps(load.worstA), 'largest run increments of each circuit'),
      limitInput(ctx),
      input('all on', formatAmps(load.allOnA), 'the limit is kept by software only'),
      input('margin', formatPercent(project.supplyMarginPercent), FROM_POLICY),
      input('rating in this cabinet', ampsAgainstMinimum(load.ratingA), `type data, derated to the cabinet’s temperature${supply.redundant ? '; one of the redundant pair must carry all, both must be equal' : ''}`),
    ],
    rounding: [step('up', result, UP)],
    result,
    source: 'Common practice: margin on the worst load, linear derating by the type',
    usedBy: ['check of the supply', 'headroom'],
  };
}

function limitInput({ circuit }: LaneContext): Input {
  return input('concurrency limit', circuit?.concurrencyLimit == null ? 'none' : String(circuit.concurrencyLimit), circuit ? `circuit ${circuit.name}` : 'no circuit yet');
}
