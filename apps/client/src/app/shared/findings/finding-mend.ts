import type { Assessment, Design, Finding } from '#calc';

/** An edit that mends a finding by itself, as a button says it. */
export interface Mend {
  readonly label: string;
  readonly circuitId: string;
  readonly concurrencyLimit: number;
}

/** Findings that fewer dispensers at once would mend: loads and voltages under the concurrency limit. */
const BY_LIMIT: ReadonlySet<string> = new Set(['IO-03', 'IO-05', 'VD-01', 'VD-02', 'SU-01']);

/** The smaller limit k with which the circuit passes, where the finding is of that kind and such a limit exists. */
export function mendOf(finding: Finding, design: Design, assessment: Assessment): Mend | null {
  if (!BY_LIMIT.has(finding.code)) return null;
  const touched = new Set(finding.dispenserIds);
  const circuitIds = new Set(design.dispensers.filter((d) => touched.has(d.id)).map((d) => d.circuitId));
  for (const circuit of design.circuits) {
    const k = circuitIds.has(circuit.id) ? assessment.circuits.get(circuit.id)?.largestPassingK : null;
    if (k && k < (circuit.concurrencyLimit ?? Infinity)) {
      return { label: `Set k to ${k} on ${circuit.name}`, circuitId: circuit.id, concurrencyLimit: k };
    }
  }
  return null;
}
