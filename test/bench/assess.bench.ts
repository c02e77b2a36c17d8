import { assess, type Assessment, createAssessor, type Design } from '#calc';
import { galleryDesign } from './assess-design.ts';
import { type FloorResult, plainArithmetic } from './assess-floor.ts';
import { type Bench, interleaved } from './harness.ts';

const LANES = 10_000;
const ROUNDS = 15;

/** A project of 10,000 lanes from nothing, against a plain loop that works out the same numbers. */
async function cold() {
  const design = galleryDesign(LANES);
  compare(design, assess(design), plainArithmetic(design));
  return interleaved({
    name: 'assess 10,000 lanes', unit: '× plain-object loop', limit: 2, rounds: ROUNDS,
    floor: () => plainArithmetic(design), subject: () => assess(design),
  });
}

/** What follows an edit in such a project, against assessing it anew. */
async function afterEdit(name: string, edit: (design: Design, round: number) => Design) {
  let design = galleryDesign(LANES);
  const reassess = createAssessor();
  reassess(design);
  let round = 0;
  return interleaved({
    name, unit: '× cold assess', limit: 0.15, rounds: ROUNDS, floor: () => assess(design),
    subject: () => {
      design = edit(design, ++round);
      return reassess(design);
    },
  });
}

/** Moves a lane's control output to a spare channel of its module, and back. */
function remapped(design: Design, round: number): Design {
  const at = 3001 + 2 * (round % 500);
  const row = design.assignments[at];
  return { ...design, assignments: design.assignments.with(at, { ...row, channel: row.channel < 12 ? row.channel + 4 : row.channel - 4 }) };
}

function redosed(design: Design, round: number): Design {
  const at = (round * 37) % design.dispensers.length;
  const row = design.dispensers[at];
  return { ...design, dispensers: design.dispensers.with(at, { ...row, doseUl: row.doseUl! + 100 }) };
}

function withAnotherK(design: Design, round: number): Design {
  const at = round % design.circuits.length;
  const row = design.circuits[at];
  return { ...design, circuits: design.circuits.with(at, { ...row, concurrencyLimit: row.concurrencyLimit === 4 ? 5 : 4 }) };
}

export const benches: readonly Bench[] = [
  cold,
  () => afterEdit('reassess after one mapping edit, ratio to cold assess', remapped),
  () => afterEdit('reassess after one dose edit, ratio to cold assess', redosed),
  () => afterEdit('reassess after one change of k, ratio to cold assess', withAnotherK),
];

/** @throws where the two do not give the same numbers */
function compare(design: Design, assessment: Assessment, plain: FloorResult): void {
  plain.lanes.forEach((lane) => {
    const figures = assessment.lanes.get(lane.id)!;
    const plan = figures.plan ?? figures.timed!;
    same(`${lane.id} demand`, assessment.points.get(lane.dispenser.pointId)!.demandUlPer1000h, lane.demandUl);
    same(`${lane.id} interval`, figures.plan?.intervalMs ?? 0, lane.intervalMs);
    same(`${lane.id} pulses`, figures.plan?.pulsesPerCartridge ?? 0, lane.pulses);
    same(`${lane.id} life`, plan.lifeDays, lane.lifeDays);
    same(`${lane.id} pulses a year`, figures.plan?.pulsesPerYear ?? 0, lane.pulsesPerYear);
    same(`${lane.id} over-greasing`, plan.overGreasingPercent, lane.overPercent);
    same(`${lane.id} channel load`, figures.channelA, lane.channelA);
    same(`${lane.id} worst`, figures.worst?.volts, lane.worstV);
    same(`${lane.id} worst set`, figures.worst?.worstSet.length, lane.worstSet.length);
    same(`${lane.id} idle`, figures.idle?.volts ?? Infinity, lane.idleV);
    same(`${lane.id} all on`, figures.allOn?.volts, lane.allOnV);
    same(`${lane.id} alone`, figures.aloneV, lane.aloneV);
    same(`${lane.id} smallest section`, figures.smallestPassingMm2, lane.smallestMm2);
    same(`${lane.id} pulse level`, figures.pulseLevelV, lane.pulseLevelV);
    same(`${lane.id} status level`, figures.statusLevelV, lane.statusLevelV);
    figures.profile.forEach(({ worstV, aloneV }, s) => {
      same(`${lane.id} profile ${s}`, worstV, lane.profile[s].worstV);
      same(`${lane.id} profile alone ${s}`, aloneV, lane.profile[s].aloneV);
    });
  });
  plain.circuits.forEach(({ circuit, standingA, worstA, allOnA, lowestV, shortA, largestK }) => {
    const figures = assessment.circuits.get(circuit.id)!;
    same(`${circuit.id} standing`, figures.standingA, standingA);
    same(`${circuit.id} worst`, figures.worstA, worstA);
    same(`${circuit.id} all on`, figures.allOnA, allOnA);
    same(`${circuit.id} lowest`, figures.lowestV, lowestV);
    same(`${circuit.id} short circuit`, figures.shortCircuitA, shortA);
    same(`${circuit.id} largest k`, figures.largestPassingK, largestK);
  });
  design.supplies.forEach(({ id }, i) => {
    same(`${id} worst`, assessment.supplies.get(id)!.worstA, plain.supplies[i].worstA);
    same(`${id} all on`, assessment.supplies.get(id)!.allOnA, plain.supplies[i].allOnA);
  });
  const outputs = design.modules.filter(({ typeId }) => typeId === 'out-16');
  outputs.forEach(({ id }, m) => {
    same(`${id} worst`, assessment.modules.get(id)!.worstA, plain.modules[m].worstA);
    for (const g of [0, 1]) same(`${id}/${g} worst`, assessment.groups.get(`${id}/${g}`)!.worstA, plain.groups[2 * m + g].worstA);
  });
  const unlimited = new Set(['PR-04', 'SP-01']);
  same('findings', assessment.findings.filter(({ code }) => !unlimited.has(code)).length, plain.exceeded);
}

function same(what: string, value: number | null | undefined, expected: number | null): void {
  if (value === expected) return;
  if (value != null && expected !== null && Math.abs(value - expected) <= 1e-9 * Math.max(1, Math.abs(expected))) return;
  throw new Error(`${what}: assess says ${value}, the plain loop ${expected}`);
}
