import { addDays, readPlainDate, type PlainDate } from '@weftway/calendar/plain-date';
import type { Member } from '@weftway/contract/member';
import type { Me } from '@weftway/contract/session';
import type { Signer } from '@weftway/pathway/protocol';
import { familyChoice, waiveFaults, waiverReasons } from '@weftway/pathway/sign-off-waive';
import { disciplineNames } from '@weftway/team/disciplines';
import { useState } from 'react';
import { isProblem } from '../../../api/api-client.ts';
import { pathwayMutations, type Place } from '../../../queries/pathway-queries.ts';
import { ComboboxField } from '../../../ui/fields/combobox-field.tsx';
import { DateField } from '../../../ui/fields/date-field.tsx';
import { PasswordField } from '../../../ui/fields/password-field.tsx';
import { RadioField } from '../../../ui/fields/radio-field.tsx';
import { TextArea } from '../../../ui/fields/text-area.tsx';
import { TextField } from '../../../ui/fields/text-field.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { signingWords } from '../../../words/signing.ts';
import type { MilestoneView } from '../model/milestone-view.ts';
import { clinicianOption, clinicians } from '../model/clinicians.ts';
import { useAct } from '../use-act.ts';
import { ActDialog } from './act-dialog.tsx';

interface WaiveDialogProps {
  readonly place: Place;
  readonly view: MilestoneView;
  readonly today: PlainDate;
  readonly birth: PlainDate | null;
  readonly me: Me;
  readonly isLeadClinician: boolean;
  readonly members: readonly Member[];
  readonly onClose: () => void;
}

type Kind = 'waived' | 'not-recoverable';

const shortReason = 3;

function useWaiver({ view, today, onClose, place, me, members, isLeadClinician }: WaiveDialogProps) {
  const act = useAct(pathwayMutations.waive, place);
  const [kind, setKind] = useState<Kind>(view.planned.isLapsed ? 'not-recoverable' : 'waived');
  const [reason, setReason] = useState('');
  const [note, setNote] = useState('');
  const [secondName, setSecondName] = useState('');
  // The default is the next yearly review.
  const [offerAgainOn, setOfferAgainOn] = useState<string>(addDays(today, 365));
  const [password, setPassword] = useState('');
  const [isTried, setTried] = useState(false);
  const offersAgain = kind === 'waived' && reason === familyChoice && view.rule.kind !== 'elective';
  const person = { ...me, isLeadClinician };
  const lacksSecond = (second: Member | null): boolean =>
    waiveFaults({
      rule: view.rule,
      planned: view.planned,
      person,
      second,
      kind,
      reason,
      offerAgainOn: null,
      today,
    }).some((fault) => fault.code === 'second-discipline-needed');
  const needsSecond = lacksSecond(null);
  const seconds = needsSecond ? clinicians(members, me.id).filter((member) => !lacksSecond(member)) : [];
  const reading = readPlainDate(offerAgainOn);
  const offer = reading.kind === 'date' && reading.date > today ? reading.date : null;
  const isReasonMissing = reason.trim().length < shortReason;
  const isSecondMissing = needsSecond && secondName.trim() === '';
  const submit = () => {
    setTried(true);
    if (isReasonMissing || isSecondMissing || password === '' || (offersAgain && offer === null)) return;
    const second = secondName.trim() === '' ? null : secondName.trim();
    act.mutate(
      {
        body: {
          kind,
          reason: reason.trim(),
          note: note.trim(),
          secondName: second,
          offerAgainOn: offersAgain ? offer : null,
          password,
        },
      },
      {
        onSuccess: () => {
          showToast({ text: signingWords.waive.done(view.title) });
          onClose();
        },
      },
    );
  };
  const errors = {
    reason: isTried && isReasonMissing,
    second: isTried && isSecondMissing,
    offer: isTried && offersAgain && offer === null,
    password: isTried && password === '',
  };
  const fields = { kind, reason, note, secondName, offerAgainOn, password };
  const set = { setKind, setReason, setNote, setSecondName, setOfferAgainOn, setPassword };
  return { act, fields, set, errors, offersAgain, seconds, needsSecond, submit };
}

/** Records that it will not be done: why, who decided, and when a family is asked again. */
export function WaiveDialog(props: WaiveDialogProps) {
  const words = signingWords.waive;
  const { view, birth } = props;
  const { act, fields, set, errors, offersAgain, seconds, needsSecond, submit } = useWaiver(props);
  const wrong = isProblem(act.error, 'wrong-password')
    ? (act.error.problem.detail ?? signingWords.wrongPassword)
    : undefined;
  const mine: readonly Signer[] = props.me.disciplines;
  const others = (view.rule.waiverNeeds ?? [])
    .filter((group) => !group.some((one) => mine.includes(one)))
    .map((group) =>
      group.map((one) => (one === 'lead-clinician' ? words.lead : disciplineNames[one].toLowerCase())).join(' or '),
    );
  return (
    <ActDialog
      title={words.title}
      onClose={props.onClose}
      onSubmit={submit}
      submitLabel={words.save(props.me.name)}
      isBusy={act.isPending}
      error={act.error}
      look="danger"
    >
      <p className="text-body m-0">
        <strong>{view.title}.</strong> {words.text}
      </p>
      {view.planned.isLapsed ? (
        <RadioField
          label={words.kind}
          value={fields.kind}
          onChange={(kind) => set.setKind(kind === 'waived' ? 'waived' : 'not-recoverable')}
          options={[
            { value: 'not-recoverable', label: words.kinds['not-recoverable'] },
            { value: 'waived', label: words.kinds.waived },
          ]}
        />
      ) : null}
      {fields.kind === 'waived' ? (
        <RadioField
          label={words.reason}
          value={fields.reason}
          onChange={set.setReason}
          error={errors.reason ? words.reasonError : undefined}
          options={waiverReasons(view.rule).map((one) => ({ value: one, label: one }))}
        />
      ) : (
        <TextField
          label={words.otherReason}
          value={fields.reason}
          onChange={set.setReason}
          error={errors.reason ? signingWords.hold.reasonError : undefined}
        />
      )}
      {needsSecond ? (
        <ComboboxField
          label={words.secondName}
          hint={words.secondHint(others.join(' and '))}
          value={fields.secondName === '' ? null : fields.secondName}
          onChange={(name) => set.setSecondName(name ?? '')}
          options={seconds.map(clinicianOption)}
          error={errors.second ? words.secondError : undefined}
        />
      ) : null}
      {offersAgain ? (
        <DateField
          label={words.offerAgain}
          hint={words.offerHint}
          value={fields.offerAgainOn}
          onChange={set.setOfferAgainOn}
          birth={birth ?? undefined}
          error={errors.offer ? words.offerError : undefined}
        />
      ) : null}
      <TextArea label={words.note} rows={2} value={fields.note} onChange={set.setNote} maxLength={1000} />
      <PasswordField
        label={signingWords.password}
        value={fields.password}
        onChange={set.setPassword}
        error={wrong ?? (errors.password ? signingWords.passwordMissing : undefined)}
      />
    </ActDialog>
  );
}
