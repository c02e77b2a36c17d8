import type { CircuitModel } from './circuit-model.ts';

/**
 * Netlist of one circuit with outgoing and return conductors as resistors of their own, while a set of
 * lanes runs. Nodes end in the mark, so that several cases stand in one file: `p_<box>`, `m_<box>` the
 * shared +24 V and 0 V of a box (`p_0`, `m_0` the terminals), `d_<lane>`, `e_<lane>` the device's two
 * supply terminals, `s_<box>_<lane>` a two-core lane's own core at a box. Constant current only.
 */
export function netlistOf(model: CircuitModel, running: ReadonlySet<string>, mark: string): string[] {
  const node = (name: string): string => `${name}_${mark}`;
  let count = 0;
  const lines: string[] = [];
  const resistor = (a: string, b: string, ohm: number): number => lines.push(`R${++count}_${mark} ${node(a)} ${node(b)} ${Math.max(ohm, 1e-9)}`);
  lines.push(`V0_${mark} ${node('src')} 0 ${model.volts}`, `R0_${mark} ${node('m_0')} 0 1e-9`);
  resistor('src', 'p_0', model.upstreamOhm);
  for (const [box, { parent, powerOhm }] of model.edges) {
    resistor(`p_${parent ?? 0}`, `p_${box}`, powerOhm);
    resistor(`m_${parent ?? 0}`, `m_${box}`, powerOhm);
  }
  for (const lane of model.lanes) {
    const runs = running.has(lane.id) || lane.timed;
    const box = lane.box ?? '0';
    resistor(`m_${box}`, `e_${lane.id}`, lane.ownOhm);
    if (lane.fourCore) resistor(`p_${box}`, `d_${lane.id}`, lane.ownOhm);
    else ownCore(model, lane.id, lane.box, lane.ownOhm, lane.outputDropV, lines, node, resistor);
    lines.push(`I${++count}_${mark} ${node(`d_${lane.id}`)} ${node(`e_${lane.id}`)} ${lane.motorA(runs, 24)}`);
    // The pulse comes from the terminals over a core of its own and returns over the device's 0 V.
    if (runs && lane.controlA > 0) lines.push(`I${++count}_${mark} ${node('p_0')} ${node(`e_${lane.id}`)} ${lane.controlA}`);
  }
  return lines;
}

/** A two-core lane's way out: the output's drop, then its own core through each trunk to its own cable. */
function ownCore(
  { edges }: CircuitModel, lane: string, box: string | null, ownOhm: number, dropV: number, lines: string[],
  node: (name: string) => string, resistor: (a: string, b: string, ohm: number) => number,
): void {
  const way: string[] = [];
  for (let at = box; at !== null; at = edges.get(at)!.parent) way.unshift(at);
  lines.push(`VD${lane}_${node('x')} ${node('p_0')} ${node(`s_0_${lane}`)} ${dropV}`);
  let before = '0';
  for (const at of way) {
    resistor(`s_${before}_${lane}`, `s_${at}_${lane}`, edges.get(at)!.signalOhm);
    before = at;
  }
  resistor(`s_${before}_${lane}`, `d_${lane}`, ownOhm);
}
