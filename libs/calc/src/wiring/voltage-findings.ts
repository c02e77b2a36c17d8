import type { CircuitContext, LaneContext } from '../assess-context.ts';
import { makeFinding } from '../finding-codes.ts';
import type { Finding } from '../findings.ts';
import { ampsAgainstMaximum, formatSection, formatVolts, voltsAgainstMinimum } from '../format.ts';
import { isStandardSection } from './conductor.ts';
import { overloadText } from './protection.ts';

const TOLERANCE_V = 1e-9;

/** Voltages of one lane against the type's minimum. */
export function voltageFindings(lane: LaneContext): Finding[] {
  const { figures, type, voltages } = lane;
  if (!type || !voltages) return [];
  if (figures.collapsed) return [collapse(lane)];
  const low = (volts: number | undefined): volts is number => volts !== undefined && volts < type.minV - TOLERANCE_V;
  const findings: Finding[] = [];
  if (low(figures.worst?.volts)) findings.push(below(lane, 'VD-01', figures.worst.volts, type.minV));
  if (low(figures.idle?.volts)) findings.push(below(lane, 'VD-02', figures.idle.volts, type.minV));
  if (findings.length === 0 && (low(figures.allOn?.volts) || (figures.worst && !figures.allOn))) findings.push(belowWithAllOn(lane, type.minV));
  return findings;
}

function below(lane: LaneContext, code: 'VD-01' | 'VD-02', volts: number, minV: number): Finding {
  const { dispenser, tag, figures } = lane;
  const set = (code === 'VD-01' ? figures.worst! : figures.idle!).worstSet.length;
  const when = code === 'VD-01' ? (set === 1 ? 'running alone' : `while ${set} run`) : `idling while ${set} others run`;
  return makeFinding(code, 'dispenser', dispenser.id, tag, {
    title: `${voltsAgainstMinimum(volts)} ${when}, needs ${formatVolts(minV)}`,
    detail: `${worstCaseText(lane)}${figures.worst?.bound ? ' A sound bound: no permitted set goes lower.' : ''}`,
    remedy: voltageRemedy(lane),
    compared: [{ name: 'lowest voltage', value: volts, limit: minV, unit: 'V' }],
    dispenserIds: [dispenser.id],
  });
}

function belowWithAllOn(lane: LaneContext, minV: number): Finding {
  const { dispenser, tag, figures } = lane;
  const volts = figures.allOn?.volts;
  return makeFinding('VD-03', 'dispenser', dispenser.id, tag, {
    title: volts === undefined ? `${NO_VOLTAGE[lane.voltages?.noWorkingPoint === 'all-on' ? 'collapse' : 'nothing']} with all on` : `${voltsAgainstMinimum(volts)} with all on, needs ${formatVolts(minV)}`,
    detail: worstCaseText(lane),
    remedy: 'Keep forcing under control, or enlarge the cable until all may run.',
    compared: volts === undefined ? [] : [{ name: 'voltage with all on', value: volts, limit: minV, unit: 'V' }],
    dispenserIds: [dispenser.id],
  });
}

const NO_VOLTAGE = { collapse: 'The voltage collapses', nothing: 'No voltage is left at the device' } as const;

/** Constant-power loads without a working point, or a current so large that nothing is left at the device. */
function collapse(lane: LaneContext): Finding {
  const collapses = lane.voltages?.noWorkingPoint === 'worst';
  return makeFinding('VD-04', 'dispenser', lane.dispenser.id, lane.tag, {
    title: `${NO_VOLTAGE[collapses ? 'collapse' : 'nothing']} with the worst set`,
    detail: collapses
      ? 'The loads ask for more than the cables can carry: the network has no working point. Currents and loads of its channels, circuit and supply are stated as without any drop: they are too low, and no check of them counts until this is mended.'
      : 'The drop on the way takes all that the supply gives.',
    remedy: 'Set a smaller k, enlarge the trunk, or shorten the cables.',
    dispenserIds: [lane.dispenser.id],
  });
}

