/** 1, 2, 2.5 or 5 times a power of ten, the smallest that is not below the step asked for. */
export function roundStep(least: number): number {
  const decade = 10 ** Math.floor(Math.log10(least));
  const factor = [1, 2, 2.5, 5].find((each) => each * decade >= least * (1 - 1e-9)) ?? 10;
  return factor * decade;
}
