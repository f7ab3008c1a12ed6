import type { Ref } from 'react';
import { FieldFrame, inputClass, useFieldIds, type FieldProps } from './field-frame.tsx';

interface TextAreaProps extends FieldProps<string> {
  readonly ref?: Ref<HTMLTextAreaElement>;
  readonly rows?: number;
  readonly maxLength?: number | undefined;
}

export function TextArea(props: TextAreaProps) {
  const { value, onChange, onBlur, name, error, isReadOnly, ref, rows = 4, maxLength } = props;
  const ids = useFieldIds(props);
  return (
    <FieldFrame ids={ids} field={props}>
      <textarea
        ref={ref}
        id={ids.control}
        name={name}
        rows={rows}
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
