import type { HttpInterceptorFn } from '@angular/common/http';
import { catchError, throwError } from 'rxjs';
import { toProblem } from './problem';

/** Makes every failed request fail with a {@link Problem}. */
export const problemInterceptor: HttpInterceptorFn = (request, next) =>
  next(request).pipe(catchError((failure: unknown) => throwError(() => toProblem(failure))));
