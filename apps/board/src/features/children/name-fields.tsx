import { sexes } from '@weftway/contract/child';
import { RadioField } from '../../ui/fields/radio-field.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { Section } from '../../ui/page/section.tsx';
import { childFormWords, fieldWords, sexWords } from '../../words/children.ts';
import { FormField, type FieldsProps } from './form-field.tsx';

const sexOptions = sexes.map((sex) => ({ value: sex, label: sexWords[sex] }));

export function NameFields({ isReadOnly, refusals }: FieldsProps) {
  const shared = { isReadOnly };
  return (
    <Section title={childFormWords.name}>
      <FormField name="firstName" refusals={refusals}>
        {(field, error) => (
          <TextField
            {...field}
            {...shared}
            label={fieldWords.firstName}
            hint={childFormWords.firstNameExpected}
            error={error}
          />
        )}
      </FormField>
      <FormField name="familyName" refusals={refusals}>
        {(field, error) => <TextField {...field} {...shared} label={fieldWords.familyName} error={error} />}
      </FormField>
      <FormField name="recordNumber" refusals={refusals}>
        {(field, error) => (
          <TextField
            {...field}
            {...shared}
            label={fieldWords.recordNumber}
            hint={childFormWords.recordHint}
            error={error}
          />
        )}
      </FormField>
      <FormField name="sex" refusals={refusals}>
        {(field, error) => (
          <RadioField
            {...field}
            {...shared}
            label={fieldWords.sex}
            options={sexOptions}
            direction="across"
            error={error}
          />
        )}
      </FormField>
    </Section>
  );
}
