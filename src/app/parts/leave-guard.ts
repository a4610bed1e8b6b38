import type { CanDeactivateFn } from '@angular/router';
import type { PartEdit } from './part-edit.ts';

/** Holds who leaves the form with something unsent. */
export const leaveGuard: CanDeactivateFn<PartEdit> = (page) => page.mayLeave();
