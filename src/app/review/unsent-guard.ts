import type { CanDeactivateFn } from '@angular/router';
import type { CheckPage } from './check-page.ts';

/** Holds who leaves the check page with something unsent. */
export const unsentGuard: CanDeactivateFn<CheckPage> = (page) => page.mayLeave();
