/**
 * Widths of 12 px labels without asking the browser, so that the layout is the same everywhere. Widths are those of
 * the text face in thousandths of its size, rounded up: a label may get a little too much room, never too little.
 */
const narrow = new Set("iljI.,:;'’|!()[]ft-r ");
const wide = new Set('mwMW@%…–—');

export type TextWeight = 'regular' | 'bold';

export function textWidth(text: string, weight: TextWeight, size = 12): number {
  let thousandths = 0;
  for (const letter of text) thousandths += letterWidth(letter);
  return (thousandths / 1000) * size * (weight === 'bold' ? 1.07 : 1);
}

function letterWidth(letter: string): number {
  if (letter === ' ') return 200;
  if (narrow.has(letter)) return 350;
  if (wide.has(letter)) return 880;
  if (letter >= '0' && letter <= '9') return 500;
  if (letter !== letter.toLowerCase()) return 640;
  return 540;
}
