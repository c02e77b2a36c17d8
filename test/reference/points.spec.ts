import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { BearingFactors, Point } from '#calc';
import { assessPoint, bearingSteps, demandOf, PLAN_CODES, pulsePlan } from '../../libs/calc/src/points/index.ts';
import { aBearingPoint, aContext, aType } from '../../libs/calc/src/points/testing/rows.ts';

interface Reference { readonly id: string; readonly quantity: string; readonly value: number | string; readonly unit: string; readonly source: string }
const { values } = JSON.parse(readFileSync(new URL('../fixtures/reference-values.json', import.meta.url), 'utf8')) as { values: Reference[] };
const reference = new Map(values.map((each) => [each.id, each]));

/** A published value by its id; with its source it heads the check. */
function published(id: string): Reference {
  const found = reference.get(id);
  if (!found) throw new Error(`No reference value ${id}`);
  return found;
}

function numberOf(id: string): number {
  return Number(published(id).value);
}

function named(id: string): string {
  const { quantity, value, source } = published(id);
  return `${id} ${quantity}: ${value} (${source})`;
}

const HOUR_MS = 3_600_000;
const worked = aBearingPoint({ hoursPerDay: 24 });

describe('replenishment quantity', () => {
  it.each([[180, 46], [100, 25], [62, 16], [420, 202]])(`${named('5-001')}, %d × %d mm`, (outsideMm, widthMm) => {
    expect(published('5-001').value).toBe('Gp = 0.005 D B');
    expect(bearingSteps(aBearingPoint({ boreMm: 30, speedRpm: 500, outsideMm, widthMm }), 0.9)!.grams).toBeCloseTo(0.005 * outsideMm * widthMm, 12);
  });

  it(`${named('5-003')}, with ${named('5-051')}`, () => {
    const inchSquareG = bearingSteps(aBearingPoint({ boreMm: 20, speedRpm: 500, outsideMm: 25.4, widthMm: 25.4 }), 0.9)!.grams;
    const ouncePerSquareInch = inchSquareG / numberOf('5-051');
    expect(Math.abs(ouncePerSquareInch - numberOf('5-003'))).toBeLessThan(5e-10);
    // 5-002 gives the factor rounded to 0.114 oz/in², 0.19 % above.
    expect(0.114 / ouncePerSquareInch - 1).toBeCloseTo(0.0019, 4);
  });
});

describe('relubrication interval', () => {
  it(named('5-029'), () => {
    expect(bearingSteps(worked, 0.9)!.hours).toBe(numberOf('5-029'));
  });

  it(`${named('5-004')}: the bracket is multiplied as a whole by K`, () => {
    const factors = { ...worked.factors, temperature: 0.5, contamination: 0.7, moisture: 0.4, design: 10 };
    expect(bearingSteps({ ...worked, factors }, 0.9)!.hours).toBeCloseTo(1.4 * 1000, 9);
  });

  it.each([25, 45, 100, 240])(`${named('5-030')}, bore %d mm`, (boreMm) => {
    const zeroRpm = 3.5e6 / boreMm ** 1.5;
    const at = (speedRpm: number) => demandOf(aBearingPoint({ boreMm, outsideMm: 500, speedRpm }), 0.9);
    expect(at(zeroRpm * 0.999).demandUlPer1000h).toBeGreaterThan(0);
    expect(at(zeroRpm * 1.001).refusal).toContain('bearing maker’s data');
  });

  it('5-030 at bore 100 mm: 3,500 r/min itself gives no interval', () => {
    expect(published('5-030').value).toContain('d=100 -> 3500');
    expect(demandOf(aBearingPoint({ speedRpm: 3500 }), 0.9).demandUlPer1000h).toBeNull();
  });
});

