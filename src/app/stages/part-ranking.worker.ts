/// <reference lib="webworker" />
import '../../zod-without-eval.ts';
import { deriveTransistor } from '../../../shared/parts/derive-transistor.ts';
import { judgePart, unfit } from '../../../shared/sizing/rank-parts.ts';
import type { RankingReply, RankingRequest } from './part-ranking-message.ts';

addEventListener('message', ({ data }: MessageEvent<RankingRequest>) => {
  for (const { key, record } of data.parts) {
    const derived = deriveTransistor(record);
    const part = derived.ok ? judgePart(data.stage, derived.data) : unfit(derived.reason);
    postMessage({ key, part } satisfies RankingReply);
  }
});
