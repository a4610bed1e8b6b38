import type { HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { catchError, throwError } from 'rxjs';
import { toApiProblem } from './api-problem.ts';
import { SessionEnd } from './session-end.ts';

/** Tells the session that it is over when the server no longer knows it; the error goes on to the caller. */
export const notSignedInInterceptor: HttpInterceptorFn = (request, next) => {
  const sessionEnd = inject(SessionEnd);
  return next(request).pipe(
    catchError((error: unknown) => {
      if (toApiProblem(error).code === 'not-signed-in') sessionEnd.announce();
      return throwError(() => error);
    }),
  );
};
