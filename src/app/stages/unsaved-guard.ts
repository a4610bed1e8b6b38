import type { CanDeactivateFn } from '@angular/router';

/** A page that may hold something the server does not have yet. */
export interface KeepsWork {
  /** Sends what waits; whether anything is still unsent afterwards. */
  leaveUnsent(): Promise<boolean>;
}

/** Saves before leaving; asks only when something really could not be sent. */
export const unsavedGuard: CanDeactivateFn<KeepsWork> = async (page) => {
  if (!(await page.leaveUnsent())) return true;
  return confirm('Some changes are not saved yet and would be lost. Leave this page?');
};
