import { formatDate } from '@weftway/calendar/format-date';
import { readPlainDate, type PlainDate } from '@weftway/calendar/plain-date';
import { useState } from 'react';
import { pathwayMutations } from '../../../queries/pathway-queries.ts';
import { ComboboxField } from '../../../ui/fields/combobox-field.tsx';
import { DateField } from '../../../ui/fields/date-field.tsx';
import { RadioField } from '../../../ui/fields/radio-field.tsx';
import { TextField } from '../../../ui/fields/text-field.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { findingWords } from '../../../words/findings.ts';
import { pathwayWords } from '../../../words/pathway.ts';
import type { ChildPlan } from '../model/child-plan.ts';
import { findingNames } from '../model/finding-names.ts';
import { useAct } from '../use-act.ts';
import { ActDialog } from './act-dialog.tsx';

interface FindingDialogProps {
  readonly of: ChildPlan;
  readonly onClose: () => void;
}

/** A finding that starts or ends a milestone, with its day. */
export function FindingDialog({ of, onClose }: FindingDialogProps) {
  const words = pathwayWords.finding;
  const act = useAct(pathwayMutations.recordFinding, { childId: of.pathway.child.id, milestone: '' });
  const [name, setName] = useState<string | null>(null);
  const [on, setOn] = useState<string>(of.today);
  const [presence, setPresence] = useState('yes');
  const [note, setNote] = useState('');
  const [isTried, setTried] = useState(false);
  const reading = readPlainDate(on);
  const day: PlainDate | null = reading.kind === 'date' && reading.date <= of.today ? reading.date : null;
  const known = new Map(of.pathway.facts.findings.map((finding) => [finding.name, finding.on]));
  const options = findingNames(of.protocol).map((one) => {
    const since = known.get(one);
    return {
      value: one,
      label: findingWords(one),
      ...(since === undefined ? {} : { detail: words.recorded(formatDate(since)) }),
    };
  });
  const submit = () => {
    setTried(true);
    if (name === null || day === null) return;
    act.mutate(
      { body: { name, on: day, isPresent: presence === 'yes', note: note.trim() } },
      {
        onSuccess: () => {
          showToast({ text: words.done(findingWords(name)) });
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
      submitLabel={words.save}
      isBusy={act.isPending}
      error={act.error}
    >
      <p className="text-body m-0">{words.text}</p>
      <ComboboxField
        label={words.which}
        value={name}
        onChange={setName}
        options={options}
        error={isTried && name === null ? words.nameError : undefined}
      />
      <RadioField
        label={words.present}
        value={presence}
        onChange={setPresence}
        options={[
          { value: 'yes', label: words.yes },
          { value: 'no', label: words.no },
        ]}
      />
      <DateField
        label={words.on}
        value={on}
        onChange={setOn}
        birth={of.pathway.facts.birth ?? undefined}
        error={isTried && day === null ? words.dateError : undefined}
      />
      <TextField label={words.note} value={note} onChange={setNote} maxLength={300} />
    </ActDialog>
  );
}
