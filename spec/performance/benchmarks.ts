import { evaluateStage } from '../../shared/checks/evaluate-stage.ts';
import { sizeStage } from '../../shared/sizing/size-stage.ts';
import { relayStage } from '../shared/relay-stage.ts';

const stage = relayStage();
const fine = relayStage({ policy: { name: 'General practice', series: 'E96' } });

/** What the bench measures, and what each may take on a quiet two-core machine. */
export const benchmarks = [
  {
    name: 'criteria and verdict of 1024 corners',
    budgetMs: 2,
    task: () => evaluateStage(stage),
  },
  { name: 'sizing, E24', budgetMs: 50, task: () => sizeStage(stage) },
  { name: 'sizing, E96', budgetMs: 150, task: () => sizeStage(fine) },
];
