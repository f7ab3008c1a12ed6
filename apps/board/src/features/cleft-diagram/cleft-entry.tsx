import { parseCleftCode } from '@weftway/pathway/cleft-code';
import type { ChildFlag } from '@weftway/contract/child';
import { TextField } from '../../ui/fields/text-field.tsx';
import { cleftWords } from '../../words/cleft.ts';
import { CleftDiagram } from './cleft-diagram.tsx';
import { CleftReading } from './cleft-reading.tsx';

interface CleftEntryProps {
  /** A code, or whatever was typed so far. */
  readonly value: string;
  readonly onChange: (code: string) => void;
  readonly onBlur?: (() => void) | undefined;
  readonly name?: string | undefined;
  readonly error?: string | undefined;
  readonly flags: readonly ChildFlag[];
  readonly isReadOnly?: boolean | undefined;
}

/** The cleft, drawn and written: the drawing and the code are two views of one value, so they cannot disagree. */
export function CleftEntry({ value, onChange, onBlur, name, error, flags, isReadOnly = false }: CleftEntryProps) {
  const reading = parseCleftCode(value);
  const message = error ?? (reading.ok || value.trim() === '' ? undefined : reading.message);
  return (
    <div className="flex flex-col gap-4">
      <CleftDiagram code={reading.ok ? reading.code : value} onChange={isReadOnly ? undefined : onChange} />
      <div className="max-w-xs">
        <TextField
          label={cleftWords.code}
          hint={cleftWords.codeHint}
          value={value}
          onChange={onChange}
          onBlur={onBlur}
          name={name}
          error={message}
          isReadOnly={isReadOnly}
          maxLength={30}
        />
      </div>
      <CleftReading code={value} flags={flags} />
    </div>
  );
}