/** Says what all on would do, and what holds then, since k is kept by software. */
function worstCaseText({ index, circuit, circuitFigures, figures, voltages }: LaneContext): string {
  if (!circuit || !circuitFigures) return '';
  if (voltages?.noWorkingPoint) return 'With all on the circuit has no working point, so its current is not known.';
  const { allOnA } = circuitFigures;
  const overload = overloadText(circuit, allOnA, index.design.project.breakerDcFactor);
  const all = figures.allOn ? `With all on: ${voltsAgainstMinimum(figures.allOn.volts)}${overload ? '' : `, ${ampsAgainstMaximum(allOnA)}`}.` : '';
  return `${all} ${overload ?? 'No protection acts then: the program alone keeps the limit.'}`.trim();
}

function voltageRemedy({ circuit, circuitFigures, figures, dispenser }: LaneContext): string {
  const ways: string[] = [];
  const k = circuitFigures?.largestPassingK ?? 0;
  if (circuit && k > 0 && k < (circuit.concurrencyLimit ?? Infinity)) ways.push(`set k to ${k} on ${circuit.name}`);
  const section = figures.smallestPassingMm2;
  if (section !== null && section > (dispenser.crossSectionMm2 ?? 0)) ways.push(`lay its own cable in ${formatSection(section)}`);
  if (ways.length === 0) ways.push('enlarge the trunk', 'feed it from a nearer circuit');
  const text = ways.join(', or ');
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}

/** What keeps a lane's voltage from being known: blanks and cross-sections that the tables do not hold. */
export function laneCableFindings({ dispenser, tag, circuit, index }: LaneContext): Finding[] {
  if (!circuit) return [];
  const findings: Finding[] = [];
  const about = { dispenserIds: [dispenser.id] };
  const blanks = [
    ...(dispenser.cableLengthM === null ? ['length'] : []),
    ...(dispenser.crossSectionMm2 === null ? ['cross-section'] : []),
  ];
  if (blanks.length > 0) {
    findings.push(makeFinding('CB-01', 'dispenser', dispenser.id, tag, {
      ...about,
      title: `The cable has no ${blanks.join(' and no ')}`,
      detail: 'Its voltage is not computed.',
      remedy: `Enter the ${blanks.join(' and the ')} of its own cable.`,
    }));
  }
  const section = dispenser.crossSectionMm2;
  if (section !== null && !isStandardSection(section)) {
    findings.push(makeFinding('CB-02', 'dispenser', dispenser.id, tag, {
      ...about,
      title: `No resistance known for ${formatSection(section)}`,
      detail: 'Its voltage is not computed.',
      remedy: 'Choose a standard cross-section from 0.5 to 16 mm².',
    }));
  }
  const node = dispenser.nodeId === null ? null : index.nodes.get(dispenser.nodeId);
  if (node !== null && node?.circuitId !== circuit.id) {
    findings.push(makeFinding('CB-04', 'dispenser', dispenser.id, tag, {
      ...about,
      title: `Its box ${node?.location ?? ''} does not belong to ${circuit.name}`.replace('  ', ' '),
      detail: 'Its voltage is not computed.',
      remedy: `Choose a box of ${circuit.name}, or move the lane to the box’s circuit.`,
    }));
  }
  return findings;
}

/** Trunks of one circuit that cannot be computed. */
export function trunkFindings({ index, circuit, solution }: CircuitContext): Finding[] {
  const findings = solution.network.tree.problems.map(({ node, kind, message }) =>
    makeFinding(kind === 'loop' ? 'CB-05' : 'CB-02', 'cable', node.id, node.cableTag, {
      title: kind === 'loop' ? `The trunk to ${node.location} runs in a loop` : message,
      detail: 'Voltages behind it are not computed.',
      remedy: kind === 'loop' ? 'Let one box of the loop hang on the cabinet.' : 'Choose a standard cross-section from 0.5 to 16 mm².',
    }),
  );
  for (const node of index.nodesByCircuit.get(circuit.id) ?? []) {
    const parent = node.parentId === null ? null : index.nodes.get(node.parentId);
    if (parent === null || parent?.circuitId === circuit.id) continue;
    findings.push(makeFinding('CB-04', 'cable', node.id, node.cableTag, {
      title: `${node.location} hangs on ${parent?.location ?? 'a box'} of another circuit`,
      detail: `It counts as hanging on the terminals of ${circuit.name}.`,
      remedy: `Choose a box of ${circuit.name} before it, or the cabinet.`,
    }));
  }
  return findings;
}
