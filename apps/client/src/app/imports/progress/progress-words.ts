import type { ImportWork } from '#contract';

export type ProgressStage = 'sending' | ImportWork['stage'] | 'stopping';

/** How far an import is, as the screen shows it. */
export interface ImportProgress {
  readonly stage: ProgressStage;
  /** Bytes while the file is being sent, rows afterwards. */
  readonly done: number;
  /** Null while nobody can know it. */
  readonly total: number | null;
  readonly leftMs: number | null;
}

const STAGES: Readonly<Record<ProgressStage, string>> = {
  sending: 'Sending the file',
  waiting: 'Waiting for the server',
  reading: 'Reading the file',
  checking: 'Checking the rows',
  writing: 'Writing to the project',
  stopping: 'Stopping',
};

export const stageWords = (stage: ProgressStage): string => STAGES[stage];

/** `1,250 of 50,000 rows`, `3.2 of 9.8 MB`; empty where there is nothing to say yet. */
export function amountWords({ stage, done, total }: ImportProgress): string {
  if (stage === 'stopping' || stage === 'waiting' || (done === 0 && total === null)) return '';
  if (stage === 'sending') return total === null ? `${megabytes(done)} MB` : `${megabytes(done)} of ${megabytes(total)} MB`;
  return total === null ? `${counted(done)} rows` : `${counted(done)} of ${counted(total)} rows`;
}

/** `about 8 s left`, `about 2 min left`; empty while it cannot be known. Coarse, so that it does not flicker. */
export function leftWords(leftMs: number | null): string {
  if (leftMs === null) return '';
  const seconds = Math.ceil(leftMs / 1000);
  if (seconds <= 1) return 'almost done';
  if (seconds < 10) return `about ${seconds} s left`;
  if (seconds < 55) return `about ${Math.ceil(seconds / 5) * 5} s left`;
  return `about ${Math.max(1, Math.round(seconds / 60))} min left`;
}

/** Whole per cent, never 100 before the end; null where it cannot be known. */
export function percent({ done, total }: ImportProgress): number | null {
  return total === null || total <= 0 ? null : Math.min(99, Math.floor((done / total) * 100));
}

/** In one sentence, for those who listen. */
export const spoken = (progress: ImportProgress): string =>
  [stageWords(progress.stage), amountWords(progress), leftWords(progress.leftMs)].filter(Boolean).join(', ');

export const counted = (count: number): string => count.toLocaleString('en-GB');

const megabytes = (bytes: number): string => (bytes / 1_000_000).toFixed(1);
