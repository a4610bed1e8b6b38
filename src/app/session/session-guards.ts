import { inject } from '@angular/core';
import { Router, type CanActivateFn } from '@angular/router';
import { SessionStore } from './session-store.ts';

/** Pages of signed-in people; others go to the sign-in page, which leads back. */
export const signedInGuard: CanActivateFn = (_, state) => {
  const session = inject(SessionStore).session();
  const router = inject(Router);
  if (session?.setupNeeded) return router.createUrlTree(['/set-up']);
  if (session?.person) return true;
  return router.createUrlTree(['/sign-in'], {
    queryParams: state.url === '/' ? {} : { next: state.url },
  });
};

/** Sign-in and set-up: only for who is not signed in, and only one of them applies. */
export const signedOutGuard: CanActivateFn = (route) => {
  const session = inject(SessionStore).session();
  const router = inject(Router);
  if (session?.person) return router.createUrlTree(['/desk']);
  const setUpPage = route.routeConfig?.path === 'set-up';
  if (session?.setupNeeded && !setUpPage) return router.createUrlTree(['/set-up']);
  if (!session?.setupNeeded && setUpPage) return router.createUrlTree(['/sign-in']);
  return true;
};

export const administratorGuard: CanActivateFn = () =>
  inject(SessionStore).person()?.administrator === true
    ? true
    : inject(Router).createUrlTree(['/desk']);
