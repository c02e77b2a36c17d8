import type { Uuid, Wiring } from '#calc';
import type { DecimalMark } from './grid.ts';
import type { FieldKey, SignalKey, ValueKey } from './fields.ts';

/** What a person chose, or took over from the suggestions. */
export interface ImportSettings {
  readonly decimal: DecimalMark;
  /** Number of the lowest row of the headings; in a workbook that of the first sheet taken. */
  readonly headerRow: number;
  readonly mapping: Mapping;
  readonly valueMapping?: ValueMapping;
}

/** Column letter → field; columns are told apart by position, a column not named is left out. */
export type Mapping = Readonly<Record<string, FieldKey>>;

/** Field → text of the file (any case) → value of the project; null leaves it blank. Only for choices. */
export type ValueMapping = Readonly<Partial<Record<FieldKey, Readonly<Record<string, string | null>>>>>;

/**
 * What a row says, by value: null is "says nothing". Lengths in mm and m, volumes in whole microlitres,
 * choices by the name they have in the project.
 */
export interface ImportValues {
  readonly tag: string | null;
  readonly description: string | null;
  readonly function: string | null;
  readonly location: string | null;
  readonly product: string | null;
  readonly machine: string | null;
  readonly boreMm: number | null;
  readonly outsideMm: number | null;
  readonly widthMm: number | null;
  readonly speedRpm: number | null;
  readonly hoursPerDay: number | null;
  readonly daysPerWeek: number | null;
  readonly demandUlPer100h: number | null;
  readonly demandUlPer1000h: number | null;
  readonly grease: string | null;
  readonly dispenserType: string | null;
  readonly cartridgeUl: number | null;
  readonly doseUl: number | null;
  readonly wiring: Wiring | null;
  readonly controller: string | null;
  readonly outputModule: string | null;
  readonly outputChannel: number | null;
  readonly outputAddress: string | null;
  readonly statusModule: string | null;
  readonly statusChannel: number | null;
  readonly statusAddress: string | null;
  readonly junctionBox: string | null;
  readonly cableTag: string | null;
  readonly cableLengthM: number | null;
  readonly crossSectionMm2: number | null;
  readonly circuit: string | null;
  readonly remarks: string | null;
}

/** Values while a row is being read. */
export type DraftValues = { -readonly [K in ValueKey]: ImportValues[K] };

export type ProblemCode =
  | 'tag-missing'
  | 'tag-doubled'
  | 'tag-too-long'
  | 'too-many-cells'
  | 'signal-type-missing'
  | 'signal-type-unknown'
  | 'signal-doubled'
  | 'rows-differ'
  | 'not-a-number'
  | 'other-unit'
  | 'not-positive'
  | 'out-of-range'
  | 'outside-not-above-bore'
  | 'dose-step'
  | 'volume-too-fine'
  | 'demand-contradiction'
  | 'no-such-cartridge'
  | 'type-unknown'
  | 'wiring-unknown'
  | 'wiring-contradiction'
  | 'controller-unknown'
  | 'controller-missing'
  | 'controller-contradiction'
  | 'circuit-unknown'
  | 'grease-unknown'
  | 'box-unknown'
  | 'box-contradiction'
  | 'no-such-module'
  | 'no-such-channel'
  | 'module-missing'
  | 'channel-missing'
  | 'address-malformed'
  | 'address-contradiction'
  | 'address-wrong-kind'
  | 'output-taken'
  | 'input-taken';

export type NoteCode = 'read-as-blank' | 'grouping-removed' | 'unit-removed' | 'full-width-folded' | 'spaces-removed';

/** What is wrong with a text, before it is known where it stands. */
export interface Fault {
  readonly code: ProblemCode;
  readonly message: string;
  readonly remedy: string;
}

/** The value a problem or note belongs to; `output` and `status` stand for module, channel and address together. */
export type Subject = ValueKey | SignalKey | 'output' | 'status';

/** An error holds the row back; a warning leaves its value blank and imports the rest. */
export interface Problem extends Fault {
  readonly severity: 'error' | 'warning';
  /** Null: the row as a whole. */
  readonly field: Subject | null;
  readonly column: string | null;
  /** The cell as it stands in the file. */
  readonly cell: string | null;
}

/** Something read otherwise than it stands, without doubt about what is meant. */
export interface Note {
  readonly code: NoteCode;
  readonly field: ValueKey | SignalKey;
  readonly column: string;
  readonly cell: string;
  readonly message: string;
}

export type RowAction = 'create' | 'update' | 'same' | 'hold' | 'skip';
/** `other-signal`: the row stands for a signal that no dispenser has. */
export type SkipReason = 'blank' | 'repeated-heading' | 'totals' | 'other-signal';

/** One value of a point that the import changes. */
export interface FieldChange {
  readonly field: ValueKey;
  readonly from: string | number | null;
  readonly to: string | number;
}

export interface PlannedRow {
  /** The sheet of a workbook; null in a CSV. */
  readonly sheet: string | null;
  readonly row: number;
  readonly line: number;
  /** Every row of the file that makes this point, `row` first; more than one where each row is a signal. */
  readonly rows: readonly number[];
  readonly action: RowAction;
  /** Why the row is skipped; null for all other actions. */
  readonly why: SkipReason | null;
  /** The point it updates or equals; null when there is none yet. */
  readonly pointId: Uuid | null;
  readonly values: ImportValues;
  /** Old and new, for an update; empty otherwise. */
  readonly changes: readonly FieldChange[];
  readonly problems: readonly Problem[];
  /** Held rows carry none: what counts there is the problem. */
  readonly notes: readonly Note[];
}

export interface ImportCounts {
  /** Rows of the file with data: all but the skipped ones. The other counts are of points. */
  readonly rows: number;
  readonly toCreate: number;
  readonly toUpdate: number;
  readonly same: number;
  readonly heldBack: number;
  readonly skipped: number;
  /** Rows that make a point without any problem. */
  readonly created: number;
  readonly createdWithProblems: number;
  /** Rows with at least one problem, held ones included. */
  readonly withProblems: number;
  readonly problems: number;
  readonly rowsWithNotes: number;
  readonly notes: number;
  /** Points of the project once the import is done. */
  readonly pointsAfter: number;
  /** Of the rows that are imported: those that say so. */
  readonly outputsAssigned: number;
  readonly statusInputsAssigned: number;
  readonly twoCore: number;
  readonly fourCore: number;
  readonly withoutDose: number;
}

/** What an import would do; making it changes nothing. */
export interface ImportPlan {
  /** The file is our own export: its guarded texts lost the apostrophe again. */
  readonly ownExport: boolean;
  readonly rows: readonly PlannedRow[];
  readonly counts: ImportCounts;
}
