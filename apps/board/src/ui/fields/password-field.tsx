import { useState, type Ref } from 'react';
import { kitWords } from '../../words/kit.ts';
import { FieldFrame, inputClass, useFieldIds, type FieldProps } from './field-frame.tsx';

interface PasswordFieldProps extends FieldProps<string> {
  readonly ref?: Ref<HTMLInputElement>;
  readonly autoComplete?: 'current-password' | 'new-password';
}

export function PasswordField(props: PasswordFieldProps) {
  const { value, onChange, onBlur, name, error, ref, autoComplete = 'current-password' } = props;
  const ids = useFieldIds(props);
  const [isShown, setShown] = useState(false);
  return (
    <FieldFrame ids={ids} field={props}>
      <div className="relative">
        <input
          ref={ref}
          id={ids.control}
          name={name}
          type={isShown ? 'text' : 'password'}
          autoComplete={autoComplete}
          value={value}
          onChange={(event) => onChange(event.target.value)}
          onBlur={onBlur}
          aria-invalid={error ? true : undefined}
          aria-describedby={ids.describedBy}
          className={`${inputClass(Boolean(error))} pr-16`}
        />
        <button
          type="button"
          aria-label={isShown ? kitWords.hidePasswordLong : kitWords.showPasswordLong}
          aria-controls={ids.control}
          onClick={() => setShown(!isShown)}
          className="text-body text-indigo absolute inset-y-1 right-1 min-w-11 rounded px-2 underline underline-offset-3"
        >
          {isShown ? kitWords.hidePassword : kitWords.showPassword}
        </button>
      </div>
    </FieldFrame>
  );
}
