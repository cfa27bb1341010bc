import type { HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { Router } from '@angular/router';
import { catchError, throwError } from 'rxjs';
import { newId } from '../api/new-id';
import { Problem } from '../problems/problem';
import { Session } from './session';

const WRITES = new Set(['POST', 'PUT', 'PATCH', 'DELETE']);

/**
 * Gives every write an idempotency key, and leads to the sign-in page when the server no longer
 * knows the session. The anti-forgery header is Angular's own.
 */
export const sessionInterceptor: HttpInterceptorFn = (request, next) => {
  const session = inject(Session);
  const router = inject(Router);
  const sent =
    WRITES.has(request.method) && !request.headers.has('Idempotency-Key')
      ? request.clone({ setHeaders: { 'Idempotency-Key': newId() } })
      : request;
  return next(sent).pipe(
    catchError((failure: unknown) => {
      if (failure instanceof Problem && failure.status === 401 && session.current()) {
        session.forget();
        void router.navigate(['/sign-in'], { queryParams: { returnUrl: router.url } });
      }
      return throwError(() => failure);
    }),
  );
};
