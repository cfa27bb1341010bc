import { HttpErrorResponse } from '@angular/common/http';
import type { FieldError, ProblemDocument } from '@shared/problem';

/** What went wrong with a request: the problem document of RFC 9457, or its nearest likeness. */
export class Problem extends Error {
  override readonly name = 'Problem';

  constructor(
    /** HTTP status; 0 when no answer came at all. */
    readonly status: number,
    /** Stable code of the server, or `offline`, `unreadable`. */
    readonly code: string,
    readonly title = '',
    readonly detail = '',
    readonly requestId = '',
    readonly errors: readonly FieldError[] = [],
  ) {
    super(detail || title || code);
  }
}

/**
 * Reads a failure as a problem. Anything without a problem document (a proxy's page, a broken
 * line) still gets a status and a code, so callers need one shape only.
 */
export function toProblem(failure: unknown): Problem {
  if (failure instanceof Problem) return failure;
  if (!(failure instanceof HttpErrorResponse)) {
    return new Problem(0, 'unreadable', '', failure instanceof Error ? failure.message : '');
  }
  if (failure.status === 0) return new Problem(0, 'offline');
  const document = readDocument(failure.error);
  return new Problem(
    failure.status,
    document.code ?? `http-${failure.status}`,
    document.title ?? '',
    document.detail ?? '',
    document.requestId ?? failure.headers.get('X-Request-Id') ?? '',
    Array.isArray(document.errors) ? document.errors : [],
  );
}

function readDocument(body: unknown): Partial<ProblemDocument> {
  if (typeof body === 'object' && body !== null && !(body instanceof Blob)) return body;
  if (typeof body !== 'string') return {};
  try {
    const parsed: unknown = JSON.parse(body);
    return typeof parsed === 'object' && parsed !== null ? parsed : {};
  } catch {
    return {};
  }
}
