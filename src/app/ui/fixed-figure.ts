/**
 * A figure with the same decimals all down a column, minus as U+2212; an en dash where there is none.
 *
 * @param scale what the SI value is multiplied by, such as 1000 for a column headed "mW"
 */
export function fixedFigure(value: number | null, decimals: number, scale = 1): string {
  if (value === null || !Number.isFinite(value)) return '–';
  return (value * scale).toFixed(decimals).replace('-', '−');
}

/** A margin in percent: no sign when met, minus when not. One decimal below 100 %. */
export function marginText(margin: number | null): string {
  if (margin === null) return '';
  return `${fixedFigure(margin, Math.abs(margin) < 1 ? 1 : 0, 100)}\u00a0%`;
}
