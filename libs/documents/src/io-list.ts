import type { Assessment, Design } from '#calc';
import { CAUTIONS, DISCLAIMER, DRAFT_STATE } from './cautions.ts';
import { IO_COLUMNS, type IoCell, type IoColumn } from './io-columns.ts';
import { lanesInOrder, type Lane } from './io-rows.ts';
import { ioSummary, type IoSummary } from './io-summary.ts';

/** The I/O list of a project: one row a point, output and status side by side. */
export interface IoList {
  readonly project: string;
  /** Which state of the design it shows, for instance "Draft, not for construction". */
  readonly state: string;
  /** Day on which it was made, YYYY-MM-DD. */
  readonly date: string;
  readonly columns: readonly IoColumn[];
  /** All rows in the order of cabinet, controller, module and channel; cells in the order of the columns. */
  readonly rows: readonly (readonly IoCell[])[];
  /** The same rows by cabinet; what belongs to no cabinet comes last. */
  readonly sheets: readonly IoSheet[];
  readonly summary: IoSummary;
  readonly disclaimer: string;
  readonly cautions: readonly string[];
}

export interface IoSheet {
  /** Location of the cabinet; null: points that belong to none yet. */
  readonly cabinet: string | null;
  readonly description: string;
  readonly rows: readonly (readonly IoCell[])[];
}

/**
 * Builds the I/O list of a draft. Every point has one row, mapped or not, so that importing the list
 * again changes nothing; derived columns are left out by an import.
 *
 * @param date day on which it is made, YYYY-MM-DD
 */
export function ioList(design: Design, assessment: Assessment, date: string): IoList {
  const lanes = lanesInOrder(design, assessment);
  const rows = lanes.map((lane) => IO_COLUMNS.map(({ cell }) => cell(lane)));
  return {
    project: design.project.name,
    state: DRAFT_STATE,
    date,
    columns: IO_COLUMNS,
    rows,
    sheets: sheetsOf(design, lanes, rows),
    summary: ioSummary(design, assessment, lanes),
    disclaimer: DISCLAIMER,
    cautions: CAUTIONS,
  };
}

/** Cabinets without a point have no sheet: their modules stand in the summary. */
function sheetsOf(design: Design, lanes: readonly Lane[], rows: IoList['rows']): IoSheet[] {
  const byCabinet = new Map<string | null, (readonly IoCell[])[]>();
  lanes.forEach(({ cabinet }, i) => {
    const key = cabinet?.id ?? null;
    const kept = byCabinet.get(key);
    if (kept) kept.push(rows[i]);
    else byCabinet.set(key, [rows[i]]);
  });
  const cabinets = new Map(design.cabinets.map((each) => [each.id, each]));
  return [...byCabinet].map(([id, own]) => {
    const cabinet = id === null ? undefined : cabinets.get(id);
    return { cabinet: cabinet?.location ?? null, description: cabinet?.description ?? '', rows: own };
  });
}
