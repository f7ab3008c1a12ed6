import { useFieldArray, useFormContext } from 'react-hook-form';
import { alertKinds } from '@weftway/contract/child';
import { Button } from '../../ui/actions/button.tsx';
import { SelectField } from '../../ui/fields/select-field.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { Section } from '../../ui/page/section.tsx';
import { alertWords, childFormWords } from '../../words/children.ts';
import type { ChildFormValues } from './child-form-values.ts';
import { FormField, type FieldsProps } from './form-field.tsx';

const kinds = alertKinds.map((kind) => ({ value: kind, label: alertWords[kind] }));
const mostAlerts = 12;

export function AlertRows({ isReadOnly, refusals }: FieldsProps) {
  const { control } = useFormContext<ChildFormValues>();
  const { fields, append, remove } = useFieldArray({ control, name: 'alerts' });
  return (
    <Section title={childFormWords.alerts}>
      {fields.map((row, index) => (
        <fieldset key={row.id} className="border-hair m-0 flex flex-col gap-2 border-0 border-t p-0 pt-3">
          <legend className="sr-only">{childFormWords.alert(index)}</legend>
          <FormField name={`alerts.${index}.kind`} refusals={refusals}>
            {(field, error) => (
              <SelectField
                {...field}
                isReadOnly={isReadOnly}
                label={childFormWords.alertKind}
                options={kinds}
                placeholder={null}
                error={error}
              />
            )}
          </FormField>
          <FormField name={`alerts.${index}.text`} refusals={refusals}>
            {(field, error) => (
              <TextField {...field} isReadOnly={isReadOnly} label={childFormWords.alertText} error={error} />
            )}
          </FormField>
          {isReadOnly ? null : (
            <div>
              <Button look="quiet" size="small" onClick={() => remove(index)}>
                {childFormWords.removeAlert}
              </Button>
            </div>
          )}
        </fieldset>
      ))}
      {isReadOnly || fields.length >= mostAlerts ? null : (
        <div>
          <Button onClick={() => append({ kind: 'allergy', text: '' })}>{childFormWords.addAlert}</Button>
        </div>
      )}
    </Section>
  );
}
