import { parentPort, workerData } from 'node:worker_threads';
import { Database } from '../database.ts';
import { ProblemError } from '../problems.ts';
import type { Progress, Task, TaskMessage, TaskRequest } from './task.ts';

/** Between two reports of a task, so that telling does not cost more than doing. */
const REPORT_EVERY_MS = 100;

/** Where the thread finds the database. */
export interface DatabaseUrls {
  readonly appUrl: string;
  readonly authUrl: string;
}

/** The life of the thread: one task after another, as they are sent. */
export function runTasks(tasks: Readonly<Record<string, Task<never, unknown>>>): void {
  const port = parentPort;
  if (!port) throw new Error('This file is the entry of a thread.');
  const database = new Database(workerData as DatabaseUrls);
  port.on('message', (request: TaskRequest) => {
    const report = sparsely((progress) => port.postMessage({ kind: 'progress', progress } satisfies TaskMessage));
    void answerTo(tasks, database, request, report).then((message) => port.postMessage(message));
  });
}

async function answerTo(tasks: Readonly<Record<string, Task<never, unknown>>>, database: Database, { name, input }: TaskRequest, report: (progress: Progress) => void): Promise<TaskMessage> {
  try {
    const task = tasks[name];
    if (!task) throw new Error(`There is no task ${name}`);
    return { kind: 'done', output: await task(database, input as never, report) };
  } catch (error) {
    if (error instanceof ProblemError) {
      const { status, type, message: title, more } = error;
      return { kind: 'problem', problem: { status, type, title, more } };
    }
    const { message, stack } = error instanceof Error ? error : new Error(String(error));
    return { kind: 'failed', message, stack };
  }
}

/** Passes on a new stage at once, and within a stage what comes after a while. */
function sparsely(tell: (progress: Progress) => void): (progress: Progress) => void {
  let last = 0;
  let stage = '';
  return (progress) => {
    const now = Date.now();
    if (progress.stage === stage && now - last < REPORT_EVERY_MS) return;
    last = now;
    stage = progress.stage;
    tell(progress);
  };
}
