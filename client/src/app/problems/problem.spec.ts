import { HttpErrorResponse, HttpHeaders } from '@angular/common/http';
import { Problem, toProblem } from './problem';

describe('toProblem', () => {
  it('keeps every member of a problem document (RFC 9457 section 3)', () => {
    const problem = toProblem(
      new HttpErrorResponse({
        status: 422,
        error: {
          title: 'Not valid',
          code: 'validation-failed',
          detail: 'Two fields need another look.',
          requestId: 'r-1',
          errors: [{ field: 'name', reason: 'required', message: 'Give a name.' }],
        },
      }),
    );
    expect(problem).toMatchObject({
      status: 422,
      code: 'validation-failed',
      title: 'Not valid',
      requestId: 'r-1',
      message: 'Two fields need another look.',
    });
    expect(problem.errors).toHaveLength(1);
  });

  it('calls an answer that never came offline', () => {
    expect(toProblem(new HttpErrorResponse({ status: 0 }))).toMatchObject({ code: 'offline' });
  });

  it('makes do with a page that is no problem document', () => {
    const problem = toProblem(
      new HttpErrorResponse({
        status: 502,
        error: '<html>Bad gateway</html>',
        headers: new HttpHeaders({ 'X-Request-Id': 'r-2' }),
      }),
    );
    expect(problem).toMatchObject({ status: 502, code: 'http-502', requestId: 'r-2', errors: [] });
  });

  it('reads a document that came as text', () => {
    const failure = new HttpErrorResponse({ status: 409, error: '{"code":"stale"}' });
    expect(toProblem(failure).code).toBe('stale');
  });

  it('returns a problem as it is', () => {
    const problem = new Problem(404, 'not-found');
    expect(toProblem(problem)).toBe(problem);
  });
});
