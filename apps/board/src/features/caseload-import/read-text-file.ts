/** A chosen file as text. UTF-8 first, then what byte marks say, then the code page that spreadsheets on Windows write. */
export interface TextFile {
  readonly name: string;
  readonly text: string;
  /** Name of the encoding when it was not UTF-8. */
  readonly otherEncoding: string | null;
}

export type TextFileReading =
  { readonly kind: 'text'; readonly file: TextFile } | { readonly kind: 'too-large' } | { readonly kind: 'unreadable' };

/** As many bytes as the API takes, less room for the rest of the request. */
const mostBytes = 11 * 1024 * 1024;

const decoded = (bytes: Uint8Array, encoding: string): string | null => {
  try {
    return new TextDecoder(encoding, { fatal: true }).decode(bytes);
  } catch {
    return null;
  }
};

const encodingOf = (bytes: Uint8Array): string => {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  return bytes[0] === 0xfe && bytes[1] === 0xff ? 'utf-16be' : 'utf-8';
};

export const readTextBytes = (
  bytes: Uint8Array,
): { readonly text: string; readonly otherEncoding: string | null } | null => {
  const marked = encodingOf(bytes);
  const text = decoded(bytes, marked);
  if (text !== null) return { text, otherEncoding: marked === 'utf-8' ? null : marked.toUpperCase() };
  const western = decoded(bytes, 'windows-1252');
  return western === null ? null : { text: western, otherEncoding: 'Windows-1252' };
};

export const readTextFile = async (file: File): Promise<TextFileReading> => {
  if (file.size > mostBytes) return { kind: 'too-large' };
  const reading = readTextBytes(new Uint8Array(await file.arrayBuffer()));
  return reading === null
    ? { kind: 'unreadable' }
    : { kind: 'text', file: { name: file.name.slice(0, 200), ...reading } };
};
