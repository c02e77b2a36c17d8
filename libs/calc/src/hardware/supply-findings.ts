import type { Electrics } from '../assess-context.ts';
import { makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';
import { ampsAgainstMaximum, ampsAgainstMinimum, formatNumber } from '../format.ts';

/** Supplies against their rating at the cabinet's temperature, under the limits and with all on. */
export function supplyFindings({ index, supplies }: Electrics): Finding[] {
  const findings: Finding[] = [];
  for (const supply of index.design.supplies) {
    const figures = supplies.get(supply.id);
    if (!figures) continue;
    const cabinet = index.cabinets.get(supply.cabinetId);
    const label = `${cabinet?.location ?? ''}${supply.name}`;
    const over = figures.demandA > figures.ratingA + 1e-9;
    if (!over && figures.allOnA <= figures.ratingA + 1e-9) continue;
    const margin = formatNumber(index.design.project.supplyMarginPercent);
    const rating = `${ampsAgainstMinimum(figures.ratingA)} at ${formatNumber(cabinet?.temperatureC)} °C`;
    const amps = over ? figures.demandA : figures.allOnA;
    findings.push(
      makeFinding(over ? 'SU-01' : 'SU-02', 'supply', supply.id, label, {
        title: over
          ? `${ampsAgainstMaximum(amps)} asked of the supply, rating ${rating}`
          : `${ampsAgainstMaximum(amps)} if all run at once, rating ${rating}`,
        detail: over
          ? `Worst load ${ampsAgainstMaximum(figures.worstA)} with ${margin} % margin; standing ${ampsAgainstMaximum(figures.standingA)}; with all on ${ampsAgainstMaximum(figures.allOnA)}.`
          : 'The program alone keeps the limits; if they fail, the supply limits its current and every voltage on it falls.',
        remedy: over ? 'Set a smaller k on its circuits, choose a larger supply, or cool the cabinet' : 'Choose a larger supply, or keep forcing under control',
        compared: [{ name: over ? 'load with margin' : 'load with all on', value: amps, limit: figures.ratingA, unit: 'A' }],
        dispenserIds: [],
      }),
    );
  }
  return findings;
}
