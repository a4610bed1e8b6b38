/// <reference lib="webworker" />
import '../../zod-without-eval.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { sizeShunt } from '../../../shared/sizing/size-shunt.ts';
import { sizeStage } from '../../../shared/sizing/size-stage.ts';
import type { EngineReply, EngineRequest } from './engine-worker-message.ts';

const TASKS = { evaluate: evaluateStage, size: sizeStage, shunt: sizeShunt };

addEventListener('message', ({ data }: MessageEvent<EngineRequest>) => {
  postMessage({ id: data.id, result: TASKS[data.task](data.input) } satisfies EngineReply);
});
