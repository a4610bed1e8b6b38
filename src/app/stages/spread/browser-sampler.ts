import { DestroyRef, inject, Injectable } from '@angular/core';
import { Observable } from 'rxjs';
import { TrustedWorker as Worker } from '../trusted-worker.ts';
import type { Sampler, SpreadTask } from './spread-stream.ts';
import type { SpreadOrder, SpreadReport } from './spread-worker-message.ts';

/** Judges samples in a worker of their own, so that verdicts and sizing never wait for them. */
@Injectable()
export class BrowserSampler implements Sampler {
  private worker: Worker | null = null;
  private sent = 0;

  constructor() {
    inject(DestroyRef).onDestroy(() => this.worker?.terminate());
  }

  sample({ input, request }: SpreadTask): Observable<SpreadReport> {
    return new Observable<SpreadReport>((subscriber) => {
      this.sent += 1;
      const id = this.sent;
      const worker = this.running();
      const hear = ({ data }: MessageEvent<SpreadReport>) => {
        if (data.id !== id) return;
        subscriber.next(data);
        if (data.spread !== null) subscriber.complete();
      };
      worker.addEventListener('message', hear);
      worker.postMessage({ id, input, request } satisfies SpreadOrder);
      return () => {
        worker.removeEventListener('message', hear);
        worker.postMessage({ id, input: null } satisfies SpreadOrder);
      };
    });
  }

  private running(): Worker {
    this.worker ??= new Worker(new URL('./spread.worker.ts', import.meta.url), { type: 'module' });
    return this.worker;
  }
}
