import { LiveAnnouncer } from '@angular/cdk/a11y';
import { inject, Injectable } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { Subject, throttleTime } from 'rxjs';

/** Spoken status: at most one polite message a second, the last one of a burst; failures at once. */
@Injectable({ providedIn: 'root' })
export class StatusAnnouncer {
  private readonly live = inject(LiveAnnouncer);
  private readonly messages = new Subject<string>();

  constructor() {
    this.messages
      .pipe(throttleTime(1000, undefined, { leading: true, trailing: true }), takeUntilDestroyed())
      .subscribe((message) => void this.live.announce(message, 'polite'));
  }

  say(message: string): void {
    this.messages.next(message);
  }

  alert(message: string): void {
    void this.live.announce(message, 'assertive');
  }
}
