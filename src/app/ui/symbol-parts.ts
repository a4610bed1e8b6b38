/** A piece of text; `sub` pieces are set as subscripts. */
export interface SymbolPart {
  readonly text: string;
  readonly sub: boolean;
}

/**
 * Letter symbols of the trade with their subscripts. Longest first, so that `VCE(sat)` is not read as `VCE`.
 * `IC` and `RC` count only as whole words; a designator such as `R30` never matches.
 */
const SYMBOLS =
  /(?<![A-Za-z0-9])(V)(CE\(sat\)|BE\(sat\)|BE\(on\)|I\(on\)|I\(off\)|CEO|CES|CBO|EBO|CE|BE|EB|CB|CC|OH|OL|IH|IL|S|F|Z|A|T|0|1|2)(?![A-Za-z0-9])|(?<![A-Za-z0-9])(I)(CBO|CEO|CEX|CES|EBO|OH|OL|IH|IL|B1|B2|CM|C|B|E|F|R|I)(?![A-Za-z0-9])|(?<![A-Za-z0-9])(R)(CE\(sat\)|thJA|thJC|θJA|θJC|BE1|BE2|BE|B1|B2|B|C|E|L)(?![A-Za-z0-9])|(?<![A-Za-z0-9])(h)(FE|fe)(?![A-Za-z0-9])|(?<![A-Za-z0-9])(T)(J|A|C)(?![A-Za-z0-9])|(?<![A-Za-z0-9])(P)(tot|C|D)(?![A-Za-z0-9])|(?<![A-Za-z0-9])(t)(off|on|s|d|r|f)(?![A-Za-z0-9])|(?<![A-Za-z0-9])(C)(ob|obo|ib)(?![A-Za-z0-9])|(?<![A-Za-z0-9])(f)(T)(?![A-Za-z0-9])|(?<![A-Za-z0-9])(r)(o|b)(?![A-Za-z0-9])|(?<![A-Za-z0-9])(β)(F|R)(?![A-Za-z0-9])/g;

/** Splits a text at the symbols in it: `Off-state VBE` gives `Off-state V` and the subscript `BE`. */
export function symbolParts(text: string): readonly SymbolPart[] {
  const parts: SymbolPart[] = [];
  let from = 0;
  for (const match of text.matchAll(SYMBOLS)) {
    const [letter = '', subscript = ''] = match.slice(1).filter(Boolean);
    const at = match.index + letter.length;
    parts.push({ text: text.slice(from, at), sub: false }, { text: subscript, sub: true });
    from = at + subscript.length;
  }
  if (from < text.length) parts.push({ text: text.slice(from), sub: false });
  return parts;
}
