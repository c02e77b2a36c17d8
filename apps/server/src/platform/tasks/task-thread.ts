import { Worker } from 'node:worker_threads';
import { ProblemError, TooLarge } from '../problems.ts';
import type { DatabaseUrls } from './run-tasks.ts';
import type { Progress, TaskMessage, TaskRequest } from './task.ts';

/** A task that needs more than this is given up, and the instance goes on. */
const MEMORY_MB = 1024;
/** Room for what lives shortly: less of it would be copied to and fro all the time. */
const YOUNG_MB = 64;

interface Job {
  readonly key: string;
  readonly request: TaskRequest;
  readonly onProgress: (progress: Progress) => void;
  readonly resolve: (output: unknown) => void;
  readonly reject: (error: Error) => void;
}

/** Runs long tasks beside the requests of an instance: in one thread, one after another. Starts it with the first. */
export class TaskThread {
  private readonly waiting: Job[] = [];
  private current: Job | null = null;
  private worker: Worker | null = null;

  /** @param entry the file that calls `runTasks` */
  constructor(private readonly entry: URL, private readonly urls: DatabaseUrls) {}

  /**
   * @param key what `cancel` names
   * @throws {ProblemError} as the task throws it, of type `cancelled` where it was stopped
   */
  run<Output>(name: string, input: unknown, key: string, onProgress: (progress: Progress) => void): Promise<Output> {
    return new Promise<Output>((resolve, reject) => {
      this.waiting.push({ key, request: { name, input }, onProgress, resolve: resolve as (output: unknown) => void, reject });
      this.next();
    });
  }

  /** Stops a task, whether it waits or runs; what it has written in a transaction is rolled back. */
  cancel(key: string): void {
    const at = this.waiting.findIndex((job) => job.key === key);
    if (at >= 0) this.waiting.splice(at, 1)[0].reject(cancelled());
    if (this.current?.key === key) this.end(cancelled());
  }

  async close(): Promise<void> {
    const worker = this.worker;
    this.worker = null;
    await worker?.terminate();
  }

  private next(): void {
    if (this.current || this.waiting.length === 0) return;
    this.current = this.waiting.shift() ?? null;
    this.worker ??= this.start();
    this.worker.postMessage(this.current?.request);
  }

  private start(): Worker {
    const options = { workerData: this.urls, execArgv: [], resourceLimits: { maxOldGenerationSizeMb: MEMORY_MB, maxYoungGenerationSizeMb: YOUNG_MB } };
    const worker = this.entry.pathname.endsWith('.ts')
      ? new Worker(fromSources(this.entry), { ...options, eval: true })
      : new Worker(this.entry, options);
    worker.on('message', (message: TaskMessage) => {
      if (this.worker === worker) this.hear(message);
    });
    worker.on('error', (error: Error & { code?: string }) => {
      if (this.worker === worker) this.end(error.code === 'ERR_WORKER_OUT_OF_MEMORY' ? tooLarge() : error);
    });
    worker.unref();
    return worker;
  }

  private hear(message: TaskMessage): void {
    if (message.kind === 'progress') this.current?.onProgress(message.progress);
    else if (message.kind === 'done') this.settle((job) => job.resolve(message.output));
    else if (message.kind === 'problem') {
      const { status, type, title, more } = message.problem;
      this.settle((job) => job.reject(new ProblemError(status, type, title, more)));
    } else this.settle((job) => job.reject(Object.assign(new Error(message.message), { stack: message.stack })));
  }

  /** Gives up the thread; the next task starts another. */
  private end(error: Error): void {
    void this.worker?.terminate();
    this.worker = null;
    this.settle((job) => job.reject(error));
  }

  private settle(how: (job: Job) => void): void {
    const job = this.current;
    this.current = null;
    if (job) how(job);
    this.next();
  }
}

/** Loads an entry in TypeScript: in development and in tests, where nothing is built. A thread inherits no loader. */
const fromSources = (entry: URL): string =>
  `import('tsx/esm/api').then(({ register }) => { register(); return import(${JSON.stringify(entry.href)}); })`;

const cancelled = () => new ProblemError(409, 'cancelled', 'This was stopped', { detail: 'Nothing was changed.' });
const tooLarge = () => new TooLarge('The file needs too much memory', 'Split the list into several files, and leave out columns that are not needed.');
