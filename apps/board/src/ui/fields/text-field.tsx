import type { HTMLInputAutoCompleteAttribute, Ref } from 'react';
import { FieldFrame, inputClass, useFieldIds, type FieldProps } from './field-frame.tsx';

interface TextFieldProps extends FieldProps<string> {
  readonly ref?: Ref<HTMLInputElement>;
  readonly type?: 'text' | 'email' | 'tel' | 'search';
  readonly inputMode?: 'text' | 'numeric' | 'email' | 'tel';
  readonly autoComplete?: HTMLInputAutoCompleteAttribute;
  readonly maxLength?: number | undefined;
}

export function TextField(props: TextFieldProps) {
  const {
    value,
    onChange,
    onBlur,
    name,
    error,
    isReadOnly,
    ref,
    type = 'text',
    inputMode,
    autoComplete,
    maxLength,
  } = props;
  const ids = useFieldIds(props);
  return (
    <FieldFrame ids={ids} field={props}>
      <input
        ref={ref}
        id={ids.control}
        name={name}
        type={type}
        inputMode={inputMode}
        autoComplete={autoComplete ?? 'off'}
        maxLength={maxLength}
        value={value}
        readOnly={isReadOnly}
        onChange={(event) => onChange(event.target.value)}
        onBlur={onBlur}
        aria-invalid={error ? true : undefined}
        aria-describedby={ids.describedBy}
        className={inputClass(Boolean(error))}
      />
    </FieldFrame>
  );
}
