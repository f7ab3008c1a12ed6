import { addMonths, readPlainDate, type PlainDate } from '@weftway/calendar/plain-date';
import { milestoneCatalogue } from '@weftway/pathway/milestone-catalogue';
import { laneNames } from '@weftway/team/lanes';
import { useState } from 'react';
import { pathwayMutations } from '../../../queries/pathway-queries.ts';
import { ComboboxField } from '../../../ui/fields/combobox-field.tsx';
import { DateField } from '../../../ui/fields/date-field.tsx';
import { TextArea } from '../../../ui/fields/text-area.tsx';
import { TextField } from '../../../ui/fields/text-field.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { pathwayWords } from '../../../words/pathway.ts';
import { signingWords } from '../../../words/signing.ts';
import type { ChildPlan } from '../model/child-plan.ts';
import { useAct } from '../use-act.ts';
import { ActDialog } from './act-dialog.tsx';

interface OwnMilestoneDialogProps {
  readonly of: ChildPlan;
  readonly onClose: () => void;
}

const dayOf = (text: string): PlainDate | null => {
  const reading = readPlainDate(text);
  return reading.kind === 'date' ? reading.date : null;
};

/** A milestone that the protocol does not know, for this child alone. */
export function OwnMilestoneDialog({ of, onClose }: OwnMilestoneDialogProps) {
  const words = pathwayWords.own;
  const act = useAct(pathwayMutations.addOwn, { childId: of.pathway.child.id, milestone: '' });
  const [kind, setKind] = useState<string | null>(null);
  const [title, setTitle] = useState('');
  const [days, setDays] = useState<Readonly<Record<'earliest' | 'target' | 'latest', string>>>({
    earliest: of.today,
    target: addMonths(of.today, 3),
    latest: addMonths(of.today, 6),
  });
  const [reason, setReason] = useState('');
  const [isTried, setTried] = useState(false);
  const choose = (id: string | null) => {
    setKind(id);
    const template = milestoneCatalogue.find((one) => one.id === id);
    if (template !== undefined) setTitle(template.title);
  };
  const [earliest, target, latest] = [dayOf(days.earliest), dayOf(days.target), dayOf(days.latest)];
  const isInOrder = earliest !== null && target !== null && latest !== null && earliest <= target && target <= latest;
  const submit = () => {
    setTried(true);
    if (kind === null || title.trim() === '' || !isInOrder || reason.trim().length < 3) return;
    act.mutate(
      { body: { catalogueId: kind, title: title.trim(), earliest, target, latest, reason: reason.trim() } },
      {
        onSuccess: () => {
          showToast({ text: words.done(title.trim()) });
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
        value={kind}
        onChange={choose}
        options={milestoneCatalogue.map((one) => ({ value: one.id, label: one.title, detail: laneNames[one.lane] }))}
        error={isTried && kind === null ? words.whichError : undefined}
      />
      <TextField
        label={words.name}
        value={title}
        onChange={setTitle}
        maxLength={80}
        error={isTried && title.trim() === '' ? words.nameError : undefined}
      />
      {(['earliest', 'target', 'latest'] as const).map((which) => (
        <DateField
          key={which}
          label={words[which]}
          value={days[which]}
          onChange={(day) => setDays((was) => ({ ...was, [which]: day }))}
          birth={of.pathway.facts.birth ?? undefined}
          error={
            isTried && dayOf(days[which]) === null
              ? words.dateError
              : isTried && which === 'latest' && !isInOrder
                ? words.orderError
                : undefined
          }
        />
      ))}
      <TextArea
        label={words.reason}
        rows={2}
        value={reason}
        onChange={setReason}
        error={isTried && reason.trim().length < 3 ? words.reasonError : undefined}
      />
      <p className="text-fine text-ink-3 m-0">{signingWords.ownHint}</p>
    </ActDialog>
  );
}
