import { formatDate } from '@weftway/calendar/format-date';
import { readPlainDate, type PlainDate } from '@weftway/calendar/plain-date';
import type { Evidence, Signature } from '@weftway/contract/pathway';
import type { EvidenceField as Field } from '@weftway/pathway/protocol';
import { missingFields, valueFaults } from '@weftway/pathway/sign-off-evidence';
import { useState } from 'react';
import { isProblem } from '../../../api/api-client.ts';
import { pathwayMutations, type Place } from '../../../queries/pathway-queries.ts';
import { DateField } from '../../../ui/fields/date-field.tsx';
import { PasswordField } from '../../../ui/fields/password-field.tsx';
import { TextArea } from '../../../ui/fields/text-area.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { signingWords } from '../../../words/signing.ts';
import { EvidenceField } from '../evidence/evidence-field.tsx';
import { valueOf } from '../model/evidence.ts';
import { useAct } from '../use-act.ts';
import { ActDialog } from './act-dialog.tsx';

interface AmendDialogProps {
  readonly place: Place;
  readonly title: string;
  readonly signature: Signature;
  readonly fields: readonly Field[];
  /** What was typed while somebody else signed; else what was signed. */
  readonly start: Evidence;
  readonly birth: PlainDate | null;
  readonly today: PlainDate;
  readonly signer: string;
  readonly onClose: () => void;
}

/** Puts a signed entry right by a further one; the first stays readable. */
export function AmendDialog(props: AmendDialogProps) {
  const { place, title, signature, fields, birth, today, signer, onClose } = props;
  const words = signingWords.amend;
  const act = useAct(pathwayMutations.amend, place);
  const [values, setValues] = useState<Evidence>({ ...signature.values, ...props.start });
  const [performedOn, setPerformedOn] = useState<string>(signature.performedOn);
  const [reason, setReason] = useState('');
  const [password, setPassword] = useState('');
  const [isTried, setTried] = useState(false);
  const reading = readPlainDate(performedOn);
  const day = reading.kind === 'date' && reading.date <= today ? reading.date : null;
  const isUnsound = missingFields(fields, values).length > 0 || valueFaults(fields, values).length > 0;
  const wrong = isProblem(act.error, 'wrong-password')
    ? (act.error.problem.detail ?? signingWords.wrongPassword)
    : undefined;
  const submit = () => {
    setTried(true);
    if (day === null || isUnsound || reason.trim().length < 3 || password === '') return;
    act.mutate(
      { body: { signatureId: signature.id, performedOn: day, values, reason: reason.trim(), password } },
      {
        onSuccess: () => {
          showToast({ text: words.done });
          onClose();
        },
      },
    );
  };
  return (
    <ActDialog
      title={words.title}
      onClose={onClose}
      onSubmit={submit}
      submitLabel={words.save(signer)}
      isBusy={act.isPending}
      error={act.error}
    >
      <p className="text-body m-0">
        <strong>{title}.</strong> {words.read(signature.signerName, formatDate(signature.performedOn))}
      </p>
      <DateField
        label={signingWords.performedOn}
        value={performedOn}
        onChange={setPerformedOn}
        birth={birth ?? undefined}
        error={isTried && day === null ? signingWords.dayMissing : undefined}
      />
      {fields.map((field) => (
        <EvidenceField
          key={field.name}
          field={{ ...field, name: `amend-${field.name}` }}
          value={valueOf(values, field.name)}
          onChange={(value) => setValues((was) => ({ ...was, [field.name]: value }))}
          birth={birth ?? undefined}
          isAskedFor={isTried}
        />
      ))}
      <TextArea
        label={words.reason}
        rows={2}
        value={reason}
        onChange={setReason}
        error={isTried && reason.trim().length < 3 ? signingWords.hold.reasonError : undefined}
      />
      <PasswordField
        label={signingWords.password}
        value={password}
        onChange={setPassword}
        error={wrong ?? (isTried && password === '' ? signingWords.passwordMissing : undefined)}
      />
    </ActDialog>
  );
}
