/** The figures whose spread is kept, by their names in a result. */
export const SPREAD_FIGURES = ['overdriveFactor', 'vceSatV', 'icA', 'powerW', 'tjDegC'] as const;
export type SpreadFigure = (typeof SPREAD_FIGURES)[number];

/** One value for each figure. */
export function byFigure<T>(of: (figure: SpreadFigure) => T): Record<SpreadFigure, T> {
  return Object.fromEntries(SPREAD_FIGURES.map((figure) => [figure, of(figure)])) as Record<
    SpreadFigure,
    T
  >;
}
