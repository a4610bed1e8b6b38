import { Observable } from 'rxjs';
import type { RankingReply, RankingRequest } from './part-ranking-message.ts';
import { TrustedWorker as Worker } from './trusted-worker.ts';

/** Judges library parts in a worker of its own, so that neither typing nor sizing waits; unsubscribing stops it. */
export function judgedParts(request: RankingRequest): Observable<RankingReply> {
  return new Observable((subscriber) => {
    const worker = new Worker(new URL('./part-ranking.worker.ts', import.meta.url), {
      type: 'module',
    });
    let left = request.parts.length;
    worker.addEventListener('message', ({ data }: MessageEvent<RankingReply>) => {
      subscriber.next(data);
      left -= 1;
      if (left === 0) subscriber.complete();
    });
    worker.postMessage(request);
    return () => {
      worker.terminate();
    };
  });
}
