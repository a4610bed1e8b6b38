/** `A`, `A and B`, `A, B and C`. */
export function listed(words: readonly string[], last = 'and'): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} ${last} ${words.at(-1) ?? ''}`;
}

/** Numbers with runs drawn together: `line 4`, `lines 1 to 3 and 5`. */
export function numbered(word: string, numbers: readonly number[], last = 'and'): string {
  const runs: [number, number][] = [];
  for (const number of numbers) {
    const run = runs.at(-1);
    if (run?.[1] === number - 1) run[1] = number;
    else runs.push([number, number]);
  }
  const texts = runs.flatMap(([from, to]) =>
    to - from > 1 ? [`${from} to ${to}`] : from === to ? [`${from}`] : [`${from}`, `${to}`],
  );
  return `${word}${numbers.length === 1 ? '' : 's'} ${listed(texts, last)}`;
}
