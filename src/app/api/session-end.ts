import { Injectable } from '@angular/core';
import { Subject } from 'rxjs';

/** Carries the news that the server no longer knows the session from the interceptor to whoever acts on it. */
@Injectable({ providedIn: 'root' })
export class SessionEnd {
  private readonly subject = new Subject<void>();
  readonly events = this.subject.asObservable();

  announce(): void {
    this.subject.next();
  }
}
