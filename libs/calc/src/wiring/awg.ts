import { temperatureFactor } from './conductor.ts';

/** Resistivity of annealed copper at 20 °C, Ω·mm²/m (IACS, IEC 60028: 1/58). */
export const COPPER_RESISTIVITY_20 = 1 / 58;
const FEET_PER_METRE = 1 / 0.3048;
/** Temperature coefficient of the handbook's table, referred to 75 °C, 1/K. */
const HANDBOOK_ALPHA_75 = 0.00323;

/** Uncoated stranded copper at 75 °C, Ω per 1,000 ft, by AWG (NEC chapter 9, table 8). */
const STRANDED_OHM_PER_KFT_75: ReadonlyMap<number, number> = new Map([
  [18, 7.95], [16, 4.99], [14, 3.14], [12, 1.98], [10, 1.24], [8, 0.778],
]);

/**
 * Diameter of a solid wire, mm: 0.127·92^((36 − n)/39) (ASTM B258).
 *
 * @param gauge AWG number, whole, 0 to 40
 * @throws {RangeError} any other gauge
 */
export function awgDiameterMm(gauge: number): number {
  if (!Number.isInteger(gauge) || gauge < 0 || gauge > 40) throw new RangeError(`AWG ${gauge} is not a whole number from 0 to 40`);
  return 0.127 * 92 ** ((36 - gauge) / 39);
}

/** Cross-section of a solid wire, mm² (ASTM B258). @throws {RangeError} as `awgDiameterMm` */
export function awgAreaMm2(gauge: number): number {
  return (Math.PI / 4) * awgDiameterMm(gauge) ** 2;
}

/** Ideal solid wire of IACS copper, Ω/m. Real wires lie above it. @throws {RangeError} as `awgDiameterMm` */
export function awgSolidOhmPerMetre(gauge: number, temperatureC: number): number {
  return (COPPER_RESISTIVITY_20 / awgAreaMm2(gauge)) * temperatureFactor(temperatureC);
}

/**
 * Resistance of a stranded AWG conductor, Ω/m: the handbook's value at 75 °C with the handbook's own
 * correction 1 + 0.00323·(θ − 75) where it gives one (AWG 8 to 18, even), else the ideal solid wire.
 *
 * @throws {RangeError} as `awgDiameterMm`
 */
export function awgOhmPerMetre(gauge: number, temperatureC: number): number {
  const perKft = STRANDED_OHM_PER_KFT_75.get(gauge);
  if (perKft === undefined) return awgSolidOhmPerMetre(gauge, temperatureC);
  return (perKft / 1000) * FEET_PER_METRE * (1 + HANDBOOK_ALPHA_75 * (temperatureC - 75));
}
