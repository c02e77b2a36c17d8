import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assess, type Design } from '#calc';
import { modelOf } from '#support/circuit-model.ts';
import { netlistOf } from '#support/netlist.ts';
import { hasNgspice, printedFigures, runNgspice } from '#support/outside-tools.ts';
import { arbitraryCircuit } from '#support/random-circuit.ts';

const SEED = 20_240;

interface Expected {
  readonly expression: string;
  readonly volts: number;
  readonly where: string;
}

/** The voltages at every station of one lane, each with the simulator's expression for it. */
function expectedVoltages(design: Design, laneId: string, mark: string): { lines: string[]; expected: Expected[] } {
  const supplyV = design.supplies[0].setV * (1 - design.supplyTypes[0].tolerancePercent! / 100);
  const lane = assess(design).lanes.get(laneId)!;
  const lines = netlistOf(modelOf(design, supplyV), new Set(lane.worst!.worstSet), mark);
  const dispenser = design.dispensers.find((d) => d.id === laneId)!;
  const way: string[] = [];
  for (let box = dispenser.nodeId; box !== null; box = design.cableNodes.find((n) => n.id === box)!.parentId) way.unshift(box);
  const expected = ['0', ...way].map((box, i) => {
    const plus = dispenser.wiring === 'four-core' ? `p_${box}_${mark}` : `s_${box}_${laneId}_${mark}`;
    return { expression: `v(${plus})-v(m_${box}_${mark})`.toLowerCase(), volts: lane.profile[i + 1].worstV, where: lane.profile[i + 1].label };
  });
  const device = `v(d_${laneId}_${mark})-v(e_${laneId}_${mark})`.toLowerCase();
  return { lines, expected: [...expected, { expression: device, volts: lane.worst!.volts, where: 'device' }] };
}

describe.runIf(hasNgspice)('a random tree of twelve mixed loads against ngspice, worst set of each lane applied', () => {
  it.each(fc.sample(arbitraryCircuit({ lanes: 12 }), { seed: SEED, numRuns: 4 }).map((design, i) => ({ design, i })))(
    'tree $i: every station of every lane within 1e-6 V',
    ({ design }) => {
      const cases = design.dispensers.map((d, t) => expectedVoltages(design, d.id, `t${t}`));
      const netlist = [
        '* circuit with separate outgoing and return conductors',
        ...cases.flatMap((one) => one.lines),
        '.options reltol=1e-12 abstol=1e-15 vntol=1e-12 gmin=1e-20',
        '.control', 'set numdgt=12', 'op',
        ...cases.flatMap((one) => one.expected.map(({ expression }) => `print ${expression}`)),
        '.endc', '.end', '',
      ].join('\n');
      const printed = printedFigures(runNgspice(netlist));
      for (const { expected } of cases) {
        for (const { expression, volts, where } of expected) {
          expect(Math.abs(printed.get(expression)! - volts), `${where}: ${expression}`).toBeLessThan(1e-6);
        }
      }
    },
    30_000,
  );
});
