/** A plain reader of RFC 4180, apart from the writer under test. */
export function readCsv(text: string): string[][] {
  const source = text.replace(/^\ufeff/, '');
  const records: string[][] = [[]];
  let field = '';
  let quoted = false;
  for (let index = 0; index < source.length; index += 1) {
    const character = source.charAt(index);
    if (quoted) {
      if (character !== '"') field += character;
      else if (source.charAt(index + 1) === '"') {
        field += '"';
        index += 1;
      } else quoted = false;
    } else if (character === '"') quoted = true;
    else if (character === ',') {
      records.at(-1)!.push(field);
      field = '';
    } else if (source.startsWith('\r\n', index)) {
      records.at(-1)!.push(field);
      field = '';
      records.push([]);
      index += 1;
    } else field += character;
  }
  return records.slice(0, -1);
}
