import type { ErrorRequestHandler, Response } from 'express';
import { problemOfDatabase } from '../database-problems.ts';
import type { Logger } from '../log.ts';
import { BadRequest, ProblemError, TooLarge } from '../problems.ts';

/** The one place where errors become RFC 9457 answers. What we did not foresee is logged and told without details. */
export const errorHandler = (log: Logger): ErrorRequestHandler => (error: unknown, req, res, next) => {
  const problem = problemOf(error);
  if (!problem) log.error({ err: error, method: req.method, path: req.path }, 'unforeseen error');
  if (res.headersSent) {
    next(error);
    return;
  }
  sendProblem(res, problem ?? new ProblemError(500, 'internal', 'Something went wrong on the server', {
    detail: 'Try again; if it stays, tell your administrator. Nothing was saved.',
  }));
};

export function sendProblem(res: Response, problem: ProblemError): void {
  res.status(problem.status).set('Cache-Control', 'no-store').type('application/problem+json').send(JSON.stringify(problem.toDocument()));
}

function problemOf(error: unknown): ProblemError | null {
  if (error instanceof ProblemError) return error;
  return problemOfDatabase(error) ?? problemOfBody(error);
}

/** Errors of Express's own parsers carry a type. */
function problemOfBody(error: unknown): ProblemError | null {
  if (!(error instanceof Error) || !('status' in error) || typeof error.status !== 'number' || error.status >= 500) return null;
  if (error.status === 413) return new TooLarge('The request is too large', 'Send less at once.');
  return new BadRequest('The request could not be read', 'Check that the body is well-formed JSON in UTF-8 and the address is well-formed.');
}
