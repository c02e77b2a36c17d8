/** How many times the longer proof (`npm run verify`) tries what every test run tries a few dozen times. */
const FACTOR = Number(process.env['PROPERTY_FACTOR'] ?? 1);

/** Runs of a property: `usual` in `npm test`, many times that in `npm run verify`. */
export const runs = (usual: number): number => Math.round(usual * FACTOR);
