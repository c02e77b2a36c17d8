/** Fields whose name alone would not be understood. */
const CALLED: Readonly<Record<string, string>> = {
  concurrencyLimit: 'Concurrency limit k', lengthM: 'Length', nodeId: 'Junction box', parentId: 'Box before it', powerMm2: 'Power cross section',
  protectionA: 'Protection rating', setV: 'Set voltage', signalMm2: 'Signal cross section', statedUl: 'Stated demand',
  tripTempC: 'Conductor temperature for tripping', voltageTempC: 'Conductor temperature for voltage',
};

/** A row's field in words, without its unit: `crossSectionMm2` is read "Cross section". */
export function fieldName(field: string): string {
  const called = CALLED[field];
  if (called) return called;
  const bare = field.replace(/(Ul|Mm2|Mm|Rpm|Ohm|Percent|Ms|Id)$/, '').replace(/(Length)M$/, '$1').replace(/([a-z])[AVC]$/, '$1');
  const words = bare.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase();
  return words.charAt(0).toUpperCase() + words.slice(1);
}
