import type { Explanation, VoltageFigure } from '../assessment.ts';
import { wiringBy } from '../design-index.ts';
import { formatMetres, formatVolts, voltsAgainstMinimum, formatNumber, withUnit } from '../format.ts';
import { FROM_POLICY, input, step, tagsOf, typeSource, type Input, type LaneContext } from './lane-context.ts';

export type VoltageFigureName = 'worstVoltage' | 'allOnVoltage' | 'aloneVoltage' | 'idleVoltage';

const SOURCE = 'Ohm’s law over the outgoing and the return conductor; resistance of conductors by IEC 60228';
const DOWN = 'toward the lowest voltage at which the type works';

/** A voltage at the device; null while it cannot be computed. */
export function explainVoltage(ctx: LaneContext, figure: VoltageFigureName): Explanation | null {
  const { figures, circuit } = ctx;
  switch (figure) {
    case 'worstVoltage':
      return figures.worst && lowest(ctx, figures.worst, 'with the worst permitted set', limitText(circuit?.concurrencyLimit), stations(ctx, 'worstV'));
    case 'allOnVoltage':
      return figures.allOn && lowest(ctx, figures.allOn, 'with every dispenser on', 'all of the circuit: the limit is kept by software only', []);
    case 'idleVoltage':
      return figures.idle && lowest(ctx, figures.idle, 'while it idles', `${limitText(circuit?.concurrencyLimit)}, this one idle`, []);
    case 'aloneVoltage':
      return alone(ctx);
  }
}

function lowest(ctx: LaneContext, figure: VoltageFigure, when: string, set: string, profile: readonly Input[]): Explanation {
  const lowestV = supplyFigures(ctx)?.lowestV ?? null;
  const result = voltsAgainstMinimum(figure.volts);
  return {
    title: `Why ${result} ${when}`,
    formula: `voltage = lowest supply − Σ Iᵢ × R(path shared with i)${outputTerm(ctx)}`,
    substituted: lowestV === null ? fineVolts(figure.volts) : difference(lowestV, figure.volts),
    inputs: [
      input('lowest supply', voltsAgainstMinimum(lowestV), 'voltage set × (1 − tolerance); 24 V − 15 % where none is stated'),
      input('at once', set, 'concurrency limit of the circuit'),
      input('worst set', tagsOf(ctx.design, figure.worstSet), 'found exactly: the largest drops on the shared path'),
      temperatureInput(ctx),
      ...minimumInput(ctx),
      ...profile,
    ],
    rounding: [step('down to 0.1 V', result, DOWN)],
    result,
    source: SOURCE,
    usedBy: ['check of the lowest voltage', 'smallest cross-section that passes', 'loop check'],
  };
}

function alone(ctx: LaneContext): Explanation | null {
  const { figures: { aloneV }, supply } = ctx;
  if (aloneV === null || !supply) return null;
  const result = formatVolts(aloneV);
  return {
    title: `Why ${result} running alone`,
    formula: `voltage = voltage set − Σ Iᵢ × R(path shared with i)${outputTerm(ctx)}, this dispenser running, all others idle`,
    substituted: difference(supply.setV, aloneV),
    inputs: [input('voltage set', formatVolts(supply.setV), `supply ${supply.name}`), temperatureInput(ctx), ...stations(ctx, 'aloneV')],
    rounding: [step('to 0.1 V', result, 'compared with a reading, not with a limit')],
    result,
    source: SOURCE,
    usedBy: ['loop check: what a meter should read'],
  };
}

/** Each station with the drop on the way from the one before. */
function stations({ figures: { profile } }: LaneContext, volts: 'worstV' | 'aloneV'): Input[] {
  return profile.map((station, index) => {
    const before = profile[index - 1];
    const drop = before ? `drop ${fineVolts(before[volts] - station[volts])}` : 'start';
    return input(`${station.label}, ${formatMetres(station.metres)}`, fineVolts(station[volts]), drop);
  });
}

/** From the source to the device, to 0.01 V, so that the numbers add up before the last rounding. */
function difference(fromV: number, toV: number): string {
  return `${fineVolts(fromV)} − ${fineVolts(fromV - toV)} = ${fineVolts(toV)}`;
}

function fineVolts(volts: number): string {
  return withUnit(formatNumber(volts, 2), 'V');
}

function outputTerm({ dispenser, type }: LaneContext): string {
  return wiringBy(dispenser, type) === 'two-core' ? ' − drop in the output' : '';
}

function limitText(limit: number | null | undefined): string {
  return limit == null ? 'all, as the circuit has no limit' : `at most ${limit}`;
}

function temperatureInput({ design }: LaneContext): Input {
  return input('conductor temperature', withUnit(formatNumber(design.project.voltageTempC), '°C'), FROM_POLICY);
}

function minimumInput({ figures, type }: LaneContext): Input[] {
  return figures.minV === null || !type ? [] : [input('lowest for this type', formatVolts(figures.minV, 'up'), typeSource(type))];
}

function supplyFigures({ assessment, supply }: LaneContext) {
  return supply ? assessment.supplies.get(supply.id) : undefined;
}
