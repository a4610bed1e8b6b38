import { symbolParts } from './symbol-parts.ts';

/** The text with subscripts in braces, to read the outcome at a glance. */
const marked = (text: string) =>
  symbolParts(text)
    .map((part) => (part.sub ? `{${part.text}}` : part.text))
    .join('');

describe('symbol parts', () => {
  it.each([
    ['VCE(sat)', 'V{CE(sat)}'],
    ['RB', 'R{B}'],
    ['RBE dissipation', 'R{BE} dissipation'],
    ['Off-state VBE', 'Off-state V{BE}'],
    ['hFE, VCE = 1 V', 'h{FE}, V{CE} = 1 V'],
    ['Junction TJ', 'Junction T{J}'],
    ['IC / mA', 'I{C} / mA'],
    ['RθJA', 'R{θJA}'],
  ])('sets the subscript of %s', (text, expected) => {
    expect(marked(text)).toBe(expected);
  });

  it.each(['Forced β', 'R30', 'IC24 socket', 'VCExyz', 'Dissipation'])(
    'leaves %s as it is',
    (text) => {
      expect(marked(text)).toBe(text);
    },
  );
});
