import type { Electrics } from '../assess-context.ts';
import type { SupplyFigures } from '../assessment.ts';
import type { Supply } from '../design.ts';
import { makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';
import { ampsAgainstMaximum, ampsAgainstMinimum, formatNumber } from '../format.ts';

const TOLERANCE_A = 1e-9;
const ONE_OF_PAIR = ' One of the redundant pair must carry all, so one rating counts; both must be equal.';

/** Supplies against their rating at the cabinet's temperature, under the limits and with all on. */
export function supplyFindings(electrics: Electrics): Finding[] {
  const { index, supplies } = electrics;
  const findings: Finding[] = [];
  for (const supply of index.design.supplies) {
    const figures = supplies.get(supply.id);
    if (!figures) continue;
    const lacks = withoutWorkingPoint(electrics, supply);
    if (lacks.worst.length > 0) findings.push(notComputable(electrics, supply, figures, lacks.worst));
    if (figures.demandA > figures.ratingA + TOLERANCE_A) findings.push(overRating(electrics, supply, figures));
    else if (lacks.worst.length === 0 && (figures.allOnA > figures.ratingA + TOLERANCE_A || lacks.allOn.length > 0)) {
      findings.push(overWithAllOn(electrics, supply, figures, lacks.allOn.length > 0));
    }
  }
  return findings;
}

/** Circuits of a supply that have no working point, by name: with the worst set, with all on. */
function withoutWorkingPoint({ index, circuits }: Electrics, supply: Supply): { worst: string[]; allOn: string[] } {
  const solved = (index.circuitsBySupply.get(supply.id) ?? []).map(({ id, name }) => ({ name, solution: circuits.get(id)?.solution }));
  return {
    worst: solved.filter(({ solution }) => solution?.worst.collapsed).map(({ name }) => name),
    allOn: solved.filter(({ solution }) => solution?.allOn.collapsed).map(({ name }) => name),
  };
}

function notComputable(electrics: Electrics, supply: Supply, figures: SupplyFigures, names: readonly string[]): Finding {
  return makeFinding('SU-03', 'supply', supply.id, labelOf(electrics, supply), {
    title: `The load cannot be computed: no working point on ${names.join(', ')}`,
    detail: `The loads take at least ${ampsAgainstMinimum(figures.worstA)}, which they would at the voltage without any drop. Nothing says yet that the supply carries them.`,
    remedy: 'Mend the voltage collapse first (VD-04).',
  });
}

function overRating(electrics: Electrics, supply: Supply, figures: SupplyFigures): Finding {
  const margin = formatNumber(electrics.index.design.project.supplyMarginPercent);
  return makeFinding('SU-01', 'supply', supply.id, labelOf(electrics, supply), {
    title: `${ampsAgainstMaximum(figures.demandA)} asked of the supply, rating ${ratingText(electrics, supply, figures)}`,
    detail: `Worst load ${ampsAgainstMaximum(figures.worstA)} with ${margin} % margin; standing ${ampsAgainstMaximum(figures.standingA)}; with all on ${ampsAgainstMaximum(figures.allOnA)}.${supply.redundant ? ONE_OF_PAIR : ''}`,
    remedy: `Set a smaller k on its circuits, choose a larger supply${supply.redundant ? ' for both of the pair' : ''}, or cool the cabinet.`,
    compared: [{ name: 'load with margin', value: figures.demandA, limit: figures.ratingA, unit: 'A' }],
  });
}

function overWithAllOn(electrics: Electrics, supply: Supply, figures: SupplyFigures, collapses: boolean): Finding {
  const amps = collapses ? `At least ${ampsAgainstMinimum(figures.allOnA)}` : ampsAgainstMaximum(figures.allOnA);
  return makeFinding('SU-02', 'supply', supply.id, labelOf(electrics, supply), {
    title: `${amps} if all run at once, rating ${ratingText(electrics, supply, figures)}`,
    detail: `${collapses ? 'With all on a circuit has no working point, so the load is larger than is known. ' : ''}The program alone keeps the limits; if they fail, the supply limits its current and every voltage on it falls.${supply.redundant ? ONE_OF_PAIR : ''}`,
    remedy: 'Choose a larger supply, or keep forcing under control.',
    compared: [{ name: 'load with all on', value: figures.allOnA, limit: figures.ratingA, unit: 'A' }],
  });
}

function labelOf({ index }: Electrics, supply: Supply): string {
  return `${index.cabinets.get(supply.cabinetId)?.location ?? ''}${supply.name}`;
}

function ratingText({ index }: Electrics, supply: Supply, { ratingA }: SupplyFigures): string {
  return `${ampsAgainstMinimum(ratingA)} at ${formatNumber(index.cabinets.get(supply.cabinetId)?.temperatureC)} °C`;
}
