/** What may stand in the head of a letter: one line, one address. Checked before the mail library sees it. */

// eslint-disable-next-line no-control-regex -- refusing control characters is the purpose
const breaksLine = /[\u0000-\u001f\u007f\u2028\u2029]/;
const oneAddress = /^[^\s@<>,;:"()[\]\\]{1,64}@[^\s@<>,;:"()[\]\\]{1,190}$/;

/** Throws when the text would end the header it stands in. */
export const oneLine = (text: string): string => {
  if (breaksLine.test(text)) throw new Error('A header of a letter holds a line break or control character');
  return text;
};

/** Throws when this is anything but one plain address. */
export const plainAddress = (text: string): string => {
  if (!oneAddress.test(oneLine(text))) throw new Error('A letter needs one plain address');
  return text;
};
