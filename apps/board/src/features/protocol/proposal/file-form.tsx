import { useRef, type ChangeEvent } from 'react';
import type { ProtocolFault } from '@weftway/pathway/protocol-faults';
import { Button } from '../../../ui/actions/button.tsx';
import { TextArea } from '../../../ui/fields/text-area.tsx';
import { protocolWords } from '../../../words/protocol.ts';
import { FaultList } from './fault-list.tsx';
import { jsonLines, lineOf } from './json-places.ts';

const words = protocolWords.proposal;

interface FileFormProps {
  readonly text: string;
  readonly onChange: (text: string) => void;
  /** Set: the text is no JSON from this line on. */
  readonly brokenAt: number | null;
  /** What the last check found. */
  readonly faults: readonly ProtocolFault[];
}

const save = (text: string): void => {
  const address = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = 'protocol.json';
  link.click();
  URL.revokeObjectURL(address);
};

/** The whole protocol as text: typed, loaded from a file, saved to one. */
export function FileForm({ text, onChange, brokenAt, faults }: FileFormProps) {
  const area = useRef<HTMLTextAreaElement>(null);
  const picker = useRef<HTMLInputElement>(null);
  const load = async (event: ChangeEvent<HTMLInputElement>) => {
    const [file] = event.target.files ?? [];
    if (file !== undefined) onChange(await file.text());
    event.target.value = '';
  };
  const goTo = (line: number) => {
    const lines = text.split('\n');
    const start = lines.slice(0, line - 1).reduce((sum, one) => sum + one.length + 1, 0);
    const box = area.current;
    box?.focus();
    box?.setSelectionRange(start, start + (lines[line - 1]?.length ?? 0));
    if (box) box.scrollTop = Math.max(0, ((line - 6) / lines.length) * box.scrollHeight);
  };
  const places = brokenAt === null && faults.length > 0 ? jsonLines(text) : null;
  return (
    <div className="flex flex-col gap-3">
      <div className="flex flex-wrap gap-2">
        <input
          ref={picker}
          type="file"
          accept="application/json,.json"
          tabIndex={-1}
          aria-label={words.upload}
          className="sr-only"
          onChange={(event) => void load(event)}
        />
        <Button onClick={() => picker.current?.click()}>{words.upload}</Button>
        <Button onClick={() => save(text)}>{words.download}</Button>
      </div>
      {places === null ? null : (
        <FaultList faults={faults} lineOf={(pointer) => lineOf(places, pointer)} onGoTo={goTo} />
      )}
      <TextArea
        ref={area}
        label={words.text}
        name="file"
        rows={24}
        value={text}
        onChange={onChange}
        hint={words.textHint}
        error={brokenAt === null ? undefined : words.notJson(brokenAt)}
      />
    </div>
  );
}
