import { BreakpointObserver } from '@angular/cdk/layout';
import { inject, type Signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { map } from 'rxjs';

/** Three columns, two with the form in a drawer, or one with tabs. */
export type SheetLayout = 'wide' | 'medium' | 'phone';

const WIDE = '(min-width: 1200px)';
const PHONE = '(max-width: 839.98px)';

/** How the sheet is laid out in the window as it is now; call it in a field or constructor. */
export function sheetLayout(): Signal<SheetLayout> {
  const layouts = inject(BreakpointObserver)
    .observe([WIDE, PHONE])
    .pipe(
      map(({ breakpoints }): SheetLayout => {
        if (breakpoints[PHONE] === true) return 'phone';
        return breakpoints[WIDE] === true ? 'wide' : 'medium';
      }),
    );
  return toSignal(layouts, { initialValue: 'wide' as const });
}
