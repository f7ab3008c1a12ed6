import { useState, type KeyboardEvent, type ReactNode, type Ref } from 'react';
import { kitWords } from '../../words/kit.ts';
import { AlertIcon } from '../icons.tsx';
import { FieldFrame, inputClass, useFieldIds, type FieldProps } from './field-frame.tsx';
import { parseTypedNumber, stepNumber } from './typed-number.ts';

/** `null` is empty; `NaN` is text that is no number, which every number schema refuses. */
interface NumberFieldProps extends FieldProps<number | null> {
  readonly ref?: Ref<HTMLInputElement>;
  readonly unit?: string | undefined;
  readonly step?: number | undefined;
  /** Stands left of the input: the last value and its date. */
  readonly previous?: ReactNode;
  /** Unlikely but let through. */
  readonly warning?: string | undefined;
}

export function NumberField(props: NumberFieldProps) {
  const { value, onChange, onBlur, name, isReadOnly, ref, unit, step = 1, previous, warning } = props;
  const [typed, setTyped] = useState<{ text: string; value: number | null } | null>(null);
  const [isLeft, setLeft] = useState(false);
  const text =
    typed !== null && Object.is(typed.value, value)
      ? typed.text
      : value === null || Number.isNaN(value)
        ? ''
        : String(value);
  const ownError = isLeft && Number.isNaN(value) && text !== '' ? kitWords.notANumber(text) : undefined;
  const field = { ...props, error: ownError ?? props.error };
  const ids = useFieldIds(field);

  const take = (next: string) => {
    const parsed = parseTypedNumber(next);
    setTyped({ text: next, value: parsed });
    onChange(parsed);
  };
  const stepBy = (event: KeyboardEvent) => {
    if (isReadOnly === true || (event.key !== 'ArrowUp' && event.key !== 'ArrowDown')) return;
    event.preventDefault();
    take(stepNumber(text, event.key === 'ArrowUp' ? step : -step));
  };

  return (
    <FieldFrame ids={ids} field={field}>
      <div className="figures flex items-center gap-2">
        {previous ? <span className="text-small text-ink-2">{previous}</span> : null}
        <span className="w-28">
          <input
            ref={ref}
            id={ids.control}
            name={name}
            type="text"
            inputMode="decimal"
            autoComplete="off"
            value={text}
            readOnly={isReadOnly}
            onChange={(event) => take(event.target.value)}
            onKeyDown={stepBy}
            onBlur={() => {
              setLeft(true);
              onBlur?.();
            }}
            aria-invalid={field.error ? true : undefined}
            aria-describedby={
              [ids.describedBy, unit ? `${ids.control}-unit` : undefined].filter(Boolean).join(' ') || undefined
            }
            className={`${inputClass(Boolean(field.error))} text-right`}
          />
        </span>
        {unit ? (
          <span id={`${ids.control}-unit`} className="text-body text-ink-2">
            {unit}
          </span>
        ) : null}
      </div>
      {warning ? (
        <p role="status" className="text-label text-weld m-0 flex items-start gap-1.5">
          <AlertIcon size={14} />
          <span>{warning}</span>
        </p>
      ) : null}
    </FieldFrame>
  );
}
