/** Where in a JSON text a value stands: the line of every pointer, so that a fault leads to its place. */

interface Reader {
  readonly text: string;
  at: number;
  line: number;
}

const skipSpace = (reader: Reader): void => {
  for (; reader.at < reader.text.length; reader.at += 1) {
    const sign = reader.text[reader.at];
    if (sign === '\n') reader.line += 1;
    else if (sign !== ' ' && sign !== '\t' && sign !== '\r') return;
  }
};

/** The string that begins here, as it stands between its quotes. */
const takeString = (reader: Reader): string => {
  const start = reader.at;
  reader.at += 1;
  while (reader.at < reader.text.length && reader.text[reader.at] !== '"')
    reader.at += reader.text[reader.at] === '\\' ? 2 : 1;
  reader.at += 1;
  return JSON.parse(reader.text.slice(start, reader.at)) as string; // a JSON string
};

const takePlain = (reader: Reader): void => {
  while (reader.at < reader.text.length && !/[\s,\]}]/.test(reader.text[reader.at] ?? '')) reader.at += 1;
};

const escaped = (name: string): string => name.replaceAll('~', '~0').replaceAll('/', '~1');

/** Members of a list or an object, up to its end. */
const takeMembers = (reader: Reader, end: ']' | '}', take: (index: number) => void): void => {
  reader.at += 1;
  skipSpace(reader);
  for (let index = 0; reader.at < reader.text.length && reader.text[reader.at] !== end; index += 1) {
    take(index);
    skipSpace(reader);
    if (reader.text[reader.at] === ',') reader.at += 1;
    skipSpace(reader);
  }
  reader.at += 1;
};

const takeValue = (reader: Reader, pointer: string, lines: Map<string, number>): void => {
  skipSpace(reader);
  lines.set(pointer, reader.line);
  const sign = reader.text[reader.at];
  if (sign === '"') takeString(reader);
  else if (sign === '[') takeMembers(reader, ']', (index) => takeValue(reader, `${pointer}/${index}`, lines));
  else if (sign === '{') {
    takeMembers(reader, '}', () => {
      const name = takeString(reader);
      skipSpace(reader);
      reader.at += 1; // the colon
      takeValue(reader, `${pointer}/${escaped(name)}`, lines);
    });
  } else takePlain(reader);
};

/** Line, from 1, of every value of a readable JSON text by its pointer. */
export const jsonLines = (text: string): ReadonlyMap<string, number> => {
  const lines = new Map<string, number>();
  takeValue({ text, at: 0, line: 1 }, '', lines);
  return lines;
};

/** The line of a pointer; of its nearest parent where the value itself is missing. */
export const lineOf = (lines: ReadonlyMap<string, number>, pointer: string): number => {
  const found = lines.get(pointer);
  if (found !== undefined) return found;
  return pointer === '' ? 1 : lineOf(lines, pointer.slice(0, pointer.lastIndexOf('/')));
};

/** The line at which an unreadable text stops being JSON. */
export const brokenLine = (text: string, error: unknown): number => {
  const message = error instanceof Error ? error.message : '';
  const line = /line (\d+)/.exec(message)?.[1];
  const position = /position (\d+)/.exec(message)?.[1];
  if (line !== undefined) return Number(line);
  return position === undefined ? text.split('\n').length : text.slice(0, Number(position)).split('\n').length;
};
