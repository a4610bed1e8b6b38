import { createRequire } from 'node:module';
import path from 'node:path';

const require = createRequire(import.meta.url);

/** Roboto as the PDF library ships it. */
const FOLDER = path.join(path.dirname(require.resolve('pdfmake/package.json')), 'fonts', 'Roboto');

export const FONTS = {
  Roboto: {
    normal: path.join(FOLDER, 'Roboto-Regular.ttf'),
    bold: path.join(FOLDER, 'Roboto-Medium.ttf'),
  },
};

/** Whether the PDF library may open a file: only the two it needs. */
export function isFontFile(file: string): boolean {
  return file === FONTS.Roboto.normal || file === FONTS.Roboto.bold;
}
