import { Controller, useWatch } from 'react-hook-form';
import { memberStandings, type Member } from '@weftway/contract/member';
import { disciplineNames, disciplines } from '@weftway/team/disciplines';
import { standingNames } from '@weftway/team/standings';
import { Checkbox } from '../../ui/fields/checkbox.tsx';
import { FieldError } from '../../ui/fields/field-error.tsx';
import { RadioField } from '../../ui/fields/radio-field.tsx';
import { SelectField } from '../../ui/fields/select-field.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { teamWords } from '../../words/team.ts';
import type { MemberForm } from './use-member-form.ts';

interface MemberFieldsProps {
  readonly form: MemberForm;
  readonly everyone: readonly Member[];
  /** The member who is changed; nobody supervises themselves. */
  readonly memberId: string | null;
}

const standingChoices = memberStandings.map((value) => ({
  value,
  label: standingNames[value],
  detail: teamWords.standingDetails[value],
}));

/** Name, address, standing, disciplines, and for a trainee the supervisor. */
export function MemberFieldsInputs({ form, everyone, memberId }: MemberFieldsProps) {
  const { control } = form;
  const standing = useWatch({ control, name: 'standing' });
  const hasDisciplines = standing === 'member' || standing === 'trainee';
  return (
    <>
      <Controller
        control={control}
        name="name"
        render={({ field, fieldState }) => (
          <TextField {...field} label={teamWords.fields.name} error={fieldState.error?.message} />
        )}
      />
      <Controller
        control={control}
        name="email"
        render={({ field, fieldState }) => (
          <TextField
            {...field}
            type="email"
            inputMode="email"
            label={teamWords.fields.email}
            error={fieldState.error?.message}
          />
        )}
      />
      <Controller
        control={control}
        name="standing"
        render={({ field, fieldState }) => (
          <RadioField
            label={teamWords.fields.standing}
            name="standing"
            value={field.value}
            options={standingChoices}
            error={fieldState.error?.message}
            onBlur={field.onBlur}
            onChange={(next) => {
              if (next === '') return;
              field.onChange(next);
            }}
          />
        )}
      />
      {hasDisciplines ? <DisciplineChoice form={form} /> : null}
      {standing === 'trainee' ? <SupervisorChoice form={form} everyone={everyone} memberId={memberId} /> : null}
    </>
  );
}

function DisciplineChoice({ form }: { readonly form: MemberForm }) {
  return (
    <Controller
      control={form.control}
      name="disciplines"
      render={({ field, fieldState }) => (
        <fieldset
          id="field-disciplines"
          tabIndex={-1}
          aria-describedby="disciplines-told"
          className="m-0 flex flex-col gap-1 border-0 p-0"
        >
          <legend className="text-label text-ink mb-1 p-0">{teamWords.fields.disciplines}</legend>
          <div className="grid gap-x-6 gap-y-1 sm:grid-cols-2">
            {disciplines.map((one) => (
              <Checkbox
                key={one}
                label={disciplineNames[one]}
                value={field.value.includes(one)}
                onBlur={field.onBlur}
                onChange={(isHeld) =>
                  field.onChange(disciplines.filter((other) => (other === one ? isHeld : field.value.includes(other))))
                }
              />
            ))}
          </div>
          <div id="disciplines-told">
            <p className="text-fine text-ink-3 m-0">{teamWords.disciplinesHint}</p>
            <FieldError message={fieldState.error?.message} />
          </div>
        </fieldset>
      )}
    />
  );
}

function SupervisorChoice({ form, everyone, memberId }: MemberFieldsProps) {
  const held = useWatch({ control: form.control, name: 'disciplines' });
  const possible = everyone.filter(
    (one) =>
      one.id !== memberId &&
      one.status === 'active' &&
      one.standing === 'member' &&
      one.disciplines.some((discipline) => held.includes(discipline)),
  );
  return (
    <Controller
      control={form.control}
      name="supervisorId"
      render={({ field, fieldState }) => (
        <SelectField
          label={teamWords.fields.supervisor}
          name="supervisorId"
          ref={field.ref}
          value={possible.some(({ id }) => id === field.value) ? (field.value ?? '') : ''}
          options={possible.map(({ id, name }) => ({ value: id, label: name }))}
          hint={held.length > 0 && possible.length === 0 ? teamWords.nobodySupervises : teamWords.supervisorHint}
          error={fieldState.error?.message}
          onBlur={field.onBlur}
          onChange={(next) => field.onChange(next === '' ? null : next)}
        />
      )}
    />
  );
}
