/** How names are found: without accents, in small letters, words and record number in one text. */
export const foldText = (text: string): string =>
  text
    .normalize('NFD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replaceAll('ł', 'l')
    .replaceAll('ø', 'o')
    .replaceAll('đ', 'd')
    .replaceAll('ß', 'ss')
    .replace(/\s+/g, ' ')
    .trim();

export const searchTextOf = (child: {
  readonly firstName: string;
  readonly familyName: string;
  readonly recordNumber: string;
}): string => foldText(`${child.familyName} ${child.firstName} ${child.familyName} ${child.recordNumber}`);
