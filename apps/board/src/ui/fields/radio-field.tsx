import { useId } from 'react';
import { kitWords } from '../../words/kit.ts';
import { FieldError } from './field-error.tsx';
import { fieldId, type FieldProps } from './field-frame.tsx';

interface RadioFieldProps<Value extends string> extends FieldProps<Value | ''> {
  readonly options: readonly { readonly value: Value; readonly label: string; readonly detail?: string | undefined }[];
  readonly direction?: 'down' | 'across';
}

export function RadioField<Value extends string>(props: RadioFieldProps<Value>) {
  const { label, value, onChange, onBlur, name, hint, error, options, isOptional, direction = 'down' } = props;
  const made = useId();
  const told = [error ? `${made}-error` : '', hint ? `${made}-hint` : ''].filter((id) => id !== '').join(' ');
  return (
    <fieldset
      id={name === undefined ? made : fieldId(name)}
      tabIndex={-1}
      className="m-0 flex min-w-0 flex-col gap-1 border-0 p-0"
      aria-describedby={told === '' ? undefined : told}
    >
      <legend className={props.isLabelHidden === true ? 'sr-only' : 'text-label text-ink mb-1 p-0'}>
        {label}
        {isOptional === true ? <span className="text-ink-3 font-normal"> {kitWords.ifKnown}</span> : null}
      </legend>
      <div className={direction === 'across' ? 'flex flex-wrap gap-x-5 gap-y-1' : 'flex flex-col gap-1'}>
        {options.map((option) => (
          <label
            key={option.value}
            className="text-body text-ink flex min-h-6 cursor-pointer items-start gap-2 max-sm:min-h-11 max-sm:items-center"
          >
            <input
              type="radio"
              name={name ?? made}
              value={option.value}
              checked={option.value === value}
              disabled={props.isReadOnly}
              onChange={() => onChange(option.value)}
              onBlur={onBlur}
              className="accent-ink mt-0.5 size-4 shrink-0 max-sm:mt-0"
            />
            <span>
              {option.label}
              {option.detail ? <span className="text-fine text-ink-3 block">{option.detail}</span> : null}
            </span>
          </label>
        ))}
      </div>
      {hint ? (
        <div id={`${made}-hint`} className="text-fine text-ink-3">
          {hint}
        </div>
      ) : null}
      <FieldError id={`${made}-error`} message={error} />
    </fieldset>
  );
}
