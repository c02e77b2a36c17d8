/**
 * The codes of demand and plan. A code never changes its meaning; a new check takes the next number.
 *
 * | code  | severity | what it says |
 * |-------|----------|--------------|
 * | PL-01 | warning  | the demand is not known |
 * | PL-02 | warning  | no dispenser at the point |
 * | PL-03 | warning  | type blank |
 * | PL-04 | warning  | cartridge blank |
 * | PL-05 | warning  | dose blank |
 * | PL-06 | warning  | hours per day blank |
 * | PL-07 | warning  | wiring blank |
 * | PL-08 | warning  | period of timed discharge blank |
 * | PL-10 | error    | dose outside the type's range |
 * | PL-11 | error    | dose between two steps of the type |
 * | PL-12 | error    | cartridge does not fit the type |
 * | PL-13 | error    | cartridge holds no whole dose |
 * | PL-14 | error    | interval shorter than wait, run and recovery (or than a slot): demand out of reach |
 * | PL-15 | warning  | cartridge stays longer than the policy allows |
 * | PL-16 | warning  | cartridge lasts shorter than is worthwhile |
 * | PL-17 | warning  | over-greasing above the policy |
 * | PL-20 | error    | wiring contradicts the type |
 * | PL-21 | error    | timed discharge with two-core wiring |
 * | PL-22 | error    | type has no timed discharge |
 * | PL-23 | error    | period not in the type's list |
 * | PL-24 | error    | timed discharge gives less than the demand |
 * | PL-30 | note     | fast bearing: amount and interval need care |
 */
export const PLAN_CODES = {
  demandUnknown: 'PL-01',
  noDispenser: 'PL-02',
  typeBlank: 'PL-03',
  cartridgeBlank: 'PL-04',
  doseBlank: 'PL-05',
  hoursBlank: 'PL-06',
  wiringBlank: 'PL-07',
  periodBlank: 'PL-08',
  doseRange: 'PL-10',
  doseStep: 'PL-11',
  cartridgeMisfit: 'PL-12',
  noWholeDose: 'PL-13',
  intervalTooShort: 'PL-14',
  lifeTooLong: 'PL-15',
  lifeTooShort: 'PL-16',
  overGreasing: 'PL-17',
  wiringContradicts: 'PL-20',
  timedTwoCore: 'PL-21',
  timedUnknown: 'PL-22',
  periodMisfit: 'PL-23',
  timedTooLittle: 'PL-24',
  fastBearing: 'PL-30',
} as const;
