import type { CircuitContext, LaneContext } from '../assess-context.ts';
import type { VoltageFigure } from '../assessment.ts';
import { type FindingCode, makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';
import { ampsAgainstMaximum, formatSection, formatVolts, voltsAgainstMinimum } from '../format.ts';
import { type Lane, laneTag } from '../lane-rows.ts';
import { isStandardSection } from './conductor.ts';
import { noWorkingPoint } from './lane-voltages.ts';
import { overloadText } from './protection.ts';

const TOLERANCE_V = 1e-9;

/** Voltages of one lane against the type's minimum. */
export function voltageFindings(lane: LaneContext, findings: Finding[]): void {
  const { figures, rows: { type }, circuit } = lane;
  if (!type || !circuit) return;
  if (figures.collapsed) {
    findings.push(collapse(lane));
    return;
  }
  const { worst, idle, allOn } = figures;
  const least = type.minV - TOLERANCE_V;
  const low = worst !== null && worst.volts < least;
  const idlesLow = idle !== null && idle.volts < least;
  if (low) findings.push(below(lane, 'VD-01', worst, type.minV));
  if (idlesLow) findings.push(below(lane, 'VD-02', idle, type.minV));
  if (!low && !idlesLow && (allOn ? allOn.volts < least : worst !== null)) findings.push(belowWithAllOn(lane, type.minV));
}

function below(lane: LaneContext, code: 'VD-01' | 'VD-02', { volts, worstSet }: VoltageFigure, minV: number): Finding {
  const { rows: { dispenser }, figures } = lane;
  const set = worstSet.length;
  const when = code === 'VD-01' ? (set === 1 ? 'running alone' : `while ${set} run`) : `idling while ${set} others run`;
  return makeFinding(code, 'dispenser', dispenser.id, laneTag(lane.rows), {
    title: `${voltsAgainstMinimum(volts)} ${when}, needs ${formatVolts(minV)}`,
    detail: `${worstCaseText(lane)}${figures.worst?.bound ? ' A sound bound: no permitted set goes lower.' : ''}`,
    remedy: voltageRemedy(lane),
    compared: [{ name: 'lowest voltage', value: volts, limit: minV, unit: 'V' }],
    dispenserIds: [dispenser.id],
  });
}

function belowWithAllOn(lane: LaneContext, minV: number): Finding {
  const { rows: { dispenser }, figures } = lane;
  const volts = figures.allOn?.volts;
  return makeFinding('VD-03', 'dispenser', dispenser.id, laneTag(lane.rows), {
    title: volts === undefined ? `${NO_VOLTAGE[stopsAt(lane) === 'all-on' ? 'collapse' : 'nothing']} with all on` : `${voltsAgainstMinimum(volts)} with all on, needs ${formatVolts(minV)}`,
    detail: worstCaseText(lane),
    remedy: 'Keep forcing under control, or enlarge the cable until all may run.',
    compared: volts === undefined ? [] : [{ name: 'voltage with all on', value: volts, limit: minV, unit: 'V' }],
    dispenserIds: [dispenser.id],
  });
}

function stopsAt({ circuit }: LaneContext): ReturnType<typeof noWorkingPoint> {
  return circuit && noWorkingPoint(circuit.solution);
}

const NO_VOLTAGE = { collapse: 'The voltage collapses', nothing: 'No voltage is left at the device' } as const;

/** Constant-power loads without a working point, or a current so large that nothing is left at the device. */
function collapse(lane: LaneContext): Finding {
  const collapses = stopsAt(lane) === 'worst';
  return makeFinding('VD-04', 'dispenser', lane.rows.dispenser.id, laneTag(lane.rows), {
    title: `${NO_VOLTAGE[collapses ? 'collapse' : 'nothing']} with the worst set`,
    detail: collapses
      ? 'The loads ask for more than the cables can carry: the network has no working point. Currents and loads of its channels, circuit and supply are stated as without any drop: they are too low, and no check of them counts until this is mended.'
      : 'The drop on the way takes all that the supply gives.',
    remedy: 'Set a smaller k, enlarge the trunk, or shorten the cables.',
    dispenserIds: [lane.rows.dispenser.id],
  });
}

/** Says what all on would do, and what holds then, since k is kept by software. */
function worstCaseText({ rows: { project }, circuit: context, figures }: LaneContext): string {
  if (!context) return '';
  if (noWorkingPoint(context.solution)) return 'With all on the circuit has no working point, so its current is not known.';
  const { allOnA } = context.figures;
  const overload = overloadText(context.rows.circuit, allOnA, project.breakerDcFactor);
  const all = figures.allOn ? `With all on: ${voltsAgainstMinimum(figures.allOn.volts)}${overload ? '' : `, ${ampsAgainstMaximum(allOnA)}`}.` : '';
  return `${all} ${overload ?? 'No protection acts then: the program alone keeps the limit.'}`.trim();
}

function voltageRemedy({ rows: { dispenser }, circuit: context, figures }: LaneContext): string {
  const ways: string[] = [];
  const circuit = context?.rows.circuit;
  const k = context?.figures.largestPassingK ?? 0;
  if (circuit && k > 0 && k < (circuit.concurrencyLimit ?? Infinity)) ways.push(`set k to ${k} on ${circuit.name}`);
  const section = figures.smallestPassingMm2;
  if (section !== null && section > (dispenser.crossSectionMm2 ?? 0)) ways.push(`lay its own cable in ${formatSection(section)}`);
  if (ways.length === 0) ways.push('enlarge the trunk', 'feed it from a nearer circuit');
  const text = ways.join(', or ');
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}

/** What keeps a lane's voltage from being known: blanks and cross-sections that the tables do not hold. */
export function laneCableFindings({ rows, circuit: context }: LaneContext, findings: Finding[]): void {
  if (!context) return;
  const { dispenser, node } = rows;
  const { circuit } = context.rows;
  const section = dispenser.crossSectionMm2;
  if (dispenser.cableLengthM === null || section === null) {
    const blanks = [...(dispenser.cableLengthM === null ? ['length'] : []), ...(section === null ? ['cross-section'] : [])];
    findings.push(notComputed(rows, 'CB-01', `The cable has no ${blanks.join(' and no ')}`, `Enter the ${blanks.join(' and the ')} of its own cable.`));
  }
  if (section !== null && !isStandardSection(section)) {
    findings.push(notComputed(rows, 'CB-02', `No resistance known for ${formatSection(section)}`, 'Choose a standard cross-section from 0.5 to 16 mm².'));
  }
  if (dispenser.nodeId !== null && node?.circuitId !== circuit.id) {
    findings.push(notComputed(rows, 'CB-04', `Its box ${node?.location ?? ''} does not belong to ${circuit.name}`.replace('  ', ' '),
      `Choose a box of ${circuit.name}, or move the lane to the box’s circuit.`));
  }
}

function notComputed(rows: Lane, code: FindingCode, title: string, remedy: string): Finding {
  const { dispenser } = rows;
  return makeFinding(code, 'dispenser', dispenser.id, laneTag(rows), { title, remedy, detail: 'Its voltage is not computed.', dispenserIds: [dispenser.id] });
}

/** Trunks of one circuit that cannot be computed. */
export function trunkFindings({ rows: { circuit, nodes, parents }, solution }: CircuitContext): Finding[] {
  const findings = solution.network.tree.problems.map(({ node, kind, message }) =>
    makeFinding(kind === 'loop' ? 'CB-05' : 'CB-02', 'cable', node.id, node.cableTag, {
      title: kind === 'loop' ? `The trunk to ${node.location} runs in a loop` : message,
      detail: 'Voltages behind it are not computed.',
      remedy: kind === 'loop' ? 'Let one box of the loop hang on the cabinet.' : 'Choose a standard cross-section from 0.5 to 16 mm².',
    }),
  );
  nodes.forEach((node, i) => {
    const parent = parents[i];
    if (node.parentId === null || parent?.circuitId === circuit.id) return;
    findings.push(makeFinding('CB-04', 'cable', node.id, node.cableTag, {
      title: `${node.location} hangs on ${parent?.location ?? 'a box'} of another circuit`,
      detail: `It counts as hanging on the terminals of ${circuit.name}.`,
      remedy: `Choose a box of ${circuit.name} before it, or the cabinet.`,
    }));
  });
  return findings;
}
