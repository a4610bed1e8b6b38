import { computed, DestroyRef, Directive, ElementRef, inject, input } from '@angular/core';

/**
 * A button that may not be pressed now, and why: it stays focusable, says `aria-disabled`, points to the reason
 * (which stands in words beside it, in the element of id `reasonId`) and swallows clicks.
 *
 *     <span id="pass-reason" class="reason">{{ reason }}</span>
 *     <button matButton="filled" [appNotAllowed]="reason" reasonId="pass-reason" (click)="pass()">Pass</button>
 */
@Directive({
  selector: 'button[appNotAllowed]',
  host: {
    '[class.not-allowed]': 'refused()',
    '[attr.aria-disabled]': 'refused() ? true : null',
    '[attr.aria-describedby]': 'refused() ? reasonId() : null',
  },
})
export class NotAllowed {
  /** The reason, or null when the act is allowed. */
  readonly appNotAllowed = input.required<string | null>();
  readonly reasonId = input.required<string>();

  protected readonly refused = computed(() => this.appNotAllowed() !== null);

  constructor() {
    const button = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    const guard = (event: Event) => {
      if (!this.refused()) return;
      event.preventDefault();
      event.stopImmediatePropagation();
    };
    // Capture: the template's own click listener must not see the event.
    button.addEventListener('click', guard, { capture: true });
    inject(DestroyRef).onDestroy(() => {
      button.removeEventListener('click', guard, { capture: true });
    });
  }
}
