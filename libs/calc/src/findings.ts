/** What the checks noticed; derived, never stored as truth. */
export type Severity = 'error' | 'warning' | 'note';

export type SubjectKind =
  | 'project' | 'point' | 'dispenser' | 'channel' | 'group' | 'module' | 'controller' | 'cabinet'
  | 'cable' | 'circuit' | 'supply';

export interface Finding {
  /** Stable within a design: code, subject and what tells two findings of one subject apart. */
  readonly key: string;
  /** Stable code of our own, two letters and two digits, for instance IO-03. */
  readonly code: string;
  readonly severity: Severity;
  readonly subject: { readonly kind: SubjectKind; readonly id: string; readonly label: string };
  /** One short sentence with the numbers compared, for instance "1.68 A in the group, rating 1.50 A". */
  readonly title: string;
  /** Why it matters and how the numbers come about; may be empty. */
  readonly detail: string;
  /** The standard and clause, "type data" or "policy". */
  readonly source: string;
  /** What would mend it, as an instruction. */
  readonly remedy: string;
  /** The numbers compared, unrounded. */
  readonly compared: readonly { readonly name: string; readonly value: number; readonly limit: number; readonly unit: string }[];
  /** Dispensers whose lane shows it. */
  readonly dispenserIds: readonly string[];
}
