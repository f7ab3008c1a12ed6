import { useFormContext } from 'react-hook-form';
import { readPlainDate } from '@weftway/calendar/plain-date';
import { DateField } from '../../ui/fields/date-field.tsx';
import { SelectField } from '../../ui/fields/select-field.tsx';
import { TextArea } from '../../ui/fields/text-area.tsx';
import { Section } from '../../ui/page/section.tsx';
import { childFormWords, fieldWords } from '../../words/children.ts';
import type { ChildFormValues, ChildKind } from './child-form-values.ts';
import { FormField, type FieldsProps } from './form-field.tsx';

export interface TeamChoices {
  readonly sites: readonly string[];
  readonly leads: readonly { readonly id: string; readonly name: string }[];
}

export function TeamFields({
  kind,
  isReadOnly,
  refusals,
  choices,
}: FieldsProps & { readonly kind: ChildKind; readonly choices: TeamChoices }) {
  const { watch } = useFormContext<ChildFormValues>();
  const reading = readPlainDate(watch('bornOn'));
  const birth = reading.kind === 'date' ? reading.date : undefined;
  const sites = choices.sites.map((site) => ({ value: site, label: site }));
  const leads = choices.leads.map(({ id, name }) => ({ value: id, label: name }));
  return (
    <Section title={childFormWords.path}>
      <FormField name="site" refusals={refusals}>
        {(field, error) => (
          <SelectField {...field} isReadOnly={isReadOnly} label={fieldWords.site} options={sites} error={error} />
        )}
      </FormField>
      <FormField name="leadClinicianId" refusals={refusals}>
        {(field, error) => (
          <SelectField
            {...field}
            isReadOnly={isReadOnly}
            label={fieldWords.leadClinicianId}
            options={leads}
            placeholder={childFormWords.chooseLead}
            isOptional
            error={error}
          />
        )}
      </FormField>
      <FormField name="prenatalReferralOn" refusals={refusals}>
        {(field, error) => (
          <DateField {...field} isReadOnly={isReadOnly} label={childFormWords.prenatal} isOptional error={error} />
        )}
      </FormField>
      {kind === 'expected' ? null : (
        <FormField name="referredOn" refusals={refusals}>
          {(field, error) => (
            <DateField
              {...field}
              isReadOnly={isReadOnly}
              birth={birth}
              label={childFormWords.referral}
              isOptional
              error={error}
            />
          )}
        </FormField>
      )}
      <FormField name="teamStartOn" refusals={refusals}>
        {(field, error) => (
          <DateField
            {...field}
            isReadOnly={isReadOnly}
            birth={birth}
            label={childFormWords.start}
            hint={childFormWords.startHint}
            isOptional
            error={error}
          />
        )}
      </FormField>
      <FormField name="notes" refusals={refusals}>
        {(field, error) => (
          <TextArea
            {...field}
            isReadOnly={isReadOnly}
            label={fieldWords.notes}
            isOptional
            error={error}
            maxLength={2000}
          />
        )}
      </FormField>
    </Section>
  );
}
