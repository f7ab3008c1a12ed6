import { readSpan } from '@weftway/calendar/span';
import { TextField } from '../../../ui/fields/text-field.tsx';
import { protocolWords, spanWords } from '../../../words/protocol.ts';

interface SpanFieldProps {
  readonly label: string;
  readonly name: string;
  /** `10w`; undefined while there is none. */
  readonly value: string | undefined;
  readonly onChange: (value: string | undefined) => void;
  readonly error?: string | undefined;
  readonly isOptional?: boolean | undefined;
}

/** A span in its short form, with its words under it. */
export function SpanField({ label, name, value, onChange, error, isOptional }: SpanFieldProps) {
  const text = value ?? '';
  const isReadable = text !== '' && readSpan(text) !== null;
  const unreadable = text === '' || isReadable ? undefined : protocolWords.proposal.spanError(text);
  return (
    <div className="w-36">
      <TextField
        label={label}
        name={name}
        value={text}
        onChange={(typed) => onChange(typed.trim() === '' && isOptional === true ? undefined : typed.trim())}
        hint={
          isReadable
            ? spanWords(text)
            : isOptional === true && text === ''
              ? protocolWords.proposal.noSpan
              : protocolWords.proposal.spanHint
        }
        error={unreadable ?? error}
      />
    </div>
  );
}
