import type { BearingFactors } from '#calc';

/** A correction factor with the usual steps of the published table. */
export interface FactorSteps {
  readonly name: keyof BearingFactors;
  readonly label: string;
  readonly steps: readonly { readonly value: number; readonly label: string }[];
}

const steps = (...pairs: readonly (readonly [number, string])[]) => pairs.map(([value, what]) => ({ value, label: `${value}\u2002${what}` }));

/** The six factors of the interval formula, K = Ft·Fc·Fm·Fv·Fp·Fd, with the steps that its table gives. */
export const FACTOR_STEPS: readonly FactorSteps[] = [
  { name: 'temperature', label: 'Housing temperature', steps: steps([1, 'below 65 °C'], [0.5, '65 to 80 °C'], [0.2, '80 to 93 °C'], [0.1, 'above 93 °C']) },
  { name: 'contamination', label: 'Solid contamination', steps: steps([1, 'light, not abrasive'], [0.7, 'severe, not abrasive'], [0.4, 'light, abrasive'], [0.2, 'severe, abrasive']) },
  { name: 'moisture', label: 'Moisture', steps: steps([1, 'humidity below 80 %'], [0.7, 'humidity to 90 %'], [0.4, 'occasional condensation'], [0.1, 'occasional water']) },
  { name: 'vibration', label: 'Vibration, peak velocity', steps: steps([1, 'below 5 mm/s'], [0.6, '5 to 10 mm/s'], [0.3, 'above 10 mm/s']) },
  { name: 'position', label: 'Shaft position', steps: steps([1, 'horizontal'], [0.5, '45 degrees'], [0.3, 'vertical']) },
  { name: 'design', label: 'Bearing design', steps: steps([10, 'ball'], [5, 'cylindrical, needle'], [1, 'tapered, spherical']) },
];

/** The steps, and the value set now where it is none of them. */
export function stepsWith({ steps: usual }: FactorSteps, value: number): FactorSteps['steps'] {
  return usual.some((step) => step.value === value) ? usual : [...usual, { value, label: `${value}\u2002own value` }];
}
