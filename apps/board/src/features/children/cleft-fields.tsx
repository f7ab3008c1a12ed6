import type { ReactNode } from 'react';
import { useFormContext } from 'react-hook-form';
import { childFlags, type ChildFlag } from '@weftway/contract/child';
import { Checkbox } from '../../ui/fields/checkbox.tsx';
import { FieldError } from '../../ui/fields/field-error.tsx';
import { TextArea } from '../../ui/fields/text-area.tsx';
import { Section } from '../../ui/page/section.tsx';
import { flagWords } from '../../words/cleft.ts';
import { childFormWords, fieldWords } from '../../words/children.ts';
import type { CleftEntrySlot, FormReach } from './child-form.tsx';
import type { ChildFormValues, FormFault } from './child-form-values.ts';
import { FormField } from './form-field.tsx';

interface CleftFieldsProps {
  readonly reach: FormReach;
  readonly refusals: readonly FormFault[];
  readonly renderCleft: (slot: CleftEntrySlot) => ReactNode;
}

const withFlag = (flags: readonly ChildFlag[], flag: ChildFlag, isOn: boolean): ChildFlag[] =>
  childFlags.filter((one) => (one === flag ? isOn : flags.includes(one)));

export function CleftFields({ reach, refusals, renderCleft }: CleftFieldsProps) {
  const { watch } = useFormContext<ChildFormValues>();
  const flags = watch('flags');
  const isReadOnly = !reach.mayCleft;
  return (
    <Section title={childFormWords.cleft}>
      {isReadOnly ? <p className="text-body text-ink-2 m-0">{childFormWords.cleftClosed}</p> : null}
      <FormField name="cleft" refusals={refusals}>
        {(field, error) => (
          <>
            {renderCleft({
              value: field.value,
              onChange: field.onChange,
              onBlur: field.onBlur,
              name: field.name,
              error,
              flags,
              isReadOnly,
            })}
          </>
        )}
      </FormField>
      <FormField name="isCleftProvisional" refusals={refusals}>
        {(field, error) => (
          <Checkbox
            {...field}
            label={childFormWords.provisional}
            hint={reach.mayConfirm ? childFormWords.provisionalHint : childFormWords.provisionalFixed}
            error={error}
            onChange={(value) => (reach.mayConfirm && !isReadOnly ? field.onChange(value) : undefined)}
          />
        )}
      </FormField>
      <FormField name="flags" refusals={refusals}>
        {(field, error) => (
          <fieldset className="m-0 flex flex-col gap-1 border-0 p-0" onBlur={field.onBlur}>
            <legend className="text-label text-ink mb-1 p-0">{fieldWords.flags}</legend>
            {childFlags.map((flag) => (
              <Checkbox
                key={flag}
                label={flagWords[flag].label}
                hint={flagWords[flag].hint}
                value={field.value.includes(flag)}
                onChange={(isOn) => (isReadOnly ? undefined : field.onChange(withFlag(field.value, flag, isOn)))}
              />
            ))}
            <FieldError message={error} />
          </fieldset>
        )}
      </FormField>
      <FormField name="syndromes" refusals={refusals}>
        {(field, error) => (
          <TextArea
            {...field}
            isReadOnly={isReadOnly}
            rows={2}
            label={fieldWords.syndromes}
            hint={childFormWords.syndromesHint}
            isOptional
            error={error}
          />
        )}
      </FormField>
    </Section>
  );
}
