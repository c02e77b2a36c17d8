import { describe, expect, it } from 'vitest';
import { bearingSteps } from './bearing-demand.ts';
import { demandOf } from './demand.ts';
import { aBearingPoint, aPoint } from './testing/rows.ts';

describe('demand from the bearing', () => {
  it('is 46.0 cm³ per 1,000 h for the worked example', () => {
    expect(demandOf(aBearingPoint(), 0.9)).toEqual({ demandUlPer1000h: 46_000, refusal: null });
  });

  it('names what is missing', () => {
    expect(demandOf(aBearingPoint({ boreMm: null, speedRpm: null }), 0.9).refusal).toBe('Give the bore and the speed, or state the demand.');
  });

  it('refuses without a grease', () => {
    expect(demandOf(aBearingPoint(), null).refusal).toContain('Choose the grease');
  });

  it('sends the user to the bearing maker’s data above the formula’s range', () => {
    expect(demandOf(aBearingPoint({ speedRpm: 3600 }), 0.9)).toEqual({
      demandUlPer1000h: null,
      refusal: 'Speed 3,600 rpm is above the formula’s range for bore 100 mm (3,500 rpm); '
        + 'take the interval from the bearing maker’s data and state the demand.',
    });
  });

  it('refuses at the very end of the range, where the interval is 0', () => {
    expect(demandOf(aBearingPoint({ speedRpm: 3500 }), 0.9).refusal).toContain('at the end of the formula’s range');
  });

  it('refuses just below it, where the demand leaves every dispenser behind', () => {
    expect(demandOf(aBearingPoint({ speedRpm: 3499.9999999 }), 0.9).refusal).toContain('Correct the inputs');
  });

  it('refuses factors outside the table and a ring without width', () => {
    const factors = { ...aBearingPoint().factors, moisture: 0 };
    expect(demandOf(aBearingPoint({ factors }), 0.9).refusal).toContain('moisture factor');
    expect(demandOf(aBearingPoint({ factors: { ...factors, moisture: 1, design: 11 } }), 0.9).refusal).toContain('design factor');
    expect(demandOf(aBearingPoint({ outsideMm: 100 }), 0.9).refusal).toContain('outside diameter 100 mm is not above bore');
    expect(demandOf(aBearingPoint({ widthMm: 0 }), 0.9).refusal).toBe('Correct width: 0 is not above 0.');
  });

  it('shows the steps of the formula, and none where it refuses', () => {
    const steps = bearingSteps(aBearingPoint(), 0.9);
    expect(steps).toEqual({ grams: 41.4, factorK: 1, hours: 1000 });
    expect(bearingSteps(aBearingPoint({ speedRpm: 4000 }), 0.9)).toBeNull();
  });
});

describe('stated demand', () => {
  it.each([
    ['1000h', 12_500, 16, 7, 12_500],
    ['100h', 12_500, 16, 7, 125_000],
    ['running-day', 330, 16.5, 5, 20_000],
    ['week', 1_650, 16.5, 5, 20_000],
    ['month', 7_305, 24, 7, 10_000],
  ] as const)('per %s: %d µL is %d h, %d days a week → %d', (statedPer, statedUl, hoursPerDay, daysPerWeek, expected) => {
    expect(demandOf(aPoint({ statedPer, statedUl, hoursPerDay, daysPerWeek }), null)).toEqual({ demandUlPer1000h: expected, refusal: null });
  });

  it('rounds up', () => {
    expect(demandOf(aPoint({ statedPer: 'running-day', statedUl: 100, hoursPerDay: 7 }), null).demandUlPer1000h).toBe(14_286);
  });

  it('needs the hours only where the unit does', () => {
    expect(demandOf(aPoint({ hoursPerDay: null }), null).demandUlPer1000h).toBe(50_000);
    expect(demandOf(aPoint({ statedPer: 'week', hoursPerDay: null }), null).refusal).toBe('Give the hours per day.');
  });

  it('refuses nothing stated, nothing at all and a day of 25 hours', () => {
    expect(demandOf(aPoint({ statedUl: null }), null).refusal).toBe('Give the demand.');
    expect(demandOf(aPoint({ statedUl: 0 }), null).refusal).toContain('not above 0');
    expect(demandOf(aPoint({ statedPer: 'week', hoursPerDay: 25 }), null).refusal).toContain('hours per day');
    expect(demandOf(aPoint({ statedPer: 'week', daysPerWeek: 0 }), null).refusal).toContain('days per week');
  });
});

describe('demand from today’s practice', () => {
  const practice = aPoint({ demandWay: 'practice', practiceStrokes: 3, practiceGramsPerStroke: 1.2, practiceEveryDays: 14, hoursPerDay: 16, daysPerWeek: 5 });

  it('spreads the mass over the operating hours between two rounds', () => {
    // 3.6 g ÷ 0.9 g/cm³ = 4 cm³ in 14 × 5/7 × 16 h = 160 h.
    expect(demandOf(practice, 0.9)).toEqual({ demandUlPer1000h: 25_000, refusal: null });
  });

  it('names what is missing and refuses without a grease', () => {
    expect(demandOf({ ...practice, practiceStrokes: null }, 0.9).refusal).toBe('Give the strokes, or state the demand.');
    expect(demandOf(practice, null).refusal).toContain('Choose the grease');
  });
});

it('asks for the way while none is chosen', () => {
  expect(demandOf(aPoint({ demandWay: null }), 0.9).refusal).toContain('Say how the demand is known');
});