describe('correction factors', () => {
  const ids: Readonly<Record<keyof BearingFactors, readonly string[]>> = {
    temperature: ['5-005', '5-006', '5-007', '5-008'],
    contamination: ['5-009', '5-010', '5-011', '5-012'],
    moisture: ['5-013', '5-014', '5-015', '5-016'],
    vibration: ['5-017', '5-018', '5-019'],
    position: ['5-020', '5-021', '5-022'],
    design: ['5-023', '5-024', '5-025'],
  };
  const cases = Object.entries(ids).flatMap(([factor, list]) => list.map((id) => ({ factor, id, name: named(id) })));

  it.each(cases)('$name', ({ factor, id }) => {
    const point: Point = { ...worked, factors: { ...worked.factors, [factor]: numberOf(id) } };
    expect(bearingSteps(point, 0.9)!.hours).toBeCloseTo(1000 * numberOf(id), 9);
    expect(demandOf(point, 0.9).demandUlPer1000h).toBe(Math.ceil(Number((46_000 / numberOf(id)).toFixed(6))));
  });

  it(`${named('5-037')}: at the upper end of each band the table is not laxer than the rule`, () => {
    for (const [upperC, id] of [[80, '5-006'], [93, '5-007']] as const) {
      const byRule = 1000 * 0.5 ** (Math.floor((upperC - 65) / 14));
      const point = { ...worked, factors: { ...worked.factors, temperature: numberOf(id) } };
      expect(bearingSteps(point, 0.9)!.hours).toBeLessThanOrEqual(byRule);
    }
  });
});

describe(named('5-033'), () => {
  const demand = demandOf(worked, 0.9).demandUlPer1000h!;
  const plan = pulsePlan({ demandUlPer1000h: demand, doseUl: 200, cartridgeUl: 120_000, hoursPerDay: 24, daysPerWeek: 7, slotMs: null, type: aType() })!;

  it('41.4 g each 1,000 h are 46.0 cm³ at 0.90 g/cm³', () => {
    expect(bearingSteps(worked, 0.9)).toMatchObject({ grams: 41.4, hours: 1000 });
    expect(demand).toBe(46_000);
  });

  it('0.2 cm³ each 4.347826 h', () => {
    expect(plan.exactIntervalMs / HOUR_MS).toBeCloseTo(4.347826, 6);
    expect(plan.intervalMs).toBe(15_652_173);
  });

  it('120 cm³ last 2608.696 h, 108.70 d', () => {
    // Rounding down to milliseconds takes at most 1 ms a pulse: 0.6 s of 600 pulses.
    expect(Math.abs(plan.lifeMs / HOUR_MS - 2608.696)).toBeLessThan(0.0007);
    expect(plan.lifeDays).toBeCloseTo(108.7, 2);
  });
});

describe('speed factor', () => {
  const codes = (speedRpm: number) => assessPoint(aContext({ point: aBearingPoint({ boreMm: 45, outsideMm: 100, widthMm: 25, speedRpm }) }))
    .findings.map((each) => each.code);
  const criticalRpm = Number(String(published('5-035').value).replace(' ', '')) / 72.5;

  it(`${named('5-034')} is below ${named('5-035')}`, () => {
    expect(numberOf('5-034')).toBe(72.5 * 1800);
    expect(codes(1800)).not.toContain(PLAN_CODES.fastBearing);
  });

  it('above it the bearing asks for care', () => {
    expect(codes(criticalRpm - 1)).not.toContain(PLAN_CODES.fastBearing);
    expect(codes(criticalRpm + 1)).toContain(PLAN_CODES.fastBearing);
  });
});

describe('whole doses (common practice)', () => {
  const plan = (cartridgeUl: number, doseUl: number) => pulsePlan({
    demandUlPer1000h: 50_000, doseUl, cartridgeUl, hoursPerDay: 16, daysPerWeek: 7, slotMs: null, type: aType(),
  })!;

  it('250 cm³ at 0.2 cm³ are 1,250 pulses', () => {
    expect(plan(250_000, 200).pulsesPerCartridge).toBe(1_250);
  });

  it('60 cm³ at 0.3 cm³ are exactly 200 pulses', () => {
    expect(plan(60_000, 300).pulsesPerCartridge).toBe(200);
  });

  it('120 cm³ at 0.2 cm³, a pulse each 4 operating hours, 16 h a day: 600 pulses, 2,400 operating hours, 150 days', () => {
    expect(plan(120_000, 200)).toMatchObject({ pulsesPerCartridge: 600, intervalMs: 4 * HOUR_MS, lifeMs: 2_400 * HOUR_MS, lifeDays: 150 });
  });

  it(`${named('5-055')}: a cartridge of twelve months keeps the usual limit of 365 days`, () => {
    const result = assessPoint(aContext({ dispenser: { ...aContext().dispenser!, method: 'timed', doseUl: null, periodMonths: numberOf('5-055') } }));
    expect(Math.floor(result.timed!.lifeDays)).toBe(365);
    expect(result.findings.map((each) => each.code)).not.toContain(PLAN_CODES.lifeTooLong);
  });
});
