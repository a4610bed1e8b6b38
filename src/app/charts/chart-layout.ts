import { barsScene } from './bars-scene.ts';
import type { ChartModel } from './chart-model.ts';
import type { ChartScene } from './chart-scene.ts';
import { plotScene } from './plot-scene.ts';

/** Lays a chart out in so many CSS pixels. */
export function chartLayout(model: ChartModel, width: number, height: number): ChartScene {
  return model.kind === 'bars' ? barsScene(model, width, height) : plotScene(model, width, height);
}
