import type { LaneContext } from './assess-context.ts';
import { surfaceFinding, unstatedZones, zoneFinding } from './area/zone.ts';
import type { Design, Dispenser } from './design.ts';
import type { DesignIndex } from './design-index.ts';
import type { Finding } from './findings.ts';
import { addressFindings } from './hardware/address.ts';
import { channelFindings } from './hardware/load-findings.ts';
import { doubleSignals, laneMappingFindings } from './mapping/mapping-findings.ts';
import { spareFindings } from './mapping/spare.ts';
import { tagFindings } from './mapping/tag-findings.ts';
import { signalFindings } from './wiring/signal-findings.ts';
import { laneCableFindings, voltageFindings } from './wiring/voltage-findings.ts';

/** Adds the findings of one lane's chain. */
export function laneFindings(lane: LaneContext, findings: Finding[]): void {
  laneMappingFindings(lane, findings);
  laneCableFindings(lane, findings);
  voltageFindings(lane, findings);
  channelFindings(lane, findings);
  signalFindings(lane, findings);
  const { point, dispenser, type } = lane.rows;
  if (!point) return;
  for (const finding of [zoneFinding(point, dispenser.id, type), surfaceFinding(point, dispenser.id, type)]) if (finding) findings.push(finding);
}

interface DesignCheck {
  readonly check: (index: DesignIndex) => Finding[];
  /** The collections whose rows it looks at; of dispensers only id, point and cable tag. */
  readonly reads: readonly (keyof Design)[];
}

/** Checks that look at a design as a whole. */
const DESIGN_CHECKS: readonly DesignCheck[] = [
  { check: addressFindings, reads: ['modules', 'moduleTypes', 'controllers'] },
  { check: doubleSignals, reads: ['assignments', 'dispensers', 'points'] },
  { check: spareFindings, reads: ['project', 'modules', 'moduleTypes', 'controllers', 'cabinets', 'assignments'] },
  { check: tagFindings, reads: ['dispensers', 'points', 'cableNodes', 'cabinets', 'supplies', 'modules', 'controllers'] },
  { check: unstatedZones, reads: ['project', 'points', 'dispensers'] },
];

/** What the checks of the whole found, check by check. */
export interface DesignFindings {
  readonly design: Design;
  readonly findings: readonly (readonly Finding[])[];
}

/** Findings of the design as a whole; those of a check whose collections are the same arrays are taken over. */
export function designFindings(index: DesignIndex, previous: DesignFindings | null): DesignFindings {
  const { design } = index;
  const sameNames = previous !== null && sameDispenserNames(previous.design.dispensers, design.dispensers);
  const isSame = (name: keyof Design): boolean => previous?.design[name] === design[name] || (name === 'dispensers' && sameNames);
  const findings = DESIGN_CHECKS.map(({ check, reads }, i) => (previous && reads.every(isSame) ? previous.findings[i] : check(index)));
  return { design, findings };
}

/** Whether dispensers have the same names in the same order: all that checks of the whole read of them. */
function sameDispenserNames(a: readonly Dispenser[], b: readonly Dispenser[]): boolean {
  return a.length === b.length && a.every((d, i) => d === b[i] || (d.id === b[i].id && d.pointId === b[i].pointId && d.cableTag === b[i].cableTag));
}
