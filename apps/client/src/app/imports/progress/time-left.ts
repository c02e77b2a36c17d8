/** How far something was at a moment. */
export interface Sample {
  readonly atMs: number;
  readonly done: number;
}

const WINDOW_MS = 5000;
const ENOUGH_MS = 1500;
const SMOOTHING = 0.3;

/**
 * Time left of a job of known size, from its rate in the last five seconds; the estimate is smoothed, so that it does
 * not jump. Null until the job has been watched for a second and a half and has moved.
 */
export class TimeLeft {
  private samples: readonly Sample[] = [];
  private estimateMs: number | null = null;
  private atMs = 0;

  /** @returns milliseconds left, or null while that cannot be known */
  next(sample: Sample, total: number | null): number | null {
    const last = this.samples.at(-1);
    if (last && sample.done < last.done) this.restart();
    this.samples = [...this.samples.filter((each) => sample.atMs - each.atMs <= WINDOW_MS), sample];
    const raw = total === null ? null : this.raw(total);
    if (raw === null) return null;
    const expected = this.estimateMs === null ? raw : Math.max(0, this.estimateMs - (sample.atMs - this.atMs));
    this.estimateMs = expected + SMOOTHING * (raw - expected);
    this.atMs = sample.atMs;
    return this.estimateMs;
  }

  /** Another stage goes at another rate. */
  restart(): void {
    this.samples = [];
    this.estimateMs = null;
  }

  private raw(total: number): number | null {
    const first = this.samples[0];
    const last = this.samples[this.samples.length - 1];
    const took = last.atMs - first.atMs;
    const moved = last.done - first.done;
    return took < ENOUGH_MS || moved <= 0 ? null : ((total - last.done) * took) / moved;
  }
}
