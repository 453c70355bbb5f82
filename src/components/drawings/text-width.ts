/** Mean advance of a character as a share of the font size: Archivo regular and semi-bold, and the fixed-width face. */
const ADVANCE = { plain: 0.54, bold: 0.58, mono: 0.6 };

export type TextFace = keyof typeof ADVANCE;

/** Estimated width in pixels, on the wide side, so that labels kept apart by it are apart in any engine. */
export const textWidthPx = (text: string, sizePx: number, face: TextFace = 'plain'): number =>
  text.length * sizePx * ADVANCE[face];

/** Cuts a label to a width, with an ellipsis; a single letter stays. */
export function shortenToWidth(text: string, widthPx: number, sizePx: number, face: TextFace = 'plain'): string {
  if (textWidthPx(text, sizePx, face) <= widthPx) return text;
  const letters = Math.max(1, Math.floor(widthPx / (sizePx * ADVANCE[face])) - 1);
  return `${text.slice(0, letters).trimEnd()}…`;
}
