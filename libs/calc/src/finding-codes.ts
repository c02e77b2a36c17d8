import type { Finding, Severity, SubjectKind } from './findings.ts';

interface CodeEntry {
  readonly severity: Severity;
  /** What the code stands for, as the list of codes in the help shows it. */
  readonly means: string;
  readonly source: string;
}

const entry = (severity: Severity, means: string, source: string): CodeEntry => ({ severity, means, source });

/**
 * Every code of the electrical checks: IO channels and groups, VD voltage, SG signals, SU supply,
 * PR protection, MP mapping, CB cables, TG designations, AR areas, SP spares. A code never changes its
 * meaning and is never used again for another. PL codes belong to the points.
 */
export const FINDING_CODES = {
  'IO-01': entry('error', 'Channel over its rating', 'type data'),
  'IO-02': entry('error', 'Starting peak over what the channel stands', 'type data'),
  'IO-03': entry('error', 'Group over its rating under the limits k', 'type data'),
  'IO-04': entry('note', 'Group over its rating if the limits k fail', 'type data'),
  'IO-05': entry('error', 'Module over its rating under the limits k', 'type data'),
  'IO-06': entry('note', 'Module over its rating if the limits k fail', 'type data'),
  'IO-07': entry('error', 'Address ranges of two modules overlap', 'IEC 61131-3, direct representation'),
  'VD-01': entry('error', 'Too low a voltage while running', 'type data'),
  'VD-02': entry('error', 'Too low a voltage while idling', 'type data'),
  'VD-03': entry('note', 'Too low a voltage if the limit k fails', 'type data'),
  'VD-04': entry('error', 'Voltage collapse: no working point, or no voltage left', 'IEC 60228 resistances, type data'),
  'SG-01': entry('error', 'Pulse level too low at the device', 'type data'),
  'SG-02': entry('error', 'Status level too low at the input', 'IEC 61131-2, digital inputs'),
  'SG-03': entry('error', 'Output of the other polarity', 'type data'),
  'SG-04': entry('error', 'Status output and input do not match in polarity', 'type data'),
  'SG-05': entry('error', 'Leakage of the output may hold the device on', 'type data'),
  'SG-06': entry('error', 'Leakage of the status output may hold the input on', 'IEC 61131-2, digital inputs'),
  'SG-07': entry('error', 'Status output cannot deliver the input current', 'IEC 61131-2, digital inputs'),
  'SG-08': entry('warning', 'Load under the least load of the relay contact', 'type data'),
  'SG-09': entry('error', 'Relay contact wears out too early', 'type data and policy'),
  'SG-10': entry('warning', 'Leakage of the status output lifts the input over its off voltage', 'IEC 61131-2, digital inputs'),
  'SU-01': entry('error', 'Supply over its rating', 'type data and policy'),
  'SU-02': entry('note', 'Supply over its rating if the limits k fail', 'type data'),
  'SU-03': entry('warning', 'Load of the supply cannot be computed: a circuit has no working point', 'type data'),
  'PR-01': entry('error', 'Circuit over the rated current of its protection', 'IEC 60364-4-43, 433.1'),
  'PR-02': entry('error', 'Breaker does not trip at once at the far end', 'IEC 60898-1, instantaneous tripping'),
  'PR-03': entry('note', 'Fuse needs its time-current curve', 'IEC 60269'),
  'PR-04': entry('note', 'Short circuit behind an output is limited by the output', 'type data'),
  'PR-05': entry('note', 'Circuit over the rated current of its protection if the limit k fails', 'IEC 60364-4-43, 433.1'),
  'PR-06': entry('error', 'Supply cannot deliver the tripping current', 'type data'),
  'PR-07': entry('error', 'Electronic protection does not trip at the far end', 'policy'),
  'PR-08': entry('warning', 'Load on the protection cannot be computed: the circuit has no working point', 'type data'),
  'MP-01': entry('warning', 'No control output', 'policy'),
  'MP-02': entry('warning', 'No status input', 'policy'),
  'MP-03': entry('error', 'Output group fed by another circuit than the lane', 'policy'),
  'MP-04': entry('warning', 'Output group without a feeding circuit', 'policy'),
  'MP-05': entry('error', 'Channel beyond the module', 'type data'),
  'MP-06': entry('error', 'Wrong kind of module for the signal', 'type data'),
  'MP-07': entry('error', 'Channel used twice', 'policy'),
  'MP-08': entry('error', 'Signal mapped twice', 'policy'),
  'MP-09': entry('warning', 'Control output for a dispenser on its own clock', 'policy'),
  'MP-10': entry('warning', 'Mapped on another controller than its own', 'policy'),
  'MP-11': entry('error', 'Status input for a device without status signal', 'type data'),
  'MP-12': entry('warning', 'No circuit', 'policy'),
  'CB-01': entry('warning', 'Cable data missing', 'policy'),
  'CB-02': entry('error', 'Cross-section without known resistance', 'IEC 60228, tables 2 and 3'),
  'CB-03': entry('error', 'Cable tag on two cables', 'IEC 81346-1'),
  'CB-04': entry('error', 'Junction box of another circuit', 'policy'),
  'CB-05': entry('error', 'Cable tree runs in a loop', 'policy'),
  'TG-01': entry('error', 'Designation used twice', 'IEC 81346-1'),
  'AR-01': entry('error', 'Type not suited to the zone', 'IEC 60079-14, selection by protection level'),
  'AR-02': entry('warning', 'Protection level of the type unknown in a zone', 'IEC 60079-14, selection by protection level'),
  'AR-03': entry('note', 'Zone not stated', 'IEC 60079-10-1 and -10-2'),
  'AR-04': entry('note', 'Surface temperature of the type not stated in a zone', 'IEC 60079-14, selection by surface temperature'),
  'SP-01': entry('warning', 'Too few spare channels', 'policy'),
} as const satisfies Record<string, CodeEntry>;

export type FindingCode = keyof typeof FINDING_CODES;

export interface FindingText {
  readonly title: string;
  readonly remedy: string;
  readonly detail?: string;
  readonly compared?: Finding['compared'];
  readonly dispenserIds?: readonly string[];
  /** Tells two findings of one code and subject apart. */
  readonly mark?: string;
}

/** A finding of a code; severity and source come from the table. */
export function makeFinding(code: FindingCode, kind: SubjectKind, id: string, label: string, text: FindingText): Finding {
  const { severity, source } = FINDING_CODES[code];
  return {
    key: text.mark === undefined ? `${code}:${id}` : `${code}:${id}:${text.mark}`,
    code,
    severity,
    subject: { kind, id, label },
    title: text.title,
    detail: text.detail ?? '',
    source,
    remedy: text.remedy,
    compared: text.compared ?? [],
    dispenserIds: text.dispenserIds ?? [],
  };
}
