import { useState, type KeyboardEvent, type Ref } from 'react';
import { ageText } from '@weftway/calendar/age';
import { formatDate } from '@weftway/calendar/format-date';
import { addDays, type PlainDate } from '@weftway/calendar/plain-date';
import { kitWords } from '../../words/kit.ts';
import { formatDateWithDay } from '../../words/dates.ts';
import { FieldFrame, inputClass, useFieldIds, type FieldProps } from './field-frame.tsx';
import { parseTypedDate } from './typed-date.ts';

/** The value is ISO text, or the typed text itself while that is no date, which every date schema refuses. */
interface DateFieldProps extends FieldProps<string> {
  readonly ref?: Ref<HTMLInputElement>;
  /** The age on the typed day stands under the field. */
  readonly birth?: PlainDate | undefined;
}

export function DateField(props: DateFieldProps) {
  const { value, onChange, onBlur, name, isReadOnly, ref, birth } = props;
  const [typed, setTyped] = useState<{ text: string; value: string } | null>(null);
  const [isLeft, setLeft] = useState(false);
  const date = parseTypedDate(value);
  const text = typed?.value === value ? typed.text : date === null ? value : formatDate(date);
  const ownError = isLeft && text.trim() !== '' && date === null ? kitWords.notADate(text) : undefined;
  const read = date === null ? null : [formatDateWithDay(date), birth === undefined ? '' : ageText(birth, date)];
  const echo = read === null ? kitWords.dateHint : read.filter((part) => part !== '').join(', ');
  const hint = (
    <>
      <span className="figures">{echo}</span>
      {props.hint ? <span className="block">{props.hint}</span> : null}
    </>
  );
  const field = { ...props, error: ownError ?? props.error, hint };
  const ids = useFieldIds(field);

  const take = (next: string) => {
    const parsed = parseTypedDate(next) ?? next.trim();
    setTyped({ text: next, value: parsed });
    onChange(parsed);
  };
  const leave = () => {
    if (date !== null) setTyped(null);
    setLeft(true);
    onBlur?.();
  };
  const step = (event: KeyboardEvent) => {
    if (isReadOnly === true || date === null || (event.key !== 'ArrowUp' && event.key !== 'ArrowDown')) return;
    event.preventDefault();
    setTyped(null);
    onChange(addDays(date, event.key === 'ArrowUp' ? 1 : -1));
  };

  return (
    <FieldFrame ids={ids} field={field}>
      <span className="w-44 max-w-full">
        <input
          ref={ref}
          id={ids.control}
          name={name}
          type="text"
          autoComplete="off"
          value={text}
          readOnly={isReadOnly}
          onChange={(event) => take(event.target.value)}
          onKeyDown={step}
          onBlur={leave}
          aria-invalid={field.error ? true : undefined}
          aria-describedby={ids.describedBy}
          className={`figures ${inputClass(Boolean(field.error))}`}
        />
      </span>
    </FieldFrame>
  );
}
