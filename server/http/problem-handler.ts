import type { ErrorRequestHandler, RequestHandler } from 'express';
import { ConnectionAcquireTimeoutError, ConnectionError } from 'sequelize';
import { Problem, type ProblemDocument } from '@shared/problem';
import type { Logger } from 'pino';

/** The last route: what nobody answered does not exist. */
export const nothingHere: RequestHandler = () => {
  throw new Problem(404, 'not-found', 'There is nothing at this address.');
};

/** The one place where errors become RFC 9457 documents; an unknown one tells nothing but its id. */
export function problemHandler(log: Logger): ErrorRequestHandler {
  return (error, req, res, next) => {
    const problem = asProblem(error);
    if (problem.status >= 500) log.error({ err: error, requestId: req.id }, 'request failed');
    if (res.headersSent) {
      next(error);
      return;
    }
    const document: ProblemDocument = {
      type: `urn:vatwright:problem:${problem.code}`,
      title: problem.title,
      status: problem.status,
      code: problem.code,
      requestId: String(req.id),
      ...problem.more,
    };
    if (problem.status === 503) res.set('Retry-After', '2');
    res.status(problem.status).type('application/problem+json').send(JSON.stringify(document));
  };
}

function asProblem(error: unknown): Problem {
  if (error instanceof Problem) return error;
  if (error instanceof ConnectionAcquireTimeoutError || error instanceof ConnectionError) {
    return new Problem(503, 'busy', 'The database cannot be reached just now. Try again shortly.');
  }
  const { status, type } = error as { status?: number; type?: string };
  if (type === 'entity.too.large') return new Problem(413, 'too-large', 'This is too large.');
  if (status === 400) return new Problem(400, 'malformed', 'The request could not be read.');
  return new Problem(500, 'unexpected', 'Something went wrong on our side.');
}
