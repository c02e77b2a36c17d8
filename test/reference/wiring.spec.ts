import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { assess, type Design, INPUT_LIMITS, type LaneFigures, ohmPerMetre, STANDARD_SECTIONS_MM2 } from '#calc';
import { buildDesign, buildFourCoreType, buildLane, buildNode, buildProject, buildSupply, buildSupplyType } from '#support/design-builder.ts';
import { convert, hasNgspice, hasUnits, printedFigures, runNgspice } from '#support/outside-tools.ts';
import { idRange, reference } from '#support/reference-values.ts';
import { awgAreaMm2, awgDiameterMm, awgOhmPerMetre, awgSolidOhmPerMetre, COPPER_RESISTIVITY_20 } from '../../libs/calc/src/wiring/awg.ts';
import { COPPER_ALPHA_20, temperatureFactor } from '../../libs/calc/src/wiring/conductor.ts';

describe('metric conductors against IEC 60228', () => {
  const rows = idRange(1, 1, 18).map((id, i) => ({ ...reference(id), mm2: STANDARD_SECTIONS_MM2[i % 9], cls: i < 9 ? (2 as const) : (5 as const) }));
  it.each(rows)('$title', ({ quantity, number, mm2, cls }) => {
    expect(quantity.endsWith(`${mm2} mm2`)).toBe(true);
    expect(ohmPerMetre(mm2, cls, 20) * 1000).toBeCloseTo(number, 10);
  });

  it('1-019 to 1-022: resistivity, temperature coefficient and factors (IEC 60028)', () => {
    expect(COPPER_RESISTIVITY_20).toBeCloseTo(reference('1-019').number, 15);
    expect(COPPER_ALPHA_20).toBe(reference('1-020').number);
    expect(temperatureFactor(70)).toBeCloseTo(reference('1-021').number, 12);
    expect(temperatureFactor(75)).toBeCloseTo(reference('1-022').number, 12);
  });
});

describe(`AWG conductors${hasUnits ? '' : ' (GNU units is not installed: recorded values only)'}`, () => {
  const gauges = [24, 22, 20, 18, 16, 14, 12, 10, 8];
  it.each(gauges.map((gauge, i) => ({ gauge, ids: idRange(1, 24 + 3 * i, 26 + 3 * i) })))(
    'AWG $gauge: diameter, area, ideal solid copper (ASTM B258, IACS; ids $ids)',
    ({ gauge, ids }) => {
      expect(awgDiameterMm(gauge)).toBeCloseTo(reference(ids[0]).number, 8);
      expect(awgAreaMm2(gauge)).toBeCloseTo(reference(ids[1]).number, 8);
      expect(awgSolidOhmPerMetre(gauge, 20) * 1000).toBeCloseTo(reference(ids[2]).number, 5);
    },
  );

  it.runIf(hasUnits).each(gauges)('AWG %i as GNU units has it (its wiregauge, after ASTM B258)', (gauge) => {
    expect(awgDiameterMm(gauge) / convert(`wiregauge(${gauge})`, 'mm') - 1).toBeCloseTo(0, 12);
    const resistance = convert(`1 m / copperconductivity circlearea(wiregauge(${gauge})/2)`, 'ohm');
    expect(awgSolidOhmPerMetre(gauge, 20) / resistance - 1).toBeCloseTo(0, 12);
  });

  it.each(idRange(1, 53, 68).filter((_, i) => i % 3 === 0).map((id, i) => ({ ...reference(id), gauge: 18 - 2 * i })))(
    '$title',
    ({ gauge, number, quantity }) => {
      expect(quantity).toContain(`AWG ${gauge} stranded`);
      expect(awgOhmPerMetre(gauge, 75) * 1000).toBeCloseTo(number, 3);
    },
  );

  it('1-069: corrects handbook values by 0.00323 from 75 °C (NEC chapter 9, table 8, note)', () => {
    expect(awgOhmPerMetre(18, 40) / awgOhmPerMetre(18, 75)).toBeCloseTo(1 + 0.00323 * (40 - 75), 12);
  });
});

describe('digital inputs against IEC 61131-2', () => {
  it.each([
    { type: 1 as const, onV: '3-004', onA: '3-005', offV: '3-006', offA: '3-007' },
    { type: 2 as const, onV: '3-009', onA: '3-010', offV: '3-011', offA: '3-012' },
    { type: 3 as const, onV: '3-014', onA: '3-015', offV: '3-016', offA: '3-017' },
  ])('type $type: ids $onV, $onA, $offV, $offA', ({ type, onV, onA, offV, offA }) => {
    expect(INPUT_LIMITS[type].onV).toBe(reference(onV).number);
    expect(INPUT_LIMITS[type].onA * 1000).toBeCloseTo(reference(onA).number, 12);
    expect(INPUT_LIMITS[type].offV).toBe(reference(offV).number);
    expect(INPUT_LIMITS[type].offA * 1000).toBeCloseTo(reference(offA).number, 12);
  });
});

/** The simulator's figures for a netlist of the fixtures: run here, or as recorded. */
function simulated(name: string): Map<string, number> {
  const read = (ending: string): string => readFileSync(new URL(`../fixtures/circuits/${name}.${ending}`, import.meta.url), 'utf8');
  return printedFigures(hasNgspice ? runNgspice(read('cir')) : read('out'));
}
const judge = hasNgspice ? 'ngspice, run now' : 'ngspice, its recorded output: the program is not installed';

