import type { ConductorClass } from '../design.ts';

/** Temperature coefficient of annealed copper referred to 20 °C, 1/K (IEC 60028). */
export const COPPER_ALPHA_20 = 0.00393;

/** Highest resistance at 20 °C of plain copper, Ω/km, by cross-section in mm² (IEC 60228, tables 2 and 3). */
const OHM_PER_KM: Readonly<Record<ConductorClass, ReadonlyMap<number, number>>> = {
  2: new Map([
    [0.5, 36], [0.75, 24.5], [1, 18.1], [1.5, 12.1], [2.5, 7.41], [4, 4.61], [6, 3.08], [10, 1.83], [16, 1.15],
  ]),
  5: new Map([
    [0.5, 39], [0.75, 26], [1, 19.5], [1.5, 13.3], [2.5, 7.98], [4, 4.95], [6, 3.3], [10, 1.91], [16, 1.21],
  ]),
};

/** Standard cross-sections, mm², ascending. */
export const STANDARD_SECTIONS_MM2: readonly number[] = [...OHM_PER_KM[5].keys()];

/** Whether the tables know this cross-section. */
export function isStandardSection(crossSectionMm2: number): boolean {
  return OHM_PER_KM[5].has(crossSectionMm2);
}

/**
 * Resistance factor from 20 °C to a conductor temperature: 1 + 0.00393·(θ − 20).
 *
 * @param temperatureC conductor temperature, °C, −60 to 200
 * @throws {RangeError} outside that range or NaN
 */
export function temperatureFactor(temperatureC: number): number {
  if (!(temperatureC >= -60 && temperatureC <= 200)) {
    throw new RangeError(`Conductor temperature ${temperatureC} °C lies outside −60 to 200 °C`);
  }
  return 1 + COPPER_ALPHA_20 * (temperatureC - 20);
}

/**
 * Resistance of one copper conductor, Ω/m: the largest that IEC 60228 allows, so a real cable is no worse.
 *
 * @param crossSectionMm2 one of the standard cross-sections
 * @param temperatureC conductor temperature, °C
 * @throws {RangeError} a cross-section that the tables do not hold; nothing is interpolated
 */
export function ohmPerMetre(crossSectionMm2: number, conductorClass: ConductorClass, temperatureC: number): number {
  const ohmPerKm = OHM_PER_KM[conductorClass]?.get(crossSectionMm2);
  if (ohmPerKm === undefined) {
    throw new RangeError(`No resistance known for ${crossSectionMm2} mm² of class ${conductorClass}`);
  }
  return (ohmPerKm / 1000) * temperatureFactor(temperatureC);
}
