import type { PlainDate } from '@weftway/calendar/plain-date';
import type { EvidenceValue } from '@weftway/contract/pathway';
import { rootStages, type EvidenceField as Field } from '@weftway/pathway/protocol';
import { isBlank } from '@weftway/pathway/sign-off-evidence';
import { useId, useState } from 'react';
import { Button } from '../../../ui/actions/button.tsx';
import { Checkbox } from '../../../ui/fields/checkbox.tsx';
import { DateField } from '../../../ui/fields/date-field.tsx';
import { NumberField } from '../../../ui/fields/number-field.tsx';
import { RadioField } from '../../../ui/fields/radio-field.tsx';
import { SelectField } from '../../../ui/fields/select-field.tsx';
import { TextArea } from '../../../ui/fields/text-area.tsx';
import { TextField } from '../../../ui/fields/text-field.tsx';
import { signingWords } from '../../../words/signing.ts';
import { faultOf } from '../model/evidence.ts';

interface EvidenceFieldProps {
  readonly field: Field;
  readonly value: EvidenceValue;
  readonly onChange: (value: EvidenceValue) => void;
  readonly birth?: PlainDate | undefined;
  /** Sent to be signed while this was empty. */
  readonly isAskedFor: boolean;
}

/** One field of the record, with the way to leave it empty for a reason and to confirm an unlikely value. */
export function EvidenceField({ field, value, onChange, birth, isAskedFor }: EvidenceFieldProps) {
  const [isLeaving, setLeaving] = useState(!isBlank(value.emptyBecause));
  const isEmpty = isBlank(value.value);
  const id = useId();
  if (isLeaving && isEmpty) {
    return (
      <div className="flex flex-col gap-1">
        <TextField
          name={field.name}
          label={`${field.label}: ${signingWords.emptyBecause.toLowerCase()}`}
          value={value.emptyBecause ?? ''}
          onChange={(emptyBecause) => onChange({ value: null, emptyBecause })}
          maxLength={300}
          error={isAskedFor && isBlank(value.emptyBecause) ? signingWords.missing(field.label) : undefined}
        />
        <div>
          <Button
            look="quiet"
            size="small"
            onClick={() => {
              setLeaving(false);
              onChange({ value: null });
            }}
          >
            {signingWords.fillInstead}
          </Button>
        </div>
      </div>
    );
  }
  const fault = faultOf({ [field.name]: value }, field);
  const error =
    isAskedFor && isEmpty
      ? signingWords.missing(field.label)
      : fault?.kind === 'impossible'
        ? fault.message
        : undefined;
  const isUnlikely = fault?.kind === 'unlikely';
  return (
    <div className="relative flex flex-col gap-1">
      <FieldControl
        field={field}
        value={value}
        onChange={onChange}
        birth={birth}
        error={error}
        warning={isUnlikely ? fault.message : undefined}
      />
      {isUnlikely || value.isConfirmed === true ? (
        <Checkbox
          label={signingWords.confirmLikely}
          value={value.isConfirmed ?? false}
          onChange={(isConfirmed) => onChange({ ...value, isConfirmed })}
        />
      ) : null}
      {isEmpty ? (
        <div className="absolute -top-1.5 right-0">
          <Button look="quiet" size="small" aria-describedby={id} onClick={() => setLeaving(true)}>
            {signingWords.emptyBecauseLink}
          </Button>
          <span id={id} hidden>
            {field.label}
          </span>
        </div>
      ) : null}
    </div>
  );
}

interface FieldControlProps extends Omit<EvidenceFieldProps, 'isAskedFor'> {
  readonly error: string | undefined;
  readonly warning: string | undefined;
}

const mostRadios = 4;

function FieldControl({ field, value, onChange, birth, error, warning }: FieldControlProps) {
  const hint = [field.hint ?? '', field.isPrivate === true ? signingWords.privateNote : '']
    .filter((text) => text !== '')
    .join(' ');
  const shared = { label: field.label, name: field.name, error, hint: hint === '' ? undefined : hint };
  const text = { ...shared, value: value.value ?? '', onChange: (typed: string) => onChange({ value: typed }) };
  const options = (values: readonly string[]) =>
    values.map((one) => ({ value: one, label: one.charAt(0).toUpperCase() + one.slice(1) }));
  const oneOf = (choices: readonly { value: string; label: string }[]) =>
    choices.length <= mostRadios ? (
      <RadioField {...text} options={choices} direction="across" />
    ) : (
      <SelectField {...text} options={choices} />
    );
  switch (field.kind) {
    case 'number':
      return (
        <NumberField
          {...shared}
          unit={field.unit}
          value={value.value === null || value.value === '' ? null : Number(value.value)}
          onChange={(typed) => onChange({ value: typed === null ? null : String(typed) })}
          warning={warning}
        />
      );
    case 'yes-no':
      return oneOf([
        { value: 'yes', label: signingWords.yes },
        { value: 'no', label: signingWords.no },
      ]);
    case 'choice':
      return oneOf(options(field.choices ?? []));
    case 'grade':
      return oneOf(signingWords.grades.map((label, at) => ({ value: String(at), label })));
    case 'root-stage':
      return <SelectField {...text} options={rootStages.map((stage) => ({ value: stage, label: stage }))} />;
    case 'date':
      return <DateField {...text} birth={birth} />;
    case 'long-text':
      return <TextArea {...text} rows={2} maxLength={4000} />;
    case 'text':
      return <TextField {...text} maxLength={300} />;
  }
}
