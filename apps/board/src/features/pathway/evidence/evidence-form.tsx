import type { PlainDate } from '@weftway/calendar/plain-date';
import type { EvidenceField as Field } from '@weftway/pathway/protocol';
import { Button } from '../../../ui/actions/button.tsx';
import { DateField } from '../../../ui/fields/date-field.tsx';
import { Notice } from '../../../ui/notices/notice.tsx';
import { signingWords } from '../../../words/signing.ts';
import { valueOf } from '../model/evidence.ts';
import { EvidenceField } from './evidence-field.tsx';
import { evidenceText } from './evidence-text.ts';
import type { EvidenceDraft } from './use-evidence-draft.ts';

interface EvidenceFormProps {
  readonly fields: readonly Field[];
  readonly draft: Pick<
    EvidenceDraft,
    'values' | 'performedOn' | 'day' | 'change' | 'changeDay' | 'both' | 'choose' | 'isMerged'
  >;
  readonly birth: PlainDate | null;
  readonly today: PlainDate;
  /** Tried to sign: what is missing is said at each field. */
  readonly isAskedFor: boolean;
}

/** The record that a signature needs, kept as a draft while it is typed. */
export function EvidenceForm({ fields, draft, birth, today, isAskedFor }: EvidenceFormProps) {
  const isAhead = draft.day !== null && draft.day > today;
  const dayError = isAhead
    ? signingWords.dayAhead
    : isAskedFor && draft.day === null
      ? signingWords.dayMissing
      : undefined;
  return (
    <div className="flex flex-col gap-3.5">
      {draft.both.length > 0 ? <BothChanged fields={fields} draft={draft} /> : null}
      {draft.both.length === 0 && draft.isMerged ? (
        <p role="status" className="text-small text-ink-2 m-0">
          {signingWords.draft.merged}
        </p>
      ) : null}
      <DateField
        name="performedOn"
        label={signingWords.performedOn}
        value={draft.performedOn}
        onChange={draft.changeDay}
        birth={birth ?? undefined}
        error={dayError}
      />
      {fields.map((field) => (
        <EvidenceField
          key={field.name}
          field={field}
          value={valueOf(draft.values, field.name)}
          onChange={(value) => draft.change(field.name, value)}
          birth={birth ?? undefined}
          isAskedFor={isAskedFor}
        />
      ))}
    </div>
  );
}

function BothChanged({ fields, draft }: Pick<EvidenceFormProps, 'fields' | 'draft'>) {
  return (
    <Notice kind="conflict" title={signingWords.draft.choose}>
      <ul className="m-0 flex list-none flex-col gap-2 p-0">
        {draft.both.map(({ name, mine, theirs }) => {
          const field = fields.find((one) => one.name === name);
          return (
            <li key={name} className="flex flex-col gap-1">
              <span className="text-label">{field?.label ?? name}</span>
              <span className="flex flex-wrap gap-2">
                <Button size="small" onClick={() => draft.choose(name, mine)}>
                  {signingWords.draft.mine(evidenceText(field, mine))}
                </Button>
                <Button size="small" onClick={() => draft.choose(name, theirs)}>
                  {signingWords.draft.theirs(evidenceText(field, theirs))}
                </Button>
              </span>
            </li>
          );
        })}
      </ul>
    </Notice>
  );
}

/** 24-hour time of an instant, on this computer's clock. */
export const timeOf = (instant: string): string =>
  new Date(instant).toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' });

export function DraftStatus({ status, keptAt }: Pick<EvidenceDraft, 'status' | 'keptAt'>) {
  const text = {
    none: '',
    typing: signingWords.draft.typing,
    saving: signingWords.draft.saving,
    failed: signingWords.draft.failed,
    kept: keptAt === null ? '' : signingWords.draft.kept(timeOf(keptAt)),
  }[status];
  return (
    <p role="status" className={`text-fine m-0 min-h-4 ${status === 'failed' ? 'text-madder' : 'text-ink-3'}`}>
      {text}
    </p>
  );
}
