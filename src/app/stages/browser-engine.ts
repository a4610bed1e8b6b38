import { DestroyRef, inject, Injectable } from '@angular/core';
import { filter, map, Observable, of, Subject, take } from 'rxjs';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import type { ShuntSizing } from '../../../shared/sizing/size-shunt.ts';
import type { Sizing } from '../../../shared/sizing/sizing.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import type { EngineReply, EngineRequest } from './engine-worker-message.ts';
import type { Engine } from './judgement-stream.ts';
import { TrustedWorker as Worker } from './trusted-worker.ts';

/** Up to this the verdicts are made between two frames, on the page itself. */
const ON_PAGE_MS = 10;
/** So many slow ones in a row move the verdicts into the worker; the first run of all is always slow. */
const SLOW_RUNS = 4;

/** The engine in the browser: verdicts on the page while that is quick, sizing in a worker. */
@Injectable()
export class BrowserEngine implements Engine {
  private readonly replies = new Subject<EngineReply>();
  private worker: Worker | null = null;
  private sent = 0;
  private slow = 0;

  constructor() {
    inject(DestroyRef).onDestroy(() => this.worker?.terminate());
  }

  evaluate(input: StageInput): Observable<Evaluation> {
    if (this.slow >= SLOW_RUNS) return this.ask<Evaluation>('evaluate', input);
    const startMs = performance.now();
    const evaluation = evaluateStage(input);
    this.slow = performance.now() - startMs > ON_PAGE_MS ? this.slow + 1 : 0;
    return of(evaluation);
  }

  size(input: StageInput): Observable<Sizing> {
    return this.ask<Sizing>('size', input);
  }

  /** A recommendation for RBE; null where the stage takes none. */
  sizeShunt(input: StageInput): Observable<ShuntSizing | null> {
    return this.ask<ShuntSizing | null>('shunt', input);
  }

  private ask<Result extends EngineReply['result']>(
    task: EngineRequest['task'],
    input: StageInput,
  ): Observable<Result> {
    return new Observable<Result>((subscriber) => {
      this.sent += 1;
      const id = this.sent;
      const answer = this.replies
        .pipe(
          filter((reply) => reply.id === id),
          take(1),
          map(({ result }) => result as Result),
        )
        .subscribe(subscriber);
      this.running().postMessage({ id, task, input } satisfies EngineRequest);
      return answer;
    });
  }

  private running(): Worker {
    if (this.worker === null) {
      this.worker = new Worker(new URL('./engine.worker.ts', import.meta.url), { type: 'module' });
      this.worker.addEventListener('message', ({ data }: MessageEvent<EngineReply>) => {
        this.replies.next(data);
      });
    }
    return this.worker;
  }
}
