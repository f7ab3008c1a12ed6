/** The one short message that may stand at the bottom right; a new one takes the place of the old. */
export interface Toast {
  readonly id: number;
  readonly text: string;
  readonly onUndo?: (() => void) | undefined;
}

type Listener = () => void;

let current: Toast | null = null;
let nextId = 1;
const listeners = new Set<Listener>();

function change(toast: Toast | null): void {
  current = toast;
  for (const listener of listeners) listener();
}

export function showToast(toast: { readonly text: string; readonly onUndo?: (() => void) | undefined }): void {
  change({ ...toast, id: nextId });
  nextId += 1;
}

export function dismissToast(id: number): void {
  if (current?.id === id) change(null);
}

export function currentToast(): Toast | null {
  return current;
}

export function onToastChange(listener: Listener): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
