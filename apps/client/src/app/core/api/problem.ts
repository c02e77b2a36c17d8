import { HttpErrorResponse } from '@angular/common/http';
import type { Problem } from '#contract';

/** The server's problem document, or one of our own where the server could not be reached. */
export function problemOf(error: unknown): Problem {
  if (error instanceof HttpErrorResponse) {
    if (isProblem(error.error)) return error.error;
    if (error.status === 0) {
      return { type: 'offline', title: 'The server cannot be reached', status: 0, detail: 'Check the network, then try again. Nothing was saved.' };
    }
    return { type: 'internal', title: `The server answered ${error.status}`, status: error.status, detail: 'Try again; if it stays, tell your administrator.' };
  }
  return { type: 'internal', title: 'Something went wrong in the browser', status: 0, detail: error instanceof Error ? error.message : String(error) };
}

/** In one line, for a notice: what happened and what to do. */
export const problemText = (problem: Problem): string =>
  [problem.title, problem.detail, ...(problem.errors ?? []).map((e) => `${e.field}: ${e.message}`)].filter(Boolean).join('. ').replace(/\.\./g, '.');

const isProblem = (body: unknown): body is Problem =>
  typeof body === 'object' && body !== null && 'title' in body && 'status' in body;
