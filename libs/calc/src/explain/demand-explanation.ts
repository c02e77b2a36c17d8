import type { Explanation } from '../assessment.ts';
import { formatDemand, formatNumber, formatVolume, withUnit } from '../format.ts';
import { bearingSteps, factorNames } from '../points/bearing-demand.ts';
import { FROM_POINT, input, step, type Input, type LaneContext } from './lane-context.ts';

type Told = Pick<Explanation, 'formula' | 'substituted' | 'inputs' | 'source'>;

const PER: Readonly<Record<string, string>> = {
  '1000h': '1,000 operating hours', '100h': '100 operating hours', 'running-day': 'running day', week: 'week', month: 'month',
};

/** How the demand of the lane's point comes about, by the way it was entered; null while it is unknown. */
export function explainDemand(ctx: LaneContext): Explanation | null {
  const told = ctx.demandUlPer1000h === null ? null : tellWay(ctx);
  if (!told || ctx.demandUlPer1000h === null) return null;
  const result = formatDemand(ctx.demandUlPer1000h);
  return {
    title: `Why ${result}`,
    ...told,
    rounding: [step('up to whole µL per 1,000 h', withUnit(formatNumber(ctx.demandUlPer1000h), 'µL'), 'never less grease than asked for')],
    result,
    usedBy: ['pulse interval', 'over-greasing', 'timed discharge', 'alternatives', 'consumption against plan'],
  };
}

function tellWay(ctx: LaneContext): Told | null {
  switch (ctx.point.demandWay) {
    case 'bearing':
      return fromBearing(ctx);
    case 'stated':
      return asStated(ctx);
    case 'practice':
      return fromPractice(ctx);
    case null:
      return null;
  }
}

function fromBearing({ point, grease }: LaneContext): Told | null {
  const steps = bearingSteps(point, grease?.densityGPerCm3 ?? null);
  if (!steps || !grease) return null;
  const [mass, hours, k] = [formatNumber(steps.grams, 2), formatNumber(steps.hours, 1), formatNumber(Number(steps.factorK.toPrecision(6)))];
  return {
    formula: 'G = 0.005·D·B; T = K·(14·10⁶ ÷ (n·√d) − 4·d); demand = 1,000 h × G ÷ (ρ × T)',
    substituted: `G = 0.005 × ${point.outsideMm} × ${point.widthMm} = ${mass} g; `
      + `T = ${k} × (14·10⁶ ÷ (${point.speedRpm} × √${point.boreMm}) − 4 × ${point.boreMm}) = ${hours} h; `
      + `demand = 1,000 h × ${mass} g ÷ (${grease.densityGPerCm3} g/cm³ × ${hours} h)`,
    inputs: [
      input('bore d', withUnit(formatNumber(point.boreMm), 'mm'), FROM_POINT),
      input('outside diameter D', withUnit(formatNumber(point.outsideMm), 'mm'), FROM_POINT),
      input('width B', withUnit(formatNumber(point.widthMm), 'mm'), FROM_POINT),
      input('speed n', withUnit(formatNumber(point.speedRpm), 'rpm'), FROM_POINT),
      ...factorNames().map((name) => input(`${name} factor`, formatNumber(point.factors[name]), FROM_POINT)),
      input('density ρ', withUnit(formatNumber(grease.densityGPerCm3), 'g/cm³'), `grease: ${grease.name}`),
    ],
    source: 'Common bearing formula (empirical) with its table of six factors',
  };
}

function asStated({ point }: LaneContext): Told {
  const per = PER[point.statedPer] ?? point.statedPer;
  const stated = formatVolume(point.statedUl);
  const timed = point.statedPer !== '1000h' && point.statedPer !== '100h';
  const hours = hoursText(point.statedPer, point.hoursPerDay, point.daysPerWeek);
  return {
    formula: 'demand = 1,000 h × volume stated ÷ operating hours in which it is given',
    substituted: `1,000 h × ${stated} ÷ ${hours}`,
    inputs: [input('volume', `${stated} per ${per}`, FROM_POINT), ...(timed ? running(point) : [])],
    source: 'Stated by the user; a month is 30.4375 days',
  };
}

function hoursText(per: string, hoursPerDay: number | null, daysPerWeek: number): string {
  switch (per) {
    case 'running-day':
      return `${hoursPerDay} h`;
    case 'week':
      return `(${daysPerWeek} × ${hoursPerDay} h)`;
    case 'month':
      return `(30.4375 × ${daysPerWeek} ÷ 7 × ${hoursPerDay} h)`;
    default:
      return per === '100h' ? '100 h' : '1,000 h';
  }
}

function fromPractice({ point, grease }: LaneContext): Told | null {
  if (!grease) return null;
  return {
    formula: 'demand = 1,000 h × strokes × grams a stroke ÷ (ρ × days × days per week ÷ 7 × hours per day)',
    substituted: `1,000 h × ${point.practiceStrokes} × ${point.practiceGramsPerStroke} g ÷ (${grease.densityGPerCm3} g/cm³ × `
      + `${point.practiceEveryDays} × ${point.daysPerWeek} ÷ 7 × ${point.hoursPerDay} h)`,
    inputs: [
      input('strokes', formatNumber(point.practiceStrokes), FROM_POINT),
      input('grams a stroke', withUnit(formatNumber(point.practiceGramsPerStroke), 'g'), FROM_POINT),
      input('every', withUnit(formatNumber(point.practiceEveryDays), 'd'), FROM_POINT),
      ...running(point),
      input('density ρ', withUnit(formatNumber(grease.densityGPerCm3), 'g/cm³'), `grease: ${grease.name}`),
    ],
    source: 'Today’s manual practice, spread over the operating hours',
  };
}

/** Hours per day and days per week as inputs. */
export function running({ hoursPerDay, daysPerWeek }: LaneContext['point']): Input[] {
  return [
    input('hours per day', withUnit(formatNumber(hoursPerDay), 'h'), FROM_POINT),
    input('days per week', formatNumber(daysPerWeek), FROM_POINT),
  ];
}
