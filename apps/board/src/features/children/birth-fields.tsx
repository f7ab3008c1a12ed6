import { useFormContext } from 'react-hook-form';
import { ageText } from '@weftway/calendar/age';
import { readPlainDate, type PlainDate } from '@weftway/calendar/plain-date';
import { Checkbox } from '../../ui/fields/checkbox.tsx';
import { DateField } from '../../ui/fields/date-field.tsx';
import { NumberField } from '../../ui/fields/number-field.tsx';
import { Section } from '../../ui/page/section.tsx';
import { childFormWords, fieldWords } from '../../words/children.ts';
import type { ChildFormValues, ChildKind } from './child-form-values.ts';
import { FormField, type FieldsProps } from './form-field.tsx';

export function BirthFields({
  kind,
  today,
  isReadOnly,
  refusals,
}: FieldsProps & { readonly kind: ChildKind; readonly today: PlainDate }) {
  const { watch } = useFormContext<ChildFormValues>();
  const birth = readPlainDate(watch('bornOn'));
  const hasBirth = birth.kind === 'date';
  const age =
    birth.kind === 'date' && birth.date <= today ? childFormWords.ageToday(ageText(birth.date, today)) : undefined;
  const hasDue = readPlainDate(watch('dueOn')).kind === 'date';
  return (
    <Section title={childFormWords.birth}>
      {kind === 'expected' ? null : (
        <>
          <FormField name="bornOn" refusals={refusals}>
            {(field, error) => (
              <DateField
                {...field}
                isReadOnly={isReadOnly}
                label={fieldWords.bornOn}
                hint={age}
                isOptional={kind === 'any' && hasDue}
                error={error}
              />
            )}
          </FormField>
          <FormField name="isBirthEstimated" refusals={refusals}>
            {(field) => (
              <Checkbox
                {...field}
                label={childFormWords.estimated}
                hint={childFormWords.estimatedHint}
                onChange={(value) => (isReadOnly ? undefined : field.onChange(value))}
              />
            )}
          </FormField>
        </>
      )}
      <FormField name="dueOn" refusals={refusals}>
        {(field, error) => (
          <DateField
            {...field}
            isReadOnly={isReadOnly}
            label={fieldWords.dueOn}
            isOptional={kind === 'born' || (kind === 'any' && hasBirth)}
            error={error}
          />
        )}
      </FormField>
      {kind === 'expected' ? null : <GestationFields isReadOnly={isReadOnly} refusals={refusals} />}
    </Section>
  );
}

function GestationFields({ isReadOnly, refusals }: FieldsProps) {
  return (
    <div className="flex flex-wrap items-start gap-x-6 gap-y-2">
      <FormField name="gestationWeeks" refusals={refusals}>
        {(field, error) => (
          <NumberField
            {...field}
            isReadOnly={isReadOnly}
            label={childFormWords.gestation}
            unit={childFormWords.weeks}
            isOptional
            hint={childFormWords.gestationHint}
            error={error}
          />
        )}
      </FormField>
      <FormField name="gestationDays" refusals={refusals}>
        {(field, error) => (
          <NumberField
            {...field}
            isReadOnly={isReadOnly}
            label={childFormWords.gestationDays}
            unit={childFormWords.days}
            isOptional
            error={error}
          />
        )}
      </FormField>
    </div>
  );
}
