/// <reference lib="webworker" />
import '../../zod-without-eval.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { sizeStage } from '../../../shared/sizing/size-stage.ts';
import type { EngineReply, EngineRequest } from './engine-worker-message.ts';

addEventListener('message', ({ data }: MessageEvent<EngineRequest>) => {
  const result = data.task === 'size' ? sizeStage(data.input) : evaluateStage(data.input);
  postMessage({ id: data.id, result } satisfies EngineReply);
});
