import type { Ref } from 'react';
import { kitWords } from '../../words/kit.ts';
import { ChevronIcon } from '../icons.tsx';
import { FieldFrame, inputClass, useFieldIds, type FieldProps } from './field-frame.tsx';

export interface Choice<Value extends string = string> {
  readonly value: Value;
  readonly label: string;
}

/** The value is '' while nothing is chosen. */
interface SelectFieldProps<Value extends string> extends FieldProps<Value | ''> {
  readonly ref?: Ref<HTMLSelectElement>;
  readonly options: readonly Choice<Value>[];
  /** What stands first while nothing is chosen; `null` when something always is. */
  readonly placeholder?: string | null;
}

export function SelectField<Value extends string>(props: SelectFieldProps<Value>) {
  const { value, onChange, onBlur, name, error, ref, options, placeholder = kitWords.chooseOne } = props;
  const ids = useFieldIds(props);
  const choose = (text: string) => onChange(options.find((option) => option.value === text)?.value ?? '');
  return (
    <FieldFrame ids={ids} field={props}>
      <span className="relative">
        <select
          ref={ref}
          id={ids.control}
          name={name}
          value={value}
          disabled={props.isReadOnly}
          onChange={(event) => choose(event.target.value)}
          onBlur={onBlur}
          aria-invalid={error ? true : undefined}
          aria-describedby={ids.describedBy}
          className={`${inputClass(Boolean(error))} appearance-none pr-8`}
        >
          {placeholder === null ? null : <option value="">{placeholder}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
        <span className="text-ink-2 pointer-events-none absolute inset-y-0 right-2.5 flex items-center">
          <ChevronIcon size={12} />
        </span>
      </span>
    </FieldFrame>
  );
}
