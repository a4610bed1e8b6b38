import { readFileSync } from 'node:fs';
import { evaluateStage } from '../../shared/checks/evaluate-stage.ts';
import { deriveTransistor } from '../../shared/parts/derive-transistor.ts';
import { TransistorRecord } from '../../shared/parts/transistor-record.ts';
import { judgePart, rankParts } from '../../shared/sizing/rank-parts.ts';
import { sizeStage } from '../../shared/sizing/size-stage.ts';
import { relayStage } from '../shared/relay-stage.ts';

const stage = relayStage();
const fine = relayStage({ policy: { name: 'General practice', series: 'E96' } });
/** The shipped library, as the project's root holds it; an array cannot stand in a stage and costs nothing. */
const library = (
  JSON.parse(readFileSync('server/seed/library/transistors.json', 'utf8')) as unknown[]
).flatMap((record) => {
  const derived = deriveTransistor(TransistorRecord.parse(record));
  return derived.ok ? [derived.data] : [];
});

/** What the bench measures, and what each may take on a quiet two-core machine. */
export const benchmarks = [
  {
    name: 'criteria and verdict of 1024 corners',
    budgetMs: 2,
    task: () => evaluateStage(stage),
  },
  { name: 'sizing, E24', budgetMs: 50, task: () => sizeStage(stage) },
  { name: 'sizing, E96', budgetMs: 150, task: () => sizeStage(fine) },
  {
    name: 'ranking the transistor library',
    budgetMs: 1500,
    task: () => rankParts(library.map((transistor) => judgePart(stage, transistor))),
  },
];
