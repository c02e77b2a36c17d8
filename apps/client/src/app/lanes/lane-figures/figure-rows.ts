import {
  ampsAgainstMaximum, type Assessment, type Design, demandFigure, DEMAND_UNITS, formatCount, formatDays, formatHours, formatInterval,
  formatNumber, formatPercent, formatVolts, formatVolume, type LaneFigureName, NOTHING, voltsAgainstMinimum, withUnit,
} from '#calc';
import type { LaneRows } from '../lane-rows';

/** One line of the lane's figures; `name` where the figure explains itself. */
export interface FigureRow {
  readonly label: string;
  readonly text: string;
  readonly name: LaneFigureName | null;
  readonly limit: string;
  readonly bad: boolean;
}

const row = (label: string, text: string, name: LaneFigureName | null = null, limit = '', bad = false): FigureRow => ({ label, text, name, limit, bad });

/** The pulse plan, or the timed discharge where the dispenser runs on its own clock. */
export function planRows(design: Design, assessment: Assessment, { point, dispenser, figures }: LaneRows): readonly FigureRow[] {
  const per = design.project.demandPer;
  const demandUl = assessment.points.get(point.id)?.demandUlPer1000h ?? null;
  const demand = demandUl === null ? NOTHING : withUnit(demandFigure(demandUl, per, point.hoursPerDay, point.daysPerWeek), DEMAND_UNITS[per]);
  const head = [row('Demand', demand, 'demand'), row('Cartridge', formatVolume(dispenser.cartridgeUl))];
  const timed = figures?.timed;
  if (timed) {
    return [
      ...head,
      row('Period', dispenser.periodMonths === null ? NOTHING : `${dispenser.periodMonths} months`),
      row('Life', formatDays(timed.lifeDays), 'lifeDays'),
      row('Changes a year', formatNumber(timed.changesPerYear, 1), 'changes'),
      row('Over the demand', formatPercent(timed.overGreasingPercent), 'over'),
    ];
  }
  const plan = figures?.plan;
  return [
    ...head,
    row('Dose', formatVolume(dispenser.doseUl)),
    row('Pulse interval', formatInterval(plan?.intervalMs ?? null), 'interval'),
    row('Pulses per cartridge', formatCount(plan?.pulsesPerCartridge ?? null), 'pulses'),
    row('Life, operating', formatHours(plan?.lifeMs ?? null), 'life'),
    row('Life, calendar', formatDays(plan?.lifeDays ?? null), 'lifeDays'),
    row('Changes a year', plan ? formatNumber(plan.changesPerYear, 1) : NOTHING, 'changes'),
    row('Over the demand', formatPercent(plan?.overGreasingPercent ?? null), 'over'),
  ];
}

/** Voltages, levels and loads, each against its limit. */
export function electricRows(design: Design, assessment: Assessment, { wiring, figures, circuit }: LaneRows): readonly FigureRow[] {
  if (!figures) return [];
  const low = (volts: number | undefined): boolean => volts !== undefined && figures.minV !== null && volts < figures.minV;
  const least = figures.minV === null ? '' : `at least ${formatVolts(figures.minV)}`;
  const group = figures.outputGroup === null ? undefined : assessment.groups.get(figures.outputGroup);
  const supply = circuit ? assessment.supplies.get(circuit.supplyId) : undefined;
  const upTo = (amps: number | null | undefined): string => (amps === null || amps === undefined ? '' : `at most ${ampsAgainstMaximum(amps)}`);
  const k = circuit?.concurrencyLimit;
  return [
    row(`Worst voltage${k ? `, ${k} running` : ''}`, voltsAgainstMinimum(figures.worst?.volts ?? null), 'worstVoltage', least, low(figures.worst?.volts)),
    row('With all on', voltsAgainstMinimum(figures.allOn?.volts ?? null), 'allOnVoltage', 'k is kept by software only', low(figures.allOn?.volts)),
    row('Alone, supply as set', formatVolts(figures.aloneV), 'aloneVoltage', 'what a meter should read'),
    ...(wiring === 'four-core' ? [
      row('Idle', voltsAgainstMinimum(figures.idle?.volts ?? null), 'idleVoltage', least, low(figures.idle?.volts)),
      row('Pulse level at the device', voltsAgainstMinimum(figures.pulseLevelV), 'pulseLevel'),
      row('Status level at the input', voltsAgainstMinimum(figures.statusLevelV), 'statusLevel'),
    ] : []),
    row('Channel load', ampsAgainstMaximum(figures.channelA), 'channelLoad'),
    row('Group, worst case', ampsAgainstMaximum(group?.worstA ?? null), 'groupLoad', upTo(group?.ratingA), (group?.ratingA ?? Infinity) < (group?.worstA ?? 0)),
    row('Supply, with margin', ampsAgainstMaximum(supply?.demandA ?? null), 'supplyLoad', upTo(supply?.ratingA), (supply?.ratingA ?? Infinity) < (supply?.demandA ?? 0)),
  ];
}
