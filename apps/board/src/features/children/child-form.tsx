import { useState, type FormEvent, type ReactNode } from 'react';
import { FormProvider, useForm } from 'react-hook-form';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { ChildFields, ChildFlag } from '@weftway/contract/child';
import { childDateDoubts, type DateFault } from '@weftway/contract/child-date-rules';
import { Button } from '../../ui/actions/button.tsx';
import { Checkbox } from '../../ui/fields/checkbox.tsx';
import { ErrorSummary } from '../../ui/fields/error-summary.tsx';
import { Notice } from '../../ui/notices/notice.tsx';
import { childFormWords } from '../../words/children.ts';
import { AlertRows } from './alert-rows.tsx';
import { BirthFields } from './birth-fields.tsx';
import { CleftFields } from './cleft-fields.tsx';
import { ContactRows } from './contact-rows.tsx';
import { NameFields } from './name-fields.tsx';
import { TeamFields, type TeamChoices } from './team-fields.tsx';
import { childResolver, flatFaults } from './child-resolver.ts';
import { readChildForm, type ChildFormValues, type ChildKind, type FormFault } from './child-form-values.ts';

export interface CleftEntrySlot {
  readonly value: string;
  readonly onChange: (code: string) => void;
  readonly onBlur: () => void;
  readonly name: string;
  readonly error: string | undefined;
  readonly flags: readonly ChildFlag[];
  readonly isReadOnly: boolean;
}

export interface FormReach {
  readonly mayIdentity: boolean;
  readonly mayCleft: boolean;
  /** May say that a code is confirmed. */
  readonly mayConfirm: boolean;
}

interface ChildFormProps {
  readonly start: ChildFormValues;
  readonly reach: FormReach;
  readonly choices: TeamChoices;
  readonly today: PlainDate;
  readonly kind: ChildKind;
  readonly sendLabel: string;
  readonly isBusy: boolean;
  /** What the server refused, by field. */
  readonly refusals: readonly FormFault[];
  readonly renderCleft: (slot: CleftEntrySlot) => ReactNode;
  readonly onSend: (fields: ChildFields) => void;
  /** Told on leaving the names, number or birth date of a new child. */
  readonly onIdentity?: ((values: ChildFormValues) => void) | undefined;
  /** Stands behind names and birth: children that may be the same. */
  readonly besideIdentity?: ReactNode;
  /** Stands over the button. */
  readonly children?: ReactNode;
  readonly leave: ReactNode;
}

/** The form of a child, one column. Mistakes are told on leaving a field; sending puts their count above. */
export function ChildForm(props: ChildFormProps) {
  const { start, reach, choices, today, kind, onSend, onIdentity } = props;
  const form = useForm<ChildFormValues>({
    defaultValues: start,
    mode: 'onTouched',
    shouldFocusError: false,
    resolver: childResolver(today, kind),
  });
  const [attempt, setAttempt] = useState(0);
  const [doubts, setDoubts] = useState<readonly DateFault[]>([]);
  const [isSure, setSure] = useState(false);
  const sent =
    attempt === 0
      ? []
      : [...flatFaults(form.formState.errors), ...props.refusals].filter(
          (fault, index, all) => all.findIndex(({ name }) => name === fault.name) === index,
        );

  const send = (event: FormEvent) => {
    event.preventDefault();
    void form.handleSubmit(() => {
      const reading = readChildForm(form.getValues(), today, kind);
      if (reading.kind === 'faults') return;
      const found = childDateDoubts(reading.fields, today);
      setDoubts(found);
      if (found.length === 0 || isSure) onSend(reading.fields);
    })();
    setAttempt(attempt + 1);
  };

  return (
    <FormProvider {...form}>
      <form
        noValidate
        onSubmit={send}
        onBlur={() => onIdentity?.(form.getValues())}
        className="flex max-w-2xl flex-col gap-8"
      >
        <ErrorSummary errors={sent} attempt={attempt} />
        {reach.mayIdentity ? null : <Notice kind="note" title={childFormWords.identityClosed} />}
        <NameFields isReadOnly={!reach.mayIdentity} refusals={props.refusals} />
        <BirthFields kind={kind} today={today} isReadOnly={!reach.mayIdentity} refusals={props.refusals} />
        {props.besideIdentity}
        <CleftFields reach={reach} refusals={props.refusals} renderCleft={props.renderCleft} />
        <TeamFields kind={kind} isReadOnly={!reach.mayIdentity} refusals={props.refusals} choices={choices} />
        <ContactRows isReadOnly={!reach.mayIdentity} refusals={props.refusals} />
        <AlertRows isReadOnly={!reach.mayIdentity} refusals={props.refusals} />
        {props.children}
        {doubts.length === 0 ? null : (
          <Notice kind="conflict" title={childFormWords.doubts}>
            <ul className="m-0 mb-2 list-none p-0">
              {doubts.map((doubt) => (
                <li key={doubt.detail}>{doubt.detail}</li>
              ))}
            </ul>
            <Checkbox label={childFormWords.unlikely} value={isSure} onChange={setSure} />
          </Notice>
        )}
        <div className="flex flex-wrap items-center gap-2">
          <Button type="submit" look="filled" isBusy={props.isBusy}>
            {props.sendLabel}
          </Button>
          {props.leave}
        </div>
      </form>
    </FormProvider>
  );
}
