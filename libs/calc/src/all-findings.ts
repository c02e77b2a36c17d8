import type { Electrics, LaneContext } from './assess-context.ts';
import { surfaceFinding, unstatedZones, zoneFinding } from './area/zone.ts';
import type { Finding, Severity } from './findings.ts';
import { addressFindings } from './hardware/address.ts';
import { channelFindings, loadFindings } from './hardware/load-findings.ts';
import { supplyFindings } from './hardware/supply-findings.ts';
import { laneMappingFindings, moduleMappingFindings } from './mapping/mapping-findings.ts';
import { spareFindings } from './mapping/spare.ts';
import { tagFindings } from './mapping/tag-findings.ts';
import { protectionFindings } from './wiring/protection-findings.ts';
import { signalFindings } from './wiring/signal-findings.ts';
import { laneCableFindings, trunkFindings, voltageFindings } from './wiring/voltage-findings.ts';

/** Findings of one lane. */
export function laneFindings(lane: LaneContext): Finding[] {
  const point = lane.index.points.get(lane.dispenser.pointId);
  const area = point ? [zoneFinding(point, lane.dispenser.id, lane.type), surfaceFinding(point, lane.dispenser.id, lane.type)] : [];
  return [
    ...laneMappingFindings(lane),
    ...laneCableFindings(lane),
    ...voltageFindings(lane),
    ...channelFindings(lane),
    ...signalFindings(lane),
    ...area.filter((finding) => finding !== null),
  ];
}

/** Findings of everything that is not one lane. */
export function placeFindings(electrics: Electrics): Finding[] {
  const { index } = electrics;
  const findings = [
    ...loadFindings(electrics),
    ...supplyFindings(electrics),
    ...addressFindings(index),
    ...moduleMappingFindings(index),
    ...spareFindings(index),
    ...tagFindings(index),
    ...unstatedZones(index),
  ];
  for (const circuit of electrics.circuits.values()) findings.push(...protectionFindings(circuit), ...trunkFindings(circuit));
  return findings;
}

const ORDER: Readonly<Record<Severity, number>> = { error: 0, warning: 1, note: 2 };

/** Sorts in place: errors first, then warnings, then notes; by code, subject label and key. */
export function sortFindings(findings: Finding[]): void {
  findings.sort(
    (a, b) =>
      ORDER[a.severity] - ORDER[b.severity] || compare(a.code, b.code) || compare(a.subject.label, b.subject.label) || compare(a.key, b.key),
  );
}

/** By code units: the same order on every machine. */
function compare(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