/** A supply without tolerance, constant current without standing load, 20 °C: as the netlists have it. */
function asNetlist(parts: { internalOhm: number; constantPower?: boolean; runA: number; temperatureC?: number }, rest: Partial<Design> & { lanes: ReturnType<typeof buildLane>[] }): Design {
  return buildDesign({
    project: buildProject({ voltageTempC: parts.temperatureC ?? 20 }),
    supplyTypes: [buildSupplyType({ tolerancePercent: 0 })],
    supplies: [buildSupply({ internalOhm: parts.internalOhm })],
    dispenserTypes: [buildFourCoreType({
      runA: parts.runA, idleA: 0, controlInputA: null, load: parts.constantPower ? 'constant-power' : 'constant-current',
    })],
    ...rest,
  });
}

function figures(design: Design, id: string): LaneFigures {
  return assess(design).lanes.get(id)!;
}

describe(`single run of 50 m, 1.5 mm² class 5, against ${judge}`, () => {
  const lanes = [buildLane('A', { cableLengthM: 50, crossSectionMm2: 1.5 })];
  const sim = simulated('n1_single_run');
  it.each([
    { what: '0.5 A', printed: 'ua', id: '9-001', parts: { internalOhm: 0, runA: 0.5 } },
    { what: '12 W', printed: 'ub', id: '9-002', parts: { internalOhm: 0, runA: 0.5, constantPower: true } },
    { what: '0.5 A at 70 °C', printed: 'uc', id: '9-003', parts: { internalOhm: 0, runA: 0.5, temperatureC: 70 } },
  ])('$what gives $id', ({ printed, id, parts }) => {
    const volts = figures(asNetlist(parts, { lanes }), 'A').worst!.volts;
    expect(Math.abs(volts - sim.get(printed)!)).toBeLessThan(1e-7);
    expect(volts).toBeCloseTo(reference(id).number, 6);
  });

  it('9-012: 11.88 W and 9 W over 12 Ω; above V²/4R there is no working point', () => {
    const over = (watts: number): LaneFigures =>
      figures(asNetlist({ internalOhm: 12, runA: watts / 24, constantPower: true }, { lanes: [buildLane('A', { cableLengthM: 0 })] }), 'A');
    expect(over(11.88).worst!.volts).toBeCloseTo(13.2, 7);
    expect(over(9).worst!.volts).toBeCloseTo(18, 8);
    expect(over(12.01)).toMatchObject({ worst: null, collapsed: true });
  });
});

describe(`trunk with five tees against ${judge}`, () => {
  const boxes = [20, 15, 15, 15, 15].map((lengthM, i) =>
    buildNode({ id: `b${i}`, location: `+JB${i + 1}`, cableTag: `-W${i + 1}`, parentId: i === 0 ? null : `b${i - 1}`, lengthM, powerMm2: 2.5 }));
  const lanes = boxes.map((box, i) => buildLane(`L${i + 1}`, { nodeId: box.id, cableLengthM: 3, crossSectionMm2: 0.75 }));
  const sim = simulated('n2_trunk5');
  const design = asNetlist({ internalOhm: 0.05, runA: 0.35 }, { lanes, cableNodes: boxes });

  it('9-004: 0.35 A each', () => {
    const result = assess(design);
    lanes.forEach((_, i) => {
      expect(Math.abs(result.lanes.get(`L${i + 1}`)!.worst!.volts - sim.get(`v(ap${i + 1})-v(an${i + 1})`)!)).toBeLessThan(1e-7);
    });
    expect(result.lanes.get('L5')!.profile[1].worstV).toBeCloseTo(sim.get('v(a)')!, 7);
    expect(result.circuits.get('circuit')!.worstA).toBeCloseTo(-sim.get('i(va)')!, 9);
  });

  it('9-005: 8.4 W each', () => {
    const result = assess(asNetlist({ internalOhm: 0.05, runA: 0.35, constantPower: true }, { lanes, cableNodes: boxes }));
    lanes.forEach((_, i) => {
      const { worst } = result.lanes.get(`L${i + 1}`)!;
      expect(Math.abs(worst!.volts - sim.get(`v(bp${i + 1})-v(bn${i + 1})`)!)).toBeLessThan(1e-7);
      expect(worst!.bound).toBeUndefined();
    });
    expect(result.circuits.get('circuit')!.worstA).toBeCloseTo(-sim.get('i(vb)')!, 8);
  });

  it('9-006: only the farthest on', () => {
    expect(figures(design, 'L5').aloneV).toBeCloseTo(sim.get('v(cp5)-v(cn5)')!, 7);
  });
});

describe('smallest short-circuit current against the simulator’s fault loops (ids 4-016 to 4-018)', () => {
  it.each([
    { id: '4-016', metres: 50, mm2: 1.5, temperatureC: 20 },
    { id: '4-017', metres: 50, mm2: 1.5, temperatureC: 70 },
    { id: '4-018', metres: 100, mm2: 0.75, temperatureC: 70 },
  ])('$id: $metres m of $mm2 mm² at $temperatureC °C, 0.1 Ω before it', ({ id, metres, mm2, temperatureC }) => {
    const design = buildDesign({
      project: buildProject({ tripTempC: temperatureC }),
      supplyTypes: [buildSupplyType({ tolerancePercent: 0, shortCircuitA: 1000 })],
      supplies: [buildSupply({ internalOhm: 0.1 })],
      lanes: [buildLane('A', { cableLengthM: metres, crossSectionMm2: mm2 })],
    });
    expect(assess(design).circuits.get('circuit')!.shortCircuitA).toBeCloseTo(reference(id).number, 5);
  });
});
