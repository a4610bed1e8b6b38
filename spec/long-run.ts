const { SINKWELL_LONG, SINKWELL_SEED } = process.env;

/** How often a test repeats: `SINKWELL_LONG=1` takes the larger number. */
export function repeats(usual: number, long: number): number {
  return SINKWELL_LONG === '1' ? long : usual;
}

/** Where a test's chance begins: always the same, unless `SINKWELL_SEED` names another start. Print it. */
export function seed(usual: number): number {
  return Number(SINKWELL_SEED ?? usual);
}
