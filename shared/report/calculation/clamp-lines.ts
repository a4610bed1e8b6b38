import type { CornerSource } from './corner-source.ts';
import type { Worksheet } from './worksheet.ts';

/** The voltages of a coil’s clamp; nothing where there is none. */
export function clampLines(sheet: Worksheet, { point, input }: CornerSource): void {
  const { clamp } = point.model;
  if (clamp === null || sheet.has('V_own')) return;
  if (clamp.standOffV === null) acrossCoil(sheet, clamp, input.clamp);
  else acrossTransistor(sheet, clamp, input.clamp.zenerV ?? { min: 0, max: 0 });
}

type Clamp = CornerSource['input']['clamp'];
type Voltages = NonNullable<CornerSource['point']['model']['clamp']>;

function acrossCoil(sheet: Worksheet, clamp: Voltages, { kind, zenerV, forwardV }: Clamp): void {
  const zener = kind === 'diode-zener' ? zenerV : null;
  const source = (end: string) => (zener === null ? 'Diode alone' : `Clamp, zener voltage ${end}`);
  sheet.apply('clamp-in-series', {
    stated: clamp.ownV,
    put: {
      V_F: [forwardV ?? 0, 'Clamp, forward drop'],
      V_Zmax: [zener?.max ?? 0, source('max')],
    },
  });
  sheet.give('V_cl', clamp.largestV, 'Across the coil: that of the clamp');
  sheet.apply('clamp-least', {
    stated: clamp.smallestV,
    put: { V_Zmin: [zener?.min ?? 0, source('min')] },
  });
  sheet.apply('peak-voltage', { stated: clamp.peakV });
}

function acrossTransistor(
  sheet: Worksheet,
  clamp: Voltages,
  { min, max }: { readonly min: number; readonly max: number },
): void {
  const across = 'Clamp across the transistor';
  sheet.give('V_own', clamp.ownV, `${across}, largest voltage`);
  sheet.give('V_pk', clamp.peakV, `${across}, largest voltage`);
  sheet.apply('clamp-across-least', {
    stated: clamp.smallestV,
    put: { V_Zmin: [min, `${across}, smallest voltage`] },
  });
  sheet.apply('clamp-across-largest', {
    stated: clamp.largestV,
    put: { V_Zmax: [max, `${across}, largest voltage`] },
  });
}
