/** One line of the trail in a few words, without names or contents: every reader sees it. */
import { eventKindNames } from '@weftway/contract/trail';

const readable = (kind: string): string => {
  const text = kind
    .replaceAll('-', ' ')
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase();
  return text.charAt(0).toUpperCase() + text.slice(1);
};

export const lineInWords = (kind: string, milestone: string | null): string => {
  const known = Object.entries<string>(eventKindNames).find(([name]) => name === kind)?.[1] ?? readable(kind);
  return milestone === null ? known : `${known}: ${milestone}`;
};
