import { beforeAll, describe, expect, it } from 'vitest';
import { spreadOnThreads } from '../../../server/cli/sample-threads.ts';
import { runMonteCarlo } from '../../../shared/statistics/monte-carlo.ts';
import { relayStage } from '../../shared/relay-stage.ts';

const request = { samples: 200_000, seed: 5 };

describe('samples on threads', { timeout: 120_000 }, () => {
  let threadFile = '';
  beforeAll(async () => {
    const { bundledFile } = (await import(
      new URL('../../../server/cli/bundle-engine.mjs', import.meta.url).href
    )) as { bundledFile: (entry: string, folders: string[]) => Promise<string> };
    threadFile = await bundledFile('server/cli/sample-thread.ts', ['server/cli', 'shared']);
  });

  it.each([1, 2, 3])('give the same on %i threads as here', async (threads) => {
    const told: number[] = [];
    const onProgress = (samples: number) => told.push(samples);
    const found = await spreadOnThreads(relayStage(), request, { threadFile, threads, onProgress });
    expect(found).toEqual(runMonteCarlo(relayStage(), request));
    expect(told.at(-1)).toBe(request.samples);
  });

  it.each([1, 2])('end early on %i threads when told to', async (threads) => {
    const controller = new AbortController();
    const onProgress = () => {
      controller.abort(new Error('enough'));
    };
    const run = spreadOnThreads(
      relayStage(),
      { samples: 10_000_000, seed: 1 },
      { threadFile, threads, onProgress, signal: controller.signal },
    );
    await expect(run).rejects.toThrow('enough');
  });

  it('pass on what a thread fails with', async () => {
    const broken = { ...relayStage(), load: null } as never;
    const run = spreadOnThreads(broken, request, { threadFile, threads: 2 });
    await expect(run).rejects.toThrow();
  });
});
