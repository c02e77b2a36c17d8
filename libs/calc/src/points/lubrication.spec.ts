import { describe, expect, it } from 'vitest';
import { alternatives } from './alternatives.ts';
import { assessPoint } from './lubrication.ts';
import { PLAN_CODES } from './plan-codes.ts';
import type { PointContext } from './point-context.ts';
import { aBearingPoint, aContext, aDispenser, aPoint, aProject, aType } from './testing/rows.ts';

function codes(changes: Partial<PointContext>): string[] {
  return assessPoint(aContext(changes)).findings.map((each) => each.code);
}

const timed = (changes = {}) => aDispenser({ method: 'timed', doseUl: null, periodMonths: 3, ...changes });

describe('assessPoint', () => {
  it('finds nothing at a complete point', () => {
    const result = assessPoint(aContext());
    expect(result.findings).toEqual([]);
    expect(result.plan?.intervalMs).toBe(14_400_000);
    expect(result.timed).toBeNull();
  });

  it.each<[string, keyof typeof PLAN_CODES, Partial<PointContext>]>([
    ['an unknown demand', 'demandUnknown', { point: aPoint({ statedUl: null }) }],
    ['a point without dispenser', 'noDispenser', { dispenser: null, type: null }],
    ['blank hours', 'hoursBlank', { point: aPoint({ hoursPerDay: null }) }],
    ['a blank type', 'typeBlank', { dispenser: aDispenser({ typeId: null }), type: null }],
    ['a blank wiring', 'wiringBlank', { dispenser: aDispenser({ wiring: null }) }],
    ['a blank cartridge', 'cartridgeBlank', { dispenser: aDispenser({ cartridgeUl: null }) }],
    ['a blank dose', 'doseBlank', { dispenser: aDispenser({ doseUl: null }) }],
    ['a blank period', 'periodBlank', { dispenser: timed({ periodMonths: null }) }],
    ['a dose between two steps', 'doseStep', { dispenser: aDispenser({ doseUl: 250 }) }],
    ['a cartridge that does not fit', 'cartridgeMisfit', { dispenser: aDispenser({ cartridgeUl: 160_000 }) }],
    ['a wiring that contradicts the type', 'wiringContradicts', { dispenser: aDispenser({ wiring: 'two-core' }) }],
    ['a life beyond the policy', 'lifeTooLong', { project: aProject({ maxCartridgeDays: 149 }) }],
    ['a life below the policy', 'lifeTooShort', { project: aProject({ minCartridgeDays: 151 }) }],
    ['a schedule that costs too much', 'overGreasing', { project: aProject({ slotMs: 3 * 3_600_000 }) }],
    ['an interval below wait, run and recovery', 'intervalTooShort', { waitBoundMs: 14_400_000 }],
    ['an interval below one slot', 'intervalTooShort', { project: aProject({ slotMs: 14_400_001 }) }],
    ['a period that the type lacks', 'periodMisfit', { dispenser: timed({ periodMonths: 4 }), point: aPoint({ statedUl: 61_000 }) }],
    ['a fast bearing', 'fastBearing', { point: aBearingPoint({ speedRpm: 1_100 }) }],
  ])('notices %s', (_, name, changes) => {
    expect(codes(changes)).toEqual([PLAN_CODES[name]]);
  });

  it('notices a dose outside the range and a cartridge without a whole dose', () => {
    expect(codes({ dispenser: aDispenser({ doseUl: 2_600 }) })).toContain(PLAN_CODES.doseRange);
    expect(codes({ type: aType({ residualUl: 119_900 }) })).toEqual([PLAN_CODES.noWholeDose]);
  });

  it('notices timed discharge with two cores, without the type’s consent, or of too little', () => {
    const point = aPoint({ statedUl: 80_000 });
    expect(codes({ point, dispenser: timed({ wiring: 'two-core' }), type: aType({ wiring: 'two-core' }) })).toContain(PLAN_CODES.timedTwoCore);
    expect(codes({ point, dispenser: timed(), type: aType({ timedMonths: [] }) })).toContain(PLAN_CODES.timedUnknown);
    expect(codes({ point: aPoint({ statedUl: 83_000 }), dispenser: timed() })).toEqual([PLAN_CODES.timedTooLittle]);
  });

  it('goes by the wiring of the row first, else by that of the type', () => {
    const wired = (row: 'two-core' | 'four-core' | null, ofType: 'two-core' | 'four-core') =>
      codes({ dispenser: timed({ wiring: row }), type: aType({ wiring: ofType }) }).includes(PLAN_CODES.timedTwoCore);
    expect([wired('two-core', 'four-core'), wired('four-core', 'two-core'), wired(null, 'two-core'), wired(null, 'four-core')]).toEqual([true, false, true, false]);
    const detail = (changes: Partial<PointContext>) => assessPoint(aContext(changes)).findings[0].detail;
    expect(detail({ dispenser: aDispenser({ wiring: 'two-core' }) })).toBe('Cores, terminals and voltages are computed as two-core, currents as the type states them.');
    expect(detail({ dispenser: aDispenser({ wiring: null }) })).toBe('Until it is chosen the wiring of the type counts: four-core.');
  });

  it('lets a cartridge of twelve months stay where the policy says 365 days', () => {
    const dispenser = timed({ periodMonths: 12, cartridgeUl: 250_000 });
    expect(codes({ dispenser, point: aPoint({ statedUl: 42_500 }) })).toEqual([]);
  });

  it('names point, lane, numbers, source and remedy', () => {
    const [finding] = assessPoint(aContext({ dispenser: aDispenser({ doseUl: 50 }) })).findings;
    expect(finding).toMatchObject({
      key: 'PL-10:point', severity: 'error', subject: { kind: 'point', id: 'point', label: 'GC1-LP11' }, dispenserIds: ['dispenser'],
      source: 'type data', compared: [{ name: 'dose', value: 50, limit: 100, unit: 'µL' }],
    });
    expect(finding.remedy).toContain('Choose a dose from');
  });

  it('never shows a limit and a value that break it as the same figure', () => {
    const [finding] = assessPoint(aContext({ dispenser: aDispenser({ doseUl: 250 }) })).findings;
    expect(finding.title).toBe('Dose 0.25\u2009cm³ is not a whole number of steps of 0.1\u2009cm³');
  });
});

