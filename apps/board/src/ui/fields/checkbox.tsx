import { useId, type ReactNode, type Ref } from 'react';
import { FieldError } from './field-error.tsx';
import { fieldId } from './field-frame.tsx';

interface CheckboxProps {
  readonly label: ReactNode;
  readonly value: boolean;
  readonly onChange: (value: boolean) => void;
  readonly onBlur?: (() => void) | undefined;
  readonly name?: string | undefined;
  readonly hint?: ReactNode;
  readonly error?: string | undefined;
  readonly ref?: Ref<HTMLInputElement>;
}

export function Checkbox({ label, value, onChange, onBlur, name, hint, error, ref }: CheckboxProps) {
  const made = useId();
  const told = [error ? `${made}-error` : '', hint ? `${made}-hint` : ''].filter((id) => id !== '').join(' ');
  return (
    <div className="flex flex-col gap-1">
      <label className="text-body text-ink flex min-h-6 cursor-pointer items-start gap-2 max-sm:min-h-11 max-sm:items-center">
        <input
          ref={ref}
          id={name === undefined ? made : fieldId(name)}
          type="checkbox"
          name={name}
          checked={value}
          onChange={(event) => onChange(event.target.checked)}
          onBlur={onBlur}
          aria-invalid={error ? true : undefined}
          aria-describedby={told === '' ? undefined : told}
          className="accent-ink mt-0.5 size-4 shrink-0 max-sm:mt-0"
        />
        <span className="flex items-center gap-2">{label}</span>
      </label>
      {hint ? (
        <div id={`${made}-hint`} className="text-fine text-ink-3 pl-6">
          {hint}
        </div>
      ) : null}
      <FieldError id={`${made}-error`} message={error} />
    </div>
  );
}
