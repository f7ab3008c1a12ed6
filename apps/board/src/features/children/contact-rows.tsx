import { useFieldArray, useFormContext } from 'react-hook-form';
import { contactRelations } from '@weftway/contract/child';
import { Button } from '../../ui/actions/button.tsx';
import { Checkbox } from '../../ui/fields/checkbox.tsx';
import { SelectField } from '../../ui/fields/select-field.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { Section } from '../../ui/page/section.tsx';
import { childFormWords, relationWords } from '../../words/children.ts';
import { emptyContact, type ChildFormValues, type FormFault } from './child-form-values.ts';
import { FormField, type FieldsProps } from './form-field.tsx';

const relations = contactRelations.map((relation) => ({ value: relation, label: relationWords[relation] }));
const mostContacts = 8;

export function ContactRows({ isReadOnly, refusals }: FieldsProps) {
  const { control } = useFormContext<ChildFormValues>();
  const { fields, append, remove } = useFieldArray({ control, name: 'contacts' });
  return (
    <Section title={childFormWords.contacts}>
      {fields.map((row, index) => (
        <ContactRow
          key={row.id}
          index={index}
          isReadOnly={isReadOnly}
          refusals={refusals}
          onRemove={() => remove(index)}
        />
      ))}
      {isReadOnly || fields.length >= mostContacts ? null : (
        <div>
          <Button onClick={() => append(emptyContact)}>{childFormWords.addContact}</Button>
        </div>
      )}
    </Section>
  );
}

interface ContactRowProps extends FieldsProps {
  readonly index: number;
  readonly refusals: readonly FormFault[];
  readonly onRemove: () => void;
}

function ContactRow({ index, isReadOnly, refusals, onRemove }: ContactRowProps) {
  const { watch } = useFormContext<ChildFormValues>();
  const at = <Name extends string>(name: Name) => `contacts.${index}.${name}` as const;
  return (
    <fieldset className="border-hair m-0 flex flex-col gap-2 border-0 border-t p-0 pt-3">
      <legend className="sr-only">{childFormWords.contact(index)}</legend>
      <FormField name={at('name')} refusals={refusals}>
        {(field, error) => (
          <TextField {...field} isReadOnly={isReadOnly} label={childFormWords.contactName} error={error} />
        )}
      </FormField>
      <FormField name={at('relation')} refusals={refusals}>
        {(field, error) => (
          <SelectField
            {...field}
            isReadOnly={isReadOnly}
            label={childFormWords.relation}
            options={relations}
            placeholder={null}
            error={error}
          />
        )}
      </FormField>
      <FormField name={at('phone')} refusals={refusals}>
        {(field, error) => (
          <TextField
            {...field}
            isReadOnly={isReadOnly}
            type="tel"
            inputMode="tel"
            label={childFormWords.phone}
            isOptional
            error={error}
          />
        )}
      </FormField>
      <FormField name={at('email')} refusals={refusals}>
        {(field, error) => (
          <TextField
            {...field}
            isReadOnly={isReadOnly}
            type="email"
            inputMode="email"
            label={childFormWords.email}
            isOptional
            error={error}
          />
        )}
      </FormField>
      <FormField name={at('language')} refusals={refusals}>
        {(field, error) => (
          <TextField {...field} isReadOnly={isReadOnly} label={childFormWords.language} isOptional error={error} />
        )}
      </FormField>
      <FormField name={at('needsInterpreter')} refusals={refusals}>
        {(field) => (
          <Checkbox
            {...field}
            label={childFormWords.interpreter}
            onChange={(value) => (isReadOnly ? undefined : field.onChange(value))}
          />
        )}
      </FormField>
      <FormField name={at('mayConsent')} refusals={refusals}>
        {(field) => (
          <Checkbox
            {...field}
            label={childFormWords.consent}
            onChange={(value) => (isReadOnly ? undefined : field.onChange(value))}
          />
        )}
      </FormField>
      {isReadOnly ? null : (
        <div>
          <Button look="quiet" size="small" onClick={onRemove}>
            {childFormWords.removeContact(watch(at('name')))}
          </Button>
        </div>
      )}
    </fieldset>
  );
}