describe('alternatives', () => {
  it('tries each cartridge with each dose', () => {
    const { ranked, rejected } = alternatives(aContext(), 'fewest-changes');
    expect(ranked.length + rejected.length).toBe(3 * 25);
    expect(ranked.map((each) => each.rank)).toEqual(ranked.map((_, index) => index + 1));
    expect(rejected.every((each) => each.reasons.length > 0 && each.rank === null)).toBe(true);
  });

  it('puts the smallest dose first when asked, the longer life before the shorter among equals', () => {
    const { ranked } = alternatives(aContext(), 'smallest-dose');
    expect(ranked.slice(0, 3).map((each) => [each.doseUl, each.cartridgeUl])).toEqual([[100, 250_000], [100, 120_000], [100, 60_000]]);
  });

  it('lets no milliseconds of rounding decide: of equal lives in days the smallest dose comes first', () => {
    const { ranked } = alternatives(aContext({ point: aPoint({ statedUl: 14_181 }) }), 'fewest-changes');
    expect(ranked[0]).toMatchObject({ cartridgeUl: 60_000, doseUl: 100 });
  });

  it('does not reject for what no dose can mend', () => {
    expect(alternatives(aContext({ dispenser: aDispenser({ wiring: null }) }), 'least-over').ranked).not.toHaveLength(0);
  });

  it('says what is missing where there are none', () => {
    expect(alternatives(aContext({ type: null }), 'least-over').refusal).toBe('Choose the dispenser type.');
    expect(alternatives(aContext({ point: aPoint({ hoursPerDay: null }) }), 'least-over').refusal).toContain('hours');
    expect(alternatives(aContext({ point: aPoint({ statedUl: null }) }), 'least-over').refusal).toBe('Give the demand.');
  });
});
