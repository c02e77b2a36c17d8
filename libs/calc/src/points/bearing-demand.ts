import type { PointFigures } from '../assessment.ts';
import type { BearingFactors, Point } from '../design.ts';
import { formatNumber } from '../format.ts';
import { demandFigures, isPositive, refuse, refuseMissing, refuseNotPositive } from './demand-result.ts';
import { exact, minus, over, ratio, sqrtUp, times, toNumber, type Rational } from './exact.ts';
import { certainCeil } from './whole-numbers.ts';

/** Largest factor of the published table: 10 for the design of ball bearings, 1 for all others. */
const FACTOR_MAX: Readonly<Record<keyof BearingFactors, number>> = {
  temperature: 1, contamination: 1, moisture: 1, vibration: 1, position: 1, design: 10,
};

const FACTOR_NAMES = Object.keys(FACTOR_MAX) as readonly (keyof BearingFactors)[];

/** The bearing's data once nothing is blank: mm and rpm. */
interface Bearing {
  readonly bore: number;
  readonly outside: number;
  readonly width: number;
  readonly rpm: number;
}

/**
 * Demand from the bearing: replenishment mass G = 0.005·D·B (g; mm) every
 * T = K·(14·10⁶/(n·√d) − 4·d) hours (rpm, mm); demand = 1000·G/(ρ·T) cm³ per 1,000 h. An irrational
 * √d is taken at its upper neighbour, which shortens T: the demand never comes out low.
 * Source: common bearing formula (empirical), its factor table K = Ft·Fc·Fm·Fv·Fp·Fd.
 */
export function bearingDemand(point: Point, densityGPerCm3: number | null): PointFigures {
  const { boreMm, outsideMm, widthMm, speedRpm, factors } = point;
  if (boreMm === null || outsideMm === null || widthMm === null || speedRpm === null) return refuseBlank(point);
  if (densityGPerCm3 === null) return refuse('Choose the grease, whose density turns the mass into a volume, or state the demand.');
  const bearing = { bore: boreMm, outside: outsideMm, width: widthMm, rpm: speedRpm };
  const refused = refuseWrong(bearing, factors, densityGPerCm3);
  if (refused) return refused;
  const certain = certainDemand(bearing, factors, densityGPerCm3);
  if (certain !== null) return { demandUlPer1000h: certain, refusal: null };
  const hours = times(hoursBeforeFactors(bearing), factorK(factors));
  return hours.num > 0n ? demandEach(hours, bearing, densityGPerCm3) : refuseSpeed(bearing.bore, bearing.rpm);
}

function refuseBlank({ boreMm, outsideMm, widthMm, speedRpm }: Point): PointFigures {
  return refuseMissing(
    { 'the bore': boreMm, 'the outside diameter': outsideMm, 'the width': widthMm, 'the speed': speedRpm },
    ', or state the demand',
  )!;
}

/** The formula in doubles, where they tell for certain what the demand rounds up to; null near the end of its range and near whole numbers. */
function certainDemand({ bore, outside, width, rpm }: Bearing, factors: BearingFactors, density: number): number | null {
  const { temperature, contamination, moisture, vibration, position, design } = factors;
  const speedTerm = 14e6 / (rpm * Math.sqrt(bore));
  const hours = speedTerm - 4 * bore;
  // A difference much smaller than its terms has lost the digits that decide.
  if (!(hours > speedTerm * 0.01)) return null;
  const factor = temperature * contamination * moisture * vibration * position * design;
  return certainCeil((5000 * outside * width) / (density * factor * hours));
}

/** The formula's intermediate figures, for explanations: unrounded. */
export interface BearingSteps {
  /** Replenishment mass G, g. */
  readonly grams: number;
  /** Product of the six factors. */
  readonly factorK: number;
  /** Interval T, h. */
  readonly hours: number;
}

/** Mass and interval between which `bearingDemand` divides; null where it refuses. */
export function bearingSteps(point: Point, densityGPerCm3: number | null): BearingSteps | null {
  if (bearingDemand(point, densityGPerCm3).refusal !== null) return null;
  const bearing = { bore: point.boreMm!, outside: point.outsideMm!, width: point.widthMm!, rpm: point.speedRpm! };
  return {
    grams: toNumber(massOf(bearing)),
    factorK: toNumber(factorK(point.factors)),
    hours: toNumber(times(factorK(point.factors), hoursBeforeFactors(bearing))),
  };
}

function demandEach(hours: Rational, bearing: Bearing, density: number): PointFigures {
  // g ÷ (g/cm³) is cm³; ×1000 to µL and ×1000 to 1,000 h.
  return demandFigures(over(times(ratio(1_000_000n, 1n), massOf(bearing)), times(exact(density), hours)));
}

/** 0.005·D·B, grams. */
function massOf({ outside, width }: Bearing): Rational {
  return times(ratio(5n, 1000n), exact(outside), exact(width));
}

/** 14·10⁶/(n·√d) − 4·d, hours. */
function hoursBeforeFactors({ bore, rpm }: Bearing): Rational {
  const d = exact(bore);
  return minus(over(ratio(14_000_000n, 1n), times(exact(rpm), sqrtUp(d))), times(ratio(4n, 1n), d));
}

function factorK(factors: BearingFactors): Rational {
  return times(...FACTOR_NAMES.map((name) => exact(factors[name])));
}

function refuseWrong(bearing: Bearing, factors: BearingFactors, density: number): PointFigures | null {
  const { bore, outside, width, rpm } = bearing;
  if (!(isPositive(bore) && isPositive(outside) && isPositive(width) && isPositive(rpm) && isPositive(density))) {
    return refuseNotPositive({ bore, 'outside diameter': outside, width, speed: rpm, 'the density of the grease': density });
  }
  if (outside <= bore) {
    return refuse(`Correct the bearing: outside diameter ${mm(outside)} is not above bore ${mm(bore)}.`);
  }
  const factor = FACTOR_NAMES.find((name) => !(factors[name] > 0 && factors[name] <= FACTOR_MAX[name]));
  return factor === undefined
    ? null
    : refuse(`Correct the ${factor} factor: ${factors[factor]} is not above 0 and at most ${FACTOR_MAX[factor]}, the range of the factor table.`);
}

/** The formula gives T = 0 at n₀ = 3.5·10⁶/d^1.5 and nothing of use above it. */
function refuseSpeed(bore: number, rpm: number): PointFigures {
  const limit = 3.5e6 / bore ** 1.5;
  const where = rpm > limit ? 'above' : 'at the end of';
  return refuse(
    `Speed ${formatNumber(rpm)} rpm is ${where} the formula’s range for bore ${mm(bore)} (${formatNumber(Math.floor(limit + 1e-9))} rpm); `
    + 'take the interval from the bearing maker’s data and state the demand.',
  );
}

function mm(value: number): string {
  return `${formatNumber(value)} mm`;
}

/** The six factors in the order of the table. */
export function factorNames(): readonly (keyof BearingFactors)[] {
  return FACTOR_NAMES;
}
