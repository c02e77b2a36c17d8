import type { SupplyContext } from '../assess-context.ts';
import type { SupplyFigures } from '../assessment.ts';
import { makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';
import { ampsAgainstMaximum, ampsAgainstMinimum, formatNumber } from '../format.ts';
import type { SolvedSupply, SupplyRows } from '../wiring/supply-network.ts';

const TOLERANCE_A = 1e-9;
const ONE_OF_PAIR = ' One of the redundant pair must carry all, so one rating counts; both must be equal.';

/** A supply against its rating at the cabinet's temperature, under the limits and with all on. */
export function supplyFindings({ solved, figures }: SupplyContext): Finding[] {
  const findings: Finding[] = [];
  const lacks = withoutWorkingPoint(solved);
  if (lacks.worst.length > 0) findings.push(notComputable(solved.rows, figures, lacks.worst));
  if (figures.demandA > figures.ratingA + TOLERANCE_A) findings.push(overRating(solved.rows, figures));
  else if (lacks.worst.length === 0 && (figures.allOnA > figures.ratingA + TOLERANCE_A || lacks.allOn.length > 0)) {
    findings.push(overWithAllOn(solved.rows, figures, lacks.allOn.length > 0));
  }
  return findings;
}

/** Circuits of a supply that have no working point, by name: with the worst set, with all on. */
function withoutWorkingPoint({ circuits }: SolvedSupply): { worst: string[]; allOn: string[] } {
  return {
    worst: circuits.filter(({ worst }) => worst.collapsed).map(({ network }) => network.circuit.name),
    allOn: circuits.filter(({ allOn }) => allOn.collapsed).map(({ network }) => network.circuit.name),
  };
}

function notComputable(rows: SupplyRows, figures: SupplyFigures, names: readonly string[]): Finding {
  return makeFinding('SU-03', 'supply', rows.supply.id, labelOf(rows), {
    title: `The load cannot be computed: no working point on ${names.join(', ')}`,
    detail: `The loads take at least ${ampsAgainstMinimum(figures.worstA)}, which they would at the voltage without any drop. Nothing says yet that the supply carries them.`,
    remedy: 'Mend the voltage collapse first (VD-04).',
  });
}

function overRating(rows: SupplyRows, figures: SupplyFigures): Finding {
  const { supply, project } = rows;
  const margin = formatNumber(project.supplyMarginPercent);
  return makeFinding('SU-01', 'supply', supply.id, labelOf(rows), {
    title: `${ampsAgainstMaximum(figures.demandA)} asked of the supply, rating ${ratingText(rows, figures)}`,
    detail: `Worst load ${ampsAgainstMaximum(figures.worstA)} with ${margin} % margin; standing ${ampsAgainstMaximum(figures.standingA)}; with all on ${ampsAgainstMaximum(figures.allOnA)}.${supply.redundant ? ONE_OF_PAIR : ''}`,
    remedy: `Set a smaller k on its circuits, choose a larger supply${supply.redundant ? ' for both of the pair' : ''}, or cool the cabinet.`,
    compared: [{ name: 'load with margin', value: figures.demandA, limit: figures.ratingA, unit: 'A' }],
  });
}

function overWithAllOn(rows: SupplyRows, figures: SupplyFigures, collapses: boolean): Finding {
  const { supply } = rows;
  const amps = collapses ? `At least ${ampsAgainstMinimum(figures.allOnA)}` : ampsAgainstMaximum(figures.allOnA);
  return makeFinding('SU-02', 'supply', supply.id, labelOf(rows), {
    title: `${amps} if all run at once, rating ${ratingText(rows, figures)}`,
    detail: `${collapses ? 'With all on a circuit has no working point, so the load is larger than is known. ' : ''}The program alone keeps the limits; if they fail, the supply limits its current and every voltage on it falls.${supply.redundant ? ONE_OF_PAIR : ''}`,
    remedy: 'Choose a larger supply, or keep forcing under control.',
    compared: [{ name: 'load with all on', value: figures.allOnA, limit: figures.ratingA, unit: 'A' }],
  });
}

function labelOf({ cabinet, supply }: SupplyRows): string {
  return `${cabinet?.location ?? ''}${supply.name}`;
}

function ratingText({ cabinet }: SupplyRows, { ratingA }: SupplyFigures): string {
  return `${ampsAgainstMinimum(ratingA)} at ${formatNumber(cabinet?.temperatureC)} °C`;
}
