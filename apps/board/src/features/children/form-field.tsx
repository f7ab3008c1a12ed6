import type { ReactElement } from 'react';
import { Controller, useFormContext, type ControllerRenderProps, type FieldPath } from 'react-hook-form';
import type { ChildFormValues, FormFault } from './child-form-values.ts';

export type FieldName = FieldPath<ChildFormValues>;

export interface FieldsProps {
  readonly isReadOnly: boolean;
  readonly refusals: readonly FormFault[];
}

interface FormFieldProps<Name extends FieldName> {
  readonly name: Name;
  readonly refusals: readonly FormFault[];
  readonly children: (field: ControllerRenderProps<ChildFormValues, Name>, error: string | undefined) => ReactElement;
}

/** One field of the form with its message: the form's own, else what the server refused. */
export function FormField<Name extends FieldName>({ name, refusals, children }: FormFieldProps<Name>) {
  const { control } = useFormContext<ChildFormValues>();
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) =>
        children(field, fieldState.error?.message ?? refusals.find((fault) => fault.name === name)?.message)
      }
    />
  );
}
