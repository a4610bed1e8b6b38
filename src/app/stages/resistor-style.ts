/** Box in the manner of IEC, zig-zag in that of IEEE. */
export type ResistorStyle = 'box' | 'zigzag';

const KEY = 'sinkwell.resistor';

/** The person's choice on this device; box until they choose. */
export function storedResistorStyle(): ResistorStyle {
  return localStorage.getItem(KEY) === 'zigzag' ? 'zigzag' : 'box';
}

export function storeResistorStyle(style: ResistorStyle): void {
  localStorage.setItem(KEY, style);
}
